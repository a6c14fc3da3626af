/** What stands in the way of cutting the rest as issued, and what can be done about it, as values; words are made elsewhere. */
import type { PieceId } from "../piece";
import type { Edge, Part } from "../program/program";
import type { Um } from "../units/um";
import type { Missing } from "./fit-in-part";

export interface PieceName {
  readonly pieceId: PieceId;
  readonly label: string;
}

export type TroubleFact =
  /** The part in hand ends so much short of what is to be sawn for the piece, at this edge. */
  | { readonly kind: "short"; readonly piece: PieceName; readonly edge: Edge; readonly by: Um }
  /** So much is missing between two pieces for the true blade and their clean-up. */
  | { readonly kind: "too-close"; readonly pieces: readonly [PieceName, PieceName]; readonly by: Um }
  /** No straight cut from edge to edge parts them, or none can be measured from a straight edge. */
  | { readonly kind: "no-cut"; readonly pieces: readonly PieceName[] }
  /** Lies on a keep-clear area, over the outline or on spoiled wood. */
  | { readonly kind: "bad-wood"; readonly piece: PieceName }
  | { readonly kind: "spoiled"; readonly piece: PieceName }
  /** Its wood was cut away. */
  | { readonly kind: "no-wood"; readonly piece: PieceName };

/**
 * In the order of choice. Slide: the pieces move within the part. Less clean-up: their edges keep more of the saw's marks. Narrower: one
 * that need not keep its size loses some. Elsewhere: cut from other wood of this board in hand. Smaller: one that should keep its
 * size loses some. Other board: nothing in hand of this board will do.
 */
export const rescueKinds = ["slide", "less-clean-up", "narrower", "elsewhere", "smaller", "other-board"] as const;
export type RescueKind = (typeof rescueKinds)[number];

/** What becomes different of one piece. */
export interface PieceChange extends PieceName {
  /** Of its finished rectangle in the wood. */
  readonly by: { readonly x: Um; readonly y: Um };
  /** Edges that are cleaned up less. */
  readonly cleanUp: readonly { readonly edge: Edge; readonly planned: Um; readonly left: Um }[];
  /** Lost of its finished size. */
  readonly smaller: Missing;
  /** The part it is cut from, where that is another one than before. */
  readonly from: Part | null;
}

/** Worked out and checked: with it the part, and what it takes from elsewhere, can be cut. */
export interface Rescue {
  readonly kind: RescueKind;
  readonly changes: readonly PieceChange[];
  /** Pieces for which another board is needed. */
  readonly leftOut: readonly PieceName[];
}

export interface Trouble {
  /** Tells the troubles of one board apart: "part 3.2", "piece p4". */
  readonly key: string;
  /** null: of a piece that lies in no part in hand any more. */
  readonly part: Part | null;
  readonly facts: readonly TroubleFact[];
  /** What the part is too short and too narrow by, however its pieces slide; 0 where sliding is enough. */
  readonly missing: Missing;
  /** The best first; never empty. */
  readonly rescues: readonly Rescue[];
  readonly chosen: RescueKind;
}

/** By the key of the trouble; one that is not among its rescues counts as none. */
export type RescueChoices = Readonly<Record<string, RescueKind>>;
