/** Where two pieces meet on the show side, and how far the figure jumps there. */
import type { SeamPlace } from "../pattern/pattern-rules";
import type { Um } from "../units/um";

/** Least and greatest value over the seam; equal where the jump does not vary. */
export interface UmRange {
  readonly min: Um;
  readonly max: Um;
}

export interface Seam extends SeamPlace {
  /** Jump in the wood; null where the two pieces come from unrelated stock, and between leaves whose figure leans no one knows how. */
  readonly jump: { readonly along: UmRange; readonly across: UmRange } | null;
}
