/**
 * A first place for a group on a board: inside the outline, off keep-clear areas, the saw's loss from other pieces, as near the left end as it
 * goes. The eye does the rest by sliding. Looks along whole lines exactly, and across the board at a fixed number of them.
 */
import {
  type BoardFace,
  type FaceLayout,
  groupBounds,
  leastSlide,
  lyingPieces,
  moveGroup,
  placeGroup,
  type QuarterTurns,
  type StockPoint,
  um,
} from "@/lib/layout";

/** Lines across the board that are tried, the middle one first, then further and further out on either side. */
const LINES_ACROSS = 17;

/** The layout with the group laid there, or null when no line has room for it. */
export function laidAtFirstPlace(layout: FaceLayout, groupId: string, board: BoardFace, turns: QuarterTurns): FaceLayout | null {
  for (const y of linesAcross(layout, groupId, board, turns)) {
    const placed = placeGroup(layout, groupId, board.id, { x: um(0), y }, turns);
    if (!placed.ok) return null;
    const slide = leastSlide(...moving(placed.layout, groupId, board));
    if (slide === null) continue;
    const slid = moveGroup(placed.layout, groupId, { x: slide, y: um(0) });
    if (slid.ok) return slid.layout;
  }
  return null;
}

function moving(layout: FaceLayout, groupId: string, board: BoardFace): Parameters<typeof leastSlide> {
  const here = lyingPieces(layout).filter(({ stockId }) => stockId === board.id);
  const group = here.filter((piece) => piece.groupId === groupId);
  const others = here.filter((piece) => piece.groupId !== groupId);
  return [group, { board, others, kerfs: { along: layout.crosscut.kerf, across: layout.rip.kerf } }];
}

function linesAcross(layout: FaceLayout, groupId: string, board: BoardFace, turns: QuarterTurns): StockPoint["y"][] {
  const atOrigin = placeGroup(layout, groupId, board.id, { x: um(0), y: um(0) }, turns);
  const height = atOrigin.ok ? (groupBounds(atOrigin.layout, groupId)?.height ?? 0) : 0;
  const room = board.width - height;
  if (room < 0) return [];
  const half = (LINES_ACROSS - 1) / 2;
  const offsets = Array.from({ length: LINES_ACROSS }, (_, index) => (index % 2 === 0 ? index / 2 : -(index + 1) / 2));
  return [...new Set(offsets.map((offset) => um(Math.floor((room * (half + offset)) / (2 * half)))))];
}
