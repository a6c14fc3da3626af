/** Boards in the rack. */
import { z } from "zod";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { rectSchema, sizeUmSchema, umSchema } from "./length";
import { servedLevelSchema } from "./photo";
import { boardSides } from "./straightening";

/** One piece of wood, or boards glued edge to edge. */
export const boardKinds = ["board", "blank"] as const;
/** In the rack and free to use, used up by an order, or gone for another reason. Held is not a state: layouts say so. */
export const boardStates = ["rack", "cut", "gone"] as const;
/** Which long edges are straight and square to the face, as its picture lies: fit to measure from without jointing. */
export const trueEdges = ["none", "top", "bottom", "both"] as const;
/** How the board was sawn from the log; "angled" grain between flat and quarter is rift in the trade. */
export const cuts = ["flat", "rift", "quarter"] as const;

const boardFields = {
  species: z.string().trim().min(1, "Say which wood it is").max(80),
  cut: z.enum(cuts),
  /** 4 for 4/4, 5 for 5/4 …; null when not sold by quarters. */
  nominalQuarters: z.int().min(2).max(24).nullable(),
  thickness: sizeUmSchema,
  place: z.string().trim().max(80),
  source: z.string().trim().max(120),
  costMinor: z.int().min(0).max(100_000_000).nullable(),
  note: z.string().trim().max(2000),
};

const trueEdgesSchema = z.enum(trueEdges);
/** It is cut into rough parts and flattened before its fine cuts. */
const toBeFlattenedSchema = z.boolean();

export const boardHoldSchema = z.object({ faceId: idSchema, faceTitle: z.string(), jobId: idSchema, jobTitle: z.string() });

export const boardRowSchema = z.object({
  id: idSchema,
  tag: z.string(),
  kind: z.enum(boardKinds),
  state: z.enum(boardStates),
  ...boardFields,
  trueEdges: trueEdgesSchema,
  toBeFlattened: toBeFlattenedSchema,
  /** 0 while nobody has measured. */
  length: umSchema,
  width: umSchema,
  /** Percent, one decimal. */
  moisturePercent: z.number().nullable(),
  /** By the lumber rule: whole inches × whole feet ÷ 12 to a whole number, × the thickness sold in inches, at least 1; 0 while not measured. */
  boardFeet: z.number(),
  /** The volume by plain measures in board feet, not rounded; 0 while not measured. */
  volumeBoardFeet: z.number(),
  /** The picture of its face. */
  straighteningId: idSchema.nullable(),
  backStraighteningId: idSchema.nullable(),
  /** Level small enough for the rack, or null when there is no picture. */
  picture: servedLevelSchema.nullable(),
  held: z.array(boardHoldSchema),
  /** The planned blank that it is to be glued into: it cannot be laid out by itself. */
  inBlank: z.object({ boardId: idSchema, tag: z.string() }).nullable(),
  revision: z.int(),
  createdAt: z.iso.datetime(),
});
export type BoardRow = z.output<typeof boardRowSchema>;

export const moistureReadingSchema = z.object({
  id: idSchema,
  percent: z.number(),
  takenOn: z.iso.date(),
  takenBy: z.string(),
});

/** A board of a planned blank, and where it lies there. */
export const blankMemberSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  species: z.string(),
  place: z.string(),
  side: z.enum(boardSides),
  straighteningId: idSchema,
  endForEnd: z.boolean(),
  /** What is left of it, in the frame of the blank. */
  rect: rectSchema,
  /** Taken off upper and lower edge as it lies, jointing included. */
  takes: z.object({ upper: umSchema, lower: umSchema }),
});
export type BlankMemberOnWire = z.output<typeof blankMemberSchema>;

export const boardSchema = boardRowSchema.extend({
  readings: z.array(moistureReadingSchema),
  /** Of a blank that was planned: what it is glued up from, from the upper edge down. */
  blank: z
    .object({
      jointing: umSchema,
      /** The bench has ticked that it is glued up, or it was photographed in one piece. */
      glued: z.boolean(),
      /** A cut order was issued from it: it is not taken apart any more. */
      issued: z.boolean(),
      members: z.array(blankMemberSchema),
    })
    .nullable(),
});
export type Board = z.output<typeof boardSchema>;

export const boardSorts = ["tag", "species", "length", "width", "thickness", "moisture", "place", "newest"] as const;

export const boardQuerySchema = z.object({
  /** Matches tag ("B-041", "41"), species, place and source. */
  search: z.string().trim().max(80).default(""),
  species: z.string().max(80).default(""),
  cut: z.enum(["", ...cuts]).default(""),
  minLengthUm: z.coerce.number().int().min(0).default(0),
  minWidthUm: z.coerce.number().int().min(0).default(0),
  minThicknessUm: z.coerce.number().int().min(0).default(0),
  state: z.enum(["rack", "cut", "gone", "all"]).default("rack"),
  free: z.enum(["yes", "no", "all"]).default("all"),
  sort: z.enum(boardSorts).default("tag"),
  direction: z.enum(["up", "down"]).default("up"),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(100).default(25),
});
export type BoardQuery = z.output<typeof boardQuerySchema>;

export const boardPageSchema = z.object({
  items: z.array(boardRowSchema),
  total: z.int(),
  page: z.int(),
  pageSize: z.int(),
  /** The longest board of the whole answer, for the common tape. */
  longest: umSchema,
  species: z.array(z.string()),
});

const params = z.object({ boardId: idSchema });

export const listBoards = defineEndpoint({
  method: "GET",
  path: "/api/boards",
  summary: "Boards of the rack, filtered, sorted, one page",
  tag: "boards",
  access: everyone,
  query: boardQuerySchema,
  response: boardPageSchema,
});

export const createBoardSchema = z.object({
  ...boardFields,
  trueEdges: trueEdgesSchema.default("none"),
  toBeFlattened: toBeFlattenedSchema.default(false),
  /** null: to be measured from its photograph; 0 until then. */
  length: sizeUmSchema.nullable(),
  width: sizeUmSchema.nullable(),
});
export const createBoard = defineEndpoint({
  method: "POST",
  path: "/api/boards",
  summary: "Enter a board; its tag number is given by the shop's counter",
  tag: "boards",
  access: makers,
  body: createBoardSchema.extend({
    reading: z.object({ percent: z.number().min(0).max(100), takenOn: z.iso.date() }).nullable(),
  }),
  response: boardSchema,
});

export const getBoard = defineEndpoint({
  method: "GET",
  path: "/api/boards/{boardId}",
  summary: "One board with its readings and, of a planned blank, the boards in it",
  tag: "boards",
  access: everyone,
  params,
  response: boardSchema,
});

export const updateBoard = defineEndpoint({
  method: "PATCH",
  path: "/api/boards/{boardId}",
  summary: "Change what is written about a board, from a base revision",
  tag: "boards",
  access: makers,
  params,
  body: z.object({
    baseRevision: z.int(),
    ...z.object({ ...boardFields, state: z.enum(boardStates) }).partial().shape,
    trueEdges: trueEdgesSchema.optional(),
    toBeFlattened: toBeFlattenedSchema.optional(),
    /** By hand only while there is no straightened picture, which tells the size. */
    length: sizeUmSchema.optional(),
    width: sizeUmSchema.optional(),
  }),
  response: boardSchema,
});

export const addMoistureReading = defineEndpoint({
  method: "POST",
  path: "/api/boards/{boardId}/readings",
  summary: "Add a moisture reading",
  tag: "boards",
  access: everyone,
  params,
  body: z.object({ percent: z.number().min(0).max(100), takenOn: z.iso.date() }),
  response: boardSchema,
});
