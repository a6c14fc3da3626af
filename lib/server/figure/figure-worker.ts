/** The program of a figure thread: one exported function per job. Bundled on its own, because threads load plain JavaScript. */
import "server-only";
import sharp from "sharp";
import { grainField, layOut, readSeams, type StockId, type StockPicture, seams, suggestKeepClear } from "@/lib/layout";
import { decodedPicture } from "./decoded-pictures";
import type { FigureJobName, FigureJobs } from "./figure-job";

// Decoded pictures are kept by `decoded-pictures.ts`; the library's own cache would hold them twice.
sharp.cache(false);

type Job<Name extends FigureJobName> = (request: FigureJobs[Name]["request"]) => Promise<FigureJobs[Name]["answer"]>;

export const readSeamsOf: Job<"readSeamsOf"> = async ({ layout, pictures }) => {
  const byStock = new Map<StockId, StockPicture>();
  for (const { stockId, ...picture } of pictures) byStock.set(stockId, await decodedPicture(picture));
  const pieces = layOut(layout);
  return readSeams(seams(layout, pieces), pieces, (stockId) => byStock.get(stockId) ?? null);
};

export const readGrain: Job<"readGrain"> = async (picture) => grainField(await decodedPicture(picture));

export const suggest: Job<"suggest"> = async (picture) => suggestKeepClear(await decodedPicture(picture));
