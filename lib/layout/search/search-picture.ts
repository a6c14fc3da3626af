/**
 * A straightened picture as the search reads it: grey in whole numbers, two values a millimetre each way. Whole numbers are what
 * makes sums over it exact in any order.
 */
import type { Pixels } from "../picture/warp";
import type { BoardSize } from "../stock/polygon-fault";
import { firstCell, GRID_UM } from "./grid";

/** Grey 0 (black) to 255, column by column: the cell in column x and row y is `grey[x * height + y]`. Frame: the board's own. */
export interface SearchPicture {
  readonly width: number;
  readonly height: number;
  readonly grey: Uint8Array;
}

/** Luminance of sRGB in 256ths, the usual weights of ITU-R BT.601. */
const [RED, GREEN, BLUE] = [77, 150, 29];

/**
 * The mean over each cell of the grid, by area; where the picture's rim ends before the board does, by a rounded pixel, the rim
 * goes on. `pxPerMm` may be any scale; below 2 a cell takes what the pixels under it have.
 */
export function searchPicture(pixels: Pixels, pxPerMm: number, size: BoardSize): SearchPicture {
  const [width, height] = [firstCell(size.length), firstCell(size.width)];
  const pxPerCell = (pxPerMm * GRID_UM) / 1000;
  const columns = sharesOf(width, pixels.width, pxPerCell);
  const rows = sharesOf(height, pixels.height, pxPerCell);
  const grey = new Uint8Array(width * height);
  const line = new Float64Array(pixels.width);
  for (let y = 0; y < height; y++) {
    line.fill(0);
    const share = rows[y] as Share;
    for (let row = share.first; row <= share.last; row++) addRow(line, pixels, row, weightOf(share, row));
    for (let x = 0; x < width; x++) grey[x * height + y] = Math.round(meanOver(line, columns[x] as Share) / share.total);
  }
  return { width, height, grey };
}

/** The pixels under a cell: whole ones, but for the first and the last. */
interface Share {
  readonly first: number;
  readonly last: number;
  readonly firstWeight: number;
  readonly lastWeight: number;
  readonly total: number;
}

function sharesOf(cells: number, px: number, pxPerCell: number): Share[] {
  return Array.from({ length: cells }, (_, cell) => {
    const from = Math.min(cell * pxPerCell, px - 1);
    const to = Math.max(from, Math.min((cell + 1) * pxPerCell, px));
    const first = Math.floor(from);
    const last = Math.max(first, Math.ceil(to) - 1);
    // What the rim goes on with is one pixel of any weight.
    if (first === last) return { first, last, firstWeight: 1, lastWeight: 1, total: 1 };
    const firstWeight = first + 1 - from;
    const lastWeight = to - last;
    return { first, last, firstWeight, lastWeight, total: firstWeight + lastWeight + (last - first - 1) };
  });
}

function weightOf({ first, last, firstWeight, lastWeight }: Share, pixel: number): number {
  return pixel === first ? firstWeight : pixel === last ? lastWeight : 1;
}

function addRow(line: Float64Array, { data, width, channels }: Pixels, row: number, weight: number): void {
  for (let x = 0, at = row * width * channels; x < width; x++, at += channels) {
    const luminance = RED * (data[at] as number) + GREEN * (data[at + 1] as number) + BLUE * (data[at + 2] as number);
    line[x] = (line[x] as number) + (luminance / 256) * weight;
  }
}

function meanOver(line: Float64Array, share: Share): number {
  let sum = 0;
  for (let x = share.first; x <= share.last; x++) sum += (line[x] as number) * weightOf(share, x);
  return sum / share.total;
}
