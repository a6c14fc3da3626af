import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { setTimeout as sleep } from "node:timers/promises";
import { fileURLToPath } from "node:url";
import { afterEach, expect, test } from "vitest";
import { identityOf, isAlive } from "../../scripts/ground/process-identity.mjs";

const program = fileURLToPath(new URL("programs/ground.mjs", import.meta.url));
const started: ChildProcess[] = [];

afterEach(() => {
  for (const child of started.splice(0)) child.kill("SIGKILL");
});

/** Runs the stand-in by a shell command and waits until it has named its children. */
async function startGround(shellCommand: string, env: Record<string, string> = {}) {
  const ground = spawn("sh", ["-c", shellCommand, "sh", process.execPath, program], {
    env: { ...process.env, ...env },
    stdio: ["ignore", "pipe", "inherit"],
  });
  started.push(ground);
  let text = "";
  ground.stdout.setEncoding("utf8").on("data", (part: string) => {
    text += part;
  });
  while (!/children/.test(text) || !/grandchild/.test(text)) await sleep(20);
  const numbers = [...text.matchAll(/\d+/g)].map(Number);
  return { ground, children: numbers.map((pid) => identityOf(pid) ?? `${pid} is not running`), text: () => text };
}

/** A killed process may take a moment to be gone on a busy machine; one that stays lets the test run out of time. */
async function untilNoneLives(children: string[]) {
  while (children.some(isAlive)) await sleep(20);
}

const direct = 'exec "$1" "$2"';

test.each([
  ["SIGINT", 0],
  ["SIGTERM", 143],
  ["SIGHUP", 129],
] as const)("%s stops children and grandchildren, newest first, and ends with %i", async (signal, code) => {
  const { ground, children, text } = await startGround(direct);
  expect(children.every(isAlive)).toBe(true);
  ground.kill(signal);
  expect(await once(ground, "close")).toEqual([code, null]);
  await untilNoneLives(children);
  expect(text().indexOf("ended: last started")).toBeGreaterThan(0);
  expect(text().indexOf("ended: last started")).toBeLessThan(text().indexOf("ended: first started"));
});

test("a second signal while stopping changes nothing", async () => {
  const { ground, children, text } = await startGround(direct);
  ground.kill("SIGTERM");
  while (!text().includes("ended: last started")) await sleep(1);
  ground.kill("SIGINT");
  expect(await once(ground, "close")).toEqual([143, null]);
  await untilNoneLives(children);
});

test("a failure of the command itself stops the children too", async () => {
  const { ground, children } = await startGround(`${direct} fail`);
  expect(await once(ground, "close")).toEqual([1, null]);
  await untilNoneLives(children);
});

test("when the npm that started the command is killed outright, the children are stopped all the same", async () => {
  // The shell stands for npm: it stays as the parent, and is killed without a chance to pass anything on.
  const { ground, children } = await startGround('"$1" "$2"; true', { npm_lifecycle_event: "start" });
  expect(children.every(isAlive)).toBe(true);
  ground.kill("SIGKILL");
  await untilNoneLives(children);
});
