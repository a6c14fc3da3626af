/** What the bench enters while it cuts: a true kerf, a true size, a spoiled front. */
import { z } from "zod";
import { um } from "@/lib/layout";
import { edgeSchema } from "./cut-program";
import { defineEndpoint, everyone } from "./endpoint";
import { idSchema } from "./ids";
import { sizeUmSchema, umSchema } from "./length";

const stepIdSchema = z.string().min(1).max(40);
const partIdSchema = z.string().min(1).max(40);

/** Thinner than 0.1 mm is no blade, wider than 20 mm no saw's. */
const kerfSchema = z.int().min(100).max(20_000).transform(um).meta({ description: "micrometres, 0.1 to 20 mm" });

/** How many cuts of the same saw a kerf holds for: all of the revision, from this one on, this one only. */
export const kerfReaches = ["all", "on", "only"] as const;

export const asCutEntrySchema = z.discriminatedUnion("kind", [
  z.object({
    kind: z.literal("kerf"),
    /** A cut, or a test cut, which tells it of all. */
    stepId: stepIdSchema,
    kerf: kerfSchema,
    reach: z.enum(kerfReaches),
  }),
  z.object({
    kind: z.literal("size"),
    boardId: idSchema,
    /** As the program calls it. */
    partId: partIdSchema,
    edge: edgeSchema,
    /** Longer than planned at this edge; negative: shorter. */
    by: umSchema,
  }),
  z.object({
    kind: z.literal("spoiled"),
    boardId: idSchema,
    pieceId: z.string().min(1).max(12),
    /** So much from one of its edges is still good; null: none of it. */
    usable: z.object({ from: edgeSchema, length: sizeUmSchema }).nullable(),
  }),
]);
export type AsCutEntry = z.output<typeof asCutEntrySchema>;

/** What an entry is about: of one thing there is one entry, which is corrected and not contradicted. At most 120 characters. */
export function asCutSubject(entry: AsCutEntry): string {
  switch (entry.kind) {
    case "kerf":
      return `kerf ${entry.stepId}`;
    case "size":
      return `size ${entry.boardId} ${entry.partId} ${entry.edge}`;
    case "spoiled":
      return `spoiled ${entry.boardId} ${entry.pieceId}`;
  }
}

export const asCutSchema = z.object({
  id: idSchema,
  entry: asCutEntrySchema,
  /** 1 when it was entered, one more with every correction. */
  version: z.int(),
  /** Who entered it or corrected it last. */
  by: z.string(),
  at: z.iso.datetime(),
});
export type AsCut = z.output<typeof asCutSchema>;

const params = z.object({ orderId: idSchema, revisionId: idSchema });
const entered = z.object({ asCut: z.array(asCutSchema) });

export const enterAsCut = defineEndpoint({
  method: "PUT",
  path: "/api/orders/{orderId}/revisions/{revisionId}/as-cut",
  summary: "Enter what was cut, or correct an entry from the version seen; refused on a superseded revision",
  tag: "orders",
  access: everyone,
  params,
  body: z.object({ entry: asCutEntrySchema, seenVersion: z.int().min(1).nullable() }),
  response: entered,
});

export const removeAsCut = defineEndpoint({
  method: "DELETE",
  path: "/api/orders/{orderId}/revisions/{revisionId}/as-cut/{asCutId}",
  summary: "Take an entry back, from the version seen",
  tag: "orders",
  access: everyone,
  params: params.extend({ asCutId: idSchema }),
  query: z.object({ seenVersion: z.coerce.number().int().min(1) }),
  response: entered,
});
