/** Why a layout cannot be issued from a board's picture that belongs to a cut order, and the way out, in plain words. */
import type { TakenBy } from "@/lib/schemas/taken-by";
import { revisionLetter } from "./revision-letter";

export function takenBySentence(tag: string, taken: TakenBy): string {
  const { orderNumber, faceTitle, by, cutInto, unfinished } = taken;
  if (by === "this-order") {
    return (
      `${tag} was already cut into by ${orderName(taken)} of this face. ` +
      "Issue the rest on the page of that order: it is planned around what is cut, with the fronts that are not cut yet where they lie here."
    );
  }
  if (unfinished) {
    const [given, first] = cutInto ? ["is being cut", "Finish"] : ["is issued for cutting", "Cut"];
    return (
      `${tag} ${given} with cut order ${orderNumber}, ${faceTitle}. ` +
      `${first} that order first, then photograph what is left of the board and mark it anew.`
    );
  }
  return (
    `${tag} was already cut into by ${orderName(taken)}. ` +
    "Photograph what is left and mark it anew, then move this layout over to the new picture."
  );
}

/** The same in a few words, for beside a button. */
export function takenByReason(tag: string, taken: TakenBy): string {
  return `${tag} ${taken.cutInto ? "was cut into by" : "is issued with"} ${orderName(taken)}`;
}

const orderName = ({ orderNumber, revision }: TakenBy) => `cut order ${orderNumber} ${revisionLetter(revision)}`;
