/**
 * The origin of a placed group: the stock point that carries the origin of the spaced chart. A placement says the same by way
 * of the anchor; the origin does not depend on it, so "leave the wood where it is" means "keep the origin".
 */
import { quarterTurn, turnedVector } from "../frame/combine-isometries";
import type { StockPoint } from "../frame/point";
import type { StockId } from "../piece";
import { um } from "../units/um";
import { spacedAnchor } from "./anchor";
import { spacedChart } from "./charts";
import type { FaceLayout, PieceGroup, Placement, QuarterTurns } from "./face-layout";
import type { ChartPlace } from "./pattern-rules";

export interface GroupOrigin {
  readonly stockId: StockId;
  readonly origin: StockPoint;
  readonly turns: QuarterTurns;
}

/** The origin of a group, or null when it is not laid on wood or has no pieces. */
export function originOf(layout: FaceLayout, group: PieceGroup, places = spacedChart(layout)): GroupOrigin | null {
  const { placement } = group;
  if (placement === null || group.pieceIds.length === 0) return null;
  const offset = turnedAnchor(layout, group, placement.turns, places);
  const origin = { x: um(placement.at.x - offset.x), y: um(placement.at.y - offset.y) };
  return { stockId: placement.stockId, origin, turns: placement.turns };
}

/** The placement that gives the group this origin under the anchor of the layout; null stays null. */
export function placementAt(layout: FaceLayout, group: PieceGroup, origin: GroupOrigin | null): Placement | null {
  if (origin === null || group.pieceIds.length === 0) return null;
  const offset = turnedAnchor(layout, group, origin.turns, spacedChart(layout));
  const at = { x: um(origin.origin.x + offset.x), y: um(origin.origin.y + offset.y) };
  return { stockId: origin.stockId, at, turns: origin.turns };
}

/** The group placed so that its origin is this one. */
export function groupAt(layout: FaceLayout, group: PieceGroup, origin: GroupOrigin | null): PieceGroup {
  return { ...group, placement: placementAt(layout, group, origin) };
}

function turnedAnchor(layout: FaceLayout, group: PieceGroup, turns: QuarterTurns, places: readonly ChartPlace[]) {
  const anchor = spacedAnchor(layout, group, places);
  return turnedVector(quarterTurn(turns), anchor.x, anchor.y);
}
