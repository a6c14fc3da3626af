/** What things are called now, by their ids: for lists that hold ids of many kinds. One query a kind, whatever the length of the list. */
import "server-only";
import { and, eq, inArray } from "drizzle-orm";
import { printTag } from "@/lib/schemas/tag";
import type { Connection } from "../client";
import { board, cutOrder, face, job, layout, photo, saw, species } from "../schema";
import type { ShopId } from "../shop-id";

export interface Label {
  readonly label: string;
  /** Where to see the thing. */
  readonly path: string;
}

type Read = (db: Connection, shopId: ShopId, ids: string[]) => Promise<[id: string, label: string, path: string][]>;

const readers: Readonly<Record<string, Read>> = {
  board: async (db, shopId, ids) =>
    (
      await db
        .select({ id: board.id, tagNumber: board.tagNumber })
        .from(board)
        .where(and(eq(board.shopId, shopId), inArray(board.id, ids)))
    ).map(({ id, tagNumber }) => [id, printTag(tagNumber), `/rack/${id}`]),
  job: async (db, shopId, ids) =>
    (
      await db
        .select({ id: job.id, title: job.title })
        .from(job)
        .where(and(eq(job.shopId, shopId), inArray(job.id, ids)))
    ).map(({ id, title }) => [id, title, `/jobs/${id}`]),
  face: async (db, shopId, ids) =>
    (
      await db
        .select({ id: face.id, title: face.title, jobId: face.jobId })
        .from(face)
        .where(and(eq(face.shopId, shopId), inArray(face.id, ids)))
    ).map(({ id, title, jobId }) => [id, title, `/jobs/${jobId}/faces/${id}`]),
  layout: async (db, shopId, ids) =>
    (
      await db
        .select({ id: layout.id, title: face.title, jobId: face.jobId, faceId: face.id })
        .from(layout)
        .innerJoin(face, eq(face.id, layout.faceId))
        .where(and(eq(layout.shopId, shopId), inArray(layout.id, ids)))
    ).map(({ id, title, jobId, faceId }) => [id, title, `/jobs/${jobId}/faces/${faceId}`]),
  order: async (db, shopId, ids) =>
    (
      await db
        .select({ id: cutOrder.id, number: cutOrder.number })
        .from(cutOrder)
        .where(and(eq(cutOrder.shopId, shopId), inArray(cutOrder.id, ids)))
    ).map(({ id, number }) => [id, `Cut order ${number}`, `/orders/${id}`]),
  photo: async (db, shopId, ids) =>
    (
      await db
        .select({ id: photo.id, fileName: photo.fileName })
        .from(photo)
        .where(and(eq(photo.shopId, shopId), inArray(photo.id, ids)))
    ).map(({ id, fileName }) => [id, fileName, "/rack/take-in"]),
  saw: async (db, shopId, ids) =>
    (
      await db
        .select({ id: saw.id, name: saw.name })
        .from(saw)
        .where(and(eq(saw.shopId, shopId), inArray(saw.id, ids)))
    ).map(({ id, name }) => [id, name, "/shop"]),
  species: async (db, shopId, ids) =>
    (
      await db
        .select({ id: species.id, name: species.name })
        .from(species)
        .where(and(eq(species.shopId, shopId), inArray(species.id, ids)))
    ).map(({ id, name }) => [id, name, "/shop"]),
};

/** Labels by id. Things that are gone, or another shop's, have none. */
export async function labelsOf(
  db: Connection,
  shopId: ShopId,
  things: readonly { readonly noun: string; readonly nounId: string }[],
): Promise<Map<string, Label>> {
  const labels = new Map<string, Label>();
  for (const [noun, read] of Object.entries(readers)) {
    const ids = [...new Set(things.filter((thing) => thing.noun === noun).map(({ nounId }) => nounId))];
    if (ids.length === 0) continue;
    for (const [id, label, path] of await read(db, shopId, ids)) labels.set(id, { label, path });
  }
  return labels;
}
