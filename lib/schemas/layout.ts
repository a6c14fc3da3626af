/** The layout document on the wire: the core's FaceLayout, checked. */
import { z } from "zod";
import { type Face, type FaceLayout, faceFaults, um } from "@/lib/layout";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";
import { allowanceUmSchema, pointSchema, sizeUmSchema } from "./length";
import { spokenForSchema } from "./spoken-for";
import { straighteningSchema } from "./straightening";
import { takenBySchema } from "./taken-by";

const pieceIdSchema = z.string().regex(/^p[1-9]\d{0,3}$/);

/** Layouts and orders from before there were patterns have none: they are grids. */
export const gridFaceSchema = z
  .object({
    pattern: z.literal("grid").optional().default("grid"),
    columns: z.array(sizeUmSchema).min(1).max(40),
    rows: z.array(sizeUmSchema).min(1).max(40),
    columnGaps: z.array(allowanceUmSchema),
    rowGaps: z.array(allowanceUmSchema),
    grain: z.enum(["horizontal", "vertical"]),
  })
  .refine((face) => face.columnGaps.length === face.columns.length - 1 && face.rowGaps.length === face.rows.length - 1, {
    message: "there is one gap fewer than columns, and one fewer than rows",
  });

const edgeAmountsSchema = z.object({
  left: allowanceUmSchema,
  right: allowanceUmSchema,
  top: allowanceUmSchema,
  bottom: allowanceUmSchema,
});

export const cutOutFaceSchema = z
  .object({
    pattern: z.literal("cutOut"),
    grain: z.enum(["horizontal", "vertical"]),
    strips: z.array(sizeUmSchema).min(2).max(21),
    rows: z
      .array(
        z.object({
          height: sizeUmSchema,
          parts: z
            .array(z.object({ kind: z.enum(["fixed", "front"]), width: sizeUmSchema }))
            .min(3)
            .max(81),
        }),
      )
      .min(1)
      .max(20),
    gap: edgeAmountsSchema,
    fitting: allowanceUmSchema,
    rails: z.enum(["jointed", "fromSaw"]),
  })
  .superRefine(refuseFaults);

const thicknessUmSchema = z.int().min(1).max(300_000).transform(um).meta({ description: "micrometres, up to 300 mm" });

const turnDegSchema = z.number().min(1).max(179);

const wrapCornerSchema = z.discriminatedUnion("kind", [
  z.object({ kind: z.literal("gap"), turnDeg: turnDegSchema, gap: allowanceUmSchema }),
  z.object({ kind: z.literal("butt"), turnDeg: turnDegSchema, covers: z.enum(["before", "after"]) }),
  z.object({ kind: z.literal("mitre"), turnDeg: turnDegSchema, parting: z.enum(["squareThenBevels", "oneBevel"]) }),
]);

export const wrapFaceSchema = z
  .object({
    pattern: z.literal("wrap"),
    grain: z.enum(["horizontal", "vertical"]),
    sides: z.array(sizeUmSchema).min(1).max(40),
    height: sizeUmSchema,
    thickness: thicknessUmSchema,
    corners: z.array(wrapCornerSchema).max(40),
    closed: z.boolean(),
  })
  .superRefine(refuseFaults);

export const resawnFaceSchema = z
  .object({
    pattern: z.literal("resawn"),
    grain: z.enum(["horizontal", "vertical"]),
    leaf: z.object({ width: sizeUmSchema, height: sizeUmSchema, thickness: thicknessUmSchema }),
    opens: z.enum(["side", "over"]),
    resaw: z.object({ kerf: allowanceUmSchema, planing: allowanceUmSchema }),
    leanDeg: z.number().min(-85).max(85).nullable(),
  })
  .superRefine(refuseFaults);

/** What the core finds wrong with a face is wrong on the wire, too. */
function refuseFaults(face: Face, context: z.core.$RefinementCtx): void {
  for (const { fault } of faceFaults(face)) context.addIssue(`the face does not hold together (${fault})`);
}

/** A face by its pattern. */
export const faceSchema = z.discriminatedUnion("pattern", [gridFaceSchema, cutOutFaceSchema, wrapFaceSchema, resawnFaceSchema]);

/** Fails to compile when the wire and the core drift apart. */
export const faceForCore = (face: z.output<typeof faceSchema>): Face => face;

export const cutLossSchema = z.object({
  kerf: allowanceUmSchema,
  cleanUpBefore: allowanceUmSchema,
  cleanUpAfter: allowanceUmSchema,
});

const anchorPieceSchema = z.object({ piece: pieceIdSchema });

const groupSchema = z.object({
  id: z.string().min(1).max(40),
  pieceIds: z.array(pieceIdSchema).min(1),
  placement: z
    .object({
      stockId: idSchema,
      at: pointSchema,
      turns: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),
    })
    .nullable(),
  takesPlaceOf: z.record(z.string(), pieceIdSchema),
});

