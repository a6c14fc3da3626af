/** Movement of a face's wood through the year: the shop's limits, what was chosen for the face, and what is known of its boards. */
import { z } from "zod";
import { FIBRE_SATURATION, type Surround } from "@/lib/layout";
import { cuts } from "./board";
import { climateSchema } from "./climate";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { allowanceUmSchema } from "./length";
import { ownSpeciesSchema } from "./species";

const settingsFields = {
  climate: climateSchema,
  /** No gap of the year is to be narrower. */
  leastGap: allowanceUmSchema,
  /** Board and surround may differ in moisture by as much as this, percent; in tenths. */
  moistureLimit: z.number().min(0.1, "At least 0.1 %").max(20, "At most 20 %"),
};

/** `revision` 0: nobody has changed anything yet, these are what the program starts with. */
export const movementSettingsSchema = z.object({ ...settingsFields, revision: z.int() });
export type MovementSettings = z.output<typeof movementSettingsSchema>;

export const getMovementSettings = defineEndpoint({
  method: "GET",
  path: "/api/shop/movement",
  summary: "Where the shop's furniture usually lives, and its least gap",
  tag: "shop",
  access: everyone,
  response: movementSettingsSchema,
});

export const updateMovementSettings = defineEndpoint({
  method: "PUT",
  path: "/api/shop/movement",
  summary: "Save the shop's movement settings from a base revision",
  tag: "shop",
  access: ["owner"],
  body: z.object({ baseRevision: z.int().min(0), ...settingsFields }),
  response: movementSettingsSchema,
});

export const surroundSchema = z.discriminatedUnion("kind", [
  z.object({
    kind: z.literal("sameWood"),
    grain: z.enum(["with", "across", "lengthwise"]),
    moisture: z.number().min(0).max(FIBRE_SATURATION).nullable(),
  }),
  z.object({ kind: z.literal("sheet") }),
  z.object({ kind: z.literal("none") }),
]);

/** Fails to compile when the wire and the core drift apart. */
export const surroundForCore = (surround: z.output<typeof surroundSchema>): Surround => surround;

export const woodChoiceSchema = z.object({
  /** The key of a published species or the id of one of the shop's own; null: the one that the board's own text names. */
  species: z.string().min(1).max(60).nullable(),
  /** Between growth rings and face, degrees; null: as the board was sawn. */
  ringAngle: z.number().min(0).max(90).nullable(),
});

export const movementChoicesSchema = z.object({
  surround: surroundSchema,
  /** The gap round the fronts; null: there is none. */
  around: allowanceUmSchema.nullable(),
  /** By board. */
  woods: z.record(idSchema, woodChoiceSchema),
});
export type MovementChoices = z.output<typeof movementChoicesSchema>;

export const boardWoodSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  species: z.string(),
  cut: z.enum(cuts),
  /** The latest reading; null: not read. */
  reading: z.object({ percent: z.number(), takenOn: z.iso.date() }).nullable(),
});
export type BoardWoodRow = z.output<typeof boardWoodSchema>;

export const faceMovementSchema = z.object({
  choices: movementChoicesSchema,
  /** 0: nothing was chosen yet. */
  revision: z.int(),
  climate: climateSchema,
  /** Whose climate it is. */
  climateOf: z.enum(["job", "shop"]),
  leastGap: allowanceUmSchema,
  moistureLimit: z.number(),
  /** The boards on the layout's table. */
  boards: z.array(boardWoodSchema),
  ownSpecies: z.array(ownSpeciesSchema),
});
export type FaceMovementFacts = z.output<typeof faceMovementSchema>;

const faceParams = z.object({ faceId: idSchema });

export const getFaceMovement = defineEndpoint({
  method: "GET",
  path: "/api/faces/{faceId}/movement",
  summary: "What the movement of a face's gaps through the year is worked out from",
  tag: "layouts",
  access: everyone,
  params: faceParams,
  response: faceMovementSchema,
});

export const saveFaceMovement = defineEndpoint({
  method: "PUT",
  path: "/api/faces/{faceId}/movement",
  summary: "Choose what stands round the fronts and which wood the boards are, from a base revision",
  tag: "layouts",
  access: makers,
  params: faceParams,
  body: z.object({ baseRevision: z.int().min(0), ...movementChoicesSchema.shape }),
  response: faceMovementSchema,
});
