/** The layout of a face with the boards on its table. */
import "server-only";
import type { z } from "zod";
import type { Connection } from "@/db/client";
import { listInBlanks } from "@/db/queries/blank";
import { findLayout, listLayoutBoards, listNewestOrders } from "@/db/queries/layout";
import type { StraighteningRow } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import type { Layout, layoutBoardSchema } from "@/lib/schemas/layout";
import type { BoardSide } from "@/lib/schemas/straightening";
import { printTag } from "@/lib/schemas/tag";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound } from "../faults";
import { straighteningOf } from "../straightenings/straightening-of";
import { holdersOf, spokenForOn } from "./spoken-for";
import { takersOf } from "./taken-by";

export type LayoutBoard = z.output<typeof layoutBoardSchema>;

export async function readLayout(access: ShopAccess, faceId: string): Promise<Layout> {
  const db = database();
  const found = await findLayout(db, access.shopId, faceId);
  if (!found) throw notFound("face");
  const { layout } = found;
  return {
    id: layout.id,
    faceId,
    faceTitle: found.faceTitle,
    jobId: found.jobId,
    jobTitle: found.jobTitle,
    document: layout.document,
    crosscutSawId: layout.crosscutSawId,
    ripSawId: layout.ripSawId,
    revision: layout.revision,
    boards: await layoutBoards(db, access.shopId, layout.id),
    updatedAt: layout.updatedAt.toISOString(),
    updatedBy: found.updatedByName,
    order: (await listNewestOrders(db, access.shopId, [faceId])).get(faceId) ?? null,
  };
}

/** Every board on the table, with the version of its picture used, who else counts on it and whose it is. */
export async function layoutBoards(db: Connection, shopId: ShopId, layoutId: string): Promise<LayoutBoard[]> {
  const rows = await listLayoutBoards(db, shopId, layoutId);
  const ids = rows.map(({ board }) => board.id);
  const holders = await holdersOf(db, shopId, ids, layoutId);
  const inBlanks = await listInBlanks(db, shopId, ids);
  const takers = await takersOf(db, shopId, layoutId);
  return Promise.all(
    rows.map(async ({ board, straightening, faceStraighteningId, backStraighteningId }) => ({
      boardId: board.id,
      tag: printTag(board.tagNumber),
      species: board.species,
      place: board.place,
      thickness: board.thickness,
      straightening: await straighteningOf(db, shopId, straightening),
      ...otherPictures(straightening, { face: faceStraighteningId, back: backStraighteningId }),
      heldBy: holders
        .filter(({ boardId }) => boardId === board.id)
        .map(({ faceId, faceTitle, jobTitle, issued, straighteningId }) => ({
          faceId,
          faceTitle,
          jobTitle,
          issued,
          samePicture: straighteningId === straightening.id,
        })),
      spokenFor: spokenForOn(holders, board.id, straightening.id),
      inBlank: inBlankOf(inBlanks, board.id),
      takenBy: takers.get(board.id) ?? null,
    })),
  );
}

/** A newer picture of the side that the layout lies on, and the present one of the other side. */
function otherPictures({ id, side }: StraighteningRow, present: Readonly<Record<BoardSide, string | null>>) {
  const newest = present[side];
  return {
    newerStraighteningId: newest === id ? null : newest,
    otherSideStraighteningId: present[side === "face" ? "back" : "face"],
  };
}

function inBlankOf(inBlanks: Awaited<ReturnType<typeof listInBlanks>>, boardId: string): LayoutBoard["inBlank"] {
  const found = inBlanks.find((one) => one.boardId === boardId);
  return found ? { boardId: found.blankId, tag: printTag(found.blankTagNumber) } : null;
}
