/** Jobs: opening, changing, listing. */
import "server-only";
import type { z } from "zod";
import type { Connection } from "@/db/client";
import { recordHistory } from "@/db/queries/history";
import { findJob, insertJob, listFaces, listJobs, updateJob } from "@/db/queries/job";
import { listLayoutsOfFaces, listNewestOrders } from "@/db/queries/layout";
import { takeNumber } from "@/db/queries/shop";
import type { ShopId } from "@/db/shop-id";
import { pieceCount } from "@/lib/layout";
import type { QueryOf } from "@/lib/schemas/endpoint";
import type {
  createJobSchema,
  FaceRow,
  Job,
  JobRow,
  listJobs as listEndpoint,
  updateJob as updateEndpoint,
} from "@/lib/schemas/job";
import { printTag } from "@/lib/schemas/tag";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound } from "../faults";

type JobRecord = NonNullable<Awaited<ReturnType<typeof findJob>>>;

const jobRowOf = (row: JobRecord, faces: number): JobRow => ({
  id: row.id,
  number: row.number,
  title: row.title,
  client: row.client,
  note: row.note,
  dueOn: row.dueOn,
  state: row.state,
  faces,
  revision: row.revision,
  updatedAt: row.updatedAt.toISOString(),
});

export async function readJobs(access: ShopAccess, query: QueryOf<typeof listEndpoint>) {
  const { rows, total } = await listJobs(database(), access.shopId, query);
  return { items: rows.map(({ job, faces }) => jobRowOf(job, faces)), total, page: query.page, pageSize: query.pageSize };
}

export async function readJob(access: ShopAccess, jobId: string): Promise<Job> {
  const db = database();
  const row = await findJob(db, access.shopId, jobId);
  if (!row) throw notFound("job");
  const faceList = await faceRows(db, access.shopId, jobId);
  return { ...jobRowOf(row, faceList.length), climate: row.climate, faceList };
}

/** The faces of a job in their order, each with what its layout lies on and the order issued for it. */
export async function faceRows(db: Connection, shopId: ShopId, jobId: string): Promise<FaceRow[]> {
  const faces = await listFaces(db, shopId, jobId);
  const ids = faces.map(({ id }) => id);
  const layouts = await listLayoutsOfFaces(db, shopId, ids);
  const orders = await listNewestOrders(db, shopId, ids);
  return faces.map(({ id, title, position }) => {
    const rows = layouts.filter(({ faceId }) => faceId === id);
    const [first] = rows;
    if (!first) throw new Error(`face ${id} has no layout`);
    return {
      id,
      title,
      position,
      layoutRevision: first.revision,
      pieces: pieceCount(first.document.face),
      face: first.document.face,
      boards: rows.flatMap(({ tagNumber }) => (tagNumber === null ? [] : [printTag(tagNumber)])),
      order: orders.get(id) ?? null,
    };
  });
}

export async function openJob(access: ShopAccess, fields: z.output<typeof createJobSchema>): Promise<Job> {
  const at = new Date();
  const jobId = await database().transaction(async (tx) => {
    const number = await takeNumber(tx, access.shopId, "nextJobNumber");
    const id = await insertJob(tx, access.shopId, number, fields, at);
    const detail = { number, title: fields.title };
    await recordHistory(tx, access.shopId, { userId: access.userId, noun: "job", nounId: id, verb: "opened", detail }, at);
    return id;
  });
  return readJob(access, jobId);
}

export async function changeJob(access: ShopAccess, jobId: string, body: z.output<typeof updateEndpoint.body>): Promise<Job> {
  const { baseRevision, ...fields } = body;
  const at = new Date();
  await database().transaction(async (tx) => {
    if (!(await findJob(tx, access.shopId, jobId))) throw notFound("job");
    if (!(await updateJob(tx, access.shopId, jobId, baseRevision, fields, at))) {
      throw conflict("Somebody else changed this job meanwhile. Load it again and repeat your change.");
    }
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "job", nounId: jobId, verb: "changed", detail: fields },
      at,
    );
  });
  return readJob(access, jobId);
}
