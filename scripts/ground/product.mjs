// Everything the product needs before a process of it can run: packages, database, tables, environment, demo.
import { buildBundles, migrate, readBundle } from "./bundles.mjs";
import { startDatabase } from "./database.mjs";
import { ensureDependencies } from "./dependencies.mjs";
import { ensurePackages } from "./packages.mjs";
import { inProject, prepareDataFolder } from "./project.mjs";
import { Refusal, say } from "./say.mjs";
import { givenSettings, keptSecret } from "./settings.mjs";

/**
 * Prepares everything but the pages.
 * @param {"production" | "development"} mode
 * @param {(settings: import("./settings.mjs").Settings) => Promise<number>} choosePort called first, so that a taken port is said before the long work
 */
export async function prepareProduct(mode, choosePort) {
  prepareDataFolder();
  const given = givenSettings();
  const port = await choosePort(given);
  // A DATABASE_URL of the user's own is used as it is, and nobody's real shop gets demo people.
  const own = given.DATABASE_URL === undefined;
  await ensurePackages(own ? ["database"] : []);
  await ensureDependencies();
  await buildBundles();
  /** @type {NodeJS.ProcessEnv} */
  const env = {
    APP_URL: `http://127.0.0.1:${port}`,
    UPLOADS_DIR: inProject("uploads"),
    SESSION_SECRET: given.SESSION_SECRET ?? keptSecret(),
    GRAINWRIGHT_DEMO: own ? "1" : "0",
    ...given,
    DATABASE_URL: given.DATABASE_URL ?? (await startDatabase("mariadb", ["grainwright"])).urlOf("grainwright"),
    PORT: String(port),
    NODE_ENV: mode,
  };
  await migrate(env);
  return { env, port, host: env.HOST ?? "127.0.0.1" };
}

/**
 * Fills an empty database with the demo, once, and returns the lines that say how to sign in; nothing when the demo is not wanted.
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<string>}
 */
export async function seedDemo(env) {
  if (env.GRAINWRIGHT_DEMO !== "1") return "";
  const { code, text } = await readBundle("seed", env);
  if (code === 0) return text.trimEnd();
  say(text);
  throw new Refusal(
    "The demo could not be put into the database (the reason stands above).",
    "Set GRAINWRIGHT_DEMO=0 to start without it.",
  );
}
