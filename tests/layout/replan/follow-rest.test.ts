import { describe, expect, test } from "vitest";
import { boundsOf, polygonToStock } from "@/lib/layout/frame/apply-isometry";
import { type CutChoices, freshLayout, rowFace, SET_ID } from "@/lib/layout/pattern/fresh-layout";
import { layOut } from "@/lib/layout/pattern/lay-out";
import { placeGroup } from "@/lib/layout/pattern/place-group";
import { followWood } from "@/lib/layout/replan/follow-rest";
import { um, umFromMm } from "@/lib/layout/units/um";

const loss = { kerf: umFromMm(2.4), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const cuts: CutChoices = { crosscut: loss, rip: loss, spacing: "followGap" };

/** Four fronts in a row, laid on a board with their left end at 96 mm. */
function rowOnBoard(turns: 0 | 2 = 0) {
  const width = umFromMm(243.2);
  const face = rowFace([width, width, width, width], umFromMm(184), umFromMm(3), "horizontal");
  const placed = placeGroup(freshLayout(face, cuts), SET_ID, "board-1", { x: umFromMm(96), y: umFromMm(13) }, turns);
  if (!placed.ok) throw new Error("not placed");
  return placed.layout;
}

const cornersOf = (layout: ReturnType<typeof rowOnBoard>) =>
  Object.fromEntries(
    layOut(layout).map(({ id, outline, stockFromFace }) => {
      const { x, y } = boundsOf(polygonToStock(stockFromFace, outline));
      return [id, [x, y]];
    }),
  );

const ids = ["p1", "p2", "p3", "p4"];
const moves = (by: (index: number) => [number, number] | null) =>
  ids.map((pieceId, i) => {
    const move = by(i);
    return { pieceId, by: move && { x: um(move[0]), y: um(move[1]) } };
  });

describe("a layout that follows the wood", () => {
  test("stays as it is, to the letter, when nothing moved", () => {
    const layout = rowOnBoard();
    expect(
      followWood(
        layout,
        moves(() => [0, 0]),
      ),
    ).toEqual({ ok: true, layout });
  });

  test("moves a group as one when all of it moved alike", () => {
    const layout = rowOnBoard();
    const followed = followWood(
      layout,
      moves(() => [400, -600]),
    );
    if (!followed.ok) throw new Error("refused");
    expect(followed.layout.groups).toHaveLength(1);
    const before = cornersOf(layout);
    expect(cornersOf(followed.layout)).toEqual(
      Object.fromEntries(ids.map((id) => [id, [(before[id]?.[0] ?? 0) + 400, (before[id]?.[1] ?? 0) - 600]])),
    );
  });

  test.each([0, 2] as const)(
    "lets each front loose that moved otherwise, with %i quarter turns, and takes those off that are left out",
    (turns) => {
      const layout = rowOnBoard(turns);
      const followed = followWood(
        layout,
        moves((i) => (i === 3 ? null : [i * 400, 0])),
      );
      if (!followed.ok) throw new Error("refused");
      const before = cornersOf(layout);
      const after = cornersOf(followed.layout);
      expect(Object.keys(after)).toEqual(["p1", "p2", "p3"]);
      for (const [i, id] of ["p1", "p2", "p3"].entries())
        expect(after[id]).toEqual([(before[id]?.[0] ?? 0) + i * 400, before[id]?.[1]]);
    },
  );
});
