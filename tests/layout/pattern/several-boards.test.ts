import fc from "fast-check";
import { expect, test } from "vitest";
import {
  boardEdges,
  carpentersTriangle,
  cutRequestFor,
  drifts,
  type FaceLayout,
  layOut,
  layoutFaults,
  letLoose,
  lyingPieces,
  pieceIdsOf,
  piecesOnBoard,
  placeGroup,
  planCuts,
  problems,
  regroup,
  seams,
  turnsAlongGrain,
  um,
  umFromMm,
  verifyProgram,
  woodTaken,
} from "@/lib/layout";
import { accepted, arbitraryFace, arbitraryLayout, arbitrarySetOf, boardOf } from "../arbitrary-layout";
import { limits } from "../program/row-of-fronts";

test("every piece laid on wood is asked of exactly one board, and takes exactly that board's wood", () => {
  fc.assert(
    fc.property(arbitraryLayout, (layout) => {
      const boards = ["b1", "b2"];
      const asked = boards.flatMap((id) => piecesOnBoard(layout, id).flatMap(({ gives }) => gives)).sort();
      expect(asked).toEqual(pieceIdsOf(layout.face).sort());
      for (const id of boards) {
        const blanks = piecesOnBoard(layout, id).map(({ pieceId, label, rect, cleanUp }) => ({
          piece: pieceId,
          label,
          rect: {
            x: rect.x - cleanUp.left,
            y: rect.y - cleanUp.top,
            width: rect.width + cleanUp.left + cleanUp.right,
            height: rect.height + cleanUp.top + cleanUp.bottom,
          },
        }));
        expect(woodTaken(layout, id).map(({ piece, label, rect }) => ({ piece, label, rect }))).toEqual(blanks);
      }
    }),
    { numRuns: 30 },
  );
});

test("a jump is told between pieces of one board only, drift of pieces of the set's board only, and the triangle of all", () => {
  fc.assert(
    fc.property(arbitraryLayout, (layout) => {
      const stock = new Map(layOut(layout).map(({ id, stockId }) => [id, stockId]));
      const unknownLean = layout.face.pattern === "resawn" && layout.face.leanDeg === null;
      for (const { a, b, jump } of seams(layout)) {
        expect(jump !== null).toBe(stock.get(a) === stock.get(b) && !unknownLean);
      }
      const own = layout.groups[0]?.placement?.stockId;
      for (const { piece, drift } of drifts(layout)) if (stock.get(piece) !== own) expect(drift).toBeNull();
      expect(carpentersTriangle(layout).map(({ piece }) => piece)).toEqual(pieceIdsOf(layout.face));
      for (const one of problems(layout, [boardOf("b1", 10, 10), boardOf("b2", 10, 10)])) {
        if (one.kind === "too-close") expect(stock.get(one.pieces[0])).toBe(stock.get(one.pieces[1]));
      }
    }),
    { numRuns: 30 },
  );
});

test("with one piece on another board both boards can be sawn to exactly what lies on them, and it comes back to its place", () => {
  fc.assert(
    fc.property(arbitrarySetOf(arbitraryFace), fc.nat(30), (set, pick) => {
      const ids = pieceIdsOf(set.face);
      const id = ids[pick % ids.length] ?? "p1";
      const change = letLoose(set, id);
      fc.pre(change.ok);
      const loose = change.ok ? change.layout : set;
      const group = loose.groups.at(-1);
      const away = accepted(
        placeGroup(loose, group?.id ?? "", "b2", { x: um(30_000), y: um(25_000) }, turnsAlongGrain(set.face.grain)[1]),
      );
      expect(layoutFaults(away)).toEqual([]);
      for (const stockId of ["b1", "b2"]) {
        const { layout, board } = onFittingBoard(away, stockId);
        const request = cutRequestFor(layout, board, {
          boardEdges: boardEdges(false, false),
          truingTakes: { longEdge: umFromMm(2), end: umFromMm(2) },
          limits,
          budget: 1_000,
        });
        expect(request.pieces.length).toBeGreaterThan(0);
        const outcome = planCuts(request);
        if (!outcome.ok) throw new Error(JSON.stringify(outcome));
        expect(verifyProgram(request, outcome.program)).toEqual({ ok: true });
      }
      expect(accepted(regroup(away, id))).toEqual(set);
    }),
    { numRuns: 12 },
  );
});

/** Everything on one board moved to 20 mm from its near corner, and the board of a size that leaves as much beyond. */
function onFittingBoard(layout: FaceLayout, stockId: string) {
  const blanks = lyingPieces(layout).flatMap((piece) => (piece.stockId === stockId ? piece.blank : []));
  const [left, top] = [Math.min(...blanks.map(({ along }) => along.from)), Math.min(...blanks.map(({ across }) => across.from))];
  const [right, bottom] = [Math.max(...blanks.map(({ along }) => along.to)), Math.max(...blanks.map(({ across }) => across.to))];
  const groups = layout.groups.map((group) => {
    const { placement } = group;
    if (placement?.stockId !== stockId) return group;
    const at = { x: um(placement.at.x + 20_000 - left), y: um(placement.at.y + 20_000 - top) };
    return { ...group, placement: { ...placement, at } };
  });
  return {
    layout: { ...layout, groups },
    board: { id: stockId, length: um(right - left + 40_000), width: um(bottom - top + 40_000) },
  };
}
