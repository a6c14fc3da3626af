// Finds a free TCP port. The port may still be lost before it is used; the server that then fails to start says so.
import net from "node:net";
import { Refusal, say } from "./say.mjs";

/** How many ports after the usual one are tried. */
const reach = 50;

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
export function isFree(port, host = "127.0.0.1") {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once("error", () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * The usual port, or the next free one after it, which is then said in a line.
 * @param {string} what the server it is for, as the line names it
 * @param {number} usual
 * @param {string} [host]
 */
export async function freePort(what, usual, host) {
  for (let port = usual; port < usual + reach && port <= 65_535; port++) {
    if (!(await isFree(port, host))) continue;
    if (port !== usual) say(`Port ${usual} is taken; ${what} uses ${port}.`);
    return port;
  }
  throw new Refusal(
    `No free port for ${what} between ${usual} and ${usual + reach - 1}.`,
    "End a program that holds one of them, then try again.",
  );
}

/**
 * A port the user asked for is used or refused, never replaced: a reverse proxy or a bookmark may count on it.
 * @param {number} port
 * @param {string} [host]
 */
export async function askedPort(port, host) {
  if (await isFree(port, host)) return port;
  throw new Refusal(`Port ${port}, asked for by PORT, is taken.`, `Try another one, for example: PORT=${port + 1} npm start`);
}
