/** Sums of grey along the board, so that any strip across it, however wide, costs one subtraction a row. Whole numbers. */
import type { SearchPicture } from "./search-picture";

export interface WoodSums {
  readonly width: number;
  readonly height: number;
  /** `before[x * height + y]`: grey of row y added up over the columns before x, x from 0 to width. */
  readonly before: Uint32Array;
}

export function woodSums({ width, height, grey }: SearchPicture): WoodSums {
  const before = new Uint32Array((width + 1) * height);
  for (let at = 0; at < width * height; at++) before[at + height] = (before[at] as number) + (grey[at] as number);
  return { width, height, before };
}

/** The grey of every row added up over `depth` columns from `column` on. */
export function readStrip({ height, before }: WoodSums, column: number, depth: number, into: Int32Array): void {
  const [start, end] = [column * height, (column + depth) * height];
  for (let y = 0; y < height; y++) into[y] = (before[end + y] as number) - (before[start + y] as number);
}
