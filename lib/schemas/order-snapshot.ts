/**
 * What a cut order freezes when it is issued: everything the paper and the bench show, so that nothing printed later can differ
 * from what was issued. Old snapshots must stay readable: a change of shape adds a `format`.
 */
import { z } from "zod";
import { cuts } from "./board";
import { cutProgramSchema, edgeStateSchema } from "./cut-program";
import { faceWorkSchema } from "./face-work";
import { gluingSchema } from "./gluing";
import { idSchema } from "./ids";
import { faceLayoutSchema } from "./layout";
import { rectSchema, sizeUmSchema, umSchema } from "./length";
import { boardAsCutSchema, snapshotRestSchema } from "./rest-snapshot";
import { boardSides } from "./straightening";
import { keepClearSchema, outlineSchema } from "./zones";

const boardEdge = edgeStateSchema.exclude(["sawn"]);

const snapshotSawSchema = z.object({ name: z.string(), kerf: umSchema, cleanUp: umSchema });

export const snapshotBoardSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  species: z.string(),
  cut: z.enum(cuts),
  place: z.string(),
  thickness: sizeUmSchema,
  length: sizeUmSchema,
  width: sizeUmSchema,
  straighteningId: idSchema,
  /** Which of its faces the picture shows and lies up; absent: the face. */
  side: z.enum(boardSides).optional(),
  /** Distances across from the upper edge; absent: a board in one piece. */
  glueLines: z.array(umSchema).optional(),
  /** Of a blank that was not glued up yet when the order was issued. */
  gluing: gluingSchema.optional(),
  outline: outlineSchema.nullable(),
  keepClear: z.array(keepClearSchema),
  pieces: z.array(z.object({ pieceId: z.string(), label: z.string(), rect: rectSchema, turns: z.int().min(0).max(3) })),
  program: cutProgramSchema,
  /** The board's own edges before any work; absent in orders issued before it was kept. */
  edges: z.object({ left: boardEdge, right: boardEdge, top: boardEdge, bottom: boardEdge }).optional(),
  /** What was cut of it before this revision; absent: nothing. */
  asCut: boardAsCutSchema.optional(),
});
export type SnapshotBoard = z.output<typeof snapshotBoardSchema>;

export const orderSnapshotSchema = z.object({
  format: z.literal(1),
  shop: z.object({ name: z.string() }),
  units: z.enum(["mm", "inch"]),
  inchFraction: z.union([z.literal(32), z.literal(64)]),
  job: z.object({ id: idSchema, number: z.int(), title: z.string(), client: z.string() }),
  faces: z
    .array(
      z.object({
        faceId: idSchema,
        title: z.string(),
        layoutRevision: z.int(),
        layout: faceLayoutSchema,
        work: faceWorkSchema.nullable().optional(),
      }),
    )
    .min(1),
  crosscutSaw: snapshotSawSchema,
  ripSaw: snapshotSawSchema,
  boards: z.array(snapshotBoardSchema).min(1),
  /** Of a revision issued after the bench had begun. */
  rest: snapshotRestSchema.optional(),
});
export type OrderSnapshot = z.output<typeof orderSnapshotSchema>;

/** What lists of orders show of a revision, kept beside the snapshot so that a list need not read the whole of each. */
export const orderSummarySchema = z.object({ faceTitles: z.array(z.string()), boards: z.array(z.string()), steps: z.int() });
export type OrderSummary = z.output<typeof orderSummarySchema>;
