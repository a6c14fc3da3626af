/** What photographs say: how the figure meets at the seams of a face, and which way the grain runs over a board. */
import { z } from "zod";
import { defineEndpoint, everyone } from "./endpoint";
import { idSchema } from "./ids";
import { umSchema } from "./length";
import { keepClearKinds, keepClearShapeSchema } from "./zones";

export const cannotTellReasons = [
  "notLaid",
  "noPicture",
  "outsidePicture",
  "tooShort",
  "grainAlongSeam",
  "noGrain",
  "noLikeness",
  "beyondReach",
  "twoAnswers",
] as const;

export const seamFigureSchema = z.discriminatedUnion("kind", [
  z.object({
    kind: z.literal("read"),
    /** Positive when the second piece's figure sits further along the seam than the first one's. */
    step: umSchema,
    match: z.number(),
    peak: z.number(),
  }),
  z.object({ kind: z.literal("cannotTell"), why: z.enum(cannotTellReasons) }),
]);

export const seamReadingSchema = z.object({
  a: z.string(),
  b: z.string(),
  /** CIEDE2000 between the mean colours of both sides; null where one of them lies on no picture. */
  tone: z.number().nullable(),
  figure: seamFigureSchema,
});
export type SeamReadingOnWire = z.output<typeof seamReadingSchema>;

export const getSeamReadings = defineEndpoint({
  method: "GET",
  path: "/api/faces/{faceId}/seam-readings",
  summary:
    "What the photographs say about every seam of the layout as it is saved: step, match and tone, or why it cannot be told",
  tag: "figure",
  access: everyone,
  params: z.object({ faceId: idSchema }),
  response: z.object({
    /** Of the layout that was read. */
    revision: z.int(),
    items: z.array(seamReadingSchema),
  }),
});

export const grainFieldSchema = z.object({
  cellMm: z.number(),
  columns: z.int(),
  rows: z.int(),
  /** Degrees from the stock's x axis towards y, row by row. */
  directionDeg: z.array(z.number()),
  /** 0 to 1, row by row. */
  coherence: z.array(z.number()),
});
export type GrainOnWire = z.output<typeof grainFieldSchema>;

export const getGrain = defineEndpoint({
  method: "GET",
  path: "/api/straightenings/{straighteningId}/grain",
  summary: "Direction of the grain over a board and how clear it is, read from its picture in cells of 10 mm",
  tag: "figure",
  access: everyone,
  params: z.object({ straighteningId: idSchema }),
  response: grainFieldSchema,
});

export const suggestionsSchema = z.object({
  /** From the surest down. */
  items: z.array(
    z.object({
      kind: z.enum(keepClearKinds),
      area: keepClearShapeSchema,
      /** 0 to 1. */
      score: z.number(),
    }),
  ),
});
export type SuggestionsOnWire = z.output<typeof suggestionsSchema>;
export type SuggestedArea = SuggestionsOnWire["items"][number];

export const getSuggestions = defineEndpoint({
  method: "GET",
  path: "/api/straightenings/{straighteningId}/suggestions",
  summary: "Areas that look as if they should be kept clear, for a maker to take up or leave",
  tag: "figure",
  access: everyone,
  params: z.object({ straighteningId: idSchema }),
  response: suggestionsSchema,
});
