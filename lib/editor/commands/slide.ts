/** Slides groups on their boards by a vector of the stock frame. A nudge is a slide by one step. */
import { moveGroup, type Um } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, inTurn, refusedBecause, stepToLayout } from "./outcome";
import { piecesOfGroups } from "./targets";

export function slideGroups(
  document: TableDocument,
  groupIds: readonly string[],
  by: { readonly x: Um; readonly y: Um },
): CommandOutcome {
  if (groupIds.length === 0) return refusedBecause({ reason: "nothing-selected" });
  const change = inTurn(document.layout, groupIds, (layout, id) => moveGroup(layout, id, by));
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "slid", pieces: piecesOfGroups(document.layout, groupIds), by });
}
