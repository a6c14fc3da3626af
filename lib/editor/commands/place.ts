/** Lays groups on a board, moves them to another, or takes them off. */
import { type BoardFace, type FaceLayout, groupById, liftGroup, turnsAlongGrain } from "@/lib/layout";
import type { TableDocument } from "../document";
import { laidAtFirstPlace } from "./find-place";
import { type CommandOutcome, inTurn, refusedBecause, stepToLayout } from "./outcome";
import { piecesOfGroups } from "./targets";

/** Each group goes to the first place with room for it, or where its problems can be seen; a group that lay on wood keeps its turn. */
export function placeOnBoard(document: TableDocument, groupIds: readonly string[], board: BoardFace): CommandOutcome {
  if (groupIds.length === 0) return refusedBecause({ reason: "nothing-selected" });
  const pieces = piecesOfGroups(document.layout, groupIds);
  const cameFromWood = groupIds.some((id) => groupById(document.layout, id)?.placement != null);
  let layout: FaceLayout = document.layout;
  let sound = true;
  for (const id of groupIds) {
    const group = groupById(layout, id);
    if (group === null) return refusedBecause({ reason: "unknown-group", groupId: id });
    const turns = group.placement?.turns ?? turnsAlongGrain(layout.face.grain)[0];
    const laid = laidAtFirstPlace(layout, id, board, turns);
    layout = laid.layout;
    sound &&= laid.sound;
  }
  return stepToLayout(document, layout, { did: cameFromWood ? "moved-to-board" : "placed", pieces, stockId: board.id, sound });
}

export function liftFromBoard(document: TableDocument, groupIds: readonly string[]): CommandOutcome {
  if (groupIds.length === 0) return refusedBecause({ reason: "nothing-selected" });
  const change = inTurn(document.layout, groupIds, liftGroup);
  if (!change.ok) return refusedBecause(change.refusal);
  return stepToLayout(document, change.layout, { did: "lifted", pieces: piecesOfGroups(document.layout, groupIds) });
}
