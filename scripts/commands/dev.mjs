// npm run dev: the same ground as npm start, with pages that follow every change of their source.
import { prepareProduct, seedDemo } from "../ground/product.mjs";
import { say } from "../ground/say.mjs";
import { serve } from "../ground/serve.mjs";
import { webPort } from "./start.mjs";

export const onInterrupt = 0;

export async function command() {
  const { env, host, port } = await prepareProduct("development", webPort);
  const signIns = await seedDemo(env);
  const server = await serve("dev", { host, port, env });
  say(`\nGrainwright is at ${env.APP_URL}, for working on it.`);
  if (signIns) say(signIns);
  return (await server.exited) || 1;
}
