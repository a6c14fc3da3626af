/**
 * The last gate before the rest is issued: what is cut stays where it is, the rest carried out from the parts in hand leaves exactly
 * the pieces asked for, and of the whole board no wood is lost.
 */
import type { StockRect } from "../frame/point";
import type { PieceId } from "../piece";
import type { CutProgram, Part } from "../program/program";
import { type Verdict, verifyConservation } from "../program/verify-program";
import type { RestPlan } from "./plan-rest";
import { type OnBench, type RestReplay, replayRest } from "./replay-rest";

export type RestVerdict =
  | Verdict
  /** Two parts in hand hold the same wood, or one reaches over the board. */
  | { readonly ok: false; readonly reason: "wood-twice"; readonly part: string }
  | { readonly ok: false; readonly reason: "rest-cannot-be-carried-out"; readonly replay: Extract<RestReplay, { ok: false }> };

export function verifyRest(board: { readonly length: number; readonly width: number }, plan: RestPlan): RestVerdict {
  const { program, inHand, done } = plan;
  const twice = woodTwice(
    board,
    inHand.map(({ part }) => part),
  );
  if (twice !== null) return { ok: false, reason: "wood-twice", part: twice };
  const replay = replayRest(
    inHand,
    program.steps.filter(({ number }) => !done.includes(number)),
    program,
  );
  if (!replay.ok) return { ok: false, reason: "rest-cannot-be-carried-out", replay };
  const different = differentPiece(plan, replay.parts);
  if (different !== null) return { ok: false, reason: "piece-differs", piece: different };
  return verifyConservation(program.conservation, foundIn(board, plan, replay));
}

function woodTwice(board: { readonly length: number; readonly width: number }, parts: readonly Part[]): string | null {
  for (const [i, { id, rect }] of parts.entries()) {
    if (rect.x < 0 || rect.y < 0 || rect.x + rect.width > board.length || rect.y + rect.height > board.width) return id;
    const other = parts.slice(i + 1).find((one) => share(one.rect, rect));
    if (other) return other.id;
  }
  return null;
}

function share(a: StockRect, b: StockRect): boolean {
  const width = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const height = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return width > 0 && height > 0;
}

/** A piece of the plan that the bench does not hold once, where it should be and at its size. */
function differentPiece({ pieces, program }: RestPlan, bench: ReadonlyMap<string, OnBench>): PieceId | null {
  for (const { pieceId, rect, cleanUp } of pieces) {
    const [made, second] = program.pieces.filter((part) => part.pieceId === pieceId);
    const sawn = made && bench.get(made.id)?.rect;
    if (!made || second || !sawn) return pieceId;
    const cleaned = {
      x: sawn.x + cleanUp.left,
      y: sawn.y + cleanUp.top,
      width: sawn.width - cleanUp.left - cleanUp.right,
      height: sawn.height - cleanUp.top - cleanUp.bottom,
    };
    const same = (a: typeof cleaned) => a.x === rect.x && a.y === rect.y && a.width === rect.width && a.height === rect.height;
    if (!same(cleaned) || !same(made.rect)) return pieceId;
  }
  return program.pieces.find((part) => !pieces.some(({ pieceId }) => pieceId === part.pieceId))?.pieceId ?? null;
}

/** Every share from the bench alone; the dust of the steps done is what the parts in hand lack of the board. */
function foundIn(
  board: { readonly length: number; readonly width: number },
  { program, inHand, done }: RestPlan,
  { parts, kerf, shavings }: Extract<RestReplay, { ok: true }>,
): CutProgram["conservation"] {
  const size = (rect: StockRect) => rect.width * rect.height;
  const total = (of: readonly Part[]) => of.reduce((sum, { id }) => sum + size(parts.get(id)?.rect ?? none), 0);
  const finished = program.pieces.reduce((sum, { rect }) => sum + size(rect), 0);
  const planed = program.steps
    .filter(({ number, kind }) => done.includes(number) && (kind === "true" || kind === "plane"))
    .reduce((sum, step) => sum + size(step.kerf), 0);
  const stock = board.length * board.width;
  const gone = stock - inHand.reduce((sum, { part }) => sum + size(part.rect), 0);
  return {
    stock,
    pieces: finished,
    kerf: gone - planed + kerf,
    cleanUp: planed + shavings + total(program.pieces) - finished,
    offcuts: total(program.offcuts),
    waste: total(program.waste),
  };
}

const none = { x: 0, y: 0, width: 0, height: 0 } as StockRect;
