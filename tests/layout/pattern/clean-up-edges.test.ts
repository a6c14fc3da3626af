import fc from "fast-check";
import { expect, test } from "vitest";
import {
  cleanUpEdges,
  type FaceLayout,
  freshLayout,
  layOut,
  lossOf,
  placeGroup,
  type QuarterTurns,
  rowFace,
  um,
} from "@/lib/layout";
import { accepted, arbitraryCut, arbitraryGrain } from "../arbitrary-layout";

const crosscut = { kerf: um(3_000), cleanUpBefore: um(1), cleanUpAfter: um(2) };
const rip = { kerf: um(3_000), cleanUpBefore: um(3), cleanUpAfter: um(4) };

function edges(grain: "horizontal" | "vertical", turns: QuarterTurns) {
  const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), grain);
  return edgesOf(freshLayout(face, { crosscut, rip, spacing: "tight" }), turns);
}

/** Those of the first piece once the layout lies with these turns. */
function edgesOf(layout: FaceLayout, turns: QuarterTurns) {
  const laid = accepted(placeGroup(layout, "set", "b1", { x: um(0), y: um(0) }, turns));
  const found = cleanUpEdges(laid, layOut(laid)).get("p1");
  if (found === undefined) throw new Error("no piece");
  return found;
}

test("not turned, the right-hand edge is the one before a crosscut and the left-hand one after it", () => {
  expect(edges("horizontal", 0)).toEqual({ left: 2, right: 1, top: 4, bottom: 3 });
});

test("end for end, opposite edges change places", () => {
  expect(edges("horizontal", 2)).toEqual({ left: 1, right: 2, top: 3, bottom: 4 });
});

test("a quarter turn clockwise takes right to bottom, bottom to left, left to top, top to right", () => {
  // Vertical grain: on the face columns are parted by rips and rows by crosscuts.
  expect(edges("vertical", 1)).toEqual({ left: 1, right: 2, top: 4, bottom: 3 });
  expect(edges("vertical", 3)).toEqual({ left: 2, right: 1, top: 3, bottom: 4 });
});

test("facing edges of two neighbours and the kerf between them come to the loss of their cut", () => {
  fc.assert(
    fc.property(arbitraryCut, arbitraryCut, arbitraryGrain, (one, other, grain) => {
      const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), grain);
      const layout = freshLayout(face, { crosscut: one, rip: other, spacing: "tight" });
      const { left, right, top, bottom } = edgesOf(layout, grain === "horizontal" ? 0 : 1);
      expect(one.kerf + left + right).toBe(lossOf(one));
      expect(other.kerf + top + bottom).toBe(lossOf(other));
    }),
  );
});
