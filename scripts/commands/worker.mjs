// npm run worker: works off long tasks beside the web server, on this machine or, with DATABASE_URL set, on any other.
import { runBundle } from "../ground/bundles.mjs";
import { prepareProduct } from "../ground/product.mjs";
import { say } from "../ground/say.mjs";

export const onInterrupt = 0;

export async function command() {
  const { env } = await prepareProduct("production", async (settings) => Number(settings.PORT ?? 3000));
  say("Working off tasks. Ctrl-C stops it.");
  return runBundle("worker", env);
}
