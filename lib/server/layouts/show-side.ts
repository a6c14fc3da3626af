/**
 * The show side as a picture: every piece cut out of its board's straightened photograph and put where it will stand, true to scale.
 * The image library does its work on threads of its own.
 */
import "server-only";
import sharp from "sharp";
import { findLayout, listLayoutBoards } from "@/db/queries/layout";
import {
  type FaceLayout,
  facePieces,
  faceSize,
  groupOf,
  layOut,
  mmFromUm,
  type QuarterTurns,
  rectToStock,
  type StockRect,
  type Um,
  um,
} from "@/lib/layout";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { type BoxPx, type Pixels, pieceFromWood, woodPixels } from "./piece-picture";

/** Gaps and pieces not laid on wood yet. */
const ground = { r: 21, g: 23, b: 24 };
/** A picture longer than this opens in no viewer worth the name. */
const maxSidePx = 16_000;
const maxPixels = 60_000_000;

export async function showSidePng(access: ShopAccess, faceId: string, pxPerMm: number): Promise<Uint8Array> {
  const db = database();
  const found = await findLayout(db, access.shopId, faceId);
  if (!found) throw notFound("face");
  const { document } = found.layout;
  const boards = await listLayoutBoards(db, access.shopId, found.layout.id);

  const { width, height } = faceSize(document.face);
  const size = { width: Math.max(1, toPx(width, pxPerMm)), height: Math.max(1, toPx(height, pxPerMm)) };
  if (Math.max(size.width, size.height) > maxSidePx || size.width * size.height > maxPixels) {
    throw refused(
      `At ${pxPerMm} pixels a millimetre the picture would have ${size.width} × ${size.height} pixels. Ask for fewer.`,
    );
  }
  return inTurn(() => draw(size, piecesToDraw(document, pxPerMm), boards, pxPerMm));
}

let lastDrawn: Promise<unknown> = Promise.resolve();

/** One after another in this process: a picture of 180 MB and the pixels of a board, 120 MB at most, lie in memory while it is drawn. */
function inTurn<T>(work: () => Promise<T>): Promise<T> {
  const mine = lastDrawn.then(work, work);
  lastDrawn = mine;
  return mine;
}

interface ToDraw {
  readonly stockId: string;
  /** Of the board's frame. */
  readonly rect: StockRect;
  readonly turns: QuarterTurns;
  readonly box: BoxPx & { readonly left: number; readonly top: number };
}

function piecesToDraw(document: FaceLayout, pxPerMm: number): ToDraw[] {
  const rects = new Map(facePieces(document).map(({ id, rect }) => [id, rect]));
  return layOut(document).flatMap(({ id, stockId, stockFromFace }) => {
    const rect = rects.get(id);
    const placement = groupOf(document, id)?.placement;
    if (!rect || !placement) return [];
    // Both edges are rounded, not the size: neighbours keep their gap to the pixel.
    const [left, top] = [toPx(rect.x, pxPerMm), toPx(rect.y, pxPerMm)];
    const box = {
      left,
      top,
      width: Math.max(1, toPx(um(rect.x + rect.width), pxPerMm) - left),
      height: Math.max(1, toPx(um(rect.y + rect.height), pxPerMm) - top),
    };
    return [{ stockId, rect: rectToStock(stockFromFace, rect), turns: placement.turns, box }];
  });
}

/** One board at a time, so that no more than one is held decoded. */
async function draw(
  size: BoxPx,
  pieces: readonly ToDraw[],
  boards: Awaited<ReturnType<typeof listLayoutBoards>>,
  pxPerMm: number,
): Promise<Uint8Array> {
  const canvas: Pixels = {
    ...size,
    data: Buffer.alloc(size.width * size.height * 3, Buffer.from([ground.r, ground.g, ground.b])),
  };
  for (const stockId of new Set(pieces.map((piece) => piece.stockId))) {
    const straightening = boards.find(({ board }) => board.id === stockId)?.straightening;
    if (!straightening) throw new Error(`pieces lie on board ${stockId}, which is not on the table`);
    const wood = await woodPixels(straightening, pxPerMm);
    for (const { rect, turns, box } of pieces.filter((piece) => piece.stockId === stockId)) {
      putInto(canvas, await pieceFromWood(wood, rect, turns, box, ground), box);
    }
  }
  return sharp(canvas.data, { raw: { ...size, channels: 3 } })
    .png({ compressionLevel: 6 })
    .toBuffer();
}

/** Row by row. What rounding puts beyond the picture's edge is left out. */
function putInto({ data, width, height }: Pixels, piece: Buffer, box: ToDraw["box"]): void {
  const columns = Math.min(box.width, width - box.left);
  const rows = Math.min(box.height, height - box.top);
  for (let row = 0; row < rows; row++) {
    const from = row * box.width * 3;
    piece.copy(data, ((box.top + row) * width + box.left) * 3, from, from + columns * 3);
  }
}

const toPx = (length: Um, pxPerMm: number) => Math.round(mmFromUm(length) * pxPerMm);
