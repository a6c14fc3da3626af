/** Which boards of the table stand in the way of issuing because they belong to an order. */
import { expect, test } from "vitest";
import { takenBoards } from "@/lib/editor/selectors/taken-boards";
import type { TakenBy } from "@/lib/schemas/taken-by";
import { longBoard, rowDocument, shortBoard, tableBoardOf } from "./sample-table";

const takenBy: TakenBy = {
  orderNumber: 3,
  revision: 1,
  faceTitle: "Left cabinet",
  by: "another-face",
  cutInto: true,
  unfinished: true,
};
const own = { ...takenBy, by: "this-order" } as const;
const table = (taken: TakenBy | null) => [{ ...tableBoardOf(longBoard), tag: "B-007", takenBy: taken }];
const found = [{ id: longBoard.id, tag: "B-007", takenBy }];

test("a board of another face's order does, whether the own order holds or not", () => {
  expect(takenBoards(rowDocument(), table(takenBy), false)).toEqual(found);
  expect(takenBoards(rowDocument(), table(takenBy), true)).toEqual(found);
});

test("what the own order has cut does only once the layout is another than was issued", () => {
  expect(takenBoards(rowDocument(), table(own), true)).toEqual([]);
  expect(takenBoards(rowDocument(), table(own), false)).toHaveLength(1);
});

test("a free board does not, nor one that no front lies on", () => {
  expect(takenBoards(rowDocument(), table(null), false)).toEqual([]);
  expect(takenBoards(rowDocument(), [{ ...tableBoardOf(shortBoard), takenBy }], false)).toEqual([]);
});
