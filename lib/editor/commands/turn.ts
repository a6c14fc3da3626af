/** Turns groups end for end, each about its own middle. */
import { turnGroup } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, inTurn, refusedBecause, stepToLayout } from "./outcome";
import { piecesOfGroups } from "./targets";

export function turnEndForEnd(document: TableDocument, groupIds: readonly string[]): CommandOutcome {
  if (groupIds.length === 0) return refusedBecause({ reason: "nothing-selected" });
  const change = inTurn(document.layout, groupIds, turnGroup);
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "turned", pieces: piecesOfGroups(document.layout, groupIds) });
}
