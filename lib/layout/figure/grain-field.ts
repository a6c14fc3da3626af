/**
 * The direction of the grain over a board, from its straightened picture: structure tensor on luminance, one cell every 10 mm.
 * Directions are averaged in doubled angles by summing tensors.
 */
import { greyPicture } from "./grey-picture";
import type { StockPicture } from "./stock-picture";
import { coherenceOf, lineDirection } from "./structure-tensor";

/** Cells row by row from the stock's origin; the last of a row or column may be cut short by the board's end. */
export interface GrainField {
  readonly cellMm: number;
  readonly columns: number;
  readonly rows: number;
  /** Radians from the stock's x axis towards y (clockwise as seen), in (−π/2, π/2]. */
  readonly direction: Float32Array;
  /** 0: no direction at all; 1: all lines of the cell run one way. */
  readonly coherence: Float32Array;
}

/** A few rings wide, and finer than a knot's surroundings. */
const CELL_MM = 10;
/** The finest rings are about 1 mm; at this scale they still have a dark and a light pixel, and sensor noise is averaged away. */
const GRAIN_PX_PER_MM = 2;

/** Direction and coherence of every cell. */
export function grainField(picture: StockPicture): GrainField {
  const { light, width, height, pxPerMm } = greyPicture(picture, GRAIN_PX_PER_MM);
  const columns = Math.max(1, Math.ceil(width / (CELL_MM * pxPerMm) - 1e-6));
  const rows = Math.max(1, Math.ceil(height / (CELL_MM * pxPerMm) - 1e-6));
  const columnOf = Uint16Array.from({ length: width }, (_, x) =>
    Math.min(columns - 1, Math.floor((x + 0.5) / (CELL_MM * pxPerMm))),
  );
  const xx = new Float64Array(columns * rows);
  const yy = new Float64Array(columns * rows);
  const xy = new Float64Array(columns * rows);
  for (let y = 1; y < height - 1; y++) {
    const first = Math.min(rows - 1, Math.floor((y + 0.5) / (CELL_MM * pxPerMm))) * columns;
    for (let x = 1, at = y * width + 1; x < width - 1; x++, at++) {
      const above = at - width;
      const below = at + width;
      const nw = light[above - 1] as number;
      const ne = light[above + 1] as number;
      const sw = light[below - 1] as number;
      const se = light[below + 1] as number;
      // Scharr's weights (3, 10, 3) favour no direction; their factor drops out.
      const dx = 3 * (ne - nw + se - sw) + 10 * ((light[at + 1] as number) - (light[at - 1] as number));
      const dy = 3 * (sw - nw + se - ne) + 10 * ((light[below] as number) - (light[above] as number));
      const cell = first + (columnOf[x] as number);
      xx[cell] = (xx[cell] as number) + dx * dx;
      yy[cell] = (yy[cell] as number) + dy * dy;
      xy[cell] = (xy[cell] as number) + dx * dy;
    }
  }
  const direction = new Float32Array(columns * rows);
  const coherence = new Float32Array(columns * rows);
  for (let cell = 0; cell < direction.length; cell++) {
    const tensor = { xx: xx[cell] as number, yy: yy[cell] as number, xy: xy[cell] as number };
    direction[cell] = lineDirection(tensor);
    coherence[cell] = coherenceOf(tensor);
  }
  return { cellMm: CELL_MM, columns, rows, direction, coherence };
}
