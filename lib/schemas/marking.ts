/** Marks on a photograph, as sent by the marking screen. Geometry is judged by the core, not here. */
import { z } from "zod";
import type { Marking } from "@/lib/layout";
import { pointSchema, sizeUmSchema } from "./length";

/** Pixels of the upright, full-size photograph; marks may lie a little outside it. */
const photoPointSchema = z.object({ x: z.number().min(-5000).max(25_000), y: z.number().min(-5000).max(25_000) });
const fourCornersSchema = z.tuple([photoPointSchema, photoPointSchema, photoPointSchema, photoPointSchema]);

export const markingSchema = z.object({
  reference: z.discriminatedUnion("kind", [
    z.object({ kind: z.literal("board"), length: sizeUmSchema, width: sizeUmSchema }),
    z.object({ kind: z.literal("sheet"), length: sizeUmSchema, width: sizeUmSchema, corners: fourCornersSchema }),
  ]),
  corners: fourCornersSchema,
  extraPoints: z.array(z.object({ photo: photoPointSchema, at: pointSchema })).max(40),
  edgePoints: z.array(z.object({ photo: photoPointSchema, edge: z.enum(["top", "right", "bottom", "left"]) })).max(80),
});

/** Fails to compile when the wire and the core drift apart. */
export const markingForCore = (marking: z.output<typeof markingSchema>): Marking => marking;
