// One at a time, across processes: a file that names its holder. A holder that died no longer counts.
import fs from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";
import { isAlive, ownIdentity } from "./process-identity.mjs";
import { atEnd } from "./processes.mjs";
import { inRun } from "./project.mjs";
import { say } from "./say.mjs";

/**
 * Takes the lock file, or returns the identity of the living process that holds it.
 * @param {string} file
 * @returns {{ kind: "taken", release: () => void } | { kind: "held", by: string }}
 */
export function tryLock(file) {
  const own = ownIdentity();
  // Linked into place whole, so that nobody ever reads a lock file before the name is in it.
  const draft = `${file}.${process.pid}`;
  fs.writeFileSync(draft, own);
  try {
    for (;;) {
      try {
        fs.linkSync(draft, file);
        return { kind: "taken", release: () => fs.rmSync(file, { force: true }) };
      } catch (cause) {
        if (!(cause instanceof Error) || !("code" in cause) || cause.code !== "EEXIST") throw cause;
      }
      const holder = readHolder(file);
      if (holder !== undefined && isAlive(holder)) return { kind: "held", by: holder };
      fs.rmSync(file, { force: true });
    }
  } finally {
    fs.rmSync(draft, { force: true });
  }
}

/** @param {string} file */
function readHolder(file) {
  try {
    return fs.readFileSync(file, "utf8");
  } catch {
    return undefined;
  }
}

/**
 * Does the work while holding the lock of that name, waiting for another holder to finish first.
 * @template T
 * @param {string} name
 * @param {string} doing what the other process is doing, as the waiting line puts it
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withLock(name, doing, work) {
  const file = inRun(`${name}.lock`);
  let told = false;
  for (;;) {
    const attempt = tryLock(file);
    if (attempt.kind === "taken") {
      const forget = atEnd(`lock ${name}`, async () => attempt.release());
      try {
        return await work();
      } finally {
        forget();
        attempt.release();
      }
    }
    // Stopping in the middle of locked work: the clean-up may touch what the work held.
    if (attempt.by === ownIdentity()) return work();
    if (!told) say(`Waiting for process ${Number.parseInt(attempt.by, 10)}, which is ${doing}.`);
    told = true;
    await sleep(500);
  }
}
