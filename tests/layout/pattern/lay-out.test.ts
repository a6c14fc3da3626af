import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  faceSize,
  freshLayout,
  layOut,
  layoutFaults,
  lossOf,
  type PieceId,
  placeGroup,
  rectToStock,
  rowFace,
  seams,
  spacingOf,
  stackFace,
  um,
  unplacedPieces,
} from "@/lib/layout";
import { accepted, arbitraryGridFace, arbitraryLayout, arbitraryLayoutOf, arbitrarySetOf } from "../arbitrary-layout";

const cut = { kerf: um(2_400), cleanUpBefore: um(200), cleanUpAfter: um(200) };
const cuts = { crosscut: cut, rip: cut, spacing: "followGap" as const };

function rectOnFace(outline: readonly { readonly x: number; readonly y: number }[]) {
  const [a, , c] = outline;
  if (a === undefined || c === undefined) throw new Error("no rectangle");
  return { x: um(a.x), y: um(a.y), width: um(c.x - a.x), height: um(c.y - a.y) };
}

describe("layOut", () => {
  test("a row of three 200 mm fronts with 3 mm gaps and 2.8 mm loss lies at 203 mm on the board, the sliver of 0.2 mm wasted", () => {
    const layout = accepted(
      placeGroup(
        freshLayout(rowFace([um(200_000), um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal"), cuts),
        "set",
        "b1",
        { x: um(10_000), y: um(5_000) },
        0,
      ),
    );
    const pieces = layOut(layout);
    expect(pieces.map(({ id, label, stockId }) => [id, label, stockId])).toEqual([
      ["p1", "1", "b1"],
      ["p2", "2", "b1"],
      ["p3", "3", "b1"],
    ]);
    const lefts = pieces.map(({ outline, stockFromFace }) => rectToStock(stockFromFace, rectOnFace(outline)).x);
    expect(lefts).toEqual([10_000, 213_000, 416_000]);
    expect(seams(layout).map(({ jump }) => jump?.along)).toEqual([
      { min: 0, max: 0 },
      { min: 0, max: 0 },
    ]);
  });

  test("tight spacing of the same row saves the sliver and shows 0.2 mm of figure twice over", () => {
    const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
    const layout = accepted(placeGroup(freshLayout(face, { ...cuts, spacing: "tight" }), "set", "b1", { x: um(0), y: um(0) }, 0));
    expect(seams(layout)[0]?.jump).toEqual({ along: { min: -200, max: -200 }, across: { min: 0, max: 0 } });
  });

  test("vertical grain is laid on the board with a quarter turn: the height of a front runs along the board", () => {
    const face = stackFace([um(100_000), um(150_000)], um(400_000), um(3_000), "vertical");
    const layout = accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: um(0), y: um(0) }, 1));
    const rects = layOut(layout).map(({ outline, stockFromFace }) => rectToStock(stockFromFace, rectOnFace(outline)));
    expect(rects).toEqual([
      { x: 153_000, y: 0, width: 100_000, height: 400_000 },
      { x: 0, y: 0, width: 150_000, height: 400_000 },
    ]);
  });

  test("before it is laid on wood a layout has no pieces, only their places", () => {
    const layout = freshLayout(rowFace([um(200_000), um(100_000)], um(150_000), um(3_000), "horizontal"), cuts);
    expect(layOut(layout)).toEqual([]);
    expect(unplacedPieces(layout).map(({ id, label, rect }) => ({ id, label, rect }))).toEqual([
      { id: "p1", label: "1", rect: { x: 0, y: 0, width: 200_000, height: 150_000 } },
      { id: "p2", label: "2", rect: { x: 203_000, y: 0, width: 100_000, height: 150_000 } },
    ]);
  });

  test("a grid assembled from its pieces has the finished size, every gap as specified, and nothing overlaps", () => {
    fc.assert(
      fc.property(arbitraryLayoutOf(arbitraryGridFace), (layout) => {
        const pieces = layOut(layout);
        const rects = pieces.map(({ outline }) => rectOnFace(outline));
        const size = faceSize(layout.face);
        expect(Math.max(...rects.map(({ x, width }) => x + width))).toBe(size.width);
        expect(Math.max(...rects.map(({ y, height }) => y + height))).toBe(size.height);
        const columns = layout.face.columns.length;
        rects.forEach((rect, index) => {
          const column = index % columns;
          const row = Math.floor(index / columns);
          const right = rects[index + 1];
          if (right !== undefined && column + 1 < columns)
            expect(right.x - rect.x - rect.width).toBe(layout.face.columnGaps[column]);
          const below = rects[index + columns];
          if (below !== undefined) expect(below.y - rect.y - rect.height).toBe(layout.face.rowGaps[row]);
        });
      }),
    );
  });

  test("every layout of the generator is sound, its pieces come in reading order and keep their finished size in the wood", () => {
    fc.assert(
      fc.property(arbitraryLayout, (layout) => {
        expect(layoutFaults(layout)).toEqual([]);
        const pieces = layOut(layout);
        expect(pieces.map(({ label }) => Number(label))).toEqual(pieces.map((_, index) => index + 1));
        for (const { outline, stockFromFace } of pieces) {
          const face = rectOnFace(outline);
          const wood = rectToStock(stockFromFace, face);
          const sizes = stockFromFace.a === 0 ? [wood.height, wood.width] : [wood.width, wood.height];
          expect(sizes).toEqual([face.width, face.height]);
        }
      }),
    );
  });

  test("the pieces of an undisturbed grid lie exactly at the spacing of their cuts", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryGridFace), (layout) => {
        const rects = new Map<PieceId, { x: number; y: number; width: number; height: number }>();
        for (const { id, outline, stockFromFace } of layOut(layout))
          rects.set(id, rectToStock(stockFromFace, rectOnFace(outline)));
        for (const { a, b, gap, normal } of seams(layout)) {
          const [first, second] = [rects.get(a), rects.get(b)];
          if (first === undefined || second === undefined) throw new Error("piece without place");
          const alongBoard = (normal === "right") === (layout.face.grain === "horizontal");
          const cutLoss = alongBoard ? layout.crosscut : layout.rip;
          const room = alongBoard
            ? Math.max(first.x, second.x) - Math.min(first.x + first.width, second.x + second.width)
            : Math.max(first.y, second.y) - Math.min(first.y + first.height, second.y + second.height);
          expect(room).toBe(spacingOf(cutLoss, gap, layout.spacing));
          expect(room).toBeGreaterThanOrEqual(lossOf(cutLoss));
        }
      }),
    );
  });

  test("the same layout gives the same pieces, byte for byte", () => {
    fc.assert(
      fc.property(arbitraryLayout, (layout) => {
        expect(JSON.stringify(layOut(structuredClone(layout)))).toBe(JSON.stringify(layOut(layout)));
      }),
    );
  });
});
