/** Lays a group at a place that a search found. */
import { placeGroup, type QuarterTurns, type StockId, type StockPoint } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, refusedBecause, stepToLayout } from "./outcome";
import { piecesOfGroups } from "./targets";

export function takeOfferedPlace(
  document: TableDocument,
  groupId: string,
  stockId: StockId,
  { corner, turns }: { readonly corner: StockPoint; readonly turns: QuarterTurns },
): CommandOutcome {
  const placed = placeGroup(document.layout, groupId, stockId, corner, turns);
  if (!placed.ok) return refusedBecause(placed.refusal);
  const pieces = piecesOfGroups(document.layout, [groupId]);
  return stepToLayout(document, placed.layout, { did: "placed", pieces, stockId, sound: true });
}
