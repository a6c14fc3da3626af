import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { fitHomography, type LineMark, type Mark, markResidualMm } from "@/lib/layout/picture/fit-homography";
import { applyHomography, depthAt, type Homography, invertHomography, type MmPoint } from "@/lib/layout/picture/homography";

/** A camera over a bench: turn, scale, shift and a moderate lean, always in front of the camera over 2400 × 300 mm. */
const photoFromStockMm = fc
  .record({
    turn: fc.double({ min: -Math.PI, max: Math.PI, noNaN: true }),
    scale: fc.double({ min: 0.3, max: 6, noNaN: true }),
    squeeze: fc.double({ min: 0.4, max: 1.6, noNaN: true }),
    shear: fc.double({ min: -0.4, max: 0.4, noNaN: true }),
    x: fc.double({ min: -500, max: 4000, noNaN: true }),
    y: fc.double({ min: -500, max: 3000, noNaN: true }),
    leanX: fc.double({ min: -1.5e-4, max: 2e-4, noNaN: true }),
    leanY: fc.double({ min: -8e-4, max: 8e-4, noNaN: true }),
  })
  .map(({ turn, scale, squeeze, shear, x, y, leanX, leanY }): Homography => {
    const cos = Math.cos(turn) * scale;
    const sin = Math.sin(turn) * scale;
    return [
      cos + x * leanX,
      shear * cos - sin * squeeze + x * leanY,
      x,
      sin + y * leanX,
      shear * sin + cos * squeeze + y * leanY,
      y,
      leanX,
      leanY,
      1,
    ];
  });

const corners: readonly MmPoint[] = [
  { x: 0, y: 0 },
  { x: 2400, y: 0 },
  { x: 2400, y: 300 },
  { x: 0, y: 300 },
];

const grid: readonly MmPoint[] = Array.from({ length: 35 }, (_, i) => ({ x: (i % 7) * 400, y: Math.floor(i / 7) * 75 }));

const seenBy = (photo: Homography, points: readonly MmPoint[]): Mark[] =>
  points.map((stockMm) => ({ photo: applyHomography(photo, stockMm), stockMm }));

function worstMm(fit: Homography, marks: readonly Mark[]): number {
  return Math.max(...marks.map((mark) => markResidualMm(fit, mark)));
}

