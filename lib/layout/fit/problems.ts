/**
 * Everything that is wrong with a layout on its boards, except whether straight cuts can part it (the cut program says that).
 * Runs while a group is dragged, so it stays in closed forms and touches every piece and area once.
 */
import type { FaceLayout } from "../pattern/face-layout";
import { layOut, unplacedPieces } from "../pattern/lay-out";
import { readingIndexOf } from "../pattern/piece-ids";
import { turnsAlongGrain } from "../pattern/place-group";
import { rulesOf } from "../pattern/rules-of";
import type { PieceId, StockId } from "../piece";
import type { BoardFace } from "../stock/board";
import { type Um, um } from "../units/um";
import { kerfsOf, missingBetween } from "./apart";
import { LEAST_GLUE_LINE, nearGlueLines } from "./glue-line";
import { middleAlong, reachInto } from "./keep-clear";
import { type LyingPiece, lyingPieces } from "./lying-piece";
import { wholeDepth } from "./noise";
import { overBoardBy } from "./on-board";
import type { Problem } from "./problem";
import { leastSlide } from "./slide";
import { missingToSpokenFor, overSpokenFor } from "./spoken-for";

/** What the shop asks for beyond what can be cut at all. */
export interface ShopAsks {
  /** Nearest that a glue line may come to the long edge of a piece that it runs through. */
  readonly glueLineFromEdge: Um;
}

const usualAsks: ShopAsks = { glueLineFromEdge: LEAST_GLUE_LINE };

/**
 * Problems by kind, then by piece in reading order, then by area, wood spoken for or glue line in the order of the board, or by the
 * second piece.
 */
export function problems(layout: FaceLayout, boards: readonly BoardFace[], asks: ShopAsks = usualAsks): Problem[] {
  const boardById = new Map(boards.map((board) => [board.id, board]));
  const lying = lyingPieces(layout, layOut(layout));
  // What is wrong with the wood of one blank is said once, of the first piece that comes from it.
  const blanks = lying.filter(({ id, blankId }) => id === blankId);
  const known = blanks.filter(({ stockId }) => boardById.has(stockId));
  const slideOf = slidesByGroup(layout, lying);
  return [
    ...notPlaced(layout),
    ...unknownStock(lying, boardById),
    ...againstGrain(layout),
    ...tooThin(layout, lying, boardById),
    ...known.flatMap((piece) => outside(piece, boardById)),
    ...inKeepClear(known, boardById, slideOf),
    ...tooClose(layout, blanks),
    ...onSpokenFor(layout, known, boardById, slideOf),
    ...nearGlueLine(known, boardById, asks),
  ];
}

type BoardsById = ReadonlyMap<StockId, BoardFace>;

function notPlaced(layout: FaceLayout): Problem[] {
  if (layout.groups.every(({ placement }) => placement !== null)) return [];
  const pieces = unplacedPieces(layout).map(({ id }) => id);
  return pieces.length === 0 ? [] : [{ kind: "not-placed", pieces }];
}

function unknownStock(lying: readonly LyingPiece[], boards: BoardsById): Problem[] {
  const piecesByStock = new Map<StockId, PieceId[]>();
  for (const { id, stockId } of lying) {
    if (boards.has(stockId)) continue;
    piecesByStock.set(stockId, [...(piecesByStock.get(stockId) ?? []), id]);
  }
  // A map keeps its entries in the order they came, which is that of the first piece on each.
  return [...piecesByStock].map(([stockId, pieces]) => ({ kind: "unknown-stock", pieces, stockId }));
}

function againstGrain(layout: FaceLayout): Problem[] {
  const right = turnsAlongGrain(layout.face.grain);
  const pieces = layout.groups
    .filter(({ placement }) => placement !== null && !right.includes(placement.turns))
    .flatMap((group) => group.pieceIds)
    .sort((p, q) => (readingIndexOf(layout.face, p) ?? 0) - (readingIndexOf(layout.face, q) ?? 0));
  return pieces.length === 0 ? [] : [{ kind: "grain", pieces }];
}

