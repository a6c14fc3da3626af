/** What a search for places is asked. */
import type { FaceLayout } from "../pattern/face-layout";
import type { StockId } from "../piece";
import type { BoardSide, LeastOffcut, SideName } from "./board-side";
import type { Weights } from "./objective";
import type { Apart } from "./really-differ";
import type { SceneGround } from "./scene";
import type { SearchPicture } from "./search-picture";

/** Plain data, so that it can be sent to a worker. */
export interface PlaceRequest {
  readonly layout: FaceLayout;
  /** The group that is looked for a place for, whether it lies on wood or not. */
  readonly groupId: string;
  /** Sides of one board that have a picture. */
  readonly sides: readonly BoardSide[];
  /** The side whose frame the layout's pieces on this board lie in. */
  readonly layoutSide: SideName;
  /** Pictures of the other boards that pieces of the layout lie on, as far as they have one. */
  readonly neighbours: readonly { readonly stockId: StockId; readonly picture: SearchPicture }[];
  readonly weights: Weights;
  /** How glad the shop is to use this board, 0..1. */
  readonly stock: number;
  readonly leastOffcut: LeastOffcut;
  /** How many places to answer at most. */
  readonly count: number;
  readonly apart: Apart;
}

/** Pictures of neighbours that lie on other boards; the searched board is seen in its own. */
export function sceneGround({ layout, groupId, neighbours, stock }: PlaceRequest): SceneGround {
  const pictures = new Map(neighbours.map(({ stockId, picture }) => [stockId, picture]));
  return { layout, groupId, stock, pictureOf: (stockId) => pictures.get(stockId) ?? null };
}
