/** Changes of a cut-out from the side panel: dividers and strips moved, put in and taken out. What can go wrong is said by the core. */
import { addDivider, type CutOutChange, moveRow, type PartPlace, removePart, type Um } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type MovablePart, moved } from "../tools/part-drag";
import { type CommandOutcome, refusedBecause, stepToLayout } from "./outcome";

export function movePart(document: TableDocument, part: MovablePart, by: Um): CommandOutcome {
  return outcomeOf(document, moved(document.layout, part, by));
}

export function moveFronts(document: TableDocument, row: number, by: Um): CommandOutcome {
  return outcomeOf(document, moveRow(document.layout, row, by));
}

/** A divider in the middle of the front. */
export function putDivider(document: TableDocument, place: PartPlace, width: Um): CommandOutcome {
  return outcomeOf(document, addDivider(document.layout, place, width));
}

export function takeOutPart(document: TableDocument, place: PartPlace): CommandOutcome {
  return outcomeOf(document, removePart(document.layout, place));
}

function outcomeOf(document: TableDocument, change: CutOutChange): CommandOutcome {
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "changed-sizes", swapsUndone: change.swapsUndone });
}