describe("fitHomography", () => {
  test("four marks give back the camera that made them", () => {
    fc.assert(
      fc.property(photoFromStockMm, (photo) => {
        const fit = fitHomography(seenBy(photo, corners));
        expect(fit).not.toBeNull();
        if (fit !== null) expect(worstMm(fit, seenBy(photo, grid))).toBeLessThan(1e-6);
      }),
    );
  });

  test("many exact marks give the same map as four", () => {
    fc.assert(
      fc.property(photoFromStockMm, (photo) => {
        const fit = fitHomography(seenBy(photo, grid));
        expect(fit).not.toBeNull();
        if (fit !== null) expect(worstMm(fit, seenBy(photo, grid))).toBeLessThan(1e-6);
      }),
    );
  });

  test("the order of the marks does not matter", () => {
    fc.assert(
      fc.property(photoFromStockMm, fc.shuffledSubarray([0, 1, 2, 3], { minLength: 4 }), (photo, order) => {
        const fit = fitHomography(
          seenBy(
            photo,
            order.map((i) => corners[i] as MmPoint),
          ),
        );
        if (fit === null) throw new Error("no fit");
        expect(worstMm(fit, seenBy(photo, grid))).toBeLessThan(1e-6);
      }),
    );
  });

  test("turning, stretching, mirroring and moving the photo changes nothing on the wood", () => {
    const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    const affine = fc.record({
      turn: between(-4, 4),
      wide: between(0.4, 2.5),
      high: between(-2.5, -0.4),
      shear: between(-1, 1),
      x: between(-900, 900),
    });
    fc.assert(
      fc.property(photoFromStockMm, affine, (photo, { turn, wide, high, shear, x }) => {
        // A turn after a shear after a stretch; `high` is negative, so the photo is mirrored too.
        const move = (p: { x: number; y: number }) => {
          const u = wide * p.x + shear * high * p.y;
          const v = high * p.y;
          return { x: Math.cos(turn) * u - Math.sin(turn) * v + x, y: Math.sin(turn) * u + Math.cos(turn) * v - x };
        };
        const moved = fitHomography(seenBy(photo, corners).map((mark) => ({ ...mark, photo: move(mark.photo) })));
        if (moved === null) throw new Error("no fit");
        for (const { photo: p, stockMm } of seenBy(photo, grid)) {
          const found = applyHomography(moved, move(p));
          expect(Math.hypot(found.x - stockMm.x, found.y - stockMm.y)).toBeLessThan(1e-5);
        }
      }),
    );
  });

  test("with noise on many marks it beats four marks of the same noise", () => {
    const photo: Homography = [1.5, 0.02, 240, -0.01, 1.45, 1300, 1e-5, -2e-5, 1];
    // Three fixed sine waves stand in for the hand's error, about ±1 px.
    const shaky = seenBy(photo, grid).map((mark, i) => ({
      ...mark,
      photo: { x: mark.photo.x + Math.sin(12.9 * i + 1), y: mark.photo.y + Math.sin(78.2 * i + 2) },
    }));
    const many = fitHomography(shaky);
    const four = fitHomography([0, 6, 34, 28].map((i) => shaky[i] as Mark));
    if (many === null || four === null) throw new Error("no fit");
    expect(worstMm(many, seenBy(photo, grid))).toBeLessThan(worstMm(four, seenBy(photo, grid)));
  });

  test("points known only to lie on an edge stand in for a hidden corner", () => {
    const photo: Homography = [1.5, 0.02, 240, -0.01, 1.45, 1300, 1e-5, -2e-5, 1];
    const at = (x: number, y: number) => applyHomography(photo, { x, y });
    // The fourth corner is hidden; one point on each of the edges that meet there takes its place.
    const onEdges: LineMark[] = [
      { photo: at(1900, 0), line: { a: 0, b: 1, c: 0 } },
      { photo: at(2400, 120), line: { a: 1, b: 0, c: 2400 } },
    ];
    const seenCorners = seenBy(photo, [corners[0] as MmPoint, corners[2] as MmPoint, corners[3] as MmPoint]);
    const fit = fitHomography(seenCorners, onEdges);
    if (fit === null) throw new Error("no fit");
    expect(worstMm(fit, seenBy(photo, grid))).toBeLessThan(1e-6);
  });

  test("three marks, or four of which three are in line, fix nothing", () => {
    const photo: Homography = [2, 0, 0, 0, 2, 0, 0, 0, 1];
    expect(fitHomography(seenBy(photo, corners.slice(0, 3)))).toBeNull();
    expect(
      fitHomography(
        seenBy(photo, [
          { x: 0, y: 0 },
          { x: 100, y: 0 },
          { x: 200, y: 0 },
          { x: 0, y: 90 },
        ]),
      ),
    ).toBeNull();
    expect(
      fitHomography(
        seenBy(photo, [
          { x: 5, y: 5 },
          { x: 5, y: 5 },
          { x: 5, y: 5 },
          { x: 5, y: 5 },
        ]),
      ),
    ).toBeNull();
  });
});

describe("invertHomography", () => {
  test("leads back, and keeps the side of the vanishing line", () => {
    fc.assert(
      fc.property(photoFromStockMm, (photo) => {
        const back = invertHomography(photo);
        if (back === null) throw new Error("singular");
        for (const p of grid) {
          const seen = applyHomography(photo, p);
          const again = applyHomography(back, seen);
          expect(Math.hypot(again.x - p.x, again.y - p.y)).toBeLessThan(1e-6);
          expect(depthAt(back, seen)).toBeGreaterThan(0);
        }
      }),
    );
  });

  test("a matrix that flattens the plane has no way back", () => {
    expect(invertHomography([1, 2, 0, 2, 4, 0, 0, 0, 1])).toBeNull();
  });
});
