/** What was cut before a revision was issued, and what of each board is still in hand; for screen and paper. */
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { capital } from "./capital";
import { styleOf } from "./order-step";
import { labelRanges, partName, sizeFigures } from "./part-name";
import { revisionLetter } from "./revision-letter";

/** A line for each board that was cut into: "B-041, by revision A: fronts 1, 2 are cut. In hand: strip A, 1740.0 × 184.0." */
export function alreadyCut(snapshot: OrderSnapshot): string[] {
  const { rest, boards } = snapshot;
  if (!rest) return [];
  const style = styleOf(snapshot);
  return boards.flatMap(({ tag, asCut, program }) => {
    if (!asCut || asCut.done.length === 0) return [];
    const cutAgain = new Set(program.steps.filter(({ number }) => !asCut.done.includes(number)).map(({ part }) => part.id));
    const pieces = asCut.inHand.filter(({ part }) => part.pieceId !== null && !cutAgain.has(part.id));
    const labels = pieces.flatMap(({ part }) => part.label ?? []).sort((a, b) => Number(a) - Number(b));
    const parts = asCut.inHand.map(({ part }) => part).filter(({ kind, pieceId }) => kind !== "waste" && pieceId === null);
    const fronts =
      labels.length === 0 ? "no front is cut yet" : `${labels.length > 1 ? "fronts" : "front"} ${labelRanges(labels)} cut`;
    const held = parts.map((part) => `${partName(part)}, ${sizeFigures(part.rect, style)}`).join("; ");
    return `${tag}, by revision ${revisionLetter(rest.revision)}: ${fronts}.${held ? ` In hand: ${capital(held)}.` : ""}`;
  });
}
