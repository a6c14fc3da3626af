/** Maps as photographs of boards have them: scaled, turned, in perspective, through a lens that bends. */
import fc from "fast-check";
import { lensOf } from "@/lib/layout/picture/lens";
import type { WarpMap } from "@/lib/layout/picture/warp-map";

const within = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

/** For pictures of up to 1200 × 400 px in this photo: depths differ by up to a half from end to end. */
export const photoSize = { width: 1600, height: 1200 };

/** `stretch`: about so many photo px per picture px. */
export function anyMap(stretch: { readonly min: number; readonly max: number }): fc.Arbitrary<WarpMap> {
  const parts = {
    stretch: within(stretch.min, stretch.max),
    turn: within(-Math.PI, Math.PI),
    x: within(0, photoSize.width),
    y: within(0, photoSize.height),
    along: within(-4e-4, 4e-4),
    across: within(-4e-4, 4e-4),
    k1: fc.oneof(fc.constant(0), within(-0.1, 0.1)),
  };
  return fc.record(parts).map(({ stretch: s, turn, x, y, along, across, k1 }) => {
    const [cos, sin] = [s * Math.cos(turn), s * Math.sin(turn)];
    return { flatFromPicture: [cos, -sin, x, sin, cos, y, along, across, 1], lens: lensOf(photoSize, k1) };
  });
}
