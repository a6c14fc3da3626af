/** One question of a property test, as the search is asked it and as the brute force is. */
import fc from "fast-check";
import {
  type BoardFace,
  type FaceLayout,
  lyingPieces,
  type PlaceRequest,
  type QuarterTurns,
  runSlices,
  um,
  type Weights,
} from "@/lib/layout";
import { sideTables } from "@/lib/layout/search/board-side";
import { sceneGround } from "@/lib/layout/search/place-request";
import { makeScene, type Scene } from "@/lib/layout/search/scene";
import { arbitrarySmallBoard, arbitraryTask, arbitraryWeights, woodPicture } from "./arbitrary-search";

export interface Case {
  readonly layout: FaceLayout;
  readonly board: BoardFace;
  readonly weights: Weights;
  readonly seed: number;
  readonly elsewhere: boolean;
  readonly second: boolean;
}

export const arbitraryCase: fc.Arbitrary<Case> = fc.record({
  layout: arbitraryTask,
  board: arbitrarySmallBoard,
  weights: arbitraryWeights,
  seed: fc.integer({ min: 1, max: 1_000 }),
  elsewhere: fc.boolean(),
  second: fc.boolean(),
});

/** Pictures are made here and not by the arbitrary, so that a counterexample can be read. */
export function requestOf({ layout, board, weights, seed, elsewhere }: Case): PlaceRequest {
  return {
    layout,
    groupId: "set",
    sides: [{ side: "face", board, picture: woodPicture(board.length, board.width, seed) }],
    layoutSide: "face",
    neighbours: elsewhere ? [{ stockId: "b2", picture: woodPicture(100_000, 60_000, seed + 1) }] : [],
    weights,
    stock: 0.37,
    leastOffcut: { along: um(12_000), across: um(5_000) },
    count: 5,
    apart: { along: 9_000, across: 4_000 },
  };
}

export function sceneOf(request: PlaceRequest, turns: QuarterTurns): Scene {
  const [side] = request.sides;
  if (side === undefined) throw new Error("no side");
  const others = lyingPieces(request.layout).filter(({ groupId, stockId }) => groupId !== "set" && stockId === "b1");
  const kerfs = { along: request.layout.crosscut.kerf, across: request.layout.rip.kerf };
  return makeScene(sceneGround(request), runSlices(sideTables(side, others, kerfs, request.leastOffcut)), turns);
}
