/** What a pattern produces: pieces, each with the one map that everything else follows from. */
import type { Isometry } from "./frame/isometry";
import type { FacePoint } from "./frame/point";

/** Stable within one layout: "p1", "p2", … in reading order of the face. */
export type PieceId = string;
/** The id of a stock item as the caller knows it. */
export type StockId = string;

/**
 * What a piece is in its face. Front: hangs or slides free. Strip, fixed: the parts of a rail that stay whole, and those set back
 * between its openings. Side: of a run that goes round corners. Leaf: of a resawn pair.
 */
export type PieceRole = "front" | "strip" | "fixed" | "side" | "leaf";

/** One solid front (or, in veneer, one leaf part) on a face. */
export interface Piece {
  readonly id: PieceId;
  /** What is written on the wood: "1", "2", … never with the letters I or O. */
  readonly label: string;
  readonly role: PieceRole;
  /** Finished outline on the face, clockwise as seen (y down). A rectangle in patterns on solid stock. */
  readonly outline: readonly FacePoint[];
  readonly stockId: StockId;
  readonly stockFromFace: Isometry;
}
