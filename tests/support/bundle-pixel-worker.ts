/** The pixel thread's program, for tests of pictures. */
import { bundleWorker } from "./bundle-worker";

/** Makes `.data/build/pixel-worker.mjs` what the sources say. */
export const bundlePixelWorker = () =>
  bundleWorker("lib/server/pictures/pixel-worker.ts", ["lib/server/pictures", "lib/layout", "lib/schemas"]);
