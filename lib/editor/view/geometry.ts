/**
 * Where things lie on the two sides of the table. Pure. Show side and stock side share one scale where that fits, so that a front is as wide above as it is
 * below. Lengths in µm, scales in CSS pixels per mm, pixels from the top left of each side.
 *
 * Table frame (stock side): x along every board from its left end, y down over the stacked boards, µm. Rulers and spaces between boards keep their size in pixels at
 * every zoom, so their share of the table frame changes with it.
 */
import { type BoardFace, type Face, faceSize, type StockId, seamPlaces, type Um, um } from "@/lib/layout";

export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface Pan {
  readonly x: number;
  readonly y: number;
}

export interface View {
  /** 1: everything fits. */
  readonly zoom: number;
  /** Pixels that each side has been moved by. */
  readonly show: Pan;
  readonly stock: Pan;
}

export const wholeView: View = { zoom: 1, show: { x: 0, y: 0 }, stock: { x: 0, y: 0 } };
export const LEAST_ZOOM = 1;
export const GREATEST_ZOOM = 24;

/** Left and right of boards and face. */
export const MARGIN_PX = 20;
/** The ruler above each board. */
export const TAPE_PX = 26;
/** Between a board and the ruler of the next, for the board's name. */
export const BOARD_SPACE_PX = 30;
/** Below the face and beside it for the jumps of its outer seams. */
const CHIP_ROOM_BELOW_PX = 46;
const CHIP_ROOM_BESIDE_PX = 92;
/** The face is drawn at the scale of the boards when it is then at least this large, as a share of the width and in pixels; else as large as it fits. */
const SHARE_FOR_ONE_SCALE = 0.5;
const HEIGHT_FOR_ONE_SCALE_PX = 90;
/** A photograph enlarged beyond this shows nothing more, px per mm on the screen. */
const LARGEST_FIT_PX_PER_MM = 4;

export interface BoardPlace {
  readonly stockId: StockId;
  /** y of the board's edge in the table frame. */
  readonly top: Um;
}

export interface TableGeometry {
  readonly stockPxPerMm: number;
  readonly showPxPerMm: number;
  /** Both sides are drawn at one scale. */
  readonly oneScale: boolean;
  readonly boards: readonly BoardPlace[];
  /** Where the top left corner of the face, and of the table frame, lie on their sides, px. */
  readonly showOrigin: Pan;
  readonly stockOrigin: Pan;
  /** The view with both sides moved no further than there is something to see. */
  readonly view: View;
}

export interface TableContent {
  readonly boards: readonly BoardFace[];
  readonly face: Face;
}

export function tableGeometry({ boards, face }: TableContent, sides: { show: Size; stock: Size }, view: View): TableGeometry {
  const { width, height } = faceSize(face);
  const { beside, below } = chipRoom(face);
  const faceFit = Math.min(
    usable(sides.show.width, 2 * MARGIN_PX + beside) / mm(width),
    usable(sides.show.height, 2 * MARGIN_PX + below) / mm(height),
  );
  const longest = Math.max(0, ...boards.map((board) => board.length));
  const totalWidth = boards.reduce((sum, board) => sum + board.width, 0);
  const fixed = boards.length * (TAPE_PX + BOARD_SPACE_PX);
  const boardFit = Math.min(
    longest > 0 ? usable(sides.stock.width, 2 * MARGIN_PX) / mm(longest) : faceFit,
    totalWidth > 0 ? usable(sides.stock.height, fixed + MARGIN_PX) / mm(totalWidth) : faceFit,
    LARGEST_FIT_PX_PER_MM,
  );
  const oneScale =
    boardFit <= faceFit &&
    boardFit * mm(width) >= SHARE_FOR_ONE_SCALE * sides.show.width &&
    boardFit * mm(height) >= HEIGHT_FOR_ONE_SCALE_PX;
  const stockPxPerMm = boardFit * view.zoom;
  const showPxPerMm = (oneScale ? boardFit : Math.min(faceFit, LARGEST_FIT_PX_PER_MM)) * view.zoom;
  const faceWidthPx = mm(width) * showPxPerMm;
  const faceHeightPx = mm(height) * showPxPerMm;
  const stacked = stackBoards(boards, stockPxPerMm);
  const show = sideGeometry(
    sides.show,
    { width: faceWidthPx + beside, height: faceHeightPx + below },
    {
      x: oneScale ? MARGIN_PX : Math.max(MARGIN_PX, (sides.show.width - beside - faceWidthPx) / 2),
      y: Math.max(MARGIN_PX, (sides.show.height - below - faceHeightPx) / 2),
    },
    view.show,
  );
  const stock = sideGeometry(
    sides.stock,
    { width: mm(longest) * stockPxPerMm, height: stacked.heightPx },
    { x: MARGIN_PX, y: Math.max(0, (sides.stock.height - stacked.heightPx) / 3) },
    view.stock,
  );
  return {
    stockPxPerMm,
    showPxPerMm,
    oneScale,
    boards: stacked.places,
    showOrigin: show.origin,
    stockOrigin: stock.origin,
    view: { zoom: view.zoom, show: show.pan, stock: stock.pan },
  };
}

