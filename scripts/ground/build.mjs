// Builds the web pages with `next build` when their sources have changed since the last build.
import fs from "node:fs";
import { withLock } from "./lock.mjs";
import { inData, inProject, root } from "./project.mjs";
import { Refusal, say } from "./say.mjs";
import { isStamped, stampOf } from "./stamp.mjs";
import { runTool, toolScript } from "./tools.mjs";

/** @typedef {".next" | ".next-test"} BuildFolder the tests have their own, so that they never pull pages from under a running server */

const sources = ["app", "components", "db", "lib", "public"];

/** Where the last lines of a failed build are taken from. */
const log = "next-build.log";

function currentStamp() {
  // Next.js writes next-env.d.ts itself. The build holds absolute paths, so a copy elsewhere is built anew.
  const configs = fs.readdirSync(root).filter((name) => /\.(ts|mjs|json)$/.test(name) && name !== "next-env.d.ts");
  return stampOf(root, [...sources, ...configs], [root]);
}

/**
 * @param {BuildFolder} folder
 */
export function buildPages(folder) {
  // One build at a time, whichever folder it fills: a build takes a gigabyte of memory, and all of them write next-env.d.ts.
  return withLock("build", "building the pages", async () => {
    const stampFile = inProject(folder, "grainwright.stamp");
    const stamp = currentStamp();
    if (isStamped(stampFile, stamp)) return;
    say("Building the pages (about a minute).");
    fs.rmSync(stampFile, { force: true });
    const out = fs.openSync(inData(log), "w");
    const env = { ...process.env, NODE_ENV: /** @type {const} */ ("production"), NEXT_DIST_DIR: folder };
    const code = await runTool(toolScript("next"), ["build"], { env, stdio: ["ignore", out, out] });
    fs.closeSync(out);
    if (code !== 0) {
      const end = fs.readFileSync(inData(log), "utf8").trimEnd().split("\n").slice(-40).join("\n");
      throw new Refusal(
        `${end}\n\nThe pages could not be built (the whole log: ${inData(log)}).`,
        "Mend what it names, then run the command again.",
      );
    }
    // Sources saved while the build was running may or may not be in it; the old stamp then makes the next start build again.
    fs.writeFileSync(stampFile, stamp);
  });
}
