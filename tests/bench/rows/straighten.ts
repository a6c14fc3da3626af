/** From a photograph's file to the stored levels, in the pool's thread as the product does it. */
import sharp from "sharp";
import { fitMarking } from "@/lib/layout";
import { levelJpeg } from "@/lib/server/pictures/encode-levels";
import { closePixelPool, straighten } from "@/lib/server/pictures/pixel-pool";
import { type BenchPhoto, benchPhotos, type PhotoWanted } from "../photos";
import type { Case, Effort, Outcome, Row } from "../row";
import { sideBySide } from "../side-by-side";

export const straightenRow: Row = {
  name: "straighten",
  what: "straightening a 12-megapixel photograph, from its file to all levels of the picture",
  against: "decoding, resizing to the picture's size and encoding with the image library alone, JPEG settings alike",
  aim: { kind: "at most", ratio: 1.5 },
  measure,
};

const frame = { widthPx: 4000, heightPx: 3000 };

/** A long board fills a strip of its photograph and is enlarged; a panel fills it; a small one is photographed finer than the picture. */
const photographs: readonly PhotoWanted[] = [
  { name: "a board of 2400 × 200 mm", lengthMm: 2400, widthMm: 200, ...frame },
  { name: "a panel of 900 × 600 mm, seen whole", lengthMm: 900, widthMm: 600, ...frame },
  { name: "a small board of 500 × 375 mm, seen whole", lengthMm: 500, widthMm: 375, ...frame },
];

async function measure({ quick }: Effort): Promise<Outcome> {
  const wanted = quick ? photographs.map((photo) => ({ ...photo, widthPx: 600, heightPx: 450 })) : photographs;
  const turns = quick ? { warmUps: 1, repetitions: 3 } : { warmUps: 4, repetitions: 15 };
  const cases: Case[] = [];
  for (const photo of await benchPhotos(wanted)) cases.push(await compared(photo, turns));
  await closePixelPool();
  return { kind: "measured", cases };
}

async function compared({ name, jpeg, marking }: BenchPhoto, turns: { warmUps: number; repetitions: number }): Promise<Case> {
  const { width = 0, height = 0 } = await sharp(jpeg).metadata();
  const fit = fitMarking(marking, { width, height });
  if (!fit.ok) throw new Error(`the marks of ${name} are refused: ${fit.refusal.reason}`);
  const { widthPx, heightPx } = fit.scale;
  const ours = async () => {
    const outcome = await straighten({ source: jpeg, marking });
    if (!outcome.ok) throw new Error(`${name} was not straightened`);
  };
  const theirs = () => sharp(jpeg).resize({ width: widthPx, height: heightPx, fit: "fill" }).jpeg(levelJpeg).toBuffer();
  return sideBySide(`${name}, picture ${widthPx} × ${heightPx} px`, { ours, theirs }, turns);
}
