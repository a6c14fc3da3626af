/**
 * All gaps of a grid along one axis made one width. The face keeps its size, and each front gives up the same, in whole micrometres, so
 * that fronts meant to be equal stay equal; what that leaves over widens the last gap.
 */
import { type Um, um } from "../../units/um";
import type { GridFace } from "../face";

/** Null when a front would come to nothing, or there is no gap along the axis. */
export function withEvenGaps(face: GridFace, axis: "columns" | "rows", gap: Um): GridFace | null {
  const [sizes, gaps] = axis === "columns" ? [face.columns, face.columnGaps] : [face.rows, face.rowGaps];
  if (gaps.length === 0) return null;
  const more = gap * gaps.length - gaps.reduce((sum, one) => sum + one, 0);
  const each = Math.ceil(more / sizes.length);
  const smaller = sizes.map((size) => um(size - each));
  if (smaller.some((size) => size <= 0)) return null;
  const left = each * sizes.length - more;
  const wider = gaps.map((_, index) => um(index === gaps.length - 1 ? gap + left : gap));
  return axis === "columns" ? { ...face, columns: smaller, columnGaps: wider } : { ...face, rows: smaller, rowGaps: wider };
}
