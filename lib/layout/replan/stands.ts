/** Whether pieces can be cut from a part in hand as they lie in it. */
import { reachInto } from "../fit/keep-clear";
import { wholeDepth } from "../fit/noise";
import { outsideBy } from "../fit/outline";
import { spansOf } from "../fit/span";
import type { CutRequest, PlacedPiece } from "../program/cut-request";
import { cutRefusal } from "../program/plan-cuts";
import type { EdgeState } from "../program/program";
import type { BoardFace } from "../stock/board";
import { um } from "../units/um";
import type { PartInHand, RestLimits, RestRequest } from "./part-in-hand";
import { blankRect, movedBy, overlap } from "./rect-edge";
import type { KerfsAsCut } from "./true-kerf";

/** What cutting on takes and where it may take it from. */
export interface Sawing extends Pick<KerfsAsCut, "kerf" | "machines"> {
  readonly board: BoardFace;
  readonly asked: RestRequest["asked"];
}

/** The part as a board of its own, its nearest corner at the origin. An edge that was sawn is as straight as a trued one. */
export function requestForPart(
  { part: { rect }, edges, flat }: PartInHand,
  pieces: readonly PlacedPiece[],
  { kerf, machines, asked }: Sawing,
  { limits, budget }: RestLimits = unlimited,
): CutRequest {
  const state = (edge: EdgeState) => (edge === "sawn" ? "trued" : edge);
  const { truingTakes, flatten, thinnestSawn } = asked;
  return {
    board: { length: rect.width, width: rect.height },
    pieces: pieces.map((piece) => ({ ...piece, rect: movedBy(piece.rect, { x: -rect.x, y: -rect.y }) })),
    kerf,
    boardEdges: { left: state(edges.left), right: state(edges.right), top: state(edges.top), bottom: state(edges.bottom) },
    truingTakes,
    ...(machines && { machines }),
    ...(thinnestSawn !== undefined && { thinnestSawn }),
    flatten: flat ? null : (flatten ?? null),
    limits,
    budget,
  };
}

/** For the question whether it can be cut at all, which no limit of the shop decides. */
const unlimited: RestLimits = {
  limits: { shortestCrosscut: um(0), narrowestRip: um(0), shortestMachined: um(0), offcutLength: um(0), offcutWidth: um(0) },
  budget: 0,
};

export function stands(held: PartInHand, pieces: readonly PlacedPiece[], sawing: Sawing): boolean {
  const refusal = cutRefusal(requestForPart(held, pieces, sawing));
  if (refusal && refusal.reason !== "nothing-to-cut") return false;
  return pieces.every((piece) => isOnSoundWood(piece, held, sawing.board));
}

/** Off every keep-clear area, inside the outline, and with nothing of what is sawn for it in spoiled wood. */
export function isOnSoundWood(piece: PlacedPiece, { spoiled }: Pick<PartInHand, "spoiled">, board: BoardFace): boolean {
  const spans = spansOf(piece.rect);
  if (board.keepClear.some(({ area }) => wholeDepth(reachInto(spans, area)) > 0)) return false;
  if (board.outline !== null && wholeDepth(outsideBy(spans, board.outline)) > 0) return false;
  const blank = blankRect(piece);
  return !spoiled.some((bad) => overlap(blank, bad));
}
