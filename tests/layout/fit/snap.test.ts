import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BoardFace,
  type FaceLayout,
  freshLayout,
  letLoose,
  moveGroup,
  placeGroup,
  problems,
  rowFace,
  snapSlide,
  um,
} from "@/lib/layout";
import { accepted, arbitraryBoard, arbitraryLayout, boardOf, umBetween } from "../arbitrary-layout";

const cut = { kerf: um(2_400), cleanUpBefore: um(200), cleanUpAfter: um(200) };
const TOLERANCE = um(3_000);

/** Two fronts of 200 by 150 mm on a board of 2400 by 200 mm, the first loose and 500 mm to the left of where the second is. */
function apart(): FaceLayout {
  const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
  const placed = accepted(
    placeGroup(
      freshLayout(face, { crosscut: cut, rip: cut, spacing: "followGap" }),
      "set",
      "b1",
      { x: um(800_000), y: um(20_000) },
      0,
    ),
  );
  return accepted(moveGroup(accepted(letLoose(placed, "p1")), "loose-1", { x: um(-500_000), y: um(0) }));
}

const board = boardOf("b1", 2_400_000, 200_000);
const knotted: BoardFace = {
  ...board,
  keepClear: [
    {
      id: "k1",
      kind: "knot",
      area: { shape: "ellipse", centre: { x: um(600_000), y: um(95_000) }, radiusX: um(20_000), radiusY: um(20_000), turnDeg: 0 },
    },
  ],
};

function slide(on: BoardFace, x: number, y = 0) {
  return snapSlide(apart(), on, ["loose-1"], { x: um(x), y: um(y) }, TOLERANCE);
}

describe("snapSlide", () => {
  test("comes to lie the saw's loss of 2.8 mm from its neighbour, from either side", () => {
    // Front 1 lies at 300..500 mm, front 2 at 1003..1203 mm.
    expect(slide(board, 499_000)).toEqual({
      delta: { x: 500_200, y: 0 },
      along: { target: { kind: "loss", piece: "p2" }, edge: 1_000_200 },
      across: { target: { kind: "flush", piece: "p2" }, edge: 20_000 },
    });
    expect(slide(board, 907_000).delta.x).toBe(1_205_800 - 300_000);
  });

  test("stops at the end of the board and at its edges, with 0.2 mm of clean-up to spare", () => {
    expect(slide(board, -298_000, 27_500)).toEqual({
      delta: { x: -299_800, y: 29_800 },
      along: { target: { kind: "outline" }, edge: 200 },
      across: { target: { kind: "outline" }, edge: 199_800 },
    });
  });

  test("stops just clear of a knot", () => {
    expect(slide(knotted, 81_500)).toMatchObject({
      delta: { x: 80_000 },
      along: { target: { kind: "keep-clear", areaId: "k1" }, edge: 580_000 },
    });
    expect(slide(knotted, 318_000)).toMatchObject({
      delta: { x: 320_000 },
      along: { target: { kind: "keep-clear", areaId: "k1" }, edge: 620_000 },
    });
  });

  test("beyond the tolerance the slide stays as it is", () => {
    expect(slide(board, 250_000, 10_000)).toEqual({ delta: { x: 250_000, y: 10_000 }, along: null, across: null });
  });

  test("edges in line count too: an end flush with the end of a piece on another strip", () => {
    const wide = boardOf("b1", 2_400_000, 600_000);
    expect(slide(wide, 702_000, 300_000)).toMatchObject({
      delta: { x: 703_000 },
      along: { target: { kind: "flush", piece: "p2" } },
    });
  });

  test("a group on another board, or none, is not snapped to anything", () => {
    expect(snapSlide(apart(), boardOf("b2", 500_000, 200_000), ["set"], { x: um(1), y: um(2) }, TOLERANCE)).toEqual({
      delta: { x: 1, y: 2 },
      along: null,
      across: null,
    });
    expect(snapSlide(apart(), board, [], { x: um(1), y: um(2) }, TOLERANCE)).toEqual({
      delta: { x: 1, y: 2 },
      along: null,
      across: null,
    });
  });

  test("never moves by more than the tolerance, and at the snapped place snapping stays put", () => {
    fc.assert(
      fc.property(
        arbitraryLayout,
        arbitraryBoard("b1"),
        umBetween(-200_000, 200_000),
        umBetween(-200_000, 200_000),
        umBetween(0, 20_000),
        (layout, b1, x, y, tolerance) => {
          const snapped = snapSlide(layout, b1, ["set"], { x, y }, tolerance);
          expect(Math.abs(snapped.delta.x - x)).toBeLessThanOrEqual(tolerance);
          expect(Math.abs(snapped.delta.y - y)).toBeLessThanOrEqual(tolerance);
          if (snapped.along === null) expect(snapped.delta.x).toBe(x);
          if (snapped.across === null) expect(snapped.delta.y).toBe(y);
          const there = accepted(moveGroup(layout, "set", snapped.delta));
          const again = snapSlide(there, b1, ["set"], { x: um(0), y: um(0) }, um(0));
          expect(again.delta).toEqual({ x: 0, y: 0 });
        },
      ),
      { numRuns: 120 },
    );
  });

  test("what was snapped clear of an area is clear of it, and what was snapped to its neighbour leaves room for the saw", () => {
    let clear = 0;
    fc.assert(
      fc.property(arbitraryLayout, arbitraryBoard("b1"), umBetween(-100_000, 100_000), (layout, b1, x) => {
        const { delta, along } = snapSlide(layout, b1, ["set"], { x, y: um(0) }, um(30_000));
        fc.pre(delta.y === 0 && along !== null);
        clear += 1;
        const found = problems(accepted(moveGroup(layout, "set", delta)), [b1]);
        const inSet = new Set(layout.groups[0]?.pieceIds);
        if (along?.target.kind === "keep-clear") {
          expect(found.filter((one) => one.kind === "keep-clear" && inSet.has(one.piece))).toEqual([]);
        }
        if (along?.target.kind === "loss") {
          const mixed = found.filter((one) => one.kind === "too-close" && inSet.has(one.pieces[0]) !== inSet.has(one.pieces[1]));
          expect(mixed).toEqual([]);
        }
        if (along?.target.kind === "outline" && layout.groups.length === 1) {
          expect(found.filter((one) => one.kind === "outside")).toEqual([]);
        }
      }),
      { numRuns: 120 },
    );
    expect(clear).toBeGreaterThan(20);
  });
});
