// Runs the development database alone, brought up to date, until it is stopped: for tools that want a DATABASE_URL.
import { buildBundles, migrate } from "../ground/bundles.mjs";
import { startDatabase } from "../ground/database.mjs";
import { ensureDependencies } from "../ground/dependencies.mjs";
import { ensurePackages } from "../ground/packages.mjs";
import { untilStopped } from "../ground/processes.mjs";
import { prepareDataFolder } from "../ground/project.mjs";
import { say } from "../ground/say.mjs";

export const onInterrupt = 0;

export async function command() {
  prepareDataFolder();
  await ensurePackages(["database"]);
  await ensureDependencies();
  await buildBundles();
  const database = await startDatabase("mariadb", ["grainwright"]);
  const url = database.urlOf("grainwright");
  await migrate({ ...process.env, DATABASE_URL: url });
  say(`DATABASE_URL=${url}`);
  say("Ctrl-C stops it.");
  return untilStopped();
}
