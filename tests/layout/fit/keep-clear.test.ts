import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type KeepClearShape, type Spans, spansOf, um } from "@/lib/layout";
import { leastMove } from "@/lib/layout/fit/forbidden-moves";
import { movesIntoArea, reachInto } from "@/lib/layout/fit/keep-clear";
import { arbitraryKeepClear, umBetween } from "../arbitrary-layout";
import { areaInside, shareInsideEllipse, shifted } from "./oracle";

const arbitraryPiece: fc.Arbitrary<Spans> = fc
  .record({
    x: umBetween(0, 700_000),
    y: umBetween(0, 200_000),
    width: umBetween(50_000, 500_000),
    height: umBetween(50_000, 300_000),
  })
  .map(spansOf);

function piece(x: number, y: number, width: number, height: number): Spans {
  return spansOf({ x: um(x), y: um(y), width: um(width), height: um(height) });
}

function knot(x: number, y: number, radiusX: number, radiusY: number, turnDeg = 0): KeepClearShape {
  return { shape: "ellipse", centre: { x: um(x), y: um(y) }, radiusX: um(radiusX), radiusY: um(radiusY), turnDeg };
}

/** µm² or a share of the radius: clearly more than nothing. The closed forms agree to far less than a micrometre of depth. */
const CLEARLY = 1e-6;
/** A hundredth of a square micrometre. A piece that reaches half a micrometre along and across covers at least an eighth of one. */
const NOTHING = 1e-12;

function overlapsByOracle(spans: Spans, area: KeepClearShape): number {
  // Area inside by square micrometre over the square of a typical size, so that both are pure numbers.
  return area.shape === "ellipse" ? shareInsideEllipse(spans, area) : areaInside(area.points, spans) / 1e10;
}

