// The browser tests: the pages built and served like in production, on the test database, driven in Debian's Chromium.
import fs from "node:fs";
import { buildPages } from "./build.mjs";
import { whereIs } from "./packages.mjs";
import { freePort } from "./ports.mjs";
import { inData } from "./project.mjs";
import { complain, say } from "./say.mjs";
import { serve } from "./serve.mjs";
import { countOfCheck, countOfPlaywright, countReport } from "./summary.mjs";
import { runTool, toolScript } from "./tools.mjs";

/**
 * @param {(port: number) => NodeJS.ProcessEnv} environment of the server on that port
 * @param {string[]} patterns only files whose path matches one of these
 */
export async function runBrowserTests(environment, patterns) {
  say("\nBrowser tests");
  const port = await freePort("the tests' web server", 3100);
  /** @type {NodeJS.ProcessEnv} */
  const env = { ...environment(port), NEXT_DIST_DIR: ".next-test", NODE_ENV: "production" };
  const log = inData("test-server.log");
  const out = fs.openSync(log, "w");
  try {
    await buildPages(".next-test");
    await serve("start", { host: "127.0.0.1", port, env, stdio: ["ignore", out, out] });
  } catch (failure) {
    say(fs.readFileSync(log, "utf8").trimEnd().split("\n").slice(-40).join("\n"));
    complain(failure);
    return [countOfCheck(false)];
  }
  const report = inData("reports", "e2e.json");
  fs.rmSync(report, { force: true });
  const code = await runTool(toolScript("@playwright/test", "playwright"), ["test", ...patterns], {
    env: {
      ...env,
      NODE_ENV: "test",
      BASE_URL: env.APP_URL,
      CHROMIUM: process.env.CHROMIUM || whereIs("chromium"),
      // Playwright knows only this way of going without colours, and Node.js warns when it meets both.
      ...(env.NO_COLOR && { NO_COLOR: undefined, FORCE_COLOR: "0" }),
    },
  });
  if (code !== 0) say(`What the web server said: ${log}`);
  return [countReport(report, code, countOfPlaywright)];
}
