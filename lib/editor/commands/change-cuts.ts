/** Other losses, saws, spacing or anchor. The wood at the anchor stays where it is. */
import {
  type AnchorX,
  type AnchorY,
  type CutDirection,
  type CutLoss,
  changeAnchor,
  changeCuts,
  type Spacing,
} from "@/lib/layout";
import type { Saw } from "@/lib/schemas/shop";
import type { TableDocument } from "../document";
import { type CommandOutcome, refusedBecause, stepTo, stepToLayout } from "./outcome";

/** The loss of one kind of cut as typed in; it no longer comes from a saw of the shop. */
export function changeLoss(document: TableDocument, direction: CutDirection, loss: CutLoss): CommandOutcome {
  return withLoss(document, direction, loss, null);
}

/** The loss of one kind of cut as the saw takes it: its kerf, and its clean-up on either side. */
export function chooseSaw(document: TableDocument, direction: CutDirection, saw: Omit<Saw, "limits">): CommandOutcome {
  const loss = { kerf: saw.kerf, cleanUpBefore: saw.cleanUp, cleanUpAfter: saw.cleanUp };
  return withLoss(document, direction, loss, saw.id);
}

export function changeSpacing(document: TableDocument, spacing: Spacing): CommandOutcome {
  return stepToLayout(document, changeCuts(document.layout, { spacing }), { did: "changed-spacing" });
}

export function chooseAnchor(document: TableDocument, anchorX: AnchorX, anchorY: AnchorY): CommandOutcome {
  const change = changeAnchor(document.layout, anchorX, anchorY);
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "changed-anchor" });
}

function withLoss(document: TableDocument, direction: CutDirection, loss: CutLoss, sawId: string | null): CommandOutcome {
  const layout = changeCuts(document.layout, direction === "rip" ? { rip: loss } : { crosscut: loss });
  const saws = direction === "rip" ? { ripSawId: sawId } : { crosscutSawId: sawId };
  return stepTo(document, { ...document, ...saws, layout }, { did: "changed-cuts" });
}
