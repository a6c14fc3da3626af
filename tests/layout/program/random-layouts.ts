/** Layouts that can be sawn for certain: a board cut up at random by straight cuts, with a piece set into some of the rectangles. */
import fc from "fast-check";
import type { BoardEdges, CutRequest, PlacedPiece } from "@/lib/layout/program/cut-request";
import { um } from "@/lib/layout/units/um";
import { limits } from "./row-of-fronts";

interface Rect {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Smallest side of a rectangle that is cut again, µm. */
const smallest = 60_000;
const longEdge = fc.constantFrom("rough" as const, "trued" as const);
const end = fc.constantFrom("rough" as const, "marked" as const, "trued" as const);

export const anyBoardEdges: fc.Arbitrary<BoardEdges> = fc.record({ left: end, right: end, top: longEdge, bottom: longEdge });

/** Every choice is drawn from one list of numbers, so that a failing layout shrinks to one with few cuts. */
export const sawableRequest: fc.Arbitrary<CutRequest> = fc
  .record({
    choices: fc.array(fc.nat(9_999), { maxLength: 160, size: "max" }),
    length: fc.integer({ min: 300_000, max: 2_500_000 }),
    width: fc.integer({ min: 100_000, max: 600_000 }),
    rip: fc.constantFrom(0, 2_381, 3_200),
    crosscut: fc.constantFrom(0, 1_800, 3_200),
    boardEdges: anyBoardEdges,
    takes: fc.constantFrom(0, 1_500, 5_000),
  })
  .map(({ choices, length, width, rip, crosscut, boardEdges, takes }) => {
    const pieces = pieceUp(
      choices,
      { x: takes, y: takes, width: length - 2 * takes, height: width - 2 * takes },
      { rip, crosscut },
      takes,
    );
    return {
      board: { length: um(length), width: um(width) },
      pieces,
      kerf: { rip: um(rip), crosscut: um(crosscut) },
      boardEdges,
      truingTakes: { longEdge: um(takes), end: um(takes) },
      limits,
      budget: 4_000,
    };
  })
  .filter((request) => request.pieces.length > 0);

function pieceUp(choices: readonly number[], board: Rect, kerf: { rip: number; crosscut: number }, takes: number): PlacedPiece[] {
  const pieces: PlacedPiece[] = [];
  let next = 0;
  const choose = (count: number) => (choices[next++] ?? 0) % count;
  const fill = (rect: Rect, depth: number): void => {
    const crosscut = choose(2) === 1;
    const size = crosscut ? rect.width : rect.height;
    if (depth < 7 && size > 2 * smallest && choose(7) > 0) {
      const blade = crosscut ? kerf.crosscut : kerf.rip;
      const at = smallest + Math.floor(((size - 2 * smallest - blade) * choose(8)) / 8);
      if (at < smallest) return;
      const rest = size - at - blade;
      fill(crosscut ? { ...rect, width: at } : { ...rect, height: at }, depth + 1);
      const second = crosscut
        ? { ...rect, x: rect.x + at + blade, width: rest }
        : { ...rect, y: rect.y + at + blade, height: rest };
      fill(second, depth + 1);
      return;
    }
    if (choose(6) < 5) pieces.push(setInto(rect, pieces.length + 1, choose));
  };
  if (board.width > 4 * takes && board.height > 4 * takes) fill(board, 0);
  return pieces;
}

/** A piece with some room round it on each side (none, less than a blade, more) and some clean-up. */
function setInto(rect: Rect, number: number, choose: (count: number) => number): PlacedPiece {
  const room = () => [0, 0, 400, 2_381, 9_100, 20_000][choose(6)] ?? 0;
  const clean = () => um([0, 0, 0, 500][choose(4)] ?? 0);
  const inset = { left: room(), right: room(), top: room(), bottom: room() };
  const cleanUp = { left: clean(), right: clean(), top: clean(), bottom: clean() };
  return {
    pieceId: `p${number}`,
    label: String(number),
    cleanUp,
    rect: {
      x: um(rect.x + inset.left + cleanUp.left),
      y: um(rect.y + inset.top + cleanUp.top),
      width: um(rect.width - inset.left - inset.right - cleanUp.left - cleanUp.right),
      height: um(rect.height - inset.top - inset.bottom - cleanUp.top - cleanUp.bottom),
    },
  };
}

/** The same piece in the same room again and again, filling the board, whose edges are trued by nothing: equal shapes that differ only in their edges. */
export const tiledRequest: fc.Arbitrary<CutRequest> = fc
  .record({
    columns: fc.integer({ min: 1, max: 4 }),
    rows: fc.integer({ min: 1, max: 3 }),
    inset: fc.record({ left: fc.nat(3), right: fc.nat(3), top: fc.nat(3), bottom: fc.nat(3) }),
    kerf: fc.constantFrom(0, 2_400),
    boardEdges: anyBoardEdges,
  })
  .map(({ columns, rows, inset, kerf, boardEdges }) => {
    const cell = { width: 320_000, height: 140_000 };
    const none = { left: um(0), right: um(0), top: um(0), bottom: um(0) };
    const pieces = Array.from({ length: columns * rows }, (_, i): PlacedPiece => {
      const x = (i % columns) * (cell.width + kerf) + inset.left * 1_300;
      const y = Math.floor(i / columns) * (cell.height + kerf) + inset.top * 1_300;
      const width = cell.width - (inset.left + inset.right) * 1_300;
      const height = cell.height - (inset.top + inset.bottom) * 1_300;
      return {
        pieceId: `p${i + 1}`,
        label: String(i + 1),
        cleanUp: none,
        rect: { x: um(x), y: um(y), width: um(width), height: um(height) },
      };
    });
    return {
      board: { length: um(columns * (cell.width + kerf) - kerf), width: um(rows * (cell.height + kerf) - kerf) },
      pieces,
      kerf: { rip: um(kerf), crosscut: um(kerf) },
      boardEdges,
      truingTakes: { longEdge: um(0), end: um(0) },
      limits,
      budget: 20_000,
    };
  });
