/** Blanks: boards edge-glued into one stock. */
import { z } from "zod";
import { boardSchema } from "./board";
import { defineEndpoint, makers } from "./endpoint";
import { idSchema } from "./ids";
import { allowanceUmSchema, umSchema } from "./length";
import { mostGlueLines } from "./zones";

const memberPlaceSchema = {
  /** Turned by half a turn in its own plane: the same face stays up. */
  endForEnd: z.boolean(),
  /** Where its left end lies along the blank, as it lies; only differences among the boards count. */
  along: umSchema,
  /** Taken off its edges before they are jointed, as it lies. */
  trim: z.object({ upper: allowanceUmSchema, lower: allowanceUmSchema }),
};

export const planMemberSchema = z.object({
  boardId: idSchema,
  /** The present picture of its face or of its back: that side comes up. */
  straighteningId: idSchema,
  ...memberPlaceSchema,
});

export const planBlankSchema = z.object({
  /** From the upper edge of the blank down. */
  members: z
    .array(planMemberSchema)
    .min(2, "A blank takes two boards at least")
    .max(mostGlueLines + 1),
  /** What jointing takes off each glued edge. */
  jointing: allowanceUmSchema,
  place: z.string().trim().max(80),
  note: z.string().trim().max(2000),
});
export type PlanBlank = z.output<typeof planBlankSchema>;

export const planBlank = defineEndpoint({
  method: "POST",
  path: "/api/blanks",
  summary: "Plan a blank of boards of the rack; it gets a tag of its own, and its picture is composed from theirs",
  tag: "blanks",
  access: makers,
  body: planBlankSchema,
  response: boardSchema,
});

export const takeApartBlank = defineEndpoint({
  method: "DELETE",
  path: "/api/blanks/{boardId}",
  summary: "Give a planned blank up, as long as no order was issued from it: its boards are free again",
  tag: "blanks",
  access: makers,
  params: z.object({ boardId: idSchema }),
  response: null,
});
