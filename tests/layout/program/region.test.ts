import { describe, expect, test } from "vitest";
import { boardEdges, type CutRequest } from "@/lib/layout/program/cut-request";
import { part } from "@/lib/layout/program/part";
import { isFinished, shapeKey, wholeBoard } from "@/lib/layout/program/region";
import { umFromMm } from "@/lib/layout/units/um";
import { front, request, row } from "./row-of-fronts";

const board = (asked: CutRequest) => wholeBoard(asked);
const rough = { boardEdges: boardEdges(false, false) };

describe("shapes remembered by the search", () => {
  const pair = board(request(402.4, 100, row(2, 0, 0, 200, 100, 2.4)));
  const { low, high } = part(pair, "x", { from: umFromMm(200), to: umFromMm(202.4) });

  test("the same piece in the same room is one shape wherever it lies", () => {
    expect(low && high && shapeKey(low) === shapeKey(high)).toBe(true);
  });

  test("a rough edge makes it another, and so does the leave to keep that edge rough", () => {
    const straight = board(request(210, 110, [front(1, 5, 5, 200, 100)]));
    const unsound = board(request(210, 110, [front(1, 5, 5, 200, 100)], rough));
    const cleaned = board(request(210, 110, [front(1, 6, 6, 198, 98, 1)], rough));
    expect(new Set([straight, unsound, cleaned].map(shapeKey)).size).toBe(3);
  });
});

describe("what needs no more sawing", () => {
  test("wood without a piece, and a piece that fills it from straight edge to straight edge", () => {
    expect(isFinished(board(request(300, 100, [])))).toBe(true);
    expect(isFinished(board(request(300, 100, [front(1, 0, 0, 300, 100)])))).toBe(true);
    expect(isFinished(board(request(300.1, 100, [front(1, 0, 0, 300, 100)])))).toBe(false);
  });

  test("a rough edge may stay only where clean-up will take it", () => {
    expect(isFinished(board(request(300, 100, [front(1, 0, 0, 300, 100)], rough)))).toBe(false);
    expect(isFinished(board(request(300, 100, [front(1, 1, 1, 298, 98, 1)], rough)))).toBe(true);
  });
});

test("a blade that runs over the edge turns only wood to dust and leaves nothing on that side", () => {
  const { kerf, low, high } = part(board(request(300, 100, [front(1, 1, 0, 299, 100)])), "x", { from: -1_400, to: 1_000 });
  expect(kerf).toEqual({ from: 0, to: 1_000 });
  expect(low).toBeNull();
  expect(high?.blanks).toHaveLength(1);
});
