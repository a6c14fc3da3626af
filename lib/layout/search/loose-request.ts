/**
 * What a search for loose pieces is asked: a run of pieces along the grain, each with a place of its own on the board, in their order, the
 * saw's loss apart.
 */
import type { FaceLayout } from "../pattern/face-layout";
import type { PieceId, StockId } from "../piece";
import type { Um } from "../units/um";
import type { BoardSide, LeastOffcut } from "./board-side";
import type { Weights } from "./objective";
import type { SearchPicture } from "./search-picture";

/** Steps of the first round, µm, whole multiples of half a millimetre. */
export interface LooseGrid {
  readonly along: Um;
  readonly across: Um;
}

/** Plain data, so that it can be sent to a worker. */
export interface LooseRequest {
  readonly layout: FaceLayout;
  /** Pieces one after another as they hang along the grain: left to right, or top to bottom. */
  readonly run: readonly PieceId[];
  /** Those of the run that stay where they are. */
  readonly locked: readonly PieceId[];
  /** The side of the board that the run is searched on and the layout's pieces on this board lie in the frame of. */
  readonly side: BoardSide;
  /** Pictures of the other boards that neighbours lie on. */
  readonly neighbours: readonly { readonly stockId: StockId; readonly picture: SearchPicture }[];
  /** Parts that are sums over seams and pieces; a step is reported, not weighed, since where the figure matches there is none. */
  readonly weights: Pick<Weights, "match" | "clear">;
  readonly leastOffcut: LeastOffcut;
  readonly grid: LooseGrid;
  /** Pairs of places that may be compared in each round; the grid is made coarser until it fits. */
  readonly mostPairs: number;
}
