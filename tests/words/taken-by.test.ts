import { expect, test } from "vitest";
import type { TakenBy } from "@/lib/schemas/taken-by";
import { takenByReason, takenBySentence } from "@/lib/words/taken-by";

const issued: TakenBy = {
  orderNumber: 3,
  revision: 1,
  faceTitle: "Left cabinet",
  by: "another-face",
  cutInto: false,
  unfinished: true,
};
const cut: TakenBy = { ...issued, orderNumber: 2, cutInto: true, unfinished: false };

test.each<[string, TakenBy, string]>([
  [
    "issued",
    issued,
    "B-003 is issued for cutting with cut order 3, Left cabinet. Cut that order first, then photograph what is left of the board and mark it anew.",
  ],
  [
    "being cut",
    { ...issued, cutInto: true },
    "B-003 is being cut with cut order 3, Left cabinet. Finish that order first, then photograph what is left of the board and mark it anew.",
  ],
  [
    "cut",
    cut,
    "B-003 was already cut into by cut order 2 A. Photograph what is left and mark it anew, then move this layout over to the new picture.",
  ],
  [
    "cut by the face's own earlier order",
    { ...cut, by: "earlier-order", revision: 2 },
    "B-003 was already cut into by cut order 2 B. Photograph what is left and mark it anew, then move this layout over to the new picture.",
  ],
  [
    "begun by the order that would get its next revision",
    { ...cut, by: "this-order" },
    "B-003 was already cut into by cut order 2 A of this face. Issue the rest on the page of that order: it is planned around what is cut, with the fronts that are not cut yet where they lie here.",
  ],
])("a board that is %s: whose it is and the way out", (_, taken, words) => {
  expect(takenBySentence("B-003", taken)).toBe(words);
});

test("beside a button in a few words", () => {
  expect(takenByReason("B-003", issued)).toBe("B-003 is issued with cut order 3 A");
  expect(takenByReason("B-003", cut)).toBe("B-003 was cut into by cut order 2 A");
});
