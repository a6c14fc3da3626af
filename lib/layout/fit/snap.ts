/**
 * Snapping while groups are slid on a board: the raw slide of the pointer becomes the nearest slide, within a tolerance, at
 * which a piece comes to lie the saw's loss from another or from wood that is spoken for, along the outline, just clear of a keep-clear area, or flush with
 * another piece. Along the board first, then across it from there. Snapping helps the hand; whether the place is sound is for
 * `problems.ts` to say.
 */
import type { FaceLayout } from "../pattern/face-layout";
import type { PieceId } from "../piece";
import type { BoardFace } from "../stock/board";
import { type Um, um } from "../units/um";
import { kerfsOf, movesTooClose } from "./apart";
import { isForbidden, unionOf } from "./forbidden-moves";
import { movesIntoArea } from "./keep-clear";
import { type LyingPiece, lyingPieces } from "./lying-piece";
import { NOISE_UM } from "./noise";
import { movesOverBoard } from "./on-board";
import type { Surroundings } from "./slide";
import { movedSpans, type Span, type StockAxis } from "./span";
import { movesIntoSpokenFor } from "./spoken-for";

export type SnapTarget =
  /** The saw's loss away from that piece. */
  | { readonly kind: "loss"; readonly piece: PieceId }
  /** The cut's kerf away from that wood of something else. */
  | { readonly kind: "spoken-for"; readonly spokenForId: string }
  /** As far as the usable outline or the board goes; clean-up keeps a finished edge that much from the board's own. */
  | { readonly kind: "outline" }
  /** Just clear of that area. */
  | { readonly kind: "keep-clear"; readonly areaId: string }
  /** An edge in line with the same edge of that piece. */
  | { readonly kind: "flush"; readonly piece: PieceId };

export interface Snap {
  readonly target: SnapTarget;
  /** Where the edge that snapped lies now, as x (along) or y (across) of the stock frame: for a guide line. */
  readonly edge: Um;
}

export interface SnappedSlide {
  readonly delta: { readonly x: Um; readonly y: Um };
  readonly along: Snap | null;
  readonly across: Snap | null;
}

/** The slide of these groups by about `delta` from where the layout has them; unchanged where nothing is within `tolerance`. */
export function snapSlide(
  layout: FaceLayout,
  board: BoardFace,
  groupIds: readonly string[],
  delta: { readonly x: Um; readonly y: Um },
  tolerance: Um,
): SnappedSlide {
  const here = lyingPieces(layout).filter(({ stockId }) => stockId === board.id);
  const moving = here.filter(({ groupId }) => groupIds.includes(groupId));
  const others = here.filter(({ groupId }) => !groupIds.includes(groupId));
  const surroundings = { board, others, kerfs: kerfsOf(layout) };

  const along = nearest(candidates(moved(moving, "across", delta.y), surroundings, "along"), delta.x, tolerance);
  const x = along?.move ?? delta.x;
  const across = nearest(candidates(moved(moving, "along", x), surroundings, "across"), delta.y, tolerance);
  return { delta: { x: um(x), y: um(across?.move ?? delta.y) }, along: snapOf(along), across: snapOf(across) };
}

interface Candidate {
  readonly move: number;
  readonly edge: number;
  readonly target: SnapTarget;
}

const rank: Readonly<Record<SnapTarget["kind"], number>> = {
  loss: 0,
  "spoken-for": 1,
  outline: 2,
  "keep-clear": 3,
  flush: 4,
};

function nearest(found: readonly Candidate[], raw: number, tolerance: number): Candidate | null {
  const near = found.filter(({ move }) => Math.abs(move - raw) <= tolerance);
  near.sort(
    (p, q) =>
      Math.abs(p.move - raw) - Math.abs(q.move - raw) ||
      rank[p.target.kind] - rank[q.target.kind] ||
      p.move - q.move ||
      p.edge - q.edge ||
      compareNames(nameOf(p.target), nameOf(q.target)),
  );
  return near[0] ?? null;
}

function snapOf(candidate: Candidate | null): Snap | null {
  return candidate === null ? null : { target: candidate.target, edge: um(Math.round(candidate.edge)) };
}

function candidates(moving: readonly LyingPiece[], { board, others, kerfs }: Surroundings, axis: StockAxis): Candidate[] {
  const atLoss = moving.flatMap((piece) =>
    others.flatMap((other) => {
      const forbidden = movesTooClose(piece, other, axis, kerfs);
      return forbidden === null ? [] : [{ piece, forbidden, target: { kind: "loss", piece: other.id } as const }];
    }),
  );
  const atSpokenFor = moving.flatMap((piece) =>
    board.spokenFor.flatMap((taken) => {
      const forbidden = movesIntoSpokenFor(piece, taken, axis, kerfs);
      return forbidden === null ? [] : [{ piece, forbidden, target: { kind: "spoken-for", spokenForId: taken.id } as const }];
    }),
  );
  const atOutline = moving.flatMap((piece) =>
    movesOverBoard(piece, board, axis).map((forbidden) => ({ piece, forbidden, target: { kind: "outline" } as const })),
  );
  const atAreas = moving.flatMap((piece) =>
    board.keepClear.flatMap(({ id, area }) =>
      movesIntoArea(piece.spans, area, axis).map((forbidden) => ({
        piece,
        forbidden,
        target: { kind: "keep-clear", areaId: id } as const,
      })),
    ),
  );
  return [...[atLoss, atSpokenFor, atOutline, atAreas].flatMap((kind) => endsOf(kind, axis)), ...flush(moving, others, axis)];
}

interface Forbidding {
  readonly piece: LyingPiece;
  readonly forbidden: Span;
  readonly target: SnapTarget;
}

/** The ends of what is forbidden, on whole micrometres outwards, without those that another piece of the group forbids. */
function endsOf(forbiddings: readonly Forbidding[], axis: StockAxis): Candidate[] {
  const union = unionOf(forbiddings.map(({ forbidden }) => forbidden));
  const ends = forbiddings.flatMap(({ piece, forbidden, target }) => [
    candidate(Math.floor(forbidden.from + NOISE_UM), piece.spans[axis].to, target),
    candidate(Math.ceil(forbidden.to - NOISE_UM), piece.spans[axis].from, target),
  ]);
  return ends.filter(({ move }) => Number.isFinite(move) && !isForbidden(union, move));
}

function flush(moving: readonly LyingPiece[], others: readonly LyingPiece[], axis: StockAxis): Candidate[] {
  return moving.flatMap(({ spans }) =>
    others.flatMap((other) => {
      const target = { kind: "flush", piece: other.id } as const;
      return [
        candidate(other.spans[axis].from - spans[axis].from, spans[axis].from, target),
        candidate(other.spans[axis].to - spans[axis].to, spans[axis].to, target),
      ];
    }),
  );
}

function candidate(move: number, edgeBefore: number, target: SnapTarget): Candidate {
  return { move, edge: edgeBefore + move, target };
}

function moved(pieces: readonly LyingPiece[], axis: StockAxis, by: number): LyingPiece[] {
  return pieces.map((piece) => ({
    ...piece,
    spans: movedSpans(piece.spans, axis, by),
    blank: movedSpans(piece.blank, axis, by),
  }));
}

function nameOf(target: SnapTarget): string {
  switch (target.kind) {
    case "outline":
      return "";
    case "keep-clear":
      return target.areaId;
    case "spoken-for":
      return target.spokenForId;
    case "loss":
    case "flush":
      return target.piece;
  }
}

function compareNames(p: string, q: string): number {
  return p < q ? -1 : p > q ? 1 : 0;
}
