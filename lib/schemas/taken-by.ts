/** The cut order that a board's picture belongs to, as the layout table is told of it. */
import { z } from "zod";

export const takenBySchema = z.object({
  orderNumber: z.int(),
  /** 1 prints as A. */
  revision: z.int(),
  /** As the order has it. */
  faceTitle: z.string(),
  /** Seen from the layout: of another face, of its own that is cut, or of its own that issuing would make the next revision of. */
  by: z.enum(["another-face", "earlier-order", "this-order"]),
  /** A step that takes wood of the board is ticked: its picture is true no more. */
  cutInto: z.boolean(),
  /** It holds, and steps are left: the bench goes on cutting by it. */
  unfinished: z.boolean(),
});
export type TakenBy = z.output<typeof takenBySchema>;
