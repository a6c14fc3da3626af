/**
 * Chooses another anchor: what later changes of size, gap or loss leave in place, and what drift is counted against. No wood moves,
 * but for the strips of a cut-out, which lie where the anchor has them: there the crosscut parts keep their place in the wood.
 */
import { quarterTurn, turnedVector } from "../frame/combine-isometries";
import { um } from "../units/um";
import { spacedChart } from "./charts";
import type { AnchorX, AnchorY, FaceLayout, PieceGroup } from "./face-layout";
import { type GroupOrigin, groupAt, originOf } from "./group-origin";
import { changed, type LayoutChange, refused } from "./layout-change";
import type { ChartPlace } from "./pattern-rules";
import { ofPiece, readingIndexOf } from "./piece-ids";
import { slotOf } from "./slots";

export function changeAnchor(layout: FaceLayout, anchorX: AnchorX, anchorY: AnchorY): LayoutChange {
  for (const anchor of [anchorX, anchorY]) {
    if (typeof anchor === "object" && readingIndexOf(layout.face, anchor.piece) === null) {
      return refused({ reason: "unknown-piece", piece: anchor.piece });
    }
  }
  const anchored = { ...layout, anchorX, anchorY };
  const charts = { before: spacedChart(layout), after: spacedChart(anchored) };
  const groups = layout.groups.map((group) => {
    const origin = originOf(layout, group, charts.before);
    return groupAt(anchored, group, origin && originAfter(group, origin, charts));
  });
  return changed({ ...anchored, groups });
}

/** The origin that leaves the group's first part where it is, or the group's first piece where it has strips only. */
function originAfter(
  group: PieceGroup,
  { origin, ...lying }: GroupOrigin,
  { before, after }: { readonly before: readonly ChartPlace[]; readonly after: readonly ChartPlace[] },
): GroupOrigin {
  const slots = group.pieceIds.map((id) => slotOf(group, id));
  const still = slots.find((slot) => !ofPiece(before, slot).anchors) ?? slots[0];
  if (still === undefined) return { origin, ...lying };
  const [was, is] = [ofPiece(before, still).rect, ofPiece(after, still).rect];
  const moved = turnedVector(quarterTurn(lying.turns), was.x - is.x, was.y - is.y);
  return { origin: { x: um(origin.x + moved.x), y: um(origin.y + moved.y) }, ...lying };
}
