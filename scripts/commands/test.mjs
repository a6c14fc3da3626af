// npm test: the same ground as npm start with a database of its own, then types, lint, unit, API and browser tests.
// Goes on after a failed part, and ends with one line that counts them all.
import fs from "node:fs";
import { runBrowserTests } from "../ground/browser-tests.mjs";
import { buildBundles, migrate } from "../ground/bundles.mjs";
import { checkLint, checkTypes, runVitest } from "../ground/checks.mjs";
import { startDatabase } from "../ground/database.mjs";
import { newSecret } from "../ground/database-access.mjs";
import { ensureDependencies } from "../ground/dependencies.mjs";
import { withLock } from "../ground/lock.mjs";
import { ensurePackages } from "../ground/packages.mjs";
import { isEnding } from "../ground/processes.mjs";
import { inData, prepareDataFolder } from "../ground/project.mjs";
import { complain, Refusal, say } from "../ground/say.mjs";
import { countOfCheck, sum, summaryLine } from "../ground/summary.mjs";

/** @typedef {"unit" | "api" | "e2e"} Part */

/** @typedef {import("../ground/summary.mjs").Count} Count */

/** @param {string[]} args nothing, or --only PART and patterns */
export function command(args) {
  const { only, patterns } = readArguments(args);
  prepareDataFolder();
  return withLock("test", "running the tests", async () => {
    /** @type {Count[]} */
    const counts = [];
    // What cannot be prepared is one failure; the parts that need it are left out, and the line at the end is still printed.
    await runParts(only, patterns, counts).catch((failure) => {
      if (!isEnding()) complain(failure);
      counts.push(countOfCheck(false));
    });
    const total = sum(counts);
    say(`\n${summaryLine(total)}`);
    return total.failed === 0 ? 0 : 1;
  });
}

/**
 * @param {Part | undefined} only
 * @param {string[]} patterns
 * @param {Count[]} counts added to
 */
async function runParts(only, patterns, counts) {
  await ensurePackages(only === "unit" ? [] : ["database", "browser", "pdfReader"]);
  await ensureDependencies();
  if (!only) counts.push(...(await checkTypes()), ...(await checkLint()));
  if (only === "unit" || !only) counts.push(...(await runVitest("unit", process.env, only ? patterns : [])));
  if (only === "unit") return;
  await buildBundles();
  const environment = await prepareDatabase();
  if (only !== "e2e") counts.push(...(await runVitest("api", environment("api", 3100), patterns)));
  if (only !== "api") counts.push(...(await runBrowserTests((port) => environment("e2e", port), patterns)));
}

/** Starts the test database with one empty, migrated database each for API and browser tests, which thus never see each other's rows and tasks. */
async function prepareDatabase() {
  const database = await startDatabase("mariadb-test", ["grainwright_api", "grainwright_e2e"]);
  fs.rmSync(inData("test-uploads"), { recursive: true, force: true });
  const secret = newSecret();
  /** @type {(name: "api" | "e2e", port: number) => NodeJS.ProcessEnv} */
  const environment = (name, port) => ({
    ...process.env,
    DATABASE_URL: database.urlOf(`grainwright_${name}`),
    APP_URL: `http://127.0.0.1:${port}`,
    PORT: String(port),
    SESSION_SECRET: secret,
    UPLOADS_DIR: inData("test-uploads", name),
    GRAINWRIGHT_DEMO: "0",
  });
  await migrate(environment("api", 3100));
  await migrate(environment("e2e", 3100));
  return environment;
}

/**
 * @param {string[]} args
 * @returns {{ only: Part | undefined, patterns: string[] }}
 */
export function readArguments(args) {
  const [flag, part, ...patterns] = args;
  if (flag === undefined) return { only: undefined, patterns: [] };
  if (flag === "--only" && (part === "unit" || part === "api" || part === "e2e")) return { only: part, patterns };
  throw new Refusal(
    `The tests do not know "${args.join(" ")}".`,
    "Use: node scripts/run.mjs test [--only unit|api|e2e [part of a file name]]",
  );
}
