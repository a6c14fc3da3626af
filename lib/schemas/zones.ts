/** Usable outline, keep-clear areas and glue lines of one straightened picture, in its stock frame. */
import { z } from "zod";
import type { KeepClear } from "@/lib/layout";
import { idSchema } from "./ids";
import { pointSchema, sizeUmSchema, umSchema } from "./length";

export const keepClearKinds = ["knot", "check", "sapwood", "stain", "other"] as const;

/** At most 200 corners: a traced edge needs some dozens, and the editor tests every one while dragging. */
const polygonSchema = z.array(pointSchema).min(3).max(200);

export const outlineSchema = polygonSchema;

export const keepClearShapeSchema = z.discriminatedUnion("shape", [
  z.object({
    shape: z.literal("ellipse"),
    centre: pointSchema,
    radiusX: sizeUmSchema,
    radiusY: sizeUmSchema,
    turnDeg: z.number().min(-180).max(180),
  }),
  z.object({ shape: z.literal("polygon"), points: polygonSchema }),
]);

export const keepClearSchema = z.object({
  id: idSchema,
  kind: z.enum(keepClearKinds),
  area: keepClearShapeSchema,
  note: z.string().max(200),
});

/** Where two boards are glued edge to edge: a line along the grain. */
export const glueLineSchema = z.object({
  id: idSchema,
  /** Across the grain, from the upper edge of the picture. */
  across: umSchema,
  /** Which boards meet there; null where nobody knows any more. */
  aboveBoardId: idSchema.nullable(),
  belowBoardId: idSchema.nullable(),
});
export type GlueLine = z.output<typeof glueLineSchema>;

/** More boards than anybody glues up at once. */
export const mostGlueLines = 40;

export const zonesSchema = z.object({
  outline: outlineSchema.nullable(),
  keepClear: z.array(keepClearSchema).max(200),
  /** From the upper edge down; empty for a board in one piece. */
  glueLines: z.array(glueLineSchema).max(mostGlueLines),
  revision: z.int().min(0),
});

/** What the editor of zones sends: the whole set, with the revision it started from. Without glue lines, those there are stay. */
export const zonesSaveSchema = zonesSchema.partial({ glueLines: true });

export type Zones = z.output<typeof zonesSchema>;
export type KeepClearArea = z.output<typeof keepClearSchema>;

/** Fails to compile when the wire and the core drift apart. */
export const keepClearForCore = (area: KeepClearArea): KeepClear => area;
