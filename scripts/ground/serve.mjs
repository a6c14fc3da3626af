// Runs the web server and waits until it answers.
import { setTimeout as sleep } from "node:timers/promises";
import { launch } from "./processes.mjs";
import { inProject } from "./project.mjs";
import { Refusal } from "./say.mjs";
import { toolScript } from "./tools.mjs";

/** `next dev` compiles the first page before it answers. */
const startLimitMs = 120_000;

/**
 * Starts `next start` or `next dev` and returns once /api/health says 200.
 * @param {"start" | "dev"} mode
 * @param {{ host: string, port: number, env: NodeJS.ProcessEnv, stdio?: import("node:child_process").StdioOptions }} options
 * @returns {Promise<{ exited: Promise<number> }>}
 */
export async function serve(mode, { host, port, env, stdio }) {
  const args = [toolScript("next"), mode, "--hostname", host, "--port", String(port)];
  const { exited } = launch(process.execPath, args, { cwd: inProject(), env, ...(stdio && { stdio }) });
  /** @type {number | undefined} */
  let code;
  void exited.then((value) => {
    code = value;
  });
  const address = `http://${host === "0.0.0.0" ? "127.0.0.1" : host}:${port}/api/health`;
  const limit = Date.now() + startLimitMs;
  let last = "no answer";
  while (last !== "200") {
    if (code !== undefined)
      throw new Refusal(
        `The web server ended while starting (code ${code}); its own message stands above.`,
        "Mend what it names.",
      );
    if (Date.now() > limit)
      throw new Refusal(`The web server does not get healthy: ${address} says ${last}.`, "Its own messages stand above.");
    await sleep(100);
    last = await statusOf(address);
  }
  return { exited };
}

/** @param {string} address */
async function statusOf(address) {
  try {
    const answer = await fetch(address, { signal: AbortSignal.timeout(10_000) });
    return String(answer.status);
  } catch {
    return "no answer";
  }
}
