// The checks that need neither database nor browser: types, lint, and the unit tests.
import fs from "node:fs";
import { inData } from "./project.mjs";
import { say } from "./say.mjs";
import { countOfCheck, countOfVitest, countReport } from "./summary.mjs";
import { runTool, toolScript } from "./tools.mjs";

/** Folders of tests that need no database. */
const unitFolders = ["layout", "reference", "sawmill", "pictures", "editor", "screens", "words", "server", "doors"].map(
  (name) => `tests/${name}/`,
);

/** @typedef {"unit" | "api"} VitestPart unit: without a database; api: all others */

export async function checkTypes() {
  say("\nTypes");
  // Route types come from the tests' build folder, which no running server uses.
  const env = { ...process.env, NEXT_DIST_DIR: ".next-test" };
  const generated = await runTool(toolScript("next"), ["typegen"], { env, stdio: ["ignore", "ignore", "inherit"] });
  const tsc = toolScript("typescript", "tsc");
  const whole = generated === 0 ? await runTool(tsc, ["--noEmit", "-p", "tsconfig.check.json"]) : generated;
  const core = await runTool(tsc, ["--noEmit", "-p", "lib/layout/tsconfig.json"]);
  return [countOfCheck(whole === 0), countOfCheck(core === 0)];
}

export async function checkLint() {
  say("\nFormat and lint");
  return [
    countOfCheck(
      (await runTool(toolScript("@biomejs/biome", "biome"), ["ci", ...(process.stdout.isTTY ? [] : ["--colors=off"]), "."])) ===
        0,
    ),
  ];
}

/**
 * @param {VitestPart} part
 * @param {NodeJS.ProcessEnv} env
 * @param {string[]} [patterns] only files whose path holds one of these
 */
export async function runVitest(part, env, patterns = []) {
  say(part === "unit" ? "\nUnit tests" : "\nAPI tests");
  const report = inData("reports", `${part}.json`);
  fs.rmSync(report, { force: true });
  const filters = patterns.length > 0 ? patterns : part === "unit" ? unitFolders : [];
  const exclusions = part === "api" && patterns.length === 0 ? unitFolders.map((folder) => `--exclude=${folder}**`) : [];
  const code = await runTool(
    toolScript("vitest"),
    ["run", "--reporter=default", "--reporter=json", `--outputFile.json=${report}`, ...exclusions, ...filters],
    { env: { ...env, NODE_ENV: "test" } },
  );
  return [countReport(report, code, countOfVitest)];
}
