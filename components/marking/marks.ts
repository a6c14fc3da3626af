/** The marks of a draft by name: where they are, moved, added, taken away. Pure. */
import type { BoardEdge, FourCorners, PhotoPoint, PhotoSize } from "@/lib/layout";
import type { Draft } from "./draft";

export interface MarkId {
  readonly of: "board" | "sheet" | "extra" | "edge" | "known";
  /** 0 to 3 for corners in the order of `FourCorners`; 0 and 1 for the ends of the known distance. */
  readonly index: number;
}

export const sameMark = (a: MarkId | null, b: MarkId | null): boolean => a?.of === b?.of && a?.index === b?.index;

/** Marks that can be seen and moved now, of one kind or all: a sheet's corners only while the sheet is what has a known size. */
export function marksOf(draft: Draft, only?: MarkId["of"]): readonly MarkId[] {
  const range = (of: MarkId["of"], count: number) => Array.from({ length: count }, (_, index): MarkId => ({ of, index }));
  const marks = [
    ...(draft.reference === "sheet" ? range("sheet", 4) : []),
    ...range("board", 4),
    ...range("extra", draft.extraPoints.length),
    ...range("edge", draft.edgePoints.length),
    ...range("known", draft.known ? 2 : 0),
  ];
  return only ? marks.filter(({ of }) => of === only) : marks;
}

export function markAt(draft: Draft, { of, index }: MarkId): PhotoPoint | null {
  if (of === "board") return draft.corners[index] ?? null;
  if (of === "sheet") return draft.sheetCorners[index] ?? null;
  if (of === "extra") return draft.extraPoints[index]?.photo ?? null;
  if (of === "edge") return draft.edgePoints[index]?.photo ?? null;
  return (index === 0 ? draft.known?.from : draft.known?.to) ?? null;
}

/** The draft with one mark moved; a corner counts as placed from then on. */
export function moveMark(draft: Draft, { of, index }: MarkId, to: PhotoPoint): Draft {
  if (of === "board") {
    const board = draft.unplaced.board.map((unplaced, i) => unplaced && i !== index);
    return { ...draft, corners: withCorner(draft.corners, index, to), unplaced: { ...draft.unplaced, board } };
  }
  if (of === "sheet") {
    const sheet = draft.unplaced.sheet.map((unplaced, i) => unplaced && i !== index);
    return { ...draft, sheetCorners: withCorner(draft.sheetCorners, index, to), unplaced: { ...draft.unplaced, sheet } };
  }
  if (of === "extra")
    return { ...draft, extraPoints: draft.extraPoints.with(index, { ...pointAt(draft.extraPoints, index), photo: to }) };
  if (of === "edge")
    return { ...draft, edgePoints: draft.edgePoints.with(index, { ...pointAt(draft.edgePoints, index), photo: to }) };
  if (!draft.known) return draft;
  return { ...draft, known: { ...draft.known, [index === 0 ? "from" : "to"]: to } };
}

export function removeMark(draft: Draft, { of, index }: MarkId): Draft {
  if (of === "extra") return { ...draft, extraPoints: draft.extraPoints.toSpliced(index, 1) };
  if (of === "edge") return { ...draft, edgePoints: draft.edgePoints.toSpliced(index, 1) };
  if (of === "known") return { ...draft, known: null };
  return draft;
}

/** Which corner comes first moves on by one, so that the grain runs the other way. The marks stay where they are. */
export function turnCorners(draft: Draft): Draft {
  const [a, b, c, d] = draft.corners;
  const [p, q, r, s] = draft.unplaced.board;
  return {
    ...draft,
    corners: [b, c, d, a],
    unplaced: { ...draft.unplaced, board: [q ?? true, r ?? true, s ?? true, p ?? true] },
    // They were said to lie on edges that have other names now.
    edgePoints: draft.edgePoints.map((point) => ({ ...point, edge: turnedEdges[point.edge] })),
    // Their places were told from a corner that is another one now; a sheet keeps its own.
    extraPoints:
      draft.reference === "board" ? draft.extraPoints.map((point) => ({ ...point, x: null, y: null })) : draft.extraPoints,
  };
}

const turnedEdges: Readonly<Record<BoardEdge, BoardEdge>> = { top: "left", right: "top", bottom: "right", left: "bottom" };
const edges: readonly BoardEdge[] = ["top", "right", "bottom", "left"];

/** The marked side of the board that a point lies nearest to; ties go to the first in the order top, right, bottom, left. */
export function nearestEdge(corners: FourCorners, p: PhotoPoint): BoardEdge {
  const distances = corners.map((from, i) => distanceToSide(p, from, corners[(i + 1) % 4] ?? from));
  return edges[distances.indexOf(Math.min(...distances))] ?? "top";
}

/** Held a little inside what the core takes: a board may run into the rim of the photograph, not out of it. */
export function withinPhoto(p: PhotoPoint, photo: PhotoSize): PhotoPoint {
  return { x: Math.min(Math.max(p.x, 0), photo.width), y: Math.min(Math.max(p.y, 0), photo.height) };
}

/** Tenths of a pixel: finer than a hand can mark, and short on the wire. */
export const rounded = (p: PhotoPoint): PhotoPoint => ({ x: Math.round(p.x * 10) / 10, y: Math.round(p.y * 10) / 10 });

function distanceToSide(p: PhotoPoint, from: PhotoPoint, to: PhotoPoint): number {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  const squared = dx * dx + dy * dy;
  const t = squared > 0 ? Math.min(1, Math.max(0, ((p.x - from.x) * dx + (p.y - from.y) * dy) / squared)) : 0;
  return Math.hypot(p.x - from.x - t * dx, p.y - from.y - t * dy);
}

function withCorner([a, b, c, d]: FourCorners, index: number, to: PhotoPoint): FourCorners {
  return [index === 0 ? to : a, index === 1 ? to : b, index === 2 ? to : c, index === 3 ? to : d];
}

function pointAt<T>(points: readonly T[], index: number): T {
  const point = points[index];
  if (point === undefined) throw new RangeError(`no mark ${index}`);
  return point;
}
