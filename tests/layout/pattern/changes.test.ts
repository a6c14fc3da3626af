import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  changeAnchor,
  changeCuts,
  changeFace,
  type FaceLayout,
  freshLayout,
  gridFace,
  groupBounds,
  groupOf,
  layOut,
  layoutFaults,
  letLoose,
  liftGroup,
  moveGroup,
  type PieceId,
  pieceIdsOf,
  placeGroup,
  regroup,
  rowFace,
  swapPieces,
  toStock,
  turnGroup,
  um,
} from "@/lib/layout";
import {
  accepted,
  arbitraryAnchors,
  arbitraryCut,
  arbitraryFace,
  arbitraryGridFace,
  arbitraryLayout,
  arbitraryLayoutOf,
  arbitrarySet,
  umBetween,
} from "../arbitrary-layout";

const cut = { kerf: um(3_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts = { crosscut: cut, rip: cut, spacing: "followGap" as const };

const rowOf = (widths: readonly number[]) => rowFace(widths.map(um), um(150_000), um(2_000), "horizontal");

function row(...widths: number[]): FaceLayout {
  return accepted(placeGroup(freshLayout(rowOf(widths), cuts), "set", "b1", { x: um(100_000), y: um(20_000) }, 0));
}

/** Where each piece lies: its map says everything. */
function wood(layout: FaceLayout) {
  return layOut(layout).map(({ id, stockId, stockFromFace }) => ({ id, stockId, stockFromFace }));
}

const withPiece = arbitraryLayout.chain((layout) => fc.tuple(fc.constant(layout), fc.constantFrom(...pieceIdsOf(layout.face))));
const withTwo = arbitraryLayout.chain((layout) => {
  const id = fc.constantFrom(...pieceIdsOf(layout.face));
  return fc.tuple(fc.constant(layout), id, id);
});

describe("changeAnchor", () => {
  test("never moves the wood of a grid, whatever halves the centres fall on", () => {
    fc.assert(
      fc.property(
        arbitraryLayoutOf(arbitraryGridFace).chain((layout) => fc.tuple(fc.constant(layout), arbitraryAnchors(layout))),
        ([layout, [anchorX, anchorY]]) => {
          const anchored = accepted(changeAnchor(layout, anchorX, anchorY));
          expect(wood(anchored)).toEqual(wood(layout));
          expect([anchored.anchorX, anchored.anchorY]).toEqual([anchorX, anchorY]);
        },
      ),
    );
  });

  test("refuses a piece that the face does not have", () => {
    expect(changeAnchor(row(200_000), { piece: "p2" }, "top")).toEqual({
      ok: false,
      refusal: { reason: "unknown-piece", piece: "p2" },
    });
  });
});

describe("letLoose and regroup", () => {
  test("letting loose moves nothing; taking back after a slide restores the layout", () => {
    fc.assert(
      fc.property(withPiece, umBetween(-90_000, 90_000), ([layout, piece], x) => {
        const change = letLoose(layout, piece);
        if (!change.ok) {
          const pair = { reason: "one-blank", pieces: ["p1", "p2"] };
          expect(change.refusal).toEqual(layout.face.pattern === "resawn" ? pair : { reason: "already-loose", piece });
          return;
        }
        expect(wood(change.layout)).toEqual(wood(layout));
        expect(layoutFaults(change.layout)).toEqual([]);
        const loose = groupOf(change.layout, piece);
        expect(loose?.pieceIds).toEqual([piece]);
        const slid = accepted(moveGroup(change.layout, loose?.id ?? "", { x, y: um(-x) }));
        expect(accepted(regroup(slid, piece))).toEqual(layout);
      }),
    );
  });

  test("a piece goes back to its place beside the others, wherever the set has gone meanwhile", () => {
    const loose = accepted(letLoose(row(200_000, 200_000, 200_000), "p2"));
    const away = accepted(moveGroup(loose, "set", { x: um(50_000), y: um(0) }));
    const back = accepted(regroup(away, "p2"));
    expect(wood(back)).toEqual(wood(accepted(moveGroup(row(200_000, 200_000, 200_000), "set", { x: um(50_000), y: um(0) }))));
  });

  test("ids of loose groups do not depend on what came before", () => {
    const first = accepted(letLoose(row(200_000, 200_000, 200_000), "p1"));
    const second = accepted(letLoose(first, "p3"));
    expect(second.groups.map(({ id }) => id)).toEqual(["set", "loose-1", "loose-2"]);
    expect(accepted(letLoose(accepted(regroup(second, "p1")), "p1")).groups.map(({ id }) => id)).toEqual([
      "set",
      "loose-2",
      "loose-1",
    ]);
  });

  test("refusals", () => {
    const layout = row(200_000, 200_000);
    expect(letLoose(layout, "p9")).toEqual({ ok: false, refusal: { reason: "unknown-piece", piece: "p9" } });
    expect(regroup(layout, "p9")).toEqual({ ok: false, refusal: { reason: "unknown-piece", piece: "p9" } });
    expect(regroup(layout, "p1")).toEqual({ ok: false, refusal: { reason: "already-in-set", piece: "p1" } });
    expect(letLoose(row(200_000), "p1")).toEqual({ ok: false, refusal: { reason: "already-loose", piece: "p1" } });
  });
});

describe("swapPieces", () => {
  const origin = (layout: FaceLayout, id: PieceId) => {
    const piece = layOut(layout).find((one) => one.id === id);
    const corner = piece?.outline[0];
    return piece === undefined || corner === undefined
      ? null
      : { stockId: piece.stockId, at: toStock(piece.stockFromFace, corner) };
  };

  test("each piece is cut where the other was, all else stays, and swapping again restores the layout", () => {
    fc.assert(
      fc.property(withTwo, ([layout, p, q]) => {
        const change = swapPieces(layout, p, q);
        if (!change.ok) {
          expect(["same-piece", "sizes-differ", "roles-differ"]).toContain(change.refusal.reason);
          return;
        }
        expect(layoutFaults(change.layout)).toEqual([]);
        expect(origin(change.layout, p)).toEqual(origin(layout, q));
        expect(origin(change.layout, q)).toEqual(origin(layout, p));
        for (const id of pieceIdsOf(layout.face))
          if (id !== p && id !== q) expect(origin(change.layout, id)).toEqual(origin(layout, id));
        expect(accepted(swapPieces(change.layout, q, p))).toEqual(layout);
      }),
    );
  });

  test("moves no wood when the anchor piece itself changes places", () => {
    const anchored = accepted(changeAnchor(row(200_000, 200_000, 200_000), { piece: "p1" }, "top"));
    const swapped = accepted(swapPieces(anchored, "p1", "p3"));
    expect(origin(swapped, "p2")).toEqual(origin(anchored, "p2"));
    expect(origin(swapped, "p3")).toEqual(origin(anchored, "p1"));
    expect(swapped.groups[0]?.placement?.at.x).toBe(100_000 + 2 * 203_000 + 100_000);
  });

  test("refuses pieces of different sizes and says both, even when they differ by a micrometre", () => {
    expect(swapPieces(row(200_000, 200_001), "p1", "p2")).toEqual({
      ok: false,
      refusal: {
        reason: "sizes-differ",
        pieces: ["p1", "p2"],
        sizes: [
          { width: 200_000, height: 150_000 },
          { width: 200_001, height: 150_000 },
        ],
      },
    });
    expect(swapPieces(row(200_000, 200_000), "p1", "p1")).toEqual({ ok: false, refusal: { reason: "same-piece", piece: "p1" } });
  });
});

describe("turnGroup", () => {
  test("turns a group about its own middle: the rectangle stays, twice is nothing, and every map is turned by 180 degrees", () => {
    fc.assert(
      fc.property(arbitraryLayout, (layout) => {
        for (const { id } of layout.groups) {
          const turned = accepted(turnGroup(layout, id));
          expect(groupBounds(turned, id)).toEqual(groupBounds(layout, id));
          expect(accepted(turnGroup(turned, id))).toEqual(layout);
          const before = new Map(layOut(layout).map((piece) => [piece.id, piece.stockFromFace]));
          for (const piece of layOut(turned)) {
            const was = before.get(piece.id);
            const sign = groupOf(turned, piece.id)?.id === id ? -1 : 1;
            expect(piece.stockFromFace.a + 0).toBe(sign * (was?.a ?? 0) + 0);
            expect(piece.stockFromFace.b + 0).toBe(sign * (was?.b ?? 0) + 0);
          }
        }
      }),
    );
  });

  test("refuses a group that is on no board, and one that is not there", () => {
    const lifted = accepted(liftGroup(row(200_000), "set"));
    expect(turnGroup(lifted, "set")).toEqual({ ok: false, refusal: { reason: "not-placed", groupId: "set" } });
    expect(moveGroup(lifted, "set", { x: um(1), y: um(0) })).toEqual({
      ok: false,
      refusal: { reason: "not-placed", groupId: "set" },
    });
    expect(turnGroup(lifted, "loose-1")).toEqual({ ok: false, refusal: { reason: "unknown-group", groupId: "loose-1" } });
  });
});

describe("placeGroup and moveGroup", () => {
  test("the near corner of the group's rectangle comes where it was asked, and sliding shifts every map by the same vector", () => {
    fc.assert(
      fc.property(arbitrarySet, umBetween(-200_000, 900_000), umBetween(-200_000, 900_000), (layout, x, y) => {
        const turns = layout.groups[0]?.placement?.turns ?? 0;
        const bounds = groupBounds(accepted(placeGroup(layout, "set", "b7", { x, y }, turns)), "set");
        expect([bounds?.x, bounds?.y]).toEqual([x, y]);
        const slid = layOut(accepted(moveGroup(layout, "set", { x, y })));
        layOut(layout).forEach((piece, index) => {
          const { tx, ty } = slid[index]?.stockFromFace ?? { tx: Number.NaN, ty: Number.NaN };
          expect([tx - piece.stockFromFace.tx, ty - piece.stockFromFace.ty]).toEqual([x, y]);
        });
      }),
    );
  });
});

describe("changeFace and changeCuts", () => {
  test("the anchor of every group stays where it is in the wood", () => {
    fc.assert(
      fc.property(arbitraryLayout, arbitraryCut, arbitraryCut, arbitraryFace, (layout, crosscut, rip, face) => {
        const places = (one: FaceLayout) => new Map(one.groups.map((group) => [group.id, group.placement]));
        const before = places(layout);
        expect(places(changeCuts(layout, { crosscut, rip }))).toEqual(before);
        for (const [id, placement] of places(changeFace(layout, face).layout)) expect(placement).toEqual(before.get(id));
      }),
    );
  });

  test("whatever face comes next, the layout stays sound", () => {
    fc.assert(
      fc.property(arbitraryLayout, arbitraryFace, (layout, face) => {
        const change = changeFace(layout, face);
        expect(layoutFaults(change.layout)).toEqual([]);
        expect(change.layout.face).toEqual(face);
      }),
    );
  });

  test("a left anchor lets a wider front push the others right; a centre anchor shares it out", () => {
    const grow = (layout: FaceLayout) => layOut(changeFace(layout, rowOf([210_000, 200_000, 200_000])).layout);
    const left = accepted(changeAnchor(row(200_000, 200_000, 200_000), "left", "top"));
    expect(grow(left).map(({ outline, stockFromFace }) => (outline[0]?.x ?? 0) + stockFromFace.tx)).toEqual([
      100_000, 313_000, 516_000,
    ]);
    const centre = accepted(changeAnchor(row(200_000, 200_000, 200_000), "centre", "top"));
    expect(grow(centre).map(({ outline, stockFromFace }) => (outline[0]?.x ?? 0) + stockFromFace.tx)).toEqual([
      95_000, 308_000, 511_000,
    ]);
    const middle = accepted(changeAnchor(row(200_000, 200_000, 200_000), { piece: "p2" }, "top"));
    expect(grow(middle).map(({ outline, stockFromFace }) => (outline[0]?.x ?? 0) + stockFromFace.tx)).toEqual([
      90_000, 303_000, 506_000,
    ]);
  });

  test("a swap whose pieces no longer have one size is undone and said; new fronts join the set", () => {
    const swapped = accepted(swapPieces(row(200_000, 200_000, 200_000), "p1", "p3"));
    const change = changeFace(
      swapped,
      rowFace([210_000, 200_000, 200_000, 200_000].map(um), um(150_000), um(2_000), "horizontal"),
    );
    expect(change.swapsUndone).toEqual(["p1", "p3"]);
    expect(change.layout.groups.map(({ pieceIds, takesPlaceOf }) => ({ pieceIds, takesPlaceOf }))).toEqual([
      { pieceIds: ["p1", "p2", "p3", "p4"], takesPlaceOf: {} },
    ]);
    const kept = changeFace(swapped, { ...rowOf([200_000, 200_000, 200_000]), rows: [um(160_000)] });
    expect(kept.swapsUndone).toEqual([]);
    expect(kept.layout.groups[0]?.takesPlaceOf).toEqual({ p1: "p3", p3: "p1" });
  });
});

describe("layoutFaults", () => {
  test("names what is wrong with the shape of a layout", () => {
    const face = gridFace([um(100_000), um(100_001)], [um(50_000)], um(3_000), um(3_000), "horizontal");
    const layout = freshLayout(face, cuts);
    const [set] = layout.groups;
    if (set === undefined) throw new Error("no set");
    expect(layoutFaults(layout)).toEqual([]);
    expect(layoutFaults({ ...layout, face: { ...face, columnGaps: [] } })).toEqual([{ fault: "gap-count", axis: "columns" }]);
    expect(layoutFaults({ ...layout, face: { ...face, rows: [um(0)] } })).toEqual([
      { fault: "size-not-positive", axis: "rows", index: 0 },
    ]);
    expect(layoutFaults({ ...layout, rip: { ...cut, kerf: um(-1) } })).toEqual([{ fault: "negative-length", where: "rip" }]);
    expect(layoutFaults({ ...layout, face: { ...face, columns: [], columnGaps: [] } })).toEqual([{ fault: "empty-face" }]);
    expect(layoutFaults({ ...layout, groups: [{ ...set, pieceIds: ["p1"] }] })).toEqual([
      { fault: "piece-not-once", piece: "p2", times: 0 },
      { fault: "slot-not-once", piece: "p2", times: 0 },
    ]);
    expect(layoutFaults({ ...layout, groups: [{ ...set, takesPlaceOf: { p1: "p2" } }] })).toEqual([
      { fault: "slot-not-once", piece: "p1", times: 0 },
      { fault: "slot-not-once", piece: "p2", times: 2 },
      { fault: "swap-of-unequal", piece: "p1", slot: "p2" },
    ]);
    expect(layoutFaults({ ...layout, anchorX: { piece: "p3" } })).toEqual([{ fault: "unknown-piece", piece: "p3" }]);
  });
});
