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
import { inData, prepareDataFolder } from "../ground/project.mjs";
import { Refusal, say } from "../ground/say.mjs";
import { sum, summaryLine } from "../ground/summary.mjs";

/** @typedef {"unit" | "api" | "e2e"} Part */

/** @param {string[]} args nothing, or --only PART and patterns */
export function command(args) {
  const { only, patterns } = readArguments(args);
  prepareDataFolder();
  return withLock("test", "running the tests", async () => {
    await ensurePackages(only === "unit" ? [] : ["database", "browser", "pdfReader"]);
    await ensureDependencies();
    const total = sum(await runParts(only, patterns));
    say(`\n${summaryLine(total)}`);
    return total.failed === 0 ? 0 : 1;
  });
}

/**
 * @param {Part | undefined} only
 * @param {string[]} patterns
 */
async function runParts(only, patterns) {
  const counts = [];
  if (!only) counts.push(...(await checkTypes()), ...(await checkLint()));
  if (only === "unit") return runVitest("unit", process.env, patterns);
  await buildBundles();
  // API and browser tests never see each other's rows, nor the tasks the other one's server works off.
  const database = await startDatabase("mariadb-test", ["grainwright_api", "grainwright_e2e"]);
  fs.rmSync(inData("test-uploads"), { recursive: true, force: true });
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
  const secret = newSecret();
  if (only !== "e2e") {
    const env = environment("api", 3100);
    await migrate(env);
    counts.push(...(await runVitest(only ?? "all", env, patterns)));
  }
  if (only !== "api") {
    await migrate(environment("e2e", 3100));
    counts.push(...(await runBrowserTests((port) => environment("e2e", port), patterns)));
  }
  return counts;
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
