// npm start: everything a fresh machine needs, then the product as it runs in production, with the demo.
import { buildPages } from "../ground/build.mjs";
import { askedPort, freePort } from "../ground/ports.mjs";
import { prepareProduct, seedDemo } from "../ground/product.mjs";
import { say } from "../ground/say.mjs";
import { serve } from "../ground/serve.mjs";

export const onInterrupt = 0;

export async function command() {
  const { env, host, port } = await prepareProduct("production", webPort);
  const signIns = await seedDemo(env);
  await buildPages(".next");
  const server = await serve("start", { host, port, env });
  say(`\nGrainwright is at ${env.APP_URL}`);
  if (signIns) say(signIns);
  say("Ctrl-C stops it.\n");
  return (await server.exited) || 1;
}

/**
 * The port to serve on.
 * @param {import("../ground/settings.mjs").Settings} settings
 */
export function webPort(settings) {
  return settings.PORT === undefined
    ? freePort("Grainwright", 3000, settings.HOST)
    : askedPort(Number(settings.PORT), settings.HOST);
}
