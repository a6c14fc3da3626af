/** The shop's settings and saws. */
import { z } from "zod";
import { defineEndpoint, makers, roles } from "./endpoint";
import { idSchema } from "./ids";
import { allowanceUmSchema, sizeUmSchema } from "./length";
import { sawKinds, sawLimitsSchema } from "./saw-limits";

const sawFields = {
  name: z.string().trim().min(1, "Name the saw").max(80),
  kind: z.enum(sawKinds),
  kerf: allowanceUmSchema,
  cleanUp: allowanceUmSchema,
};

export const sawSchema = z.object({ id: idSchema, ...sawFields, limits: sawLimitsSchema });
export type Saw = z.output<typeof sawSchema>;

const shopFields = {
  name: z.string().trim().min(1, "Name the shop").max(120),
  units: z.enum(["mm", "inch"]),
  inchFraction: z.union([z.literal(32), z.literal(64)]),
  timeZone: z.string().max(64),
  paper: z.enum(["a4", "letter"]),
  currency: z.string().regex(/^[A-Z]{3}$/, "Three capital letters, such as EUR"),
  shortestCrosscut: sizeUmSchema,
  narrowestRip: sizeUmSchema,
  shortestMachined: sizeUmSchema,
  offcutLength: sizeUmSchema,
  offcutWidth: sizeUmSchema,
};

export const shopSchema = z.object({
  id: idSchema,
  ...shopFields,
  /** What jointing takes off each edge that is glued. */
  jointing: allowanceUmSchema,
  /** What a part keeps of wood around its pieces until it is flat: at both ends together, and at both long edges together. */
  roughLength: allowanceUmSchema,
  roughWidth: allowanceUmSchema,
  revision: z.int(),
  saws: z.array(sawSchema),
});
export type Shop = z.output<typeof shopSchema>;

export const getShop = defineEndpoint({
  method: "GET",
  path: "/api/shop",
  summary: "The shop's settings and saws",
  tag: "shop",
  access: roles,
  response: shopSchema,
});

export const updateShopSchema = z.object({
  baseRevision: z.int(),
  ...shopFields,
  /** Left as it is when not given. */
  jointing: allowanceUmSchema.optional(),
  roughLength: allowanceUmSchema.optional(),
  roughWidth: allowanceUmSchema.optional(),
});
export const updateShop = defineEndpoint({
  method: "PUT",
  path: "/api/shop",
  summary: "Save the shop's settings from a base revision",
  tag: "shop",
  access: ["owner"],
  body: updateShopSchema,
  response: shopSchema,
});

export const saveSawSchema = z.object({
  ...sawFields,
  /** Of a new saw those usual for its kind when not given; of one that is there they stay. */
  limits: sawLimitsSchema.optional(),
});
export const createSaw = defineEndpoint({
  method: "POST",
  path: "/api/shop/saws",
  summary: "Add a saw",
  tag: "shop",
  access: makers,
  body: saveSawSchema,
  response: sawSchema,
});

export const updateSaw = defineEndpoint({
  method: "PUT",
  path: "/api/shop/saws/{sawId}",
  summary: "Change a saw; layouts keep the loss they were given",
  tag: "shop",
  access: makers,
  params: z.object({ sawId: idSchema }),
  body: saveSawSchema,
  response: sawSchema,
});
