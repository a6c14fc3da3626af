/** Photographs taken in. */
import { z } from "zod";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";

/** One stored size of a picture. Level 0 is the largest; each next one half of it. */
export const pictureLevelSchema = z.object({
  level: z.int().min(0),
  widthPx: z.int().min(1),
  heightPx: z.int().min(1),
  key: z.string().max(200),
});
/** As stored, with storage keys; never sent out as it stands. */
export const pictureLevelsSchema = z.array(pictureLevelSchema).max(12);

/** A size of a picture as the browser sees it. */
export const servedLevelSchema = z.object({ widthPx: z.int().min(1), heightPx: z.int().min(1), url: z.string() });
export type ServedLevel = z.output<typeof servedLevelSchema>;

export const photoSchema = z.object({
  id: idSchema,
  fileName: z.string(),
  kind: z.enum(["jpeg", "png", "webp", "avif", "heic"]),
  bytes: z.int(),
  widthPx: z.int(),
  heightPx: z.int(),
  takenAt: z.iso.datetime().nullable(),
  camera: z.string().nullable(),
  focalLengthMm: z.number().nullable(),
  levels: z.array(servedLevelSchema),
  createdAt: z.iso.datetime(),
});
export type Photo = z.output<typeof photoSchema>;

export const uploadPhoto = defineEndpoint({
  method: "POST",
  path: "/api/photos",
  summary: "Take in a photograph; sent again with the same upload key it answers with the first one",
  tag: "photos",
  access: everyone,
  query: z.object({ uploadKey: z.string().regex(/^[\w-]{8,64}$/), fileName: z.string().min(1).max(255) }),
  bodyKind: "bytes",
  response: photoSchema,
});

export const getPhoto = defineEndpoint({
  method: "GET",
  path: "/api/photos/{photoId}",
  summary: "One photograph",
  tag: "photos",
  access: everyone,
  params: z.object({ photoId: idSchema }),
  response: photoSchema,
});

export const listLoosePhotos = defineEndpoint({
  method: "GET",
  path: "/api/photos",
  summary: "Photographs taken in and not yet used for a board, newest first",
  tag: "photos",
  access: everyone,
  query: z.object({ limit: z.coerce.number().int().min(1).max(100).default(50) }),
  response: z.object({ items: z.array(photoSchema) }),
});

export const deletePhoto = defineEndpoint({
  method: "DELETE",
  path: "/api/photos/{photoId}",
  summary: "Remove a photograph that no board uses, with its files",
  tag: "photos",
  access: makers,
  params: z.object({ photoId: idSchema }),
  response: null,
});

export const getPhotoLevel = defineEndpoint({
  method: "GET",
  path: "/api/photos/{photoId}/levels/{level}",
  summary: "The upright picture at one size",
  tag: "photos",
  access: everyone,
  params: z.object({ photoId: idSchema, level: z.coerce.number().int().min(0).max(11) }),
  responseKind: "image/jpeg",
});
