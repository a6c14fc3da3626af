// What package.json's commands call: node scripts/run.mjs start | dev | test | bench | worker | check | database.
// Until `npm ci` has run there are no packages, so everything reached from here imports node: builtins alone.
import { isNodeSupported } from "./ground/node-version.mjs";
import { end, endOnSignals, isEnding } from "./ground/processes.mjs";
import { complain, Refusal } from "./ground/say.mjs";

/** @type {Record<string, () => Promise<{ command: (args: string[]) => Promise<number>, onInterrupt?: number }>>} */
const commands = {
  start: () => import("./commands/start.mjs"),
  dev: () => import("./commands/dev.mjs"),
  test: () => import("./commands/test.mjs"),
  bench: () => import("./commands/bench.mjs"),
  check: () => import("./commands/check.mjs"),
  worker: () => import("./commands/worker.mjs"),
  database: () => import("./commands/database.mjs"),
};

const [name = "", ...args] = process.argv.slice(2);
try {
  if (!isNodeSupported(process.versions.node)) {
    throw new Refusal(
      `This is Node.js ${process.versions.node}; the project runs on 20.19 or newer, 22.12 or newer, and 24.`,
      "Install one of these and run the command again.",
    );
  }
  const load = commands[name];
  if (!load) throw new Refusal(`"${name}" is not a command.`, `Use one of: ${Object.keys(commands).join(", ")}.`);
  process.env.NEXT_TELEMETRY_DISABLED = "1";
  // Colours are for eyes, not for logs.
  if (!process.stdout.isTTY) process.env.NO_COLOR ??= "1";
  const { command, onInterrupt } = await load();
  endOnSignals({ onInterrupt });
  await end(await command(args));
} catch (failure) {
  if (!isEnding()) complain(failure);
  await end(1);
}
