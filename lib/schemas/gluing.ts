/** How a blank is glued up before it is cut, as a cut order freezes it. */
import { z } from "zod";
import { idSchema } from "./ids";
import { rectSchema, sizeUmSchema, umSchema } from "./length";
import { boardSides } from "./straightening";

export const gluingMemberSchema = z.object({
  boardId: idSchema,
  tag: z.string(),
  species: z.string(),
  place: z.string(),
  thickness: sizeUmSchema,
  /** Of its picture, before anything is taken off. */
  length: sizeUmSchema,
  width: sizeUmSchema,
  straighteningId: idSchema,
  /** Which of its faces comes up. */
  side: z.enum(boardSides),
  endForEnd: z.boolean(),
  /** What is left of it, in the frame of the blank. */
  rect: rectSchema,
  /** Taken off upper and lower edge as it lies, jointing included. */
  takes: z.object({ upper: umSchema, lower: umSchema }),
});
export type GluingMember = z.output<typeof gluingMemberSchema>;

export const gluingSchema = z.object({
  /** Of `takes`, what jointing takes off each edge that is glued. */
  jointing: umSchema,
  /** From the upper edge of the blank down. */
  members: z.array(gluingMemberSchema).min(2),
});
export type Gluing = z.output<typeof gluingSchema>;
