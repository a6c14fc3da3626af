/** A board with a straightened picture, and a job with a face whose row of fronts lies on it: the state an order is issued from. */
import { v7 as newId } from "uuid";
import type { z } from "zod";
import { takeNumber } from "@/db/queries/shop";
import { board, boardPicture, face, job, layout, layoutBoard, photo, straightening } from "@/db/schema";
import {
  type FaceLayout,
  freshLayout,
  type GridFace,
  placeGroup,
  rowFace,
  SET_ID,
  type StockPoint,
  um,
  umFromMm,
} from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { pictureLevelsSchema } from "@/lib/schemas/photo";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";

export interface LayoutWanted {
  readonly face: GridFace;
  /** Nearest corner of the set in the board's frame; null: not laid on wood. */
  readonly at: StockPoint | null;
  readonly boardMm: { readonly length: number; readonly width: number };
  readonly kerfMm: number;
  readonly cleanUpMm: number;
  readonly levels: z.output<typeof pictureLevelsSchema>;
  readonly jobTitle: string;
  readonly species: string;
  readonly place: string;
  /** The board and picture of another layout to lie on; null: a board of its own. */
  readonly stock: { readonly boardId: string; readonly straighteningId: string } | null;
}

const fourFronts: LayoutWanted = {
  face: rowFace([umFromMm(243.2), umFromMm(243.2), umFromMm(243.2), umFromMm(243.2)], umFromMm(184), umFromMm(3), "horizontal"),
  at: { x: umFromMm(96), y: umFromMm(13) },
  boardMm: { length: 2350, width: 210 },
  kerfMm: 2.4,
  cleanUpMm: 0,
  levels: [],
  jobTitle: "Map chest for the reading room",
  species: "black walnut",
  place: "rack 2 left",
  stock: null,
};

export interface MadeLayout {
  readonly boardId: string;
  readonly straighteningId: string;
  readonly jobId: string;
  readonly faceId: string;
  readonly layoutId: string;
  readonly document: FaceLayout;
}

/** Layout revision 1. */
export async function makeLayout(access: ShopAccess, change: Partial<LayoutWanted> = {}): Promise<MadeLayout> {
  const wanted = { ...fourFronts, ...change };
  const { boardId, straighteningId } = wanted.stock ?? (await makeBoard(access, wanted));
  const stock = { boardId, straighteningId };
  const { jobId, faceId } = await makeFace(access, wanted);
  const document = placed(wanted, stock.boardId);
  const db = database();
  const layoutId = newId();
  await db.insert(layout).values({
    id: layoutId,
    shopId: access.shopId,
    faceId,
    document: faceLayoutSchema.parse(document),
    crosscutSawId: null,
    ripSawId: null,
    revision: 1,
    updatedBy: access.userId,
    updatedAt: new Date(),
  });
  await db.insert(layoutBoard).values({ layoutId, shopId: access.shopId, ...stock });
  return { ...stock, jobId, faceId, layoutId, document };
}

function placed({ face: grid, at, kerfMm, cleanUpMm }: LayoutWanted, boardId: string): FaceLayout {
  const cleanUp = umFromMm(cleanUpMm);
  const loss = { kerf: umFromMm(kerfMm), cleanUpBefore: cleanUp, cleanUpAfter: cleanUp };
  const fresh = freshLayout(grid, { crosscut: loss, rip: loss, spacing: "followGap" });
  if (at === null) return fresh;
  const change = placeGroup(fresh, SET_ID, boardId, at, grid.grain === "horizontal" ? 0 : 1);
  if (!change.ok) throw new Error(`the set cannot be placed: ${JSON.stringify(change)}`);
  return change.layout;
}

async function makeBoard(access: ShopAccess, { boardMm, levels, species, place }: LayoutWanted) {
  const db = database();
  const [boardId, photoId, straighteningId] = [newId(), newId(), newId()];
  const { shopId, userId } = access;
  const now = new Date();
  const size = { length: umFromMm(boardMm.length), width: umFromMm(boardMm.width) };
  const tagNumber = await db.transaction((tx) => takeNumber(tx, shopId, "nextBoardNumber"));
  await db.insert(board).values({
    id: boardId,
    shopId,
    tagNumber,
    state: "rack",
    species,
    cut: "flat",
    nominalQuarters: null,
    thickness: umFromMm(26),
    ...size,
    moistureTenths: null,
    place,
    source: "",
    costMinor: null,
    note: "",
    revision: 1,
    createdAt: now,
    updatedAt: now,
  });
  await db.insert(photo).values({
    id: photoId,
    shopId,
    uploadKey: photoId,
    fileName: "board.jpg",
    sha256: "0".repeat(64),
    kind: "jpeg",
    bytes: 1,
    widthPx: 1000,
    heightPx: 100,
    takenAt: null,
    camera: null,
    focalLengthHundredths: null,
    originalKey: `tests/${photoId}`,
    levels: [],
    uploadedBy: userId,
    createdAt: now,
  });
  const corner = { x: 0, y: 0 };
  await db.insert(straightening).values({
    id: straighteningId,
    shopId,
    boardId,
    photoId,
    version: 1,
    state: "done",
    failure: null,
    ...size,
    marking: {
      reference: { kind: "board", ...size },
      corners: [corner, corner, corner, corner],
      extraPoints: [],
      edgePoints: [],
    },
    pxPerMm: levels[0] ? levels[0].widthPx / boardMm.length : 4,
    levels,
    residual: um(0),
    outline: null,
    zonesRevision: 0,
    taskId: null,
    createdBy: userId,
    createdAt: now,
  });
  await db.insert(boardPicture).values({ boardId, straighteningId, shopId });
  return { boardId, straighteningId };
}

async function makeFace(access: ShopAccess, { jobTitle }: LayoutWanted) {
  const db = database();
  const { shopId } = access;
  const [jobId, faceId] = [newId(), newId()];
  const now = new Date();
  const number = await db.transaction((tx) => takeNumber(tx, shopId, "nextJobNumber"));
  await db.insert(job).values({
    id: jobId,
    shopId,
    number,
    title: jobTitle,
    client: "Reading room of Osterwick",
    note: "",
    dueOn: null,
    state: "open",
    revision: 1,
    createdAt: now,
    updatedAt: now,
  });
  await db.insert(face).values({ id: faceId, shopId, jobId, title: "Top row", position: 1, createdAt: now });
  return { jobId, faceId };
}