interface ChipRoom {
  readonly beside: number;
  readonly below: number;
}

const chipRoomByFace = new WeakMap<Face, ChipRoom>();

/** What the chips of the outer seams need beside the face and below it. Asked on every frame, so worked out once a face. */
function chipRoom(face: Face): ChipRoom {
  const known = chipRoomByFace.get(face);
  if (known) return known;
  const normals = new Set(seamPlaces(face).map(({ normal }) => normal));
  const room = { beside: normals.has("down") ? CHIP_ROOM_BESIDE_PX : 0, below: normals.has("right") ? CHIP_ROOM_BELOW_PX : 0 };
  chipRoomByFace.set(face, room);
  return room;
}

/** Where the content of a side starts. What fits is not moved; what does not is moved up to its edges and no further. */
function sideGeometry(side: Size, content: Size, start: Pan, pan: Pan): { readonly origin: Pan; readonly pan: Pan } {
  const held = (wish: number, from: number, length: number, room: number) =>
    from + length + MARGIN_PX <= room ? 0 : Math.min(Math.max(wish, room - MARGIN_PX - length - from), MARGIN_PX - from);
  const kept = {
    x: held(pan.x, start.x, content.width, side.width),
    y: held(pan.y, start.y, content.height, side.height),
  };
  return { origin: { x: start.x + kept.x, y: start.y + kept.y }, pan: kept };
}

function stackBoards(
  boards: readonly BoardFace[],
  pxPerMm: number,
): { readonly places: BoardPlace[]; readonly heightPx: number } {
  let px = 0;
  const places = boards.map((board) => {
    px += BOARD_SPACE_PX + TAPE_PX;
    const place = { stockId: board.id, top: um(Math.round((px / pxPerMm) * 1000)) };
    px += mm(board.width) * pxPerMm;
    return place;
  });
  return { places, heightPx: px };
}

/** A point of the table frame, not rounded: positions of a pointer. */
export interface TablePoint {
  readonly x: number;
  readonly y: number;
}

/** The point of the table frame under a pixel of the stock side. */
export function tablePointAt(geometry: TableGeometry, px: Pan): TablePoint {
  const umPerPx = 1000 / geometry.stockPxPerMm;
  return { x: (px.x - geometry.stockOrigin.x) * umPerPx, y: (px.y - geometry.stockOrigin.y) * umPerPx };
}

/** The board whose wood, or the nearest wood, lies at this height; null on an empty table. */
export function boardNear(places: readonly BoardPlace[], boards: readonly BoardFace[], y: number): BoardPlace | null {
  const distance = ({ stockId, top }: BoardPlace) => {
    const width = boards.find(({ id }) => id === stockId)?.width ?? 0;
    return Math.max(top - y, y - (top + width), 0);
  };
  return places.reduce<BoardPlace | null>(
    (best, place) => (best === null || distance(place) < distance(best) ? place : best),
    null,
  );
}

function mm(value: Um | number): number {
  return value / 1000;
}

function usable(px: number, taken: number): number {
  return Math.max(40, px - taken);
}
