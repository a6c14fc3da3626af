/** What is left of a cut order once the bench has begun, planned anew around what is cut; previewed and issued as the next revision. */
import { z } from "zod";
import { type RescueKind, rescueKinds } from "@/lib/layout";
import { partSchema } from "./cut-program";
import { defineEndpoint, makers } from "./endpoint";
import { idSchema } from "./ids";
import { rectSchema } from "./length";
import { orderRowSchema } from "./order";
import { pieceNameSchema, troubleSchema } from "./rest-snapshot";

/** By board, by the key of the trouble. */
export const rescueChoicesSchema = z.record(idSchema, z.record(z.string().max(60), z.enum(rescueKinds)));
export type RescueChoicesByBoard = Readonly<Record<string, Readonly<Record<string, RescueKind>>>>;

export const restBoardSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  /** Labels of the fronts that are cut. */
  cut: z.array(z.string()),
  /** Parts in hand from which something is still to be cut, and offcuts. */
  inHand: z.array(partSchema),
  /** Where every piece of this board lies now. */
  pieces: z.array(pieceNameSchema.extend({ rect: rectSchema })),
  /** Steps done, of which so many were not ticked, and steps to come. */
  done: z.int(),
  implied: z.int(),
  toCome: z.int(),
  /** False: the steps to come are those that were issued. */
  changed: z.boolean(),
  troubles: z.array(troubleSchema),
});
export type RestBoard = z.output<typeof restBoardSchema>;

export const restSchema = z.object({
  revision: z.int(),
  basis: z.string(),
  boards: z.array(restBoardSchema),
  /** Pieces of the layout that lie on no board. */
  unplaced: z.array(pieceNameSchema),
  /** Somebody changed the layout after the revision was issued: it counts as it is now. */
  layoutChanged: z.boolean(),
});
export type Rest = z.output<typeof restSchema>;

const params = z.object({ orderId: idSchema });

export const previewRest = defineEndpoint({
  method: "POST",
  path: "/api/orders/{orderId}/rest/preview",
  summary: "Work out the rest of an order around what is cut, with what was entered; changes nothing",
  tag: "orders",
  access: makers,
  params,
  body: z.object({ choices: rescueChoicesSchema.default({}) }),
  response: restSchema,
});

export const issueRest = defineEndpoint({
  method: "POST",
  path: "/api/orders/{orderId}/rest",
  summary:
    "Issue the rest as the order's next revision, as it was previewed; a conflict when anything was ticked, entered or moved since",
  tag: "orders",
  access: makers,
  params,
  body: z.object({ basis: z.string().length(64), choices: rescueChoicesSchema.default({}) }),
  response: orderRowSchema,
});
