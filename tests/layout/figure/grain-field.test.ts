/** The direction of the grain on drawn wood, whose direction is known. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type GrainField, grainField } from "@/lib/layout";
import { drawnWood, randomFigure } from "./drawn-wood";

const degrees = (radians: number) => (radians * 180) / Math.PI;

/** Whole cells only: the last may be a sliver. */
function cellsOf(field: GrainField, lengthMm: number, widthMm: number) {
  return Array.from(field.direction, (direction, i) => ({
    direction: degrees(direction),
    coherence: field.coherence[i] as number,
    whole: ((i % field.columns) + 1) * 10 <= lengthMm && (Math.floor(i / field.columns) + 1) * 10 <= widthMm,
  })).filter(({ whole }) => whole);
}

describe("grain field", () => {
  test("finds any slope up to 40° within 2° in every cell, whatever the scale", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -40, max: 40 }),
        fc.double({ min: 1.5, max: 6, noNaN: true }),
        fc.integer({ min: 1, max: 1e6 }),
        (deg, pxPerMm, seed) => {
          const size = { lengthMm: 40, widthMm: 40 };
          const wood = drawnWood({ ...size, pxPerMm, figure: randomFigure(seed), slope: Math.tan((deg * Math.PI) / 180) });
          const cells = cellsOf(grainField(wood), 40, 40);
          expect(cells).toHaveLength(16);
          for (const { direction, coherence } of cells) {
            expect(Math.abs(direction - deg)).toBeLessThan(2);
            expect(coherence).toBeGreaterThan(0.5);
          }
        },
      ),
      { numRuns: 12 },
    );
  });

  test("finds grain that runs across the board", () => {
    const across = drawnWood({ lengthMm: 30, widthMm: 30, pxPerMm: 3, figure: () => 0, over: (x) => 130 + 40 * Math.sin(x) });
    for (const { direction } of cellsOf(grainField(across), 30, 30)) expect(Math.abs(Math.abs(direction) - 90)).toBeLessThan(1);
  });

  test("sees the grain through the marks of a saw across it", () => {
    // Bright lines every 5 mm, a third of a millimetre wide and stronger than the figure.
    const marks = (x: number, _: number, grey: number) => (x % 5 < 0.35 ? grey + 60 : grey);
    const slope = Math.tan((6 * Math.PI) / 180);
    const wood = drawnWood({ lengthMm: 60, widthMm: 40, pxPerMm: 4, figure: randomFigure(5), slope, over: marks });
    const cells = cellsOf(grainField(wood), 60, 40);
    expect(cells).toHaveLength(24);
    for (const { direction } of cells) expect(Math.abs(direction - 6)).toBeLessThan(2);
  });

  test("claims no direction where there is nothing but noise", () => {
    const noise = drawnWood({ lengthMm: 80, widthMm: 60, pxPerMm: 4, figure: () => 0, noise: 8 });
    const sorted = cellsOf(grainField(noise), 80, 60)
      .map(({ coherence }) => coherence)
      .sort((a, b) => a - b);
    expect(sorted).toHaveLength(48);
    expect(sorted[24]).toBeLessThan(0.2);
    expect(sorted[47]).toBeLessThan(0.4);
  });

  test("has one cell for every 10 mm begun, and the fourth channel plays no part", () => {
    const wood = { lengthMm: 57, widthMm: 23, pxPerMm: 4, figure: randomFigure(9) };
    const three = grainField(drawnWood(wood));
    const four = grainField(drawnWood({ ...wood, channels: 4 }));
    expect([three.cellMm, three.columns, three.rows]).toEqual([10, 6, 3]);
    expect(four).toEqual(three);
  });

  test("a picture of a single pixel has one cell and no direction", () => {
    const field = grainField(drawnWood({ lengthMm: 0.25, widthMm: 0.25, pxPerMm: 4, figure: () => 0 }));
    expect([field.columns, field.rows, field.coherence[0]]).toEqual([1, 1, 0]);
  });
});
