/** Where two pieces meet on the show side, and how far the figure jumps there. */
import type { FacePoint } from "../frame/point";
import type { PieceId } from "../piece";
import type { Um } from "../units/um";

/** Least and greatest value over the seam; equal where the jump does not vary. */
export interface UmRange {
  readonly min: Um;
  readonly max: Um;
}

export interface Seam {
  readonly a: PieceId;
  readonly b: PieceId;
  /** The stretch of A's edge that faces B, in reading order. */
  readonly from: FacePoint;
  readonly to: FacePoint;
  readonly gap: Um;
  /** Direction from A to B on the face. */
  readonly normal: "right" | "down";
  /** Jump in the wood, or null where the two pieces come from unrelated stock. */
  readonly jump: { readonly along: UmRange; readonly across: UmRange } | null;
}
