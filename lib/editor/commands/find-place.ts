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

export interface LaidGroup {
  readonly layout: FaceLayout;
  /** False: no line has room for it; it lies at the left end in the middle, for the maker to see what is in the way. */
  readonly sound: boolean;
}

/** The layout with the group laid on the board. The group exists and has pieces. */
export function laidAtFirstPlace(layout: FaceLayout, groupId: string, board: BoardFace, turns: QuarterTurns): LaidGroup {
  const lines = linesAcross(layout, groupId, board, turns);
  for (const y of lines) {
    const placed = placeGroup(layout, groupId, board.id, { x: um(0), y }, turns);
    if (!placed.ok) continue;
    const slide = leastSlide(...moving(placed.layout, groupId, board));
    if (slide === null) continue;
    const slid = moveGroup(placed.layout, groupId, { x: slide, y: um(0) });
    if (slid.ok) return { layout: slid.layout, sound: true };
  }
  const left = placeGroup(layout, groupId, board.id, { x: um(0), y: lines[0] ?? um(0) }, turns);
  return { layout: left.ok ? left.layout : layout, sound: false };
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
  if (room < 0) return [um(0)];
  const half = (LINES_ACROSS - 1) / 2;
  const offsets = Array.from({ length: LINES_ACROSS }, (_, index) => (index % 2 === 0 ? index / 2 : -(index + 1) / 2));
  return [...new Set(offsets.map((offset) => um(Math.floor((room * (half + offset)) / (2 * half)))))];
}
