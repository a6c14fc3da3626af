// npm run bench: how fast the product is, as ratios measured side by side in one run. Prints a table and keeps it as JSON in .data/bench.
import fs from "node:fs";
import { buildPages } from "../ground/build.mjs";
import { buildBundles, migrate, runBundle } from "../ground/bundles.mjs";
import { startDatabase } from "../ground/database.mjs";
import { newSecret } from "../ground/database-access.mjs";
import { ensureDependencies } from "../ground/dependencies.mjs";
import { withLock } from "../ground/lock.mjs";
import { ensurePackages } from "../ground/packages.mjs";
import { freePort } from "../ground/ports.mjs";
import { inData, prepareDataFolder } from "../ground/project.mjs";
import { Refusal } from "../ground/say.mjs";
import { serve } from "../ground/serve.mjs";

/** Rows of the table, by name; they are measured in tests/bench. */
const rowNames = ["straighten", "warp", "rack", "guillotine", "job", "server"];

/** @param {string[]} args [--only ROW] [--quick] [--out FILE] */
export function command(args) {
  const { only } = readArguments(args);
  const wantsServer = only === undefined || only === "server";
  prepareDataFolder();
  // The tests build and serve from the same folder; beside them nothing could be measured anyway.
  return withLock("test", "running the tests", async () => {
    await ensurePackages(wantsServer ? ["database"] : []);
    await ensureDependencies();
    await buildBundles(["tests/bench/bench.ts"]);
    const env = wantsServer ? await serveForBench() : process.env;
    return runBundle("bench", env, args);
  });
}

/** The production build on a port and a database of its own; returns the environment it runs in. */
async function serveForBench() {
  const port = await freePort("the bench's web server", 3200);
  const database = await startDatabase("mariadb-test", ["grainwright_bench"]);
  fs.rmSync(inData("bench", "uploads"), { recursive: true, force: true });
  /** @type {NodeJS.ProcessEnv} */
  const env = {
    ...process.env,
    DATABASE_URL: database.urlOf("grainwright_bench"),
    APP_URL: `http://127.0.0.1:${port}`,
    PORT: String(port),
    SESSION_SECRET: newSecret(),
    UPLOADS_DIR: inData("bench", "uploads"),
    GRAINWRIGHT_DEMO: "0",
    LOG_LEVEL: "warn",
    NODE_ENV: "production",
    NEXT_DIST_DIR: ".next-test",
  };
  await migrate(env);
  await buildPages(".next-test");
  const out = fs.openSync(inData("bench-server.log"), "w");
  await serve("start", { host: "127.0.0.1", port, env, stdio: ["ignore", out, out] });
  return env;
}

/**
 * @param {string[]} args
 * @returns {{ only: string | undefined }}
 */
export function readArguments(args) {
  /** @type {string | undefined} */
  let only;
  for (let i = 0; i < args.length; i++) {
    const [flag, value] = [args[i], args[i + 1]];
    if (flag === "--quick") continue;
    const known =
      (flag === "--only" && value !== undefined && rowNames.includes(value)) || (flag === "--out" && value !== undefined);
    if (!known) {
      throw new Refusal(
        `The bench does not know "${args.slice(i).join(" ")}".`,
        `Use: npm run bench -- [--only ${rowNames.join("|")}] [--quick] [--out FILE]`,
      );
    }
    if (flag === "--only") only = value;
    i++;
  }
  return { only };
}
