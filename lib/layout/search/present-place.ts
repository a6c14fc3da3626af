/** The place a group has now, valued like any other though it need not lie on the grid. */
import type { Problem } from "../fit/problem";
import { problems } from "../fit/problems";
import type { FaceLayout } from "../pattern/face-layout";
import { groupById } from "../pattern/layout-change";
import { groupBounds } from "../pattern/place-group";
import type { PieceId } from "../piece";
import type { BoardFace } from "../stock/board";
import type { SideTables } from "./board-side";
import { GRID_UM } from "./grid";
import { type PlaceRequest, sceneGround } from "./place-request";
import { type PlaceValue, placeValue } from "./place-value";
import { marksOf, type PlaceMarks } from "./really-differ";
import { makeScene } from "./scene";

export interface PresentPlace {
  readonly value: PlaceValue;
  /** Whether the group has no problem there. */
  readonly allowed: boolean;
  readonly marks: PlaceMarks;
}

/** Null where the group does not lie on a searched side, or reaches over the board's rectangle, where there is no picture. */
export function presentPlace(request: PlaceRequest, sides: readonly SideTables[]): PresentPlace | null {
  const { layout, groupId, layoutSide, weights } = request;
  const placement = groupById(layout, groupId)?.placement;
  const bounds = groupBounds(layout, groupId);
  const side = sides.find((one) => one.side === layoutSide && one.board.id === placement?.stockId);
  if (!placement || bounds === null || side === undefined) return null;
  const { x, y, width, height } = bounds;
  if (x < 0 || y < 0 || x + width > side.board.length || y + height > side.board.width) return null;
  const [column, row] = [Math.floor(x / GRID_UM), Math.floor(y / GRID_UM)];
  const phase = { x: x - column * GRID_UM, y: y - row * GRID_UM };
  const scene = makeScene(sceneGround(request), side, placement.turns, phase);
  return {
    value: placeValue(scene, column, row, weights),
    allowed: isAllowed(layout, groupId, side.board),
    marks: marksOf(scene, column, row),
  };
}

/** Whether the pieces of a group have no problem on this board but among themselves. */
export function isAllowed(layout: FaceLayout, groupId: string, board: BoardFace): boolean {
  const own = new Set(groupById(layout, groupId)?.pieceIds ?? []);
  return !problems(layout, [board]).some((problem) => standsInTheWay(problem, own));
}

function standsInTheWay(problem: Problem, own: ReadonlySet<PieceId>): boolean {
  switch (problem.kind) {
    case "outside":
    case "keep-clear":
    case "spoken-for":
      return own.has(problem.piece);
    case "too-close":
      return own.has(problem.pieces[0]) !== own.has(problem.pieces[1]);
    case "grain":
      return problem.pieces.some((id) => own.has(id));
    case "not-placed":
    case "unknown-stock":
    case "blocked":
    case "too-thin":
    case "glue-line":
      return false;
  }
}
