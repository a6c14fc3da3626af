/** Versions of a board's straightened picture. */
import { z } from "zod";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { umSchema } from "./length";
import { markingSchema } from "./marking";
import { servedLevelSchema } from "./photo";
import { zonesSaveSchema, zonesSchema } from "./zones";

/** Turned over about its long edge, the board shows its back: left stays left, the upper edge becomes the lower one. */
export const boardSides = ["face", "back"] as const;
export type BoardSide = (typeof boardSides)[number];

export const straighteningStates = ["waiting", "done", "failed", "cancelled"] as const;

export const straighteningSchema = z.object({
  id: idSchema,
  boardId: idSchema,
  /** null, and no marks: composed from the pictures of the boards that a blank is glued up from. */
  photoId: idSchema.nullable(),
  side: z.enum(boardSides),
  version: z.int(),
  marking: markingSchema.nullable(),
  state: z.enum(straighteningStates),
  failure: z.string().nullable(),
  /** The task that makes the picture, while state is "waiting". */
  taskId: idSchema.nullable(),
  length: umSchema,
  width: umSchema,
  pxPerMm: z.number(),
  residual: umSchema.nullable(),
  levels: z.array(servedLevelSchema),
  zones: zonesSchema,
  createdAt: z.iso.datetime(),
});
export type Straightening = z.output<typeof straighteningSchema>;

export const startStraightening = defineEndpoint({
  method: "POST",
  path: "/api/boards/{boardId}/straightenings",
  summary:
    "Mark a photograph of a board's face or back and have it straightened; makes a new version, earlier layouts keep theirs",
  tag: "straightenings",
  access: makers,
  params: z.object({ boardId: idSchema }),
  body: z.object({
    photoId: idSchema,
    marking: markingSchema,
    /** The face unless said otherwise. */
    side: z.enum(boardSides).optional(),
  }),
  response: straighteningSchema,
});

export const getStraightening = defineEndpoint({
  method: "GET",
  path: "/api/straightenings/{straighteningId}",
  summary: "One version with its zones",
  tag: "straightenings",
  access: everyone,
  params: z.object({ straighteningId: idSchema }),
  response: straighteningSchema,
});

export const listStraightenings = defineEndpoint({
  method: "GET",
  path: "/api/boards/{boardId}/straightenings",
  summary: "All versions of a board's pictures, of its face and its back, newest first",
  tag: "straightenings",
  access: everyone,
  params: z.object({ boardId: idSchema }),
  response: z.object({ items: z.array(straighteningSchema) }),
});

export const saveZones = defineEndpoint({
  method: "PUT",
  path: "/api/straightenings/{straighteningId}/zones",
  summary: "Save outline, keep-clear areas and glue lines as one; a conflict names the present revision",
  tag: "straightenings",
  access: makers,
  params: z.object({ straighteningId: idSchema }),
  body: zonesSaveSchema,
  response: zonesSchema,
});

export const getStraighteningLevel = defineEndpoint({
  method: "GET",
  path: "/api/straightenings/{straighteningId}/levels/{level}",
  summary: "The straightened picture at one size",
  tag: "straightenings",
  access: everyone,
  params: z.object({ straighteningId: idSchema, level: z.coerce.number().int().min(0).max(11) }),
  responseKind: "image/jpeg",
});
