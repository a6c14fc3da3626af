/**
 * The direction of the grain over a board, from its straightened picture: structure tensor on luminance, one cell every 10 mm.
 * Directions are averaged in doubled angles by summing tensors.
 */
import { cellTensor } from "./cell-tensor";
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
export const CELL_MM = 10;
/** The finest rings are about 1 mm; at this scale they still have a dark and a light pixel, and sensor noise is averaged away. */
export const GRAIN_PX_PER_MM = 2;
/** Length of wood averaged along the expected grain: most of the distance between two marks of a saw's teeth or a planer's knives. */
export const SMOOTHED_MM = 3;

/** Direction and coherence of every cell. */
export function grainField(picture: StockPicture): GrainField {
  const grey = greyPicture(picture, GRAIN_PX_PER_MM);
  const columns = Math.max(1, Math.ceil(grey.width / (CELL_MM * grey.pxPerMm) - 1e-6));
  const rows = Math.max(1, Math.ceil(grey.height / (CELL_MM * grey.pxPerMm) - 1e-6));
  const edge = (cell: number) => Math.round(cell * CELL_MM * grey.pxPerMm);
  const reach = Math.round((SMOOTHED_MM * grey.pxPerMm) / 2);
  const direction = new Float32Array(columns * rows);
  const coherence = new Float32Array(columns * rows);
  for (let row = 0, i = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++, i++) {
      const cell = { fromX: edge(column), toX: edge(column + 1), fromY: edge(row), toY: edge(row + 1) };
      const { tensor, noise } = cellTensor(grey, cell, reach);
      direction[i] = lineDirection(tensor);
      coherence[i] = coherenceOf(tensor, noise);
    }
  }
  return { cellMm: CELL_MM, columns, rows, direction, coherence };
}