function tooThin({ face }: FaceLayout, lying: readonly LyingPiece[], boards: BoardsById): Problem[] {
  const needed = rulesOf(face).stockThickness?.(face);
  if (needed === undefined) return [];
  const stocks = [...new Set(lying.map(({ stockId }) => stockId))];
  return stocks.flatMap((stockId): Problem[] => {
    const missing = needed - (boards.get(stockId)?.thickness ?? needed);
    const pieces = lying.filter((piece) => piece.stockId === stockId).map(({ id }) => id);
    return missing > 0 ? [{ kind: "too-thin", stockId, pieces, missing: um(missing) }] : [];
  });
}

function nearGlueLine(lying: readonly LyingPiece[], boards: BoardsById, asks: ShopAsks): Problem[] {
  return lying.flatMap((piece) => {
    const board = boards.get(piece.stockId);
    if (board === undefined) return [];
    return nearGlueLines(piece, board, asks.glueLineFromEdge).map(({ at, fromEdge }): Problem => {
      return { kind: "glue-line", piece: piece.id, at, fromEdge };
    });
  });
}

function outside(piece: LyingPiece, boards: BoardsById): Problem[] {
  const board = boards.get(piece.stockId);
  if (board === undefined) return [];
  const by = wholeDepth(overBoardBy(piece, board));
  return by === 0 ? [] : [{ kind: "outside", piece: piece.id, by: um(by) }];
}

type SlideOf = (groupId: string, board: BoardFace) => Um | null;

function inKeepClear(lying: readonly LyingPiece[], boards: BoardsById, slideOf: SlideOf): Problem[] {
  return lying.flatMap((piece) => {
    const board = boards.get(piece.stockId);
    if (board === undefined) return [];
    return board.keepClear.flatMap(({ id, kind, area }): Problem[] => {
      const by = wholeDepth(reachInto(piece.spans, area));
      if (by === 0) return [];
      const atX = um(Math.round(middleAlong(area)));
      return [
        { kind: "keep-clear", piece: piece.id, areaId: id, area: kind, by: um(by), atX, slide: slideOf(piece.groupId, board) },
      ];
    });
  });
}

/** The least slide of a group, found once and only when something asks for it. */
function slidesByGroup(layout: FaceLayout, lying: readonly LyingPiece[]): SlideOf {
  const kerfs = kerfsOf(layout);
  const found = new Map<string, Um | null>();
  return (groupId, board) => {
    const before = found.get(groupId);
    if (before !== undefined) return before;
    const here = lying.filter(({ stockId }) => stockId === board.id);
    const group = here.filter((piece) => piece.groupId === groupId);
    const slide = leastSlide(group, { board, others: here.filter((piece) => piece.groupId !== groupId), kerfs });
    found.set(groupId, slide);
    return slide;
  };
}

function tooClose(layout: FaceLayout, lying: readonly LyingPiece[]): Problem[] {
  const kerfs = kerfsOf(layout);
  return lying.flatMap((a, index) =>
    lying.slice(index + 1).flatMap((b): Problem[] => {
      if (a.stockId !== b.stockId) return [];
      const missing = wholeDepth(missingBetween(a, b, kerfs));
      return missing === 0 ? [] : [{ kind: "too-close", pieces: [a.id, b.id], missing: um(missing) }];
    }),
  );
}

function onSpokenFor(layout: FaceLayout, lying: readonly LyingPiece[], boards: BoardsById, slideOf: SlideOf): Problem[] {
  const kerfs = kerfsOf(layout);
  return lying.flatMap((piece) => {
    const board = boards.get(piece.stockId);
    if (board === undefined) return [];
    return board.spokenFor.flatMap((taken): Problem[] => {
      const missing = wholeDepth(missingToSpokenFor(piece, taken, kerfs));
      if (missing === 0) return [];
      const over = um(wholeDepth(overSpokenFor(piece, taken)));
      const slide = slideOf(piece.groupId, board);
      return [{ kind: "spoken-for", piece: piece.id, spokenForId: taken.id, over, missing: um(missing), slide }];
    });
  });
}
