/** Other sizes, gaps or counts of fronts, or the grain run the other way. */
import { changeFace, type Face, type FaceLayout, type Grain, groupBounds, placeGroup, turnsAlongGrain } from "@/lib/layout";
import type { TableDocument } from "../document";
import { type CommandOutcome, stepToLayout } from "./outcome";

export function changeSizes(document: TableDocument, face: Face): CommandOutcome {
  const { layout, swapsUndone } = changeFace(document.layout, face);
  return stepToLayout(document, layout, { did: "changed-sizes", swapsUndone });
}

/** Every group that lies on wood is laid again from the same corner with its grain along the board. */
export function changeGrain(document: TableDocument, grain: Grain): CommandOutcome {
  const turned = changeFace(document.layout, { ...document.layout.face, grain }).layout;
  const layout = turned.groups.reduce<FaceLayout>((present, { id, placement }) => {
    const bounds = groupBounds(document.layout, id);
    if (placement === null || bounds === null) return present;
    const laid = placeGroup(present, id, placement.stockId, { x: bounds.x, y: bounds.y }, turnsAlongGrain(grain)[0]);
    return laid.ok ? laid.layout : present;
  }, turned);
  return stepToLayout(document, layout, { did: "changed-grain" });
}
