/** Wood of other faces at the table: where a first place is found, what a drag snaps to, what stands in the way of issuing. */
import { describe, expect, test } from "vitest";
import { laidAtFirstPlace } from "@/lib/editor/commands/find-place";
import { problemsOf } from "@/lib/editor/selectors/facts";
import { woodOfBoards } from "@/lib/editor/selectors/spoken-for";
import { previewAt } from "@/lib/editor/tools/drag";
import { type BoardFace, lyingPieces, SET_ID, um, umFromMm } from "@/lib/layout";
import { type SpokenForPiece, standsInTheWay } from "@/lib/schemas/spoken-for";
import { longBoard, rowDocument, tableBoardOf, unplacedDocument } from "./sample-table";

const kerf = umFromMm(2.4);

/** The full width of the long board between two distances from its left end. */
function wood(fromMm: number, toMm: number, issued = false): SpokenForPiece {
  return {
    id: `face p${fromMm}`,
    rect: { x: umFromMm(fromMm), y: um(0), width: umFromMm(toMm - fromMm), height: longBoard.width },
    kerfs: { along: kerf, across: kerf },
    label: "1",
    faceId: "0190a0a0-0000-7000-8000-0000000000fa",
    faceTitle: "Left cabinet",
    jobTitle: "Pair of bedside cabinets",
    issued,
  };
}

const takenBoard = (...spokenFor: SpokenForPiece[]): BoardFace => ({ ...longBoard, keepClear: [], spokenFor });

describe("a first place", () => {
  test("is the first stretch between the wood of other faces that is long enough", () => {
    // The row is 4 × 240 mm and 3 gaps of 3 mm, and 0.2 mm of clean-up at either end: 969.4 mm, and a kerf on both sides.
    const board = takenBoard(wood(0, 100), wood(1000, 1100));
    const laid = laidAtFirstPlace(unplacedDocument().layout, SET_ID, board, 0);
    expect(laid.sound).toBe(true);
    expect(Math.min(...lyingPieces(laid.layout).map(({ blank }) => blank.along.from))).toBe(umFromMm(1102.4));
    expect(problemsOf(laid.layout, [board])).toEqual([]);
  });

  test("there is none where they leave no such stretch, and the table says over whose wood the fronts lie", () => {
    const board = takenBoard(wood(700, 800), wood(1700, 1800));
    const laid = laidAtFirstPlace(unplacedDocument().layout, SET_ID, board, 0);
    expect(laid.sound).toBe(false);
    expect(problemsOf(laid.layout, [board]).some(({ kind }) => kind === "spoken-for")).toBe(true);
  });
});

test("a drag comes to lie the kerf from wood of another face", () => {
  // The row lies from 100 to 1069 mm; its blank may reach to 1497.6 mm.
  const table = { boards: [takenBoard(wood(1500, 1700))], places: [{ stockId: longBoard.id, top: um(0) }] };
  const drag = { groupIds: [SET_ID], start: { x: 200_000, y: 60_000 } };
  const preview = previewAt(
    rowDocument().layout,
    table,
    drag,
    { x: 627_000, y: 60_000 },
    { snapWithin: umFromMm(3), straight: true },
  );
  expect(preview?.along).toEqual({ target: { kind: "spoken-for", spokenForId: "face p1500" }, edge: umFromMm(1497.4) });
  expect(problemsOf(preview?.layout ?? rowDocument().layout, table.boards)).toEqual([]);
});

test("wood of other faces is told of and stands in nobody's way by itself, issued or not", () => {
  const board = takenBoard(wood(1000, 1050), wood(1060, 1070, true));
  const found = problemsOf(rowDocument().layout, [board]);
  expect(found.map((problem) => problem.kind === "spoken-for" && problem.spokenForId)).toEqual(["face p1000", "face p1060"]);
  const woodOf = woodOfBoards([{ ...tableBoardOf(board), spokenFor: [wood(1000, 1050), wood(1060, 1070, true)] }]);
  expect(found.map((problem) => "spokenForId" in problem && woodOf(problem.spokenForId)?.issued)).toEqual([false, true]);
  expect(found.map(standsInTheWay)).toEqual([false, false]);
  expect(standsInTheWay({ kind: "grain", pieces: ["p1"] })).toBe(true);
});
