import { spawn } from "node:child_process";
import { once } from "node:events";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterEach, beforeEach, expect, test } from "vitest";
import { tryLock } from "../../scripts/ground/lock.mjs";
import { identityOf, ownIdentity } from "../../scripts/ground/process-identity.mjs";

let folder = "";
const lock = () => path.join(folder, "work.lock");

beforeEach(() => {
  folder = fs.mkdtempSync(path.join(os.tmpdir(), "grainwright-lock-"));
});
afterEach(() => fs.rmSync(folder, { recursive: true }));

test("a lock is held by one until it is released", () => {
  const first = tryLock(lock());
  expect(tryLock(lock())).toEqual({ kind: "held", by: ownIdentity() });
  if (first.kind === "taken") first.release();
  expect(tryLock(lock()).kind).toBe("taken");
});

test("a lock of another living process is respected, and taken over once that process has died", async () => {
  const other = spawn("sleep", ["60"]);
  await once(other, "spawn");
  const identity = identityOf(other.pid ?? 0) ?? "";
  fs.writeFileSync(lock(), identity);
  expect(tryLock(lock())).toEqual({ kind: "held", by: identity });
  other.kill("SIGKILL");
  await once(other, "exit");
  expect(tryLock(lock()).kind).toBe("taken");
});

test("a number that now belongs to another process does not count as the holder", () => {
  fs.writeFileSync(lock(), `${process.pid}:1`);
  expect(tryLock(lock()).kind).toBe("taken");
});

test("trying leaves nothing beside the lock itself", () => {
  tryLock(lock());
  tryLock(lock());
  expect(fs.readdirSync(folder)).toEqual(["work.lock"]);
});