describe("reachInto", () => {
  test("an edge that cuts 4.2 mm off a round knot reaches 4.2 mm into it, from whichever side", () => {
    const round = knot(100_000, 100_000, 20_000, 20_000);
    expect(reachInto(piece(0, 0, 84_200, 200_000), round)).toBeCloseTo(4_200, 6);
    expect(reachInto(piece(115_800, 0, 84_200, 200_000), round)).toBeCloseTo(4_200, 6);
    expect(reachInto(piece(0, 0, 200_000, 84_200), round)).toBeCloseTo(4_200, 6);
    expect(reachInto(piece(0, 115_800, 200_000, 84_200), round)).toBeCloseTo(4_200, 6);
  });

  test("touching is clear, and so is a corner in the empty corner of the knot's rectangle", () => {
    const round = knot(100_000, 100_000, 20_000, 20_000);
    expect(reachInto(piece(0, 0, 80_000, 200_000), round)).toBe(0);
    expect(reachInto(piece(0, 0, 85_000, 85_000), round)).toBe(0);
    expect(reachInto(piece(0, 0, 86_000, 86_000), round)).toBeGreaterThan(0);
  });

  test("an ellipse turned by 90 degrees is the ellipse with its radii exchanged", () => {
    const upright = piece(0, 0, 92_000, 300_000);
    expect(reachInto(upright, knot(100_000, 100_000, 40_000, 10_000, 90))).toBeCloseTo(2_000, 6);
    expect(reachInto(upright, knot(100_000, 100_000, 10_000, 40_000))).toBeCloseTo(2_000, 6);
  });

  test("a flat area with no radius holds nothing; a crack drawn as a line does", () => {
    expect(reachInto(piece(0, 0, 200_000, 200_000), knot(100_000, 100_000, 0, 20_000))).toBe(0);
    const crack: KeepClearShape = {
      shape: "polygon",
      points: [
        { x: um(190_000), y: um(50_000) },
        { x: um(260_000), y: um(50_000) },
      ],
    };
    expect(reachInto(piece(0, 0, 200_000, 200_000), crack)).toBe(10_000);
  });

  test("a piece between the horns of a concave area is clear of it", () => {
    const horns: KeepClearShape = {
      shape: "polygon",
      points: [
        [0, 0],
        [300_000, 0],
        [300_000, 100_000],
        [200_000, 100_000],
        [200_000, 20_000],
        [100_000, 20_000],
        [100_000, 100_000],
        [0, 100_000],
      ].map(([x = 0, y = 0]) => ({ x: um(x), y: um(y) })),
    };
    expect(reachInto(piece(100_000, 20_000, 100_000, 80_000), horns)).toBe(0);
    expect(reachInto(piece(101_000, 19_000, 98_000, 81_000), horns)).toBe(1_000);
    expect(leastMove(movesIntoArea(piece(110_000, 30_000, 80_000, 60_000), horns, "along"))).toBe(0);
    expect(leastMove(movesIntoArea(piece(60_000, 30_000, 80_000, 60_000), horns, "along"))).toBe(40_000);
  });

  test("says overlap exactly where an independent test of the geometry does", () => {
    let overlapping = 0;
    fc.assert(
      fc.property(arbitraryPiece, arbitraryKeepClear, (spans, area) => {
        const truth = overlapsByOracle(spans, area);
        const reach = reachInto(spans, area);
        if (truth > CLEARLY) overlapping += 1;
        if (truth > CLEARLY) expect(reach).toBeGreaterThan(0);
        // Half a micrometre is the rounding of a depth: below it two ways of reckoning may differ about touching. Between nothing and
        // clearly something lie tips that are long and thin: they reach far and cover next to nothing.
        else if (truth < 0 || (area.shape === "polygon" && truth < NOTHING)) expect(reach).toBeLessThan(0.5);
      }),
      { numRuns: 2_000 },
    );
    expect(overlapping).toBeGreaterThan(100);
  });

  test("a thin tip that covers next to nothing still reaches as far as it does", () => {
    const tip: KeepClearShape = {
      shape: "polygon",
      points: [
        { x: um(1_000), y: um(0) },
        { x: um(-500), y: um(866) },
        { x: um(-500), y: um(-866) },
      ],
    };
    // The upper edge falls by 866 on 1500: 186 along from the piece's end it stands 186 × 866 ÷ 1500 above its corner.
    expect(reachInto(piece(814, 0, 50_000, 50_000), tip)).toBeCloseTo((186 * 866) / 1_500, 6);
  });

  test("moving off by what it reaches clears the area in one of the four directions, and moving a hair less in none", () => {
    fc.assert(
      fc.property(arbitraryPiece, arbitraryKeepClear, (spans, area) => {
        const reach = reachInto(spans, area);
        fc.pre(reach > 2);
        const reachesAfter = (by: number) =>
          [shifted(spans, by, 0), shifted(spans, -by, 0), shifted(spans, 0, by), shifted(spans, 0, -by)].map((one) =>
            reachInto(one, area),
          );
        expect(Math.min(...reachesAfter(reach + 1e-3))).toBe(0);
        expect(Math.min(...reachesAfter(reach - 1))).toBeGreaterThan(0);
      }),
      { numRuns: 500 },
    );
  });

  test("mirrored and transposed wood gives mirrored and transposed answers", () => {
    fc.assert(
      fc.property(arbitraryPiece, arbitraryKeepClear, (spans, area) => {
        const mirrored: Spans = { ...spans, along: { from: -spans.along.to, to: -spans.along.from } };
        const swapped: Spans = { along: spans.across, across: spans.along };
        const point = ({ x, y }: { readonly x: number; readonly y: number }) => ({ x, y });
        const map = (
          move: (p: { x: number; y: number }) => { x: number; y: number },
          turnDeg: (t: number) => number,
        ): KeepClearShape => {
          const moved = (p: { readonly x: number; readonly y: number }) => ({
            x: um(move(point(p)).x + 0),
            y: um(move(point(p)).y + 0),
          });
          return area.shape === "ellipse"
            ? { ...area, centre: moved(area.centre), turnDeg: turnDeg(area.turnDeg) }
            : { ...area, points: area.points.map(moved) };
        };
        const mirroredArea = map(
          ({ x, y }) => ({ x: -x, y }),
          (turn) => -turn,
        );
        const swappedArea = map(
          ({ x, y }) => ({ x: y, y: x }),
          (turn) => 90 - turn,
        );
        expect(reachInto(mirrored, mirroredArea)).toBeCloseTo(reachInto(spans, area), 3);
        expect(reachInto(swapped, swappedArea)).toBeCloseTo(reachInto(spans, area), 3);
      }),
      { numRuns: 500 },
    );
  });
});

describe("movesIntoArea", () => {
  test("every move along or across the board inside the intervals overlaps by the independent test, every one outside does not", () => {
    fc.assert(
      fc.property(
        arbitraryPiece,
        arbitraryKeepClear,
        fc.constantFrom("along" as const, "across" as const),
        fc.integer({ min: -600_000, max: 600_000 }),
        (spans, area, axis, move) => {
          const intervals = movesIntoArea(spans, area, axis);
          const there = axis === "along" ? shifted(spans, move, 0) : shifted(spans, 0, move);
          const nearEnd = intervals.some(({ from, to }) => Math.min(Math.abs(from - move), Math.abs(to - move)) < 1);
          fc.pre(!nearEnd);
          const inside = intervals.some(({ from, to }) => from < move && move < to);
          expect(overlapsByOracle(there, area) > 0).toBe(inside);
        },
      ),
      { numRuns: 3_000 },
    );
  });
});
