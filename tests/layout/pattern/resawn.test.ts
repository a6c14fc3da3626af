import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  boardEdges,
  changeFace,
  cleanUpEdges,
  cutRequestFor,
  drifts,
  type FaceLayout,
  faceFaults,
  facePieces,
  faceSize,
  freshLayout,
  groupBounds,
  inverted,
  layOut,
  layoutFaults,
  letLoose,
  lyingPieces,
  piecesOnBoard,
  placeGroup,
  planCuts,
  problems,
  quarterTurn,
  type ResawnFace,
  resawnPlan,
  rowFace,
  seams,
  swapPieces,
  toStock,
  turnedVector,
  turnGroup,
  um,
  umFromMm,
  verifyProgram,
  woodTaken,
} from "@/lib/layout";
import { accepted, arbitraryResawnFace, arbitrarySetOf, boardOf } from "../arbitrary-layout";
import { limits } from "../program/row-of-fronts";

const crosscut = { kerf: umFromMm(3), cleanUpBefore: um(700), cleanUpAfter: um(400) };
const rip = { kerf: umFromMm(2), cleanUpBefore: um(300), cleanUpAfter: um(100) };
const cuts = { crosscut, rip, spacing: "followGap" as const };

/** A pair of doors, each 300 × 500 mm and 18 mm thick, grain upright; resawn with 2 mm of kerf and 1 mm planed off each face. */
const doors: ResawnFace = {
  pattern: "resawn",
  grain: "vertical",
  leaf: { width: umFromMm(300), height: umFromMm(500), thickness: umFromMm(18) },
  opens: "side",
  resaw: { kerf: umFromMm(2), planing: umFromMm(1) },
  leanDeg: null,
};

function laid(face: ResawnFace): FaceLayout {
  return accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: umFromMm(40), y: umFromMm(20) }, 1));
}

describe("a resawn pair", () => {
  test("hangs as two leaves in one face and comes from one rectangle of the board, one blank for both", () => {
    expect(facePieces({ face: doors }).map(({ id, role, rect }) => [id, role, rect.x, rect.width])).toEqual([
      ["p1", "leaf", 0, 300_000],
      ["p2", "leaf", 300_000, 300_000],
    ]);
    expect(faceSize(doors)).toEqual({ width: 600_000, height: 500_000 });
    const spans = lyingPieces(laid(doors)).map((piece) => piece.spans);
    expect(spans[0]).toEqual({ along: { from: 40_000, to: 540_000 }, across: { from: 20_000, to: 320_000 } });
    expect(spans[1]).toEqual(spans[0]);
    expect(piecesOnBoard(laid(doors), "b1")).toMatchObject([
      {
        pieceId: "p1",
        label: "1+2",
        role: "leaf",
        gives: ["p1", "p2"],
        rect: { x: 40_000, y: 20_000, width: 500_000, height: 300_000 },
      },
    ]);
    expect(woodTaken(laid(doors), "b1")).toMatchObject([{ piece: "p1", label: "1+2" }]);
  });

  test("takes 2 × 18 mm of leaves, the kerf and four faces' planing: 42 mm of rough stock, 4 mm of it between the faces that show", () => {
    expect(resawnPlan(laid(doors))).toMatchObject({ roughThickness: 42_000, thicknessLoss: 4_000, jump: null });
  });

  test("a lean of 30 degrees makes the figure jump 4 mm · tan 30° = 2.309 mm across the grain at the seam", () => {
    const leaning = laid({ ...doors, leanDeg: 30 });
    expect(resawnPlan(leaning)?.jump).toBe(2_309);
    expect(seams(leaning)[0]?.jump).toEqual({ along: { min: 0, max: 0 }, across: { min: 2_309, max: 2_309 } });
    expect(seams(laid(doors))[0]?.jump).toBeNull();
  });

  test("the blank is jointed at the edge where the pair opens, by what either leaf needs there", () => {
    // Grain upright: on the face the seam is a rip's. Its edges lie at the wood's top: 0.3 mm before the seam, 0.1 mm after it.
    const layout = laid(doors);
    const edges = cleanUpEdges(layout, layOut(layout));
    expect(edges.get("p1")).toEqual({ left: 700, right: 400, top: 300, bottom: 300 });
    expect(edges.get("p2")).toEqual(edges.get("p1"));
  });

  test("stays together: no leaf goes loose, a face that becomes a pair gathers its leaves, and a parted pair is a fault", () => {
    const refusal = { reason: "one-blank", pieces: ["p1", "p2"] };
    expect(letLoose(laid(doors), "p2")).toEqual({ ok: false, refusal });
    const row = freshLayout(rowFace([um(9_000), um(9_000)], um(9_000), um(0), "vertical"), cuts);
    const { layout } = changeFace(accepted(letLoose(row, "p2")), doors);
    expect(layout.groups.map(({ pieceIds }) => pieceIds)).toEqual([["p1", "p2"]]);
    const [set] = layout.groups;
    if (set === undefined) throw new Error("no set");
    const parted = {
      ...layout,
      groups: [
        { ...set, pieceIds: ["p1"] },
        { ...set, id: "loose-1", pieceIds: ["p2"] },
      ],
    };
    expect(layoutFaults(parted)).toEqual([{ fault: "one-blank-parted", pieces: ["p1", "p2"] }]);
  });

  test("faults", () => {
    expect(faceFaults({ ...doors, leaf: { ...doors.leaf, thickness: um(0) }, leanDeg: 90 })).toEqual([
      { fault: "size-not-positive", axis: "thickness", index: 0 },
      { fault: "lean-out-of-range" },
    ]);
    expect(faceFaults({ ...doors, resaw: { kerf: um(-1), planing: um(0) } })).toEqual([
      { fault: "negative-length", where: "resaw" },
    ]);
  });
});

