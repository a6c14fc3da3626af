/** The bell fit finds bells again. */
import fc from "fast-check";
import { expect, test } from "vitest";
import { bellFit } from "@/lib/layout/figure/bell-fit";

test("a bell is found again from a start within its slope, and another far off does not pull", () => {
  const spread = fc.double({ min: 3, max: 7, noNaN: true });
  const near = fc.double({ min: -3, max: 3, noNaN: true });
  fc.assert(
    fc.property(spread, spread, fc.double({ min: -0.6, max: 0.6, noNaN: true }), near, near, (sx, sy, tilt, offX, offY) => {
      const [width, height, x, y] = [120, 60, 40, 30];
      const [xx, yy, xy] = [sx * sx, sy * sy, tilt * sx * sy];
      const values = Float32Array.from({ length: width * height }, (_, i) => {
        const [dx, dy] = [(i % width) + 0.5 - x, Math.floor(i / width) + 0.5 - y];
        const off = (yy * dx * dx + xx * dy * dy - 2 * xy * dx * dy) / (xx * yy - xy * xy);
        const other = Math.hypot((i % width) - 105, Math.floor(i / width) - 30) < 4 ? 1 : 0;
        return Math.exp(-off / 2) + other;
      });
      const bell = bellFit({ values, width, height }, { x: x + offX, y: y + offY }, 5, 1, 20);
      expect(Math.hypot(bell.x - x, bell.y - y)).toBeLessThan(0.2);
      // Cut off at three spreads, a bell looks about a twentieth narrower.
      for (const [found, true_] of [
        [bell.xx, xx],
        [bell.yy, yy],
      ] as const)
        expect(Math.abs(Math.sqrt(found / true_) - 1)).toBeLessThan(0.1);
      expect(Math.abs(bell.xy - xy)).toBeLessThan(0.1 * sx * sy);
    }),
    { numRuns: 20 },
  );
});

test("where there is nothing the start stays", () => {
  const nothing = { values: new Float32Array(100), width: 10, height: 10 };
  expect(bellFit(nothing, { x: 4, y: 5 }, 2, 1, 4)).toEqual({ x: 4, y: 5, xx: 4, yy: 4, xy: 0 });
});
