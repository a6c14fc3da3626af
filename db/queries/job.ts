/** Jobs and faces. */
import "server-only";
import { and, asc, count, desc, eq, like, max, or } from "drizzle-orm";
import { v7 as newId } from "uuid";
import type { Connection } from "../client";
import { face, job } from "../schema";
import type { ShopId } from "../shop-id";

export type JobFields = Pick<typeof job.$inferInsert, "title" | "client" | "note" | "dueOn">;

const escapeLike = (text: string) => text.replace(/[\\%_]/g, "\\$&");

export async function insertJob(db: Connection, shopId: ShopId, number: number, fields: JobFields, at: Date): Promise<string> {
  const id = newId();
  await db.insert(job).values({ ...fields, id, shopId, number, state: "open", revision: 1, createdAt: at, updatedAt: at });
  return id;
}

export async function findJob(db: Connection, shopId: ShopId, jobId: string) {
  const [row] = await db
    .select()
    .from(job)
    .where(and(eq(job.shopId, shopId), eq(job.id, jobId)));
  return row;
}

/** Saves from a base revision; false when somebody saved in between. */
export async function updateJob(
  db: Connection,
  shopId: ShopId,
  jobId: string,
  baseRevision: number,
  fields: Partial<JobFields & Pick<typeof job.$inferInsert, "state" | "climate">>,
  at: Date,
): Promise<boolean> {
  const [result] = await db
    .update(job)
    .set({ ...fields, revision: baseRevision + 1, updatedAt: at })
    .where(and(eq(job.shopId, shopId), eq(job.id, jobId), eq(job.revision, baseRevision)));
  return result.affectedRows === 1;
}

/** Work on a face brings its job to the top of the list. */
export async function touchJob(db: Connection, shopId: ShopId, jobId: string, at: Date) {
  await db
    .update(job)
    .set({ updatedAt: at })
    .where(and(eq(job.shopId, shopId), eq(job.id, jobId)));
}

export interface JobFilter {
  readonly state: "open" | "closed";
  readonly search: string;
  readonly page: number;
  readonly pageSize: number;
}

/** One page of jobs, the one touched last first, each with its number of faces, and how many there are in all. */
export async function listJobs(db: Connection, shopId: ShopId, filter: JobFilter) {
  const pattern = `%${escapeLike(filter.search)}%`;
  const matches = and(
    eq(job.shopId, shopId),
    eq(job.state, filter.state),
    filter.search === ""
      ? undefined
      : or(like(job.title, pattern), like(job.client, pattern), eq(job.number, Number(filter.search) || -1)),
  );
  const rows = await db
    .select({ job, faces: count(face.id) })
    .from(job)
    .leftJoin(face, eq(face.jobId, job.id))
    .where(matches)
    .groupBy(job.id)
    .orderBy(desc(job.updatedAt), desc(job.id))
    .limit(filter.pageSize)
    .offset((filter.page - 1) * filter.pageSize);
  const [total] = await db.select({ count: count() }).from(job).where(matches);
  return { rows, total: total?.count ?? 0 };
}

export async function insertFace(db: Connection, shopId: ShopId, jobId: string, title: string, at: Date): Promise<string> {
  const id = newId();
  const [last] = await db
    .select({ position: max(face.position) })
    .from(face)
    .where(and(eq(face.shopId, shopId), eq(face.jobId, jobId)));
  await db.insert(face).values({ id, shopId, jobId, title, position: (last?.position ?? 0) + 1, createdAt: at });
  return id;
}

export async function listFaces(db: Connection, shopId: ShopId, jobId: string) {
  return db
    .select()
    .from(face)
    .where(and(eq(face.shopId, shopId), eq(face.jobId, jobId)))
    .orderBy(asc(face.position));
}

export async function findFace(db: Connection, shopId: ShopId, faceId: string) {
  const [row] = await db
    .select({ face, jobTitle: job.title })
    .from(face)
    .innerJoin(job, eq(job.id, face.jobId))
    .where(and(eq(face.shopId, shopId), eq(face.id, faceId)));
  return row;
}

export async function renameFace(db: Connection, shopId: ShopId, faceId: string, title: string) {
  await db
    .update(face)
    .set({ title })
    .where(and(eq(face.shopId, shopId), eq(face.id, faceId)));
}

export async function deleteFace(db: Connection, shopId: ShopId, faceId: string) {
  await db.delete(face).where(and(eq(face.shopId, shopId), eq(face.id, faceId)));
}
