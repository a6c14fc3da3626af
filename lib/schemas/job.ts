/** Jobs and their faces. */
import { z } from "zod";
import { climateSchema } from "./climate";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { cutLossSchema, faceSchema } from "./layout";

const jobFields = {
  title: z.string().trim().min(1, "Give the job a title").max(120),
  client: z.string().trim().max(120),
  note: z.string().trim().max(4000),
  dueOn: z.iso.date().nullable(),
};

export const faceRowSchema = z.object({
  id: idSchema,
  title: z.string(),
  position: z.int(),
  layoutRevision: z.int(),
  pieces: z.int(),
  /** Face as it will stand, for a small drawing. */
  face: faceSchema,
  boards: z.array(z.string()),
  order: z.object({ id: idSchema, number: z.int(), revision: z.int(), superseded: z.boolean() }).nullable(),
});
export type FaceRow = z.output<typeof faceRowSchema>;

export const jobRowSchema = z.object({
  id: idSchema,
  number: z.int(),
  ...jobFields,
  state: z.enum(["open", "closed"]),
  faces: z.int(),
  revision: z.int(),
  updatedAt: z.iso.datetime(),
});
export type JobRow = z.output<typeof jobRowSchema>;

export const jobSchema = jobRowSchema.extend({
  /** Where this furniture will live; null: where the shop's usually does. */
  climate: climateSchema.nullable(),
  faceList: z.array(faceRowSchema),
});
export type Job = z.output<typeof jobSchema>;

const params = z.object({ jobId: idSchema });

export const listJobs = defineEndpoint({
  method: "GET",
  path: "/api/jobs",
  summary: "Jobs, the one touched last first",
  tag: "jobs",
  access: everyone,
  query: z.object({
    state: z.enum(["open", "closed"]).default("open"),
    search: z.string().trim().max(80).default(""),
    page: z.coerce.number().int().min(1).max(10_000).default(1),
    pageSize: z.coerce.number().int().min(1).max(100).default(25),
  }),
  response: z.object({ items: z.array(jobRowSchema), total: z.int(), page: z.int(), pageSize: z.int() }),
});

export const createJobSchema = z.object(jobFields);
export const createJob = defineEndpoint({
  method: "POST",
  path: "/api/jobs",
  summary: "Open a job; its number is given by the shop's counter",
  tag: "jobs",
  access: makers,
  body: createJobSchema,
  response: jobSchema,
});

export const getJob = defineEndpoint({
  method: "GET",
  path: "/api/jobs/{jobId}",
  summary: "One job with its faces",
  tag: "jobs",
  access: everyone,
  params,
  response: jobSchema,
});

export const updateJob = defineEndpoint({
  method: "PATCH",
  path: "/api/jobs/{jobId}",
  summary: "Change a job from a base revision",
  tag: "jobs",
  access: makers,
  params,
  body: z.object({
    baseRevision: z.int(),
    ...z.object({ ...jobFields, state: z.enum(["open", "closed"]), climate: climateSchema.nullable() }).partial().shape,
  }),
  response: jobSchema,
});

/** What a new face is made from; the core turns it into a layout with one set, not yet on wood. */
export const createFaceSchema = z.object({
  title: z.string().trim().min(1, "Give the face a title").max(120),
  face: faceSchema,
  crosscut: cutLossSchema,
  rip: cutLossSchema,
  crosscutSawId: idSchema.nullable(),
  ripSawId: idSchema.nullable(),
  spacing: z.enum(["followGap", "tight"]),
});
export const createFace = defineEndpoint({
  method: "POST",
  path: "/api/jobs/{jobId}/faces",
  summary: "Add a face: a row, stack or grid of fronts, with its first layout",
  tag: "jobs",
  access: makers,
  params,
  body: createFaceSchema,
  response: faceRowSchema,
});

export const renameFace = defineEndpoint({
  method: "PATCH",
  path: "/api/faces/{faceId}",
  summary: "Rename a face",
  tag: "jobs",
  access: makers,
  params: z.object({ faceId: idSchema }),
  body: z.object({ title: z.string().trim().min(1).max(120) }),
  response: faceRowSchema,
});

export const deleteFace = defineEndpoint({
  method: "DELETE",
  path: "/api/faces/{faceId}",
  summary: "Remove a face that no cut order was issued for",
  tag: "jobs",
  access: makers,
  params: z.object({ faceId: idSchema }),
  response: null,
});
