/** Which stretch of an edge, with the wood beside it, a picture shows. */
import type { EdgeMap } from "./edge-patch";

/** From and to along the edge, mm; `from >= to` where nothing is inside. */
export interface Stretch {
  readonly fromMm: number;
  readonly toMm: number;
}

/** Rounding to whole pixels and micrometres may put a board's very edge this far outside its picture, px. */
const SLACK_PX = 0.75;

/** The part of `stretch` whose wood down to `depthMm` lies on a picture of this size. The wood is a parallelogram, so corners tell. */
export function stretchInside(
  { fromMm, toMm }: Stretch,
  map: EdgeMap,
  depthMm: number,
  picture: { readonly width: number; readonly height: number },
): Stretch {
  let from = fromMm;
  let to = toMm;
  for (const depth of [0, depthMm]) {
    for (const [start, along, size] of [
      [map.x + depth * map.intoX, map.alongX, picture.width],
      [map.y + depth * map.intoY, map.alongY, picture.height],
    ] as const) {
      // −slack ≤ start + along·t ≤ size + slack
      const low = -SLACK_PX - start;
      const high = size + SLACK_PX - start;
      if (Math.abs(along) < 1e-9) {
        if (low > 0 || high < 0) return { fromMm: 0, toMm: 0 };
        continue;
      }
      from = Math.max(from, Math.min(low / along, high / along));
      to = Math.min(to, Math.max(low / along, high / along));
    }
  }
  return { fromMm: from, toMm: to };
}
