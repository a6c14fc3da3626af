/** Papers a cut order is printed on. Points of 1/72 inch, y down. */
import "server-only";
import type { Shop } from "@/lib/schemas/shop";

export type Paper = Shop["paper"];

export const pointsPerMm = 72 / 25.4;

/** Width and height. */
export const paperSizes: Readonly<Record<Paper, readonly [number, number]>> = {
  a4: [210 * pointsPerMm, 297 * pointsPerMm],
  letter: [612, 792],
};

/** Wide enough for the edge that printers leave bare (4–5 mm, common practice, no source) and for a hole punch. */
export const margins = { side: 38, top: 40, bottom: 58 } as const;
