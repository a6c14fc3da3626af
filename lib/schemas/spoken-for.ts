/** Wood of a board that another face lies on, as the layout table is told of it. */
import { z } from "zod";
import type { Problem } from "@/lib/layout";
import { idSchema } from "./ids";
import { allowanceUmSchema, rectSchema } from "./length";

export const spokenForSchema = z.object({
  /** Of the face and its piece. */
  id: z.string(),
  /** What is sawn for the piece, clean-up included, in the frame of the picture that both layouts lie on. */
  rect: rectSchema,
  kerfs: z.object({ along: allowanceUmSchema, across: allowanceUmSchema }),
  /** What is written on the piece. */
  label: z.string(),
  faceId: idSchema,
  faceTitle: z.string(),
  jobTitle: z.string(),
  /** A cut order that holds cuts it, and has the board. Else it is a plan, and whoever is issued first has the wood. */
  issued: z.boolean(),
});
export type SpokenForPiece = z.output<typeof spokenForSchema>;

/** Wood spoken for by its id; undefined where it no longer is. */
export type WoodOf = (spokenForId: string) => Pick<SpokenForPiece, "label" | "faceTitle" | "jobTitle" | "issued"> | undefined;

/**
 * Whether a layout with this problem may not be issued. Wood spoken for is none by itself: once it is issued, the whole board is taken.
 * A glue line near an edge is for the maker to judge.
 */
export function standsInTheWay(problem: Problem): boolean {
  return problem.kind !== "spoken-for" && problem.kind !== "glue-line";
}
