import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { clearances, freshLayout, placeGroup, rowFace, spansOf, um } from "@/lib/layout";
import { roomBefore } from "@/lib/layout/fit/clearance";
import { reachInto } from "@/lib/layout/fit/keep-clear";
import { accepted, arbitraryKeepClear, boardOf, umBetween } from "../arbitrary-layout";
import { shifted } from "./oracle";

const cut = { kerf: um(3_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };

describe("clearances", () => {
  test("front 2 is 21 mm from a knot, front 1 farther from the same", () => {
    const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
    const layout = accepted(
      placeGroup(freshLayout(face, { crosscut: cut, rip: cut, spacing: "followGap" }), "set", "b1", { x: um(0), y: um(0) }, 0),
    );
    const area = {
      shape: "ellipse",
      centre: { x: um(434_000), y: um(70_000) },
      radiusX: um(10_000),
      radiusY: um(20_000),
      turnDeg: 0,
    } as const;
    const board = boardOf("b1", 2_000_000, 200_000, { keepClear: [{ id: "k1", kind: "knot", area }] });
    expect(clearances(layout, [board])).toEqual([
      { piece: "p1", areaId: "k1", area: "knot", room: 224_000 },
      { piece: "p2", areaId: "k1", area: "knot", room: 21_000 },
    ]);
    expect(clearances(layout, [])).toEqual([]);
  });

  test("a straight slide a little shorter than the room stays clear, one a little longer goes in", () => {
    const arbitraryPiece = fc
      .record({
        x: umBetween(0, 700_000),
        y: umBetween(0, 200_000),
        width: umBetween(50_000, 300_000),
        height: umBetween(50_000, 300_000),
      })
      .map(spansOf);
    fc.assert(
      fc.property(arbitraryPiece, arbitraryKeepClear, (piece, area) => {
        const room = roomBefore(piece, area);
        fc.pre(room !== null && room > 2);
        const reaches = (by: number) =>
          [shifted(piece, by, 0), shifted(piece, -by, 0), shifted(piece, 0, by), shifted(piece, 0, -by)].map((one) =>
            reachInto(one, area),
          );
        expect(Math.max(...reaches((room ?? 0) - 1))).toBe(0);
        expect(Math.max(...reaches((room ?? 0) + 1))).toBeGreaterThan(0);
      }),
      { numRuns: 500 },
    );
  });
});
