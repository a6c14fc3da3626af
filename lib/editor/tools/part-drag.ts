/**
 * Moves a divider or a strip of a cut-out on the show side: a pure function of how far the pointer has come since it was pressed. Where there is no
 * more room the part stops, so that a drag can never be refused.
 */
import {
  type CutOutChange,
  type FaceLayout,
  moveDivider,
  moveStrip,
  type PartPlace,
  type PieceId,
  pieceIdAt,
  piecesOfCutOut,
  type Um,
  um,
} from "@/lib/layout";
import type { TablePoint } from "../view/geometry";

/** The layout as it would be if the pointer were let go now. */
export interface PartPreview {
  readonly kind: "part";
  readonly layout: FaceLayout;
  readonly piece: PieceId;
  readonly axis: "x" | "y";
  readonly by: Um;
}

export type MovablePart = { readonly axis: "x" | "y" } & (
  | { readonly kind: "divider"; readonly place: PartPlace }
  | { readonly kind: "strip"; readonly strip: number }
);

/** A half millimetre, the smallest step of the arrow keys: a hand does not place a divider finer than that on a screen. */
const STEP = 500;

/** What of a face can be moved by itself; null for fronts, ends, outer strips and other patterns. */
export function movablePart({ face }: Pick<FaceLayout, "face">, piece: PieceId): MovablePart | null {
  if (face.pattern !== "cutOut") return null;
  const [along, across] = face.grain === "horizontal" ? (["x", "y"] as const) : (["y", "x"] as const);
  const found = piecesOfCutOut(face).find((_, index) => pieceIdAt(index) === piece);
  if (found?.role === "strip") {
    const inner = found.strip > 0 && found.strip < face.strips.length - 1;
    return inner ? { kind: "strip", strip: found.strip, axis: across } : null;
  }
  if (found?.role !== "fixed") return null;
  const last = (face.rows[found.row]?.parts.length ?? 0) - 1;
  const place = { row: found.row, part: found.part };
  return found.part > 0 && found.part < last ? { kind: "divider", place, axis: along } : null;
}

/** The part moved by its share of the pointer's way, as far as there is room. Null for what cannot be moved. */
export function partPreviewAt(layout: FaceLayout, piece: PieceId, way: TablePoint): PartPreview | null {
  const part = movablePart(layout, piece);
  if (part === null) return null;
  const wanted = um(Math.round((part.axis === "x" ? way.x : way.y) / STEP) * STEP);
  const done = moved(layout, part, wanted);
  if (done.ok) return { kind: "part", layout: done.layout, piece, axis: part.axis, by: wanted };
  if (done.refusal.reason !== "no-room") return null;
  const { least, most } = done.refusal;
  const by = um(Math.min(most, Math.max(least, wanted)));
  const stopped = moved(layout, part, by);
  return stopped.ok ? { kind: "part", layout: stopped.layout, piece, axis: part.axis, by } : null;
}

/** The part moved by this much, or why it cannot be. */
export function moved(layout: FaceLayout, part: MovablePart, by: Um): CutOutChange {
  return part.kind === "divider" ? moveDivider(layout, part.place, by) : moveStrip(layout, part.strip, by);
}
