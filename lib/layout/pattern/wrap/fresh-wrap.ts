/** A run round corners of one kind, from the lengths that are seen of its sides. */
import type { WrapCorner, WrapFace } from "../face";

export function freshWrap(
  wish: Pick<WrapFace, "sides" | "height" | "thickness" | "grain" | "closed"> & { readonly corner: WrapCorner },
): WrapFace {
  const { corner, ...face } = wish;
  const count = Math.max(0, face.closed ? face.sides.length : face.sides.length - 1);
  return { pattern: "wrap", ...face, corners: Array.from({ length: count }, () => corner) };
}
