/**
 * The wood beside one edge of a piece, resampled so that seams read alike however the piece lies in its board: turned, mirrored,
 * finer or coarser.
 */
import type { Isometry } from "../frame/isometry";
import type { Grey } from "./cell-tensor";
import { LUMINANCE, type StockPicture } from "./stock-picture";

/** Samples are this far apart in mm along the edge and into the piece: one pixel of the finest picture that is stored (4 px/mm). */
export const SAMPLE_MM = 0.25;

/** An edge on the face. */
export interface EdgeFrame {
  /** Its first point, µm. */
  readonly x: number;
  readonly y: number;
  /** Unit vectors on the face: along the edge, and into the piece. */
  readonly along: { readonly x: number; readonly y: number };
  readonly into: { readonly x: number; readonly y: number };
}

/** Picture pixels from millimetres along an edge and into its piece: (x, y) + along·(alongX, alongY) + into·(intoX, intoY). */
export interface EdgeMap {
  readonly x: number;
  readonly y: number;
  readonly alongX: number;
  readonly alongY: number;
  readonly intoX: number;
  readonly intoY: number;
}

/** Where the picture shows the places beside an edge: the piece's own map, then the picture's scale. */
export function edgeMap(edge: EdgeFrame, { a, b, c, d, tx, ty }: Isometry, pxPerMm: number): EdgeMap {
  const perUm = pxPerMm / 1000;
  return {
    x: (a * edge.x + c * edge.y + tx) * perUm,
    y: (b * edge.x + d * edge.y + ty) * perUm,
    alongX: (a * edge.along.x + c * edge.along.y) * pxPerMm,
    alongY: (b * edge.along.x + d * edge.along.y) * pxPerMm,
    intoX: (a * edge.into.x + c * edge.into.y) * pxPerMm,
    intoY: (b * edge.into.x + d * edge.into.y) * pxPerMm,
  };
}

/**
 * Luminance beside an edge from `fromMm` on: x runs into the piece, `depth` samples; y along the edge, `length` samples. Sample
 * (i, k) is the place (i + ½)·SAMPLE_MM in and fromMm + (k + ½)·SAMPLE_MM along. Beyond the picture's rim the rim's pixels go on.
 */
export function edgePatch({ pixels }: StockPicture, map: EdgeMap, fromMm: number, length: number, depth: number): Grey {
  const { data, width, height, channels } = pixels;
  const light = new Float32Array(length * depth);
  const stride = width * channels;
  const lightAt = (at: number) =>
    LUMINANCE.r * (data[at] as number) + LUMINANCE.g * (data[at + 1] as number) + LUMINANCE.b * (data[at + 2] as number);
  for (let k = 0, to = 0; k < length; k++) {
    const along = fromMm + (k + 0.5) * SAMPLE_MM;
    for (let i = 0; i < depth; i++, to++) {
      const into = (i + 0.5) * SAMPLE_MM;
      // Pixel centres lie at +½.
      const u = Math.min(width - 1, Math.max(0, map.x + map.alongX * along + map.intoX * into - 0.5));
      const v = Math.min(height - 1, Math.max(0, map.y + map.alongY * along + map.intoY * into - 0.5));
      const column = Math.floor(u);
      const row = Math.floor(v);
      const at = row * stride + column * channels;
      const right = column + 1 < width ? channels : 0;
      const down = row + 1 < height ? stride : 0;
      const top = lightAt(at) * (1 - u + column) + lightAt(at + right) * (u - column);
      const bottom = lightAt(at + down) * (1 - u + column) + lightAt(at + down + right) * (u - column);
      light[to] = top + (bottom - top) * (v - row);
    }
  }
  return { light, width: depth, height: length };
}
