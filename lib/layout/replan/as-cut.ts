/** What the bench found when it cut: the difference between a program as issued and the wood as it lies there now. */
import type { PieceId } from "../piece";
import type { Edge } from "../program/program";
import type { Um } from "../units/um";

export type AsCutEntry =
  /** The true width of the blade at a cut, and of how many other cuts of the same saw it holds. */
  | { readonly kind: "kerf"; readonly step: number; readonly kerf: Um; readonly reach: KerfReach }
  /** A part that came off is longer (positive) or shorter (negative) than planned, at this edge of it. */
  | { readonly kind: "size"; readonly partId: string; readonly edge: Edge; readonly by: Um }
  /** A piece cannot be used. Of its wood nothing is left, or so much from one of its edges. */
  | {
      readonly kind: "spoiled";
      readonly pieceId: PieceId;
      readonly usable: { readonly from: Edge; readonly length: Um } | null;
    };

/** All: of every cut of that saw in this revision. On: from this cut on. Only: of this cut alone. */
export type KerfReach = "all" | "on" | "only";

/** Why an entry cannot be true of the program it was made for. */
export type EntryFault =
  /** There is no such cut, or nothing is sawn at it. */
  | "unknown-step"
  | "unknown-part"
  | "unknown-piece"
  /** The parts and the blade would take more wood than the part in hand has. */
  | "more-than-there-is"
  /** Longer at an edge that an earlier cut made: what lies beyond it is not known. It belongs to that cut. */
  | "longer-at-earlier-cut";
