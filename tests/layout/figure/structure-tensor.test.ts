/** Direction and coherence from sums of gradients. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { coherenceOf, lineDirection, type Tensor, tensorSum } from "@/lib/layout/figure/structure-tensor";

const degrees = (radians: number) => (radians * 180) / Math.PI;

function gradientAt(deg: number, strength = 1): Tensor {
  const [x, y] = [strength * Math.cos((deg * Math.PI) / 180), strength * Math.sin((deg * Math.PI) / 180)];
  return { xx: x * x, yy: y * y, xy: x * y };
}

describe("structure tensor", () => {
  // Worked by hand from the formulas in the file's head (Bigün & Granlund 1987).
  test("a gradient at 10° gives Jxx 0.969846, Jyy 0.030154, Jxy 0.171010, lines at −80°, coherence 1", () => {
    const tensor = gradientAt(10);
    expect(tensor.xx).toBeCloseTo(0.969846, 6);
    expect(tensor.yy).toBeCloseTo(0.030154, 6);
    expect(tensor.xy).toBeCloseTo(0.17101, 6);
    expect(degrees(lineDirection(tensor))).toBeCloseTo(-80, 9);
    expect(coherenceOf(tensor)).toBeCloseTo(1, 9);
  });

  test("directions of 1° and 179° average to 0°, not to 90°", () => {
    expect(degrees(lineDirection(tensorSum([gradientAt(91), gradientAt(269)])))).toBeCloseTo(0, 9);
  });

  test("the direction is square to the gradient, in (−90°, 90°], whatever the contrast", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -90, max: 90, noNaN: true }),
        fc.double({ min: 0.01, max: 1e4, noNaN: true }),
        (line, contrast) => {
          const found = degrees(lineDirection(gradientAt(line + 90, contrast)));
          expect(found).toBeGreaterThan(-90 - 1e-9);
          expect(found).toBeLessThanOrEqual(90);
          const off = Math.abs(found - line) % 180;
          expect(Math.min(off, 180 - off)).toBeLessThan(1e-6);
        },
      ),
    );
  });

  test("equal contrast in two directions square to each other has no coherence, and an even place neither", () => {
    expect(coherenceOf(tensorSum([gradientAt(20), gradientAt(110)]))).toBeCloseTo(0, 9);
    expect(coherenceOf({ xx: 0, yy: 0, xy: 0 })).toBe(0);
  });

  test("what noise would give counts as no direction, and lines keep theirs", () => {
    const noise = { xx: 0.1, yy: 0.9, xy: 0.05 };
    expect(coherenceOf({ xx: 3, yy: 27, xy: 1.5 }, noise)).toBeCloseTo(0, 6);
    expect(coherenceOf(gradientAt(90), noise)).toBeCloseTo(1, 9);
  });
});
