import net from "node:net";
import { afterEach, expect, test } from "vitest";
import { askedPort, freePort, isFree } from "../../scripts/ground/ports.mjs";
import { Refusal } from "../../scripts/ground/say.mjs";

const held: net.Server[] = [];

/** Holds a port the system picks. */
async function hold(): Promise<number> {
  const server = net.createServer();
  held.push(server);
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("A TCP server has an address with a port.");
  return address.port;
}

afterEach(async () => {
  await Promise.all(held.splice(0).map((server) => new Promise((resolve) => server.close(resolve))));
});

test("a port that is listened on is not free, and is free again after", async () => {
  const port = await hold();
  expect(await isFree(port)).toBe(false);
  await new Promise((resolve) => held.pop()?.close(resolve));
  expect(await isFree(port)).toBe(true);
});

test("when the usual port is taken a later free one is found", async () => {
  const taken = await hold();
  const found = await freePort("the test", taken);
  expect(found).toBeGreaterThan(taken);
  expect(await isFree(found)).toBe(true);
});

test("a port asked for by name is refused when taken, with what to do", async () => {
  const taken = await hold();
  await expect(askedPort(taken)).rejects.toThrow(Refusal);
  await expect(askedPort(taken)).rejects.toMatchObject({ mend: expect.stringContaining(`PORT=${taken + 1}`) });
});
