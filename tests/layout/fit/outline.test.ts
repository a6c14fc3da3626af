import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { outsideBy, type Spans, spansOf, um, usableOutline } from "@/lib/layout";
import { movesOutside } from "@/lib/layout/fit/outline";
import { boardOf, starPolygon, umBetween } from "../arbitrary-layout";
import { areaInside, areaOf, shifted } from "./oracle";

function piece(x: number, y: number, width: number, height: number): Spans {
  return spansOf({ x: um(x), y: um(y), width: um(width), height: um(height) });
}

function polygon(...points: readonly (readonly [number, number])[]) {
  return points.map(([x, y]) => ({ x: um(x), y: um(y) }));
}

const rectangle = usableOutline(boardOf("b1", 1_000_000, 200_000));
/** A board with a notch of 30 mm by 50 mm in its upper edge. */
const notched = polygon(
  [0, 0],
  [400_000, 0],
  [400_000, 50_000],
  [430_000, 50_000],
  [430_000, 0],
  [1_000_000, 0],
  [1_000_000, 200_000],
  [0, 200_000],
);

const arbitraryOutline = fc
  .array(umBetween(60_000, 500_000), { minLength: 4, maxLength: 12 })
  .map((radii) => starPolygon({ x: 500_000, y: 400_000 }, radii));
const arbitraryPiece = fc
  .record({
    x: umBetween(200_000, 700_000),
    y: umBetween(200_000, 500_000),
    width: umBetween(5_000, 250_000),
    height: umBetween(5_000, 200_000),
  })
  .map(spansOf);

describe("outsideBy", () => {
  test("a piece that fills the board exactly touches and fits", () => {
    expect(outsideBy(piece(0, 0, 1_000_000, 200_000), rectangle)).toBe(0);
  });

  test.each([
    [piece(-4_200, 0, 300_000, 200_000), 4_200],
    [piece(900_000, 50_000, 100_001, 100_000), 1],
    [piece(0, -3_000, 200_000, 100_000), 3_000],
    [piece(-3_000, -4_000, 200_000, 100_000), 5_000],
    [piece(-180_000, 0, 200_000, 200_000), 180_000],
    [piece(1_000_000, 0, 100_000, 200_000), 100_000],
    [piece(-10_000, -10_000, 2_000_000, 400_000), Math.hypot(990_000, 190_000)],
  ] as const)("%j is outside the rectangle by %f µm at its worst corner", (spans, by) => {
    expect(outsideBy(spans, rectangle)).toBeCloseTo(by, 6);
  });

  test("a notch that cuts in between the corners counts by its depth; touching it does not", () => {
    expect(outsideBy(piece(300_000, 20_000, 300_000, 100_000), notched)).toBeCloseTo(30_000, 6);
    expect(outsideBy(piece(300_000, 50_000, 300_000, 100_000), notched)).toBe(0);
    expect(outsideBy(piece(200_000, 0, 200_000, 200_000), notched)).toBe(0);
    expect(outsideBy(piece(430_000, 0, 200_000, 200_000), notched)).toBe(0);
  });

  test("a saw kerf narrower than any corner spacing, right through the piece, still counts", () => {
    const slit = polygon(
      [0, 0],
      [500_000, 0],
      [500_000, 190_000],
      [502_000, 190_000],
      [502_000, 0],
      [1_000_000, 0],
      [1_000_000, 200_000],
      [0, 200_000],
    );
    expect(outsideBy(piece(400_000, 20_000, 200_000, 100_000), slit)).toBeGreaterThan(0);
  });

  test("is 0 exactly where the outline covers the whole piece, by an independent reckoning of the area", () => {
    let inside = 0;
    fc.assert(
      fc.property(arbitraryPiece, arbitraryOutline, (spans, outline) => {
        const covered = areaInside(outline, spans) / areaOf(spans);
        if (covered > 1 - 1e-9) inside += 1;
        if (covered < 1 - 1e-4) expect(outsideBy(spans, outline)).toBeGreaterThan(0.5);
        if (covered > 1 - 1e-9) expect(outsideBy(spans, outline)).toBeLessThan(0.5);
      }),
      { numRuns: 2_000 },
    );
    expect(inside).toBeGreaterThan(100);
  });

  test("does not depend on where the outline starts nor on its sense", () => {
    fc.assert(
      fc.property(arbitraryPiece, arbitraryOutline, fc.nat(11), (spans, outline, start) => {
        const by = outsideBy(spans, outline);
        const first = start % outline.length;
        expect(outsideBy(spans, [...outline.slice(first), ...outline.slice(0, first)])).toBeCloseTo(by, 3);
        expect(outsideBy(spans, outline.toReversed())).toBeCloseTo(by, 3);
      }),
    );
  });
});

describe("movesOutside", () => {
  test("a piece on a plain board may go from end to end, and a piece as long as the board nowhere but where it lies", () => {
    expect(movesOutside(piece(100_000, 0, 300_000, 200_000), rectangle, "along")).toEqual([
      { from: Number.NEGATIVE_INFINITY, to: -100_000 },
      { from: 600_000, to: Number.POSITIVE_INFINITY },
    ]);
    expect(movesOutside(piece(0, 0, 1_000_000, 200_000), rectangle, "along")).toEqual([
      { from: Number.NEGATIVE_INFINITY, to: 0 },
      { from: 0, to: Number.POSITIVE_INFINITY },
    ]);
    expect(movesOutside(piece(0, 0, 1_000_001, 200_000), rectangle, "along")).toEqual([
      { from: Number.NEGATIVE_INFINITY, to: Number.POSITIVE_INFINITY },
    ]);
    expect(movesOutside(piece(0, 300_000, 100_000, 50_000), rectangle, "along")).toEqual([
      { from: Number.NEGATIVE_INFINITY, to: Number.POSITIVE_INFINITY },
    ]);
  });

  test("a notch parts the board in two for a piece that is as wide as the board", () => {
    expect(movesOutside(piece(0, 0, 100_000, 200_000), notched, "along")).toEqual([
      { from: Number.NEGATIVE_INFINITY, to: 0 },
      { from: 300_000, to: 430_000 },
      { from: 900_000, to: Number.POSITIVE_INFINITY },
    ]);
  });

  test("agrees with the area covered after the move, for any outline", () => {
    fc.assert(
      fc.property(
        arbitraryPiece,
        arbitraryOutline,
        fc.constantFrom("along" as const, "across" as const),
        fc.integer({ min: -500_000, max: 500_000 }),
        (spans, outline, axis, move) => {
          const forbidden = movesOutside(spans, outline, axis);
          fc.pre(!forbidden.some(({ from, to }) => Math.min(Math.abs(from - move), Math.abs(to - move)) < 100));
          const there = axis === "along" ? shifted(spans, move, 0) : shifted(spans, 0, move);
          const covered = areaInside(outline, there) / areaOf(there);
          expect(forbidden.some(({ from, to }) => from < move && move < to)).toBe(covered < 1 - 1e-9);
        },
      ),
      { numRuns: 2_000 },
    );
  });
});
