/** `npm run worker`, and the process beside the web server: works off tasks on this machine until it is asked to end. */
import { openPool } from "@/lib/server/database";
import { startWorking } from "@/lib/server/tasks/start";

// The web server that started this process is gone, however it ended: nobody would ever ask this one to end. Alone, the line to it
// keeps nothing running.
process.once("disconnect", () => process.kill(process.pid, "SIGTERM"));
process.channel?.unref();

await startWorking();
await openPool().pool.end();
