import fc from "fast-check";
import { expect, test } from "vitest";
import {
  boardEdges,
  cutRequestFor,
  type Face,
  type FaceLayout,
  groupBounds,
  lyingPieces,
  moveGroup,
  planCuts,
  um,
  umFromMm,
  verifyProgram,
} from "@/lib/layout";
import { accepted, arbitraryCutOutFace, arbitrarySetOf, arbitraryWrapFace } from "../arbitrary-layout";
import { limits } from "../program/row-of-fronts";

/** The set with a finger of wood round it, on a board of just that size. */
function onFittingBoard(layout: FaceLayout) {
  const blanks = lyingPieces(layout).map(({ blank }) => blank);
  const [left, top] = [Math.min(...blanks.map(({ along }) => along.from)), Math.min(...blanks.map(({ across }) => across.from))];
  const [right, bottom] = [Math.max(...blanks.map(({ along }) => along.to)), Math.max(...blanks.map(({ across }) => across.to))];
  const room = 20_000;
  const laid = accepted(moveGroup(layout, "set", { x: um(room - left), y: um(room - top) }));
  expect(groupBounds(laid, "set")).not.toBeNull();
  return { laid, board: { id: "b1", length: um(right - left + 2 * room), width: um(bottom - top + 2 * room) } };
}

test.each<[string, fc.Arbitrary<Face>]>([
  ["cut-out", arbitraryCutOutFace],
  ["run round corners", arbitraryWrapFace],
])("every %s laid on a fitting board can be sawn to exactly its pieces, by an independent replay", (_, faces) => {
  fc.assert(
    fc.property(arbitrarySetOf(faces), (layout) => {
      const { laid, board } = onFittingBoard(layout);
      const request = cutRequestFor(laid, board, {
        boardEdges: boardEdges(false, false),
        truingTakes: { longEdge: umFromMm(2), end: umFromMm(2) },
        limits,
        budget: 3_000,
      });
      const outcome = planCuts(request);
      if (!outcome.ok) throw new Error(JSON.stringify(outcome));
      expect(verifyProgram(request, outcome.program)).toEqual({ ok: true });
    }),
    { numRuns: 15 },
  );
});
