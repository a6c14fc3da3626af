/** What a revision freezes of the bench's work before it: the wood in hand, what was entered, and what did not fit. */
import { z } from "zod";
import { type PartInHand, rescueKinds, type Trouble } from "@/lib/layout";
import { asCutSchema } from "./as-cut";
import { edgeSchema, edgeStateSchema, partSchema } from "./cut-program";
import { idSchema } from "./ids";
import { rectSchema, umSchema } from "./length";

const byEdge = <S extends z.ZodType>(schema: S) => z.object({ left: schema, right: schema, top: schema, bottom: schema });

/** A part as it lies on the bench. */
export const partInHandSchema = z.object({
  part: partSchema,
  edges: byEdge(edgeStateSchema),
  owes: byEdge(umSchema),
  flat: z.boolean(),
  spoiled: z.array(rectSchema),
});
export const partInHandForCore = (part: z.output<typeof partInHandSchema>): PartInHand => part;

export const pieceNameSchema = z.object({ pieceId: z.string(), label: z.string() });

const factSchema = z.discriminatedUnion("kind", [
  z.object({ kind: z.literal("short"), piece: pieceNameSchema, edge: edgeSchema, by: umSchema }),
  z.object({ kind: z.literal("too-close"), pieces: z.tuple([pieceNameSchema, pieceNameSchema]), by: umSchema }),
  z.object({ kind: z.literal("no-cut"), pieces: z.array(pieceNameSchema) }),
  z.object({ kind: z.literal("bad-wood"), piece: pieceNameSchema }),
  z.object({ kind: z.literal("spoiled"), piece: pieceNameSchema }),
  z.object({ kind: z.literal("no-wood"), piece: pieceNameSchema }),
]);

const missingSchema = z.object({ along: umSchema, across: umSchema });

const rescueSchema = z.object({
  kind: z.enum(rescueKinds),
  changes: z.array(
    pieceNameSchema.extend({
      by: z.object({ x: umSchema, y: umSchema }),
      cleanUp: z.array(z.object({ edge: edgeSchema, planned: umSchema, left: umSchema })),
      smaller: missingSchema,
      from: partSchema.nullable(),
    }),
  ),
  leftOut: z.array(pieceNameSchema),
});

/** Something that cannot be cut as issued, with every rescue that was worked out and checked. */
export const troubleSchema = z.object({
  key: z.string(),
  part: partSchema.nullable(),
  facts: z.array(factSchema),
  missing: missingSchema,
  rescues: z.array(rescueSchema),
  chosen: z.enum(rescueKinds),
});
export const troubleForCore = (trouble: z.output<typeof troubleSchema>): Trouble => trouble;

/** Of one board. */
export const boardAsCutSchema = z.object({
  /** Numbers of the steps of its program that were done. */
  done: z.array(z.int()),
  /** Everything that lay on the bench. */
  inHand: z.array(partInHandSchema),
  /** Clean-ups ticked before, by the number in their step's id. */
  cleanedUp: z.array(
    z.object({
      number: z.int(),
      labels: z.array(z.string()),
      length: umSchema,
      width: umSchema,
      takes: z.partialRecord(edgeSchema, umSchema),
    }),
  ),
});

/** Of the whole order. */
export const snapshotRestSchema = z.object({
  /** Number of the revision that the bench had begun. */
  revision: z.int(),
  /** Everything the rest was planned from, as a hash: the same asked twice is answered once. */
  basis: z.string(),
  /** Of every revision so far, oldest first; in words as they were true of the revision they were entered for. */
  entries: z.array(asCutSchema.extend({ words: z.string() })),
  /** What did not fit, with the rescue taken. */
  troubles: z.array(z.object({ boardId: idSchema, trouble: troubleSchema })),
});
