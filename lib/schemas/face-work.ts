/** What is done to the pieces of a face once they are cut, by pattern, as a cut order freezes it. A plain grid of fronts needs nothing of the kind. */
import { z } from "zod";
import { sizeUmSchema, umSchema } from "./length";

const sizeSchema = z.object({ width: sizeUmSchema, height: sizeUmSchema });

/** How far a part is glued from the place it was cut from: positive along is towards the right or the bottom end, positive across the other way on. */
const shiftSchema = z.object({ along: umSchema, across: umSchema });

export const setBackSchema = z.object({
  pattern: z.literal("cutOut"),
  grain: z.enum(["horizontal", "vertical"]),
  /** Finished outside size of the glued-up rail. */
  outside: sizeSchema,
  rails: z.enum(["jointed", "fromSaw"]),
  /** Labels, in order across the grain. */
  strips: z.array(z.object({ label: z.string(), shift: shiftSchema.nullable() })),
  rows: z.array(
    z.object({
      fixed: z.array(z.object({ label: z.string(), shift: shiftSchema.nullable() })),
      fronts: z.array(z.object({ label: z.string(), opening: sizeSchema, finished: sizeSchema })),
    }),
  ),
});
export type SetBack = z.output<typeof setBackSchema>;

export const runWorkSchema = z.object({
  pattern: z.literal("wrap"),
  thickness: umSchema,
  corners: z.array(
    z.object({
      before: z.string(),
      after: z.string(),
      kind: z.enum(["gap", "butt", "mitre"]),
      /** Both ends, from square; 0 where they are. */
      bevelDeg: z.number(),
      /** null at the corner that closes a run. */
      way: z.enum(["square", "squareThenBevels", "oneBevel"]).nullable(),
      gap: umSchema,
    }),
  ),
  sides: z.array(z.object({ label: z.string(), show: sizeUmSchema, inner: umSchema })),
});
export type RunWork = z.output<typeof runWorkSchema>;

export const resawWorkSchema = z.object({
  pattern: z.literal("resawn"),
  labels: z.array(z.string()).length(2),
  opens: z.enum(["side", "over"]),
  roughThickness: umSchema,
  leafThickness: umSchema,
  kerf: umSchema,
  planing: umSchema,
});
export type ResawWork = z.output<typeof resawWorkSchema>;

export const faceWorkSchema = z.discriminatedUnion("pattern", [setBackSchema, runWorkSchema, resawWorkSchema]);
export type FaceWork = z.output<typeof faceWorkSchema>;
