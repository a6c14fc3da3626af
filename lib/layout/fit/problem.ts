/** What is wrong with a layout, as values. The screen puts them into words; the closed union makes sure it puts all of them. */
import type { PieceId, StockId } from "../piece";
import type { KeepClearKind } from "../stock/board";
import type { Um } from "../units/um";

export type Problem =
  | { readonly kind: "not-placed"; readonly pieces: readonly PieceId[] }
  | { readonly kind: "unknown-stock"; readonly pieces: readonly PieceId[]; readonly stockId: StockId }
  /** Reaches over the usable outline, or its sawn size with clean-up over the board, by this much at the worst corner. */
  | { readonly kind: "outside"; readonly piece: PieceId; readonly by: Um }
  /** Reaches into a keep-clear area; `by` is how far, `atX` where along the board, `slide` the least slide along the board of
   *  the piece's whole group that clears it (negative: left), null when none does. */
  | {
      readonly kind: "keep-clear";
      readonly piece: PieceId;
      readonly areaId: string;
      readonly area: KeepClearKind;
      readonly by: Um;
      readonly atX: Um;
      readonly slide: Um | null;
    }
  /** Overlap, or closer than the loss between them. */
  | { readonly kind: "too-close"; readonly pieces: readonly [PieceId, PieceId]; readonly missing: Um }
  /** Lies on wood that is spoken for, or too near it for the saw; `missing` is how far it would have to move for the cut between,
   *  `over` how much of that is wood that would be cut twice, `slide` as above. */
  | {
      readonly kind: "spoken-for";
      readonly piece: PieceId;
      readonly spokenForId: string;
      readonly over: Um;
      readonly missing: Um;
      readonly slide: Um | null;
    }
  /** The pieces on this board cannot be parted by straight cuts from edge to edge. */
  | { readonly kind: "blocked"; readonly stockId: StockId; readonly pieces: readonly PieceId[] }
  /** Laid on stock that is thinner than what its pattern asks for; `missing` is by how much. */
  | { readonly kind: "too-thin"; readonly stockId: StockId; readonly pieces: readonly PieceId[]; readonly missing: Um }
  /** A warning, nothing in the way: a glue line of the blank lies in the piece, this near its long edge; `at` from the board's top edge. */
  | { readonly kind: "glue-line"; readonly piece: PieceId; readonly at: Um; readonly fromEdge: Um }
  /** Runs with the grain the wrong way: the placement's turns do not fit the grain of the face. */
  | { readonly kind: "grain"; readonly pieces: readonly PieceId[] };
