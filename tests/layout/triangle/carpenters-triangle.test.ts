import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  carpentersTriangle,
  freshLayout,
  layOut,
  placeGroup,
  rowFace,
  stackFace,
  toStock,
  triangleCorners,
  turnGroup,
  um,
} from "@/lib/layout";
import { accepted, arbitraryLayout, arbitrarySet, umBetween } from "../arbitrary-layout";

const cut = { kerf: um(3_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts = { crosscut: cut, rip: cut, spacing: "followGap" as const };
const bases = fc.constantFrom("bottom" as const, "right" as const);

describe("carpentersTriangle", () => {
  test("a row of two: the apex in the middle of the gap, one side and half of the base on each piece", () => {
    const face = rowFace([um(198_000), um(198_000)], um(120_000), um(4_000), "horizontal");
    const marks = carpentersTriangle(freshLayout(face, cuts));
    expect(triangleCorners({ face })).toEqual([
      { x: 200_000, y: 10_000 },
      { x: 10_000, y: 110_000 },
      { x: 390_000, y: 110_000 },
    ]);
    expect(marks.map(({ piece, segments }) => [piece, segments.map(({ side }) => side)])).toEqual([
      ["p1", ["first", "base"]],
      ["p2", ["second", "base"]],
    ]);
    expect(marks[0]?.segments[1]).toEqual({
      side: "base",
      from: { x: 10_000, y: 110_000 },
      to: { x: 198_000, y: 110_000 },
      inWood: null,
    });
  });

  test("base right: a stack of two has the apex at the left, one side on each piece", () => {
    const face = stackFace([um(100_000), um(100_000)], um(300_000), um(2_000), "horizontal");
    const marks = carpentersTriangle(freshLayout(face, cuts), "right");
    expect(marks.map(({ segments }) => segments.map(({ side }) => side))).toEqual([
      ["first", "base"],
      ["second", "base"],
    ]);
  });

  test("every piece of a row and of a stack carries its part of the triangle, wherever the base is", () => {
    const sizes = fc.array(umBetween(20_000, 400_000), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(sizes, umBetween(60_000, 600_000), umBetween(0, 4_000), fc.boolean(), (list, other, gap, stacked) => {
        const face = stacked ? stackFace(list, other, gap, "horizontal") : rowFace(list, other, gap, "horizontal");
        const marks = carpentersTriangle(freshLayout(face, cuts), stacked ? "bottom" : "right");
        const middle = marks.filter(({ segments }) => segments.length === 0);
        // Only a piece that lies wholly in the inset along the outer edge can be missed.
        const [apex, first, second] = triangleCorners({ face }, stacked ? "bottom" : "right");
        for (const { piece } of middle) {
          const rect =
            layOut(accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: um(0), y: um(0) }, 0))).find(
              ({ id }) => id === piece,
            )?.outline ?? [];
          const axis = stacked ? "y" : "x";
          const low = Math.min(apex[axis], first[axis], second[axis]);
          const high = Math.max(apex[axis], first[axis], second[axis]);
          expect(rect.every((corner) => corner[axis] <= low) || rect.every((corner) => corner[axis] >= high)).toBe(true);
        }
      }),
    );
  });

  test("segments lie on their pieces, to half a micrometre on the sides of the triangle, and in the wood where the piece is cut", () => {
    fc.assert(
      fc.property(arbitraryLayout, bases, (layout, base) => {
        const [apex, first, second] = triangleCorners(layout, base);
        const ends = { first: [apex, first], second: [apex, second], base: [first, second] } as const;
        const pieces = new Map(layOut(layout).map((piece) => [piece.id, piece]));
        for (const { piece: id, segments } of carpentersTriangle(layout, base)) {
          const piece = pieces.get(id);
          const xs = piece?.outline.map(({ x }) => x) ?? [];
          const ys = piece?.outline.map(({ y }) => y) ?? [];
          for (const { side, from, to, inWood } of segments) {
            const [start, end] = ends[side];
            for (const { x, y } of [from, to]) {
              expect(x).toBeGreaterThanOrEqual(Math.min(...xs));
              expect(x).toBeLessThanOrEqual(Math.max(...xs));
              expect(y).toBeGreaterThanOrEqual(Math.min(...ys));
              expect(y).toBeLessThanOrEqual(Math.max(...ys));
              const [dx, dy] = [end.x - start.x, end.y - start.y];
              expect(Math.abs((x - start.x) * dy - (y - start.y) * dx) / Math.hypot(dx, dy)).toBeLessThan(0.75);
            }
            if (piece !== undefined)
              expect(inWood).toEqual({ from: toStock(piece.stockFromFace, from), to: toStock(piece.stockFromFace, to) });
          }
        }
      }),
    );
  });

  test("a set turned end for end carries the same triangle on the face, and the turned one in the wood", () => {
    fc.assert(
      fc.property(arbitrarySet, bases, (layout, base) => {
        const turned = carpentersTriangle(accepted(turnGroup(layout, "set")), base);
        const onFace = (marks: typeof turned) =>
          marks.map(({ piece, segments }) => [piece, segments.map(({ side, from, to }) => [side, from, to])]);
        expect(onFace(turned)).toEqual(onFace(carpentersTriangle(layout, base)));
      }),
    );
  });
});
