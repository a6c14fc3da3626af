/**
 * The process that works off long tasks beside the web server, on the same machine. A process and not threads alone: the image library works
 * in threads that cannot be told apart from those the web server reads files with, and only a whole process can be told to stand back.
 */
import "server-only";
import { type ChildProcess, spawn } from "node:child_process";
import path from "node:path";
import { log } from "../log";

/** Steps of nice(2): where both want the processor, this one gets a tenth of it. */
const standBack = 10;
/** Two pictures, each encoded in two threads, and files read and written meanwhile. Node.js has four by itself. */
const libraryThreads = "8";
/** A process that ends at once each time must not be all the machine does. */
const restartMs = 2_000;

/** Starts it, starts it again should it end, and takes it along when this process is asked to end; it also ends by itself when this one is gone. */
export function keepWorkerBeside(): void {
  let child: ChildProcess | undefined;
  let ending = false;
  const begin = () => {
    const started = spawnWorker();
    child = started;
    started.once("error", (error) => log().error({ err: error }, "the process for long work could not be started"));
    started.once("close", (code, signal) => {
      if (ending) return;
      log().error({ code, signal }, "the process for long work ended; starting it again");
      setTimeout(() => ending || begin(), restartMs).unref();
    });
  };
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) {
    process.once(signal, () => {
      ending = true;
      child?.kill("SIGTERM");
    });
  }
  begin();
}

function spawnWorker(): ChildProcess {
  // Made by scripts/bundle.mjs. The comment keeps the bundler from following a path that exists at run time only.
  const file = path.join(/* turbopackIgnore: true */ process.cwd(), ".data", "build", "worker.mjs");
  const program = [process.execPath, "--enable-source-maps", file];
  // By `nice`, because threads that are there when the process sets its own priority would keep theirs.
  return spawn("nice", ["-n", String(standBack), ...program], {
    stdio: ["ignore", "inherit", "inherit", "ipc"],
    env: { ...process.env, UV_THREADPOOL_SIZE: process.env.UV_THREADPOOL_SIZE || libraryThreads },
  });
}
