/** Takes the demo's photographs side by side, one thread a processor, but handed over in their order. */
import os from "node:os";
import path from "node:path";
import Piscina from "piscina";
import type { PhotoWish, TakenPhoto } from "./photograph";

export type TakePhoto = (wish: PhotoWish) => Promise<TakenPhoto>;

/** A photograph in the making takes some 100 MB. */
const mostThreads = 4;

export interface Photographers {
  readonly take: TakePhoto;
  readonly dismiss: () => Promise<void>;
}

export function hirePhotographers(): Photographers {
  const pool = new Piscina<PhotoWish, TakenPhoto>({
    // Made by scripts/bundle.mjs.
    filename: path.join(process.cwd(), ".data", "build", "photograph-worker.mjs"),
    maxThreads: Math.min(mostThreads, os.availableParallelism()),
  });
  return { take: (wish) => pool.run(wish), dismiss: () => pool.destroy() };
}