describe("under the reflection", () => {
  const corners = (layout: FaceLayout) =>
    layOut(layout).map(({ outline, stockFromFace }) => outline.map((corner) => toStock(stockFromFace, corner)));

  test("the leaves mirror each other at the seam: both its edges lie on one line of the wood, whichever way the pair lies or opens", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryResawnFace), fc.boolean(), (undisturbed, swapped) => {
        const { opens } = undisturbed.face;
        const layout = swapped ? accepted(swapPieces(undisturbed, "p1", "p2")) : undisturbed;
        expect(layoutFaults(layout)).toEqual([]);
        const [one, two] = layOut(layout).map(({ stockFromFace: { a, b, c, d } }) => a * d - b * c);
        expect([one, two].sort()).toEqual([-1, 1]);
        const [first, second] = corners(layout);
        const [p, q] = opens === "side" ? [first?.[1], second?.[0]] : [first?.[3], second?.[0]];
        expect(p).toEqual(q);
        const key = (points: typeof first) => points?.map(({ x, y }) => `${x} ${y}`).sort();
        expect(key(first)).toEqual(key(second));
      }),
    );
  });

  test("the jump from the maps and the depths is d · tan φ across the grain, the other way round once the leaves change places", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryResawnFace), (layout) => {
        const { resaw, leanDeg } = layout.face;
        const jumpOf = (one: FaceLayout) => seams(one)[0]?.jump;
        if (leanDeg === null) {
          expect(jumpOf(layout)).toBeNull();
          return;
        }
        const expected = Math.round((resaw.kerf + 2 * resaw.planing) * Math.tan((leanDeg * Math.PI) / 180)) + 0;
        expect(jumpOf(layout)).toEqual({ along: { min: 0, max: 0 }, across: { min: expected, max: expected } });
        const other = jumpOf(accepted(swapPieces(layout, "p1", "p2")));
        expect(other?.across.min).toBe(-expected + 0);
        expect(jumpOf(accepted(turnGroup(layout, "set")))).toEqual(jumpOf(layout));
      }),
    );
  });

  test("the leaf shown as photographed has no drift against an uncut board, the mirrored one none that one figure can tell", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryResawnFace), (layout) => {
        expect(drifts(layout)).toEqual([
          { piece: "p1", drift: { along: 0, across: 0 } },
          { piece: "p2", drift: null },
        ]);
      }),
    );
  });

  test("clean-up follows each edge into the wood: both leaves have, at every edge of the blank, the larger of what their edges there need", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryResawnFace), (layout) => {
        const pieces = layOut(layout);
        const [columnCut, rowCut] =
          layout.face.grain === "horizontal" ? [layout.crosscut, layout.rip] : [layout.rip, layout.crosscut];
        const outward = { left: [-1, 0], right: [1, 0], top: [0, -1], bottom: [0, 1] } as const;
        const onFace = {
          left: columnCut.cleanUpAfter,
          right: columnCut.cleanUpBefore,
          top: rowCut.cleanUpAfter,
          bottom: rowCut.cleanUpBefore,
        };
        const needed = { left: 0, right: 0, top: 0, bottom: 0 };
        for (const { stockFromFace } of pieces) {
          for (const [edge, [x, y]] of Object.entries(outward)) {
            const out = turnedVector(stockFromFace, x, y);
            const side = out.x > 0 ? "right" : out.x < 0 ? "left" : out.y > 0 ? "bottom" : "top";
            needed[side] = Math.max(needed[side], onFace[edge as keyof typeof onFace]);
          }
        }
        for (const edges of cleanUpEdges(layout, pieces).values()) expect(edges).toEqual(needed);
        for (const { spans, blank } of lyingPieces(layout)) {
          expect(spans.along.from - blank.along.from).toBe(needed.left);
          expect(blank.across.to - spans.across.to).toBe(needed.bottom);
        }
      }),
    );
  });

  test("lies where it is put; turned end for end it keeps its rectangle, and turned back everything is as it was", () => {
    fc.assert(
      fc.property(arbitrarySetOf(arbitraryResawnFace), (layout) => {
        const turned = accepted(turnGroup(layout, "set"));
        expect(groupBounds(turned, "set")).toEqual(groupBounds(layout, "set"));
        expect(accepted(turnGroup(turned, "set"))).toEqual(layout);
        const half = quarterTurn(2);
        layOut(layout).forEach(({ stockFromFace }, index) => {
          const { a, b } = layOut(turned)[index]?.stockFromFace ?? { a: Number.NaN, b: Number.NaN };
          const { x, y } = turnedVector(inverted(half), a, b);
          expect([x, y]).toEqual([stockFromFace.a + 0, stockFromFace.b + 0]);
        });
        const again = accepted(placeGroup(layout, "set", "b7", { x: um(5), y: um(-8) }, layout.groups[0]?.placement?.turns ?? 0));
        expect(groupBounds(again, "set")).toMatchObject({ x: 5, y: -8 });
      }),
    );
  });

  test("the blank is sawn out once, by a program that an independent replay carries out, and is in nobody's way", () => {
    const layout = laid(doors);
    const board = boardOf("b1", 700_000, 360_000);
    expect(problems(layout, [{ ...board, thickness: umFromMm(45) }])).toEqual([]);
    const request = cutRequestFor(layout, board, {
      boardEdges: boardEdges(false, true),
      truingTakes: { longEdge: um(0), end: um(0) },
      limits,
      budget: 5_000,
    });
    const outcome = planCuts(request);
    if (!outcome.ok) throw new Error(JSON.stringify(outcome));
    expect(verifyProgram(request, outcome.program)).toEqual({ ok: true });
    expect(outcome.program.pieces.map(({ label, pieceId }) => [label, pieceId])).toEqual([["1+2", "p1"]]);
  });
});
