/** Chooses another anchor without moving any wood: only what later changes of size, gap or loss leave in place is different. */
import type { AnchorX, AnchorY, FaceLayout } from "./face-layout";
import { groupAt, originOf } from "./group-origin";
import { changed, type LayoutChange, refused } from "./layout-change";
import { readingIndexOf } from "./piece-ids";

export function changeAnchor(layout: FaceLayout, anchorX: AnchorX, anchorY: AnchorY): LayoutChange {
  for (const anchor of [anchorX, anchorY]) {
    if (typeof anchor === "object" && readingIndexOf(layout.face, anchor.piece) === null) {
      return refused({ reason: "unknown-piece", piece: anchor.piece });
    }
  }
  const anchored = { ...layout, anchorX, anchorY };
  return changed({ ...anchored, groups: layout.groups.map((group) => groupAt(anchored, group, originOf(layout, group))) });
}
