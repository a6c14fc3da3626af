// Starts child processes and sees that none of them outlives this one, whichever way it ends.
// Every child leads a process group of its own: Ctrl-C reaches this process alone, which then stops the children newest first,
// so that a web server is gone before the database under it.
import { spawn } from "node:child_process";
import { complain } from "./say.mjs";

/** Exit codes by convention: 128 + the signal's number. */
const signals = { SIGINT: 130, SIGTERM: 143, SIGHUP: 129 };

/** A polite stop is given this long before the group is killed. A database writes its pages in about a second. */
const graceMs = 10_000;

/** @type {{ name: string, stop: () => Promise<void> }[]} */
const standing = [];

/** @type {Promise<never> | undefined} */
let ending;

/**
 * Registers something to undo at the end; the newest is undone first. Returns a function that takes it off the list again.
 * @param {string} name
 * @param {() => Promise<void>} stop
 */
export function atEnd(name, stop) {
  const entry = { name, stop };
  standing.push(entry);
  return () => {
    const index = standing.indexOf(entry);
    if (index >= 0) standing.splice(index, 1);
  };
}

/**
 * Starts a program in its own process group and stops it at the end if it is still running.
 * @param {string} program
 * @param {string[]} args
 * @param {{ env?: NodeJS.ProcessEnv, cwd?: string, stdio?: import("node:child_process").StdioOptions, shared?: boolean }} [options]
 *   shared: the program outlives this process on purpose; whoever asks for it stops it
 */
export function launch(program, args, { shared = false, ...options } = {}) {
  const child = spawn(program, args, { stdio: ["ignore", "inherit", "inherit"], ...options, detached: true });
  /** @type {Promise<number>} */
  const exited = new Promise((resolve) => {
    child.once("error", (cause) => {
      complain(cause);
      resolve(127);
    });
    child.once("exit", (code, signal) => resolve(code ?? (signal ? 128 : 1)));
  });
  if (shared) return { child, exited };
  const forget = atEnd(program, () => stopGroup(child, exited));
  void exited.then(forget);
  return { child, exited };
}

/**
 * Runs a program to its end and returns its exit code.
 * @param {string} program
 * @param {string[]} args
 * @param {Parameters<typeof launch>[2]} [options]
 */
export async function run(program, args, options) {
  const code = await launch(program, args, options).exited;
  // While everything is being stopped, a child ends because it was told to; its code must not be taken for a result.
  if (ending) await ending;
  return code;
}

/**
 * @param {import("node:child_process").ChildProcess} child
 * @param {Promise<number>} exited
 */
async function stopGroup(child, exited) {
  if (child.pid === undefined) return;
  signalGroup(child.pid, "SIGTERM");
  const late = setTimeout(signalGroup, graceMs, child.pid, "SIGKILL");
  await exited;
  clearTimeout(late);
  // The leader is gone; what it may have left in its group goes too.
  signalGroup(child.pid, "SIGKILL");
}

/**
 * @param {number} pid
 * @param {NodeJS.Signals} signal
 */
function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // No such group: already ended.
  }
}

/**
 * Stops everything, newest first, and leaves with the code. A second call waits for the first.
 * @param {number} code
 * @returns {Promise<never>}
 */
export function end(code) {
  ending ??= stopAll().then(() => process.exit(code));
  return ending;
}

/** Whether everything is being stopped: failures seen now are its doing. */
export function isEnding() {
  return ending !== undefined;
}

async function stopAll() {
  for (let entry = standing.at(-1); entry; entry = standing.at(-1)) {
    standing.pop();
    try {
      await entry.stop();
    } catch (cause) {
      complain(cause);
    }
  }
}

/**
 * Ends properly on Ctrl-C, a request to stop and a closed terminal, and when the npm that started this process has vanished.
 * @param {{ onInterrupt?: number }} [options] the exit code for Ctrl-C: 0 where it is the usual way to stop
 */
export function endOnSignals({ onInterrupt = signals.SIGINT } = {}) {
  for (const [signal, code] of Object.entries(signals)) {
    process.on(signal, () => void end(signal === "SIGINT" ? onInterrupt : code));
  }
  // npm passes on SIGINT and SIGTERM only. When it is killed otherwise its child gets another parent, and nobody is left to press Ctrl-C.
  if (process.env.npm_lifecycle_event !== undefined) {
    const parent = process.ppid;
    setInterval(() => {
      if (process.ppid !== parent) void end(signals.SIGHUP);
    }, 500).unref();
  }
}

/** Waits for a signal to end the process. */
export function untilStopped() {
  /** @type {Promise<number>} */
  const never = new Promise(() => {});
  // A promise alone does not keep Node.js running.
  setInterval(() => {}, 1 << 30);
  return never;
}
