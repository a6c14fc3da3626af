/** Why boards cannot be glued up as they are laid, in plain words: what is wrong, by how much, and what would mend it. */
import { type BlankRefusal, type LengthStyle, printLength } from "@/lib/layout";

export function blankRefusalWords(refusal: BlankRefusal, style: LengthStyle, tagOf: (boardId: string) => string): string {
  switch (refusal.reason) {
    case "too-few":
      return "A blank takes two boards at least. Add another.";
    case "twice":
      return `${tagOf(refusal.id)} is in this blank twice. Take it out once.`;
    case "nothing-left":
      return `Nothing is left of ${tagOf(refusal.id)}: ${printLength(refusal.by, style)} more is taken off its edges than there is. Trim less.`;
    case "apart":
      return `${tagOf(refusal.above)} and ${tagOf(refusal.below)} do not meet: they lie ${printLength(refusal.by, style)} apart along the grain. Shift one of them.`;
    case "thickness":
      return `${tagOf(refusal.thick)} is ${printLength(refusal.by, style)} thicker than ${tagOf(refusal.thin)}, too much to flatten away. Plane it first and enter its thickness.`;
    case "no-wood":
      return "No usable wood is left: the outlines of the boards lie outside what is kept of them. Trim less, or draw the outlines anew.";
    case "tangled":
      return "The usable outlines of these boards cannot be joined to one. Draw the outline of a board anew, with fewer corners near its edges.";
    case "too-detailed":
      return refusal.of === "corners"
        ? `The blank would have an outline or area with ${refusal.count} corners, at most ${refusal.most} can be kept. Draw the outlines of its boards with fewer.`
        : `The blank would have ${refusal.count} keep-clear areas, at most ${refusal.most} can be kept. Take some off its boards.`;
  }
}
