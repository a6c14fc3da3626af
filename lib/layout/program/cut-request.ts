/** What the cut program is asked for: pieces placed by hand on one board face, what the saw takes, and the board's edges. */
import type { StockRect } from "../frame/point";
import type { PieceId } from "../piece";
import type { BoardFace } from "../stock/board";
import type { Um } from "../units/um";
import type { CutMachines } from "./machine";
import type { CutKind, Edge, EdgeState, ShopLimits } from "./program";

/** A piece as it lies in the wood: finished rectangle, and what is cleaned off each edge after sawing (0: left from the saw). */
export interface PlacedPiece {
  readonly pieceId: PieceId;
  /** What is written on the wood. */
  readonly label: string;
  /** Finished size, stock frame. */
  readonly rect: StockRect;
  /** µm per edge, in the stock frame. The sawn blank is `rect` grown by these. */
  readonly cleanUp: Readonly<Record<Edge, Um>>;
}

/** The board's own edges before any work: straight and fit to measure from ("trued"), as they came ("rough"), or as they came but fit to
 *  mark a line from with a tape ("marked"). */
export type BoardEdges = Readonly<Record<Edge, Exclude<EdgeState, "sawn">>>;

/** What a part keeps around its pieces until it is flat, µm. */
export interface RoughAllowances {
  /** Both ends together. */
  readonly length: Um;
  /** Both long edges together. */
  readonly width: Um;
}

export interface CutRequest {
  readonly board: Pick<BoardFace, "length" | "width">;
  readonly pieces: readonly PlacedPiece[];
  readonly kerf: Readonly<Record<CutKind, Um>>;
  readonly boardEdges: BoardEdges;
  /** What truing takes off a rough edge; 0 where the board was marked along the line that truing reaches. */
  readonly truingTakes: { readonly longEdge: Um; readonly end: Um };
  readonly limits: ShopLimits;
  /** The shop's saws. Absent: one saw for each kind of cut, known by its kerf, that takes whatever it is given. */
  readonly machines?: CutMachines;
  /** The board is not flat: it is cut into rough parts first, which are flattened before any fine cut. Absent or null: it is flat. */
  readonly flatten?: RoughAllowances | null;
  /** What a saw does not take surely is planed off; absent: `THINNEST_SAWN`. */
  readonly thinnestSawn?: Um;
  /** Plans the search may weigh before it settles for the best it has. Some 300 000 a second on a small machine. */
  readonly budget: number;
}

/** A budget for which a screen can wait. */
export const defaultCutBudget = 600_000;

/** Board edges from the two questions a shop answers: are the long edges true, are the ends? */
export function boardEdges(longEdgesTrued: boolean, endsTrued: boolean): BoardEdges {
  const long = longEdgesTrued ? "trued" : "rough";
  const end = endsTrued ? "trued" : "rough";
  return { left: end, right: end, top: long, bottom: long };
}
