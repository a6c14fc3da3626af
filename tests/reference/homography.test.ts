/**
 * Homography figures worked out by hand and by independent calculation.
 * Method: Hartley & Zisserman, Multiple View Geometry, 2nd ed. 2003, ch. 4. Figures: calculated from the four correspondences
 * with exact rational arithmetic; the cross of the diagonals is their check without any homography.
 */
import { describe, expect, test } from "vitest";
import { fitHomography, type Mark } from "@/lib/layout/picture/fit-homography";
import { applyHomography, type Homography } from "@/lib/layout/picture/homography";

function marks(photo: readonly (readonly [number, number])[], stock: readonly (readonly [number, number])[]): Mark[] {
  return photo.map(([x, y], i) => ({
    photo: { x, y },
    stockMm: { x: stock[i]?.[0] ?? Number.NaN, y: stock[i]?.[1] ?? Number.NaN },
  }));
}

function fitted(all: Mark[]): Homography {
  const h = fitHomography(all);
  if (h === null) throw new Error("no homography");
  return h;
}

const scaledToLastEntry = (h: Homography): number[] => h.map((value) => value / h[8]);

describe("unit square on a quadrilateral", () => {
  const square = [
    [0, 0],
    [1, 0],
    [1, 1],
    [0, 1],
  ] as const;
  const quadrilateral = [
    [0, 0],
    [4, 0],
    [3, 2],
    [1, 2],
  ] as const;

  test("the matrix is [[4,2,0],[0,4,0],[0,1,1]]", () => {
    const expected = [4, 2, 0, 0, 4, 0, 0, 1, 1];
    scaledToLastEntry(fitted(marks(square, quadrilateral))).forEach((value, i) => {
      expect(value).toBeCloseTo(expected[i] as number, 12);
    });
  });

  test("the centre goes to the cross of the diagonals (2, 4/3), not to the bilinear (2, 1)", () => {
    const centre = applyHomography(fitted(marks(square, quadrilateral)), { x: 0.5, y: 0.5 });
    expect(centre.x).toBeCloseTo(2, 12);
    expect(centre.y).toBeCloseTo(4 / 3, 12);
  });
});

describe("photo of a 2400 × 300 mm board", () => {
  const h = fitted(
    marks(
      [
        [120, 80],
        [1780, 140],
        [1700, 1010],
        [90, 930],
      ],
      [
        [0, 0],
        [2400, 0],
        [2400, 300],
        [0, 300],
      ],
    ),
  );

  test("the matrix, to all printed digits", () => {
    const printed = [
      1.481152371, 0.05227596603, -181.9203618, -0.01236458279, 0.3420867904, -25.8831933, 1.710442398e-5, -3.339465987e-5, 1,
    ];
    scaledToLastEntry(h).forEach((value, i) => {
      const expected = printed[i] as number;
      expect(Math.abs(value - expected)).toBeLessThanOrEqual(Math.abs(expected) * 5e-10);
    });
  });

  test("(960, 540) px lies at (1270.2637, 147.2111) mm", () => {
    const point = applyHomography(h, { x: 960, y: 540 });
    expect(point.x).toBeCloseTo(1270.2637, 4);
    expect(point.y).toBeCloseTo(147.2111, 4);
  });
});
