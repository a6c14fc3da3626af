// Stands in for a command: starts a server and a group with a grandchild that will not listen, says their numbers, and waits.
import { atEnd, end, endOnSignals, launch, untilStopped } from "../../../scripts/ground/processes.mjs";

endOnSignals({ onInterrupt: 0 });
atEnd("first started", async () => void process.stdout.write("ended: first started\n"));
const server = launch("sleep", ["60"]);
const group = launch("sh", ["-c", "(trap '' TERM; sleep 61 & echo grandchild $!; wait) & sleep 62"]);
atEnd("last started", async () => void process.stdout.write("ended: last started\n"));
process.stdout.write(`children ${server.child.pid} ${group.child.pid}\n`);
if (process.argv[2] === "fail") setTimeout(() => void end(1), 300);
await untilStopped();
