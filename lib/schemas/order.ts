/** Cut orders: issue, read, print, tick. */
import { z } from "zod";
import { asCutSchema } from "./as-cut";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { orderSnapshotSchema } from "./order-snapshot";

export const orderRowSchema = z.object({
  id: idSchema,
  number: z.int(),
  /** 1 prints as A. */
  revision: z.int(),
  state: z.enum(["issued", "cut"]),
  superseded: z.boolean(),
  jobId: idSchema,
  jobTitle: z.string(),
  faceTitles: z.array(z.string()),
  boards: z.array(z.string()),
  steps: z.int(),
  ticked: z.int(),
  issuedAt: z.iso.datetime(),
  issuedBy: z.string(),
});
export type OrderRow = z.output<typeof orderRowSchema>;

export const tickSchema = z.object({ stepId: z.string(), by: z.string(), at: z.iso.datetime() });

export const orderSchema = orderRowSchema.extend({
  revisionId: idSchema,
  fingerprint: z.string(),
  snapshot: orderSnapshotSchema,
  ticks: z.array(tickSchema),
  /** What the bench entered of this revision, oldest first. */
  asCut: z.array(asCutSchema),
  revisions: z.array(
    z.object({
      id: idSchema,
      revision: z.int(),
      issuedAt: z.iso.datetime(),
      issuedBy: z.string(),
      supersededAt: z.iso.datetime().nullable(),
    }),
  ),
});
export type Order = z.output<typeof orderSchema>;

const params = z.object({ orderId: idSchema });
const revisionQuery = z.object({ revision: z.coerce.number().int().min(1).optional() });

export const listOrders = defineEndpoint({
  method: "GET",
  path: "/api/orders",
  summary: "Cut orders with their progress, newest first",
  tag: "orders",
  access: everyone,
  query: z.object({
    state: z.enum(["issued", "cut", "all"]).default("all"),
    page: z.coerce.number().int().min(1).max(10_000).default(1),
    pageSize: z.coerce.number().int().min(1).max(100).default(25),
  }),
  response: z.object({ items: z.array(orderRowSchema), total: z.int(), page: z.int(), pageSize: z.int() }),
});

export const issueOrder = defineEndpoint({
  method: "POST",
  path: "/api/faces/{faceId}/order",
  summary: "Issue the face's layout as a cut order, or as a new revision of the order it has",
  tag: "orders",
  access: makers,
  params: z.object({ faceId: idSchema }),
  body: z.object({ layoutRevision: z.int().min(1) }),
  response: orderRowSchema,
});

export const getOrder = defineEndpoint({
  method: "GET",
  path: "/api/orders/{orderId}",
  summary: "One order with the snapshot and ticks of a revision, the newest by default",
  tag: "orders",
  access: everyone,
  params,
  query: revisionQuery,
  response: orderSchema,
});

/** What changes while an order is worked off; small, because benches ask for it every few seconds. */
export const orderProgressSchema = z.object({
  ticks: z.array(tickSchema),
  asCut: z.array(asCutSchema),
  /** Of the revision asked about. */
  superseded: z.boolean(),
  newestRevision: z.int(),
});
export type OrderProgress = z.output<typeof orderProgressSchema>;

export const getOrderProgress = defineEndpoint({
  method: "GET",
  path: "/api/orders/{orderId}/revisions/{revisionId}/progress",
  summary: "The ticks of a revision, and whether it still holds",
  tag: "orders",
  access: everyone,
  params: z.object({ orderId: idSchema, revisionId: idSchema }),
  response: orderProgressSchema,
});

export const tickStep = defineEndpoint({
  method: "PUT",
  path: "/api/orders/{orderId}/revisions/{revisionId}/steps/{stepId}/tick",
  summary: "Tick a step; ticking twice is once. Refused on a superseded revision",
  tag: "orders",
  access: everyone,
  params: z.object({ orderId: idSchema, revisionId: idSchema, stepId: z.string().max(40) }),
  response: z.object({ ticks: z.array(tickSchema) }),
});

export const untickStep = defineEndpoint({
  method: "DELETE",
  path: "/api/orders/{orderId}/revisions/{revisionId}/steps/{stepId}/tick",
  summary: "Take a tick back",
  tag: "orders",
  access: everyone,
  params: z.object({ orderId: idSchema, revisionId: idSchema, stepId: z.string().max(40) }),
  response: z.object({ ticks: z.array(tickSchema) }),
});

export const getOrderPdf = defineEndpoint({
  method: "GET",
  path: "/api/orders/{orderId}/pdf",
  summary: "The cut order for printing",
  tag: "orders",
  access: everyone,
  params,
  query: revisionQuery.extend({ paper: z.enum(["a4", "letter"]).optional() }),
  responseKind: "application/pdf",
});

export const getOrderLabels = defineEndpoint({
  method: "GET",
  path: "/api/orders/{orderId}/labels",
  summary: "Labels of the pieces, strips and offcuts on a sheet, from a chosen first position",
  tag: "orders",
  access: everyone,
  params,
  query: revisionQuery.extend({
    sheet: z.enum(["a4-24", "letter-30"]).optional(),
    start: z.coerce.number().int().min(1).max(30).default(1),
  }),
  responseKind: "application/pdf",
});
