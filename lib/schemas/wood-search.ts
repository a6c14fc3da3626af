/** Looking for wood: better places on one board, or the best place on every board of the rack that could give the pieces. */
import { z } from "zod";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { pointSchema, rectSchema, sizeUmSchema, umSchema } from "./length";
import { servedLevelSchema } from "./photo";
import { placeParts } from "./place-parts";
import { boardSides } from "./straightening";
import { taskStates } from "./task";

const partSchema = z.enum(placeParts);
const weightSchema = z.number().min(0).max(10);

/** What counts how much; only the ratios matter. */
export const weightsSchema = z.object({
  match: weightSchema,
  step: weightSchema,
  symmetry: weightSchema,
  clear: weightSchema,
  rest: weightSchema,
  stock: weightSchema,
});

const shareSchema = z.number().nullable();
const partsSchema = z.object({
  match: shareSchema,
  step: shareSchema,
  symmetry: shareSchema,
  clear: shareSchema,
  rest: shareSchema,
  stock: shareSchema,
});

const changeSchema = z.object({ part: partSchema, by: z.number() });

export const foundPlaceSchema = z.object({
  side: z.enum(boardSides),
  corner: pointSchema,
  turns: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),
  /** 0 to 1 by the weights asked with. */
  total: z.number(),
  parts: partsSchema,
  /** The largest rectangle worth keeping that is left of the board. */
  leaves: rectSchema.nullable(),
  /** Against the place the pieces have now; null where that is on another board or none. */
  against: z.object({ better: z.array(changeSchema), worse: z.array(changeSchema) }).nullable(),
  /** Shows the same wood as the present place. */
  likePresent: z.boolean(),
});
export type FoundPlaceOnWire = z.output<typeof foundPlaceSchema>;

export const leftOutSchema = z.discriminatedUnion("reason", [
  z.object({ reason: z.literal("species"), has: z.string() }),
  z.object({ reason: z.enum(["too-thin", "too-thick", "too-short", "too-narrow"]), by: umSchema }),
  z.object({ reason: z.enum(["held", "in-blank", "no-picture"]) }),
  z.object({
    reason: z.literal("no-place"),
    obstacles: z.array(z.enum(["board", "keep-clear", "spoken-for", "other-pieces"])),
  }),
]);
export type LeftOut = z.output<typeof leftOutSchema>;

/** What the search of one board came to, as it is kept. */
export const boardFindingSchema = z.object({
  places: z.array(foundPlaceSchema),
  /** Value of the present place, where the pieces lie on this board now. */
  present: z.object({ total: z.number(), parts: partsSchema, allowed: z.boolean() }).nullable(),
  leftOut: z.array(leftOutSchema),
  /** Places weighed, and those that are allowed. */
  positions: z.int(),
  allowed: z.int(),
});
export type BoardFinding = z.output<typeof boardFindingSchema>;

/** A board with what a picture of it takes. */
export const searchedBoardSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  species: z.string(),
  place: z.string(),
  straighteningId: idSchema,
  length: sizeUmSchema,
  width: sizeUmSchema,
  thickness: sizeUmSchema,
  levels: z.array(servedLevelSchema),
  finding: boardFindingSchema,
});
export type SearchedBoard = z.output<typeof searchedBoardSchema>;

export const searchScopes = ["board", "rack"] as const;

export const searchSchema = z.object({
  id: idSchema,
  faceId: idSchema,
  scope: z.enum(searchScopes),
  groupId: z.string(),
  /** Of the layout that was searched for; a later one may have other sizes. */
  layoutRevision: z.int(),
  weights: weightsSchema,
  taskId: idSchema,
  state: z.enum(taskStates),
  progress: z.number(),
  failure: z.string().nullable(),
  /** Boards in question, searched already, and left out. */
  boards: z.int(),
  searched: z.int(),
  leftOut: z.int(),
  /** Best first, of those searched so far; at most twenty. */
  found: z.array(searchedBoardSchema),
});
export type WoodSearch = z.output<typeof searchSchema>;

export const startSearch = defineEndpoint({
  method: "POST",
  path: "/api/faces/{faceId}/searches",
  summary: "Look for better places on one board, or for wood in the whole rack; an earlier search for the face is stopped",
  tag: "searches",
  access: makers,
  params: z.object({ faceId: idSchema }),
  body: z.object({
    groupId: z.string().min(1).max(40),
    weights: weightsSchema,
    /** One board of the table; null: the rack. */
    boardId: idSchema.nullable(),
    /** Of the rack: null for any. */
    species: z.string().max(80).nullable(),
    leastThickness: umSchema.nullable(),
    mostThickness: umSchema.nullable(),
  }),
  response: z.object({ searchId: idSchema }),
});

export const getSearch = defineEndpoint({
  method: "GET",
  path: "/api/searches/{searchId}",
  summary: "How far a search is and the best it has found so far",
  tag: "searches",
  access: everyone,
  params: z.object({ searchId: idSchema }),
  response: searchSchema,
});

export const listLeftOut = defineEndpoint({
  method: "GET",
  path: "/api/searches/{searchId}/left-out",
  summary: "Boards that a search left out, with every reason, in the order of their tags",
  tag: "searches",
  access: everyone,
  params: z.object({ searchId: idSchema }),
  query: z.object({ page: z.coerce.number().int().min(1).max(10_000).default(1) }),
  response: z.object({
    items: z.array(z.object({ boardId: idSchema, tag: z.string(), species: z.string(), reasons: z.array(leftOutSchema) })),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});
