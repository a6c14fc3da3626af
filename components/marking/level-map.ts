/** A warp map for a smaller level of the photograph. Pure. */
import type { WarpMap } from "@/lib/layout";

/** `share`: pixels of the level per pixel of the full-size photograph. Points scale with it, and so do the lens' centre and radius. */
export function mapOnLevel({ flatFromPicture: h, lens }: WarpMap, share: number): WarpMap {
  return {
    flatFromPicture: [h[0] * share, h[1] * share, h[2] * share, h[3] * share, h[4] * share, h[5] * share, h[6], h[7], h[8]],
    lens: { k1: lens.k1, centre: { x: lens.centre.x * share, y: lens.centre.y * share }, norm: lens.norm * share },
  };
}
