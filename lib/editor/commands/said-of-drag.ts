/** What a finished drag did: a slide, or a move to another board. */
import { groupById, type Um, um } from "@/lib/layout";
import type { TableDocument } from "../document";
import type { Preview } from "../tools/drag";
import type { Said } from "./outcome";
import { piecesOfGroups } from "./targets";

export function saidOfDrag({ layout }: TableDocument, preview: Preview): Said {
  if (preview.kind === "part") return { did: "moved-part", piece: preview.piece, by: preview.by, axis: preview.axis };
  const pieces = piecesOfGroups(layout, preview.groupIds);
  const [first] = preview.groupIds;
  const before = first === undefined ? null : (groupById(layout, first)?.placement ?? null);
  const after = first === undefined ? null : (groupById(preview.layout, first)?.placement ?? null);
  if (before === null || after === null || before.stockId !== after.stockId) {
    return { did: "moved-to-board", pieces, stockId: preview.stockId, sound: true };
  }
  const by: { x: Um; y: Um } = { x: um(after.at.x - before.at.x), y: um(after.at.y - before.at.y) };
  return { did: "slid", pieces, by };
}
