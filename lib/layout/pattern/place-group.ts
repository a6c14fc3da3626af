/** Lays a group on a board, slides it, turns it end for end, or takes it off again. */
import { rectToStock } from "../frame/apply-isometry";
import { quarterTurn, turnedVector } from "../frame/combine-isometries";
import type { StockPoint, StockRect } from "../frame/point";
import type { StockId } from "../piece";
import { type Um, um } from "../units/um";
import { spacedBox } from "./anchor";
import type { Grain } from "./face";
import type { FaceLayout, QuarterTurns } from "./face-layout";
import { groupAt, originOf } from "./group-origin";
import { changed, groupById, type LayoutChange, refused, withGroup } from "./layout-change";

/** The turns that run the grain of the face along the board, the first choice and its end-for-end partner. */
export function turnsAlongGrain(grain: Grain): readonly [QuarterTurns, QuarterTurns] {
  return grain === "horizontal" ? [0, 2] : [1, 3];
}

/** Lays the group so that the corner of its bounding rectangle nearest the stock's origin comes to `corner`. */
export function placeGroup(
  layout: FaceLayout,
  groupId: string,
  stockId: StockId,
  corner: StockPoint,
  turns: QuarterTurns,
): LayoutChange {
  const group = groupById(layout, groupId);
  if (group === null || group.pieceIds.length === 0) return refused({ reason: "unknown-group", groupId });
  const bounds = rectToStock(quarterTurn(turns), spacedBox(layout, group));
  const origin = { x: um(corner.x - bounds.x), y: um(corner.y - bounds.y) };
  return changed(withGroup(layout, groupAt(layout, group, { stockId, origin, turns })));
}

/** Slides the group by a vector in the stock frame. */
export function moveGroup(layout: FaceLayout, groupId: string, by: { readonly x: Um; readonly y: Um }): LayoutChange {
  const group = groupById(layout, groupId);
  if (group === null) return refused({ reason: "unknown-group", groupId });
  const { placement } = group;
  if (placement === null) return refused({ reason: "not-placed", groupId });
  const at = { x: um(placement.at.x + by.x), y: um(placement.at.y + by.y) };
  return changed(withGroup(layout, { ...group, placement: { ...placement, at } }));
}

/**
 * Turns the group end for end about the middle of its own rectangle, which stays exactly where it is. With o the origin, R
 * the turn and c₀, c₁ the opposite corners of the group's box in the spaced chart: o + R·c₀ = o' − R·c₁, so o' = o + R·(c₀ +
 * c₁), a whole number.
 */
export function turnGroup(layout: FaceLayout, groupId: string): LayoutChange {
  const group = groupById(layout, groupId);
  if (group === null) return refused({ reason: "unknown-group", groupId });
  const lying = originOf(layout, group);
  if (lying === null) return refused({ reason: "not-placed", groupId });
  const box = spacedBox(layout, group);
  const corners = turnedVector(quarterTurn(lying.turns), 2 * box.x + box.width, 2 * box.y + box.height);
  const origin = { x: um(lying.origin.x + corners.x), y: um(lying.origin.y + corners.y) };
  const turns = endForEnd[lying.turns];
  return changed(withGroup(layout, groupAt(layout, group, { ...lying, origin, turns })));
}

const endForEnd: Readonly<Record<QuarterTurns, QuarterTurns>> = { 0: 2, 1: 3, 2: 0, 3: 1 };

/** Takes the group off its board. */
export function liftGroup(layout: FaceLayout, groupId: string): LayoutChange {
  const group = groupById(layout, groupId);
  if (group === null) return refused({ reason: "unknown-group", groupId });
  return changed(withGroup(layout, { ...group, placement: null }));
}

/** The rectangle of the stock around all pieces of a group, or null when it is not laid on wood. */
export function groupBounds(layout: FaceLayout, groupId: string): StockRect | null {
  const group = groupById(layout, groupId);
  const lying = group === null ? null : originOf(layout, group);
  if (group === null || lying === null) return null;
  return rectToStock(quarterTurn(lying.turns, lying.origin.x, lying.origin.y), spacedBox(layout, group));
}