export const faceLayoutSchema = z.object({
  face: faceSchema,
  crosscut: cutLossSchema,
  rip: cutLossSchema,
  spacing: z.enum(["followGap", "tight"]),
  anchorX: z.union([z.enum(["left", "centre", "right"]), anchorPieceSchema]),
  anchorY: z.union([z.enum(["top", "centre", "bottom"]), anchorPieceSchema]),
  groups: z.array(groupSchema).min(1).max(1600),
});

/** Fails to compile when the wire and the core drift apart. */
export const faceLayoutForCore = (layout: z.output<typeof faceLayoutSchema>): FaceLayout => layout;

/** A board as the layout table needs it: tag and the version of its picture that this layout uses. */
export const layoutBoardSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  species: z.string(),
  place: z.string(),
  thickness: sizeUmSchema,
  straightening: straighteningSchema,
  /** A newer version of the same side than the one this layout was made on, if there is one. */
  newerStraighteningId: idSchema.nullable(),
  /** The picture of the board's other side, if there is one: the layout may be moved over to it. */
  otherSideStraighteningId: idSchema.nullable(),
  /** Other faces of open jobs with this board on their table. On another picture of it there is no saying whether the two overlap. */
  heldBy: z.array(
    z.object({ faceId: idSchema, faceTitle: z.string(), jobTitle: z.string(), issued: z.boolean(), samePicture: z.boolean() }),
  ),
  /** What those on the same picture take of it. */
  spokenFor: z.array(spokenForSchema),
  /** The planned blank it is to be glued into: no order can be issued from it by itself. */
  inBlank: z.object({ boardId: idSchema, tag: z.string() }).nullable(),
  /** The cut order that its picture belongs to, or that has cut into the board since: no other can be issued from it. */
  takenBy: takenBySchema.nullable(),
});

export const layoutSchema = z.object({
  id: idSchema,
  faceId: idSchema,
  faceTitle: z.string(),
  jobId: idSchema,
  jobTitle: z.string(),
  document: faceLayoutSchema,
  crosscutSawId: idSchema.nullable(),
  ripSawId: idSchema.nullable(),
  revision: z.int(),
  boards: z.array(layoutBoardSchema),
  updatedAt: z.iso.datetime(),
  updatedBy: z.string(),
  /** The newest issued order of this face, and whether the layout has changed since. */
  order: z.object({ id: idSchema, number: z.int(), revision: z.int(), superseded: z.boolean() }).nullable(),
});
export type Layout = z.output<typeof layoutSchema>;

const faceParams = z.object({ faceId: idSchema });

export const getLayout = defineEndpoint({
  method: "GET",
  path: "/api/faces/{faceId}/layout",
  summary: "The layout of a face with the boards it lies on",
  tag: "layouts",
  access: everyone,
  params: faceParams,
  response: layoutSchema,
});

export const saveLayout = defineEndpoint({
  method: "PUT",
  path: "/api/faces/{faceId}/layout",
  summary: "Save a layout from a base revision; a conflict carries the present revision, who saved it and its document",
  tag: "layouts",
  access: makers,
  params: faceParams,
  body: z.object({
    baseRevision: z.int().min(1),
    document: faceLayoutSchema,
    crosscutSawId: idSchema.nullable(),
    ripSawId: idSchema.nullable(),
  }),
  response: z.object({ revision: z.int(), updatedAt: z.iso.datetime() }),
});

export const addLayoutBoard = defineEndpoint({
  method: "POST",
  path: "/api/faces/{faceId}/layout/boards",
  summary: "Put a board on the layout table, on the present version of its picture",
  tag: "layouts",
  access: makers,
  params: faceParams,
  body: z.object({ boardId: idSchema }),
  response: layoutBoardSchema,
});

export const removeLayoutBoard = defineEndpoint({
  method: "DELETE",
  path: "/api/faces/{faceId}/layout/boards/{boardId}",
  summary: "Take a board without pieces off the layout table",
  tag: "layouts",
  access: makers,
  params: z.object({ faceId: idSchema, boardId: idSchema }),
  response: null,
});

export const moveLayoutToVersion = defineEndpoint({
  method: "POST",
  path: "/api/faces/{faceId}/layout/boards/{boardId}/version",
  summary: "Move the layout over to another version of the board's picture",
  tag: "layouts",
  access: makers,
  params: z.object({ faceId: idSchema, boardId: idSchema }),
  body: z.object({ straighteningId: idSchema }),
  response: layoutBoardSchema,
});

export const getShowSidePng = defineEndpoint({
  method: "GET",
  path: "/api/faces/{faceId}/show-side",
  summary: "The show side drawn from the photograph, true to scale, as a PNG",
  tag: "layouts",
  access: everyone,
  params: faceParams,
  query: z.object({ pxPerMm: z.coerce.number().min(0.1).max(8).default(2) }),
  responseKind: "image/png",
});
