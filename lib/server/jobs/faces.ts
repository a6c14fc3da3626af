/** Faces of a job: adding, renaming, removing. A face is born with its layout. */
import "server-only";
import type { z } from "zod";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { deleteFace, findFace, findJob, insertFace, renameFace, touchJob } from "@/db/queries/job";
import { deleteLayout, insertLayout, listNewestOrders, lockLayout } from "@/db/queries/layout";
import { deleteFaceMovement } from "@/db/queries/movement";
import { findSaw } from "@/db/queries/shop";
import { deleteSearches, listSearchesOfFace } from "@/db/queries/wood-search";
import { freshLayout } from "@/lib/layout";
import type { createFaceSchema, FaceRow } from "@/lib/schemas/job";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { faceRows } from "./jobs";

export async function addFace(access: ShopAccess, jobId: string, body: z.output<typeof createFaceSchema>): Promise<FaceRow> {
  const at = new Date();
  const document = faceLayoutSchema.parse(freshLayout(body.face, body));
  const faceId = await database().transaction(async (tx) => {
    if (!(await findJob(tx, access.shopId, jobId))) throw notFound("job");
    await requireSaws(tx, access, [body.crosscutSawId, body.ripSawId]);
    const id = await insertFace(tx, access.shopId, jobId, body.title, at);
    const fields = { document, crosscutSawId: body.crosscutSawId, ripSawId: body.ripSawId };
    await insertLayout(tx, access.shopId, id, fields, access.userId, at);
    await touchJob(tx, access.shopId, jobId, at);
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "face", nounId: id, verb: "added", detail: { title: body.title, jobId } },
      at,
    );
    return id;
  });
  return faceRow(access, faceId);
}

/** Saws named by a layout have to be the shop's own. */
export async function requireSaws(tx: Connection, access: ShopAccess, sawIds: readonly (string | null)[]): Promise<void> {
  for (const sawId of new Set(sawIds)) {
    if (sawId !== null && !(await findSaw(tx, access.shopId, sawId))) throw notFound("saw");
  }
}

export async function changeFaceTitle(access: ShopAccess, faceId: string, title: string): Promise<FaceRow> {
  const at = new Date();
  await database().transaction(async (tx) => {
    const found = await findFace(tx, access.shopId, faceId);
    if (!found) throw notFound("face");
    await renameFace(tx, access.shopId, faceId, title);
    const detail = { before: found.face.title, after: title };
    await recordHistory(tx, access.shopId, { userId: access.userId, noun: "face", nounId: faceId, verb: "renamed", detail }, at);
  });
  return faceRow(access, faceId);
}

export async function removeFace(access: ShopAccess, faceId: string): Promise<void> {
  const at = new Date();
  await database().transaction(async (tx) => {
    const found = await findFace(tx, access.shopId, faceId);
    if (!found) throw notFound("face");
    // The lock keeps anybody from issuing an order while the face goes.
    const layout = await lockLayout(tx, access.shopId, faceId);
    const order = (await listNewestOrders(tx, access.shopId, [faceId])).get(faceId);
    if (order) throw refused(`Cut order ${order.number} was issued for this face, so it stays with the job.`);
    if (layout) await deleteLayout(tx, access.shopId, layout.id);
    const searches = await listSearchesOfFace(tx, access.shopId, faceId);
    await deleteSearches(
      tx,
      access.shopId,
      searches.map(({ id }) => id),
    );
    await deleteFaceMovement(tx, access.shopId, faceId);
    await deleteFace(tx, access.shopId, faceId);
    const detail = { title: found.face.title, jobId: found.face.jobId };
    await recordHistory(tx, access.shopId, { userId: access.userId, noun: "face", nounId: faceId, verb: "removed", detail }, at);
  });
}

async function faceRow(access: ShopAccess, faceId: string): Promise<FaceRow> {
  const found = await findFace(database(), access.shopId, faceId);
  if (!found) throw notFound("face");
  const row = (await faceRows(database(), access.shopId, found.face.jobId)).find(({ id }) => id === faceId);
  if (!row) throw notFound("face");
  return row;
}
