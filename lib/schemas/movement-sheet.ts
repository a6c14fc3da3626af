/** Movement of a face as an order may keep and print it: the moisture each board was cut at, and every gap through the year. */
import { z } from "zod";
import { type FaceLayout, faceMovement } from "@/lib/layout";
import { umSchema } from "./length";
import { boardWoodSchema, type FaceMovementFacts } from "./movement";
import { faceWoods, movementRequest } from "./movement-request";

export const movementSheetSchema = z.object({
  /** Moisture of wood at the driest and the dampest of the place, percent. */
  year: z.object({ driest: z.number(), dampest: z.number() }),
  leastGap: umSchema,
  boards: z.array(
    boardWoodSchema.pick({ boardId: true, tag: true, reading: true }).extend({
      /** null: nobody has said. */
      species: z.object({ name: z.string(), source: z.string() }).nullable(),
    }),
  ),
  gaps: z.array(
    z.object({
      /** Pieces by their ids; `b` may be the side of the face where the surround begins. */
      a: z.string(),
      b: z.string(),
      runs: z.enum(["sideways", "upright"]),
      today: umSchema,
      /** null: something is not known that it takes. `toCut`: today's gap that is at least the least gap all year, not rounded. */
      figures: z.object({ driest: umSchema, dampest: umSchema, toCut: umSchema }).nullable(),
    }),
  ),
});
export type MovementSheet = z.output<typeof movementSheetSchema>;

/** By the saved layout and what is known now. Boards on the table that carry no piece are left out. */
export function movementSheet(layout: FaceLayout, facts: FaceMovementFacts): MovementSheet {
  const woods = faceWoods(facts);
  const request = movementRequest(layout, facts, woods);
  const used = new Set(layout.groups.flatMap(({ placement }) => placement?.stockId ?? []));
  return {
    year: request.year,
    leastGap: facts.leastGap,
    boards: facts.boards
      .filter(({ boardId }) => used.has(boardId))
      .map(({ boardId, tag, reading }) => {
        const species = woods.byBoard.get(boardId)?.species ?? null;
        return { boardId, tag, reading, species: species && { name: species.name, source: species.source.text } };
      }),
    gaps: faceMovement(request).gaps.map(({ a, b, runs, gap, figures }) => ({
      a,
      b: "piece" in b ? b.piece : b.side,
      runs,
      today: gap,
      figures,
    })),
  };
}
