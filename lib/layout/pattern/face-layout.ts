/**
 * The document of a layout on solid stock: parameters from which `layOut` derives every piece. Plain immutable JSON; there is
 * no second representation of where a piece lies.
 *
 * The face follows a pattern (`face.ts`). As cut from stock its pieces do not lie at the gaps of the face but at the spacing that
 * the saw's loss asks for: the "spaced chart". A group is a set of pieces that keep their places in the spaced chart and lie on
 * one board together; a piece let loose is a group of one.
 */
import type { StockPoint } from "../frame/point";
import type { PieceId, StockId } from "../piece";
import type { Um } from "../units/um";
import type { Face } from "./face";

/** What one cut takes between two show edges: loss = kerf + clean-up on either side (engine: what a cut costs). */
export interface CutLoss {
  readonly kerf: Um;
  /** Taken by jointing, planing or shooting off the edge nearer the origin of the face; 0 for an edge left from the saw. */
  readonly cleanUpBefore: Um;
  readonly cleanUpAfter: Um;
}

/** `followGap`: spacing = max(loss, gap), the figure runs on exactly where gap ≥ loss. `tight`: spacing = loss, saves wood. */
export type Spacing = "followGap" | "tight";

/** What stays where it is in the wood when sizes, gaps or loss change, and against which drift is counted. */
export type AnchorX = "left" | "centre" | "right" | { readonly piece: PieceId };
export type AnchorY = "top" | "centre" | "bottom" | { readonly piece: PieceId };

/** 0 and 2 for horizontal grain, 1 and 3 for vertical: quarter turns, clockwise as seen, that take the face on to the stock. */
export type QuarterTurns = 0 | 1 | 2 | 3;

/** Where a group lies: the stock point that carries the group's anchor point. */
export interface Placement {
  readonly stockId: StockId;
  readonly at: StockPoint;
  readonly turns: QuarterTurns;
}

export interface PieceGroup {
  readonly id: string;
  readonly pieceIds: readonly PieceId[];
  /** null: not laid on wood yet. */
  readonly placement: Placement | null;
  /** Pieces that have changed places in the wood: key is cut from the place of value. Both have the same size. */
  readonly takesPlaceOf: Readonly<Record<PieceId, PieceId>>;
}

export interface FaceLayout {
  readonly face: Face;
  readonly crosscut: CutLoss;
  readonly rip: CutLoss;
  readonly spacing: Spacing;
  readonly anchorX: AnchorX;
  readonly anchorY: AnchorY;
  /** Every piece of the face is in exactly one group. The first group is the set; the rest are loose. */
  readonly groups: readonly PieceGroup[];
}
