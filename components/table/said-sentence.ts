/** What happened at the table, in plain words, for the line below it and for those who hear it. */
import type { CommandRefusal, Said } from "@/lib/editor/commands/outcome";
import type { Announcement } from "@/lib/editor/editor";
import { type LengthStyle, type PieceId, printLength, type Um, um } from "@/lib/layout";
import type { TagOf } from "@/lib/words/layout-problem";
import { labelRanges } from "@/lib/words/part-name";

export function announcementSentence(announcement: Announcement, style: LengthStyle, tagOf: TagOf): string {
  switch (announcement.kind) {
    case "did":
      return saidSentence(announcement.said, style, tagOf);
    case "refused":
      return refusalSentence(announcement.refusal, style);
    case "undid":
      return "Undone.";
    case "redid":
      return "Done again.";
    case "nothing-to-undo":
      return "There is nothing to undo.";
    case "nothing-to-redo":
      return "There is nothing to do again.";
    case "drag-dropped":
      return "Dropped: everything lies where it lay.";
    case "read-only":
      return "You may look at this layout but not change it. A maker can.";
    case "merged":
      return `${announcement.updatedBy} changed this layout in another window. The table shows it.`;
  }
}

function saidSentence(said: Said, style: LengthStyle, tagOf: TagOf): string {
  switch (said.did) {
    case "slid":
      return `${fronts(said.pieces)} slid ${way(said.by, style)}.`;
    case "turned":
      return `${fronts(said.pieces)} turned end for end.`;
    case "lifted":
      return `${fronts(said.pieces)} taken off the board.`;
    case "placed":
    case "moved-to-board": {
      const moved = `${fronts(said.pieces)} ${said.did === "placed" ? "laid on" : "moved to"} board ${tagOf(said.stockId)}.`;
      return said.sound ? moved : `${moved} It has no sound place for them as they are: see the problems.`;
    }
    case "swapped":
      return `${fronts(said.pieces)} have changed places in the wood.`;
    case "let-loose":
      return `${fronts(said.pieces)} let loose. The wood has not moved.`;
    case "regrouped":
      return `${fronts(said.pieces)} back in the set.`;
    case "changed-cuts":
      return "What the cuts cost is changed.";
    case "changed-spacing":
      return "Spacing changed.";
    case "changed-anchor":
      return "Anchor changed. No wood has moved.";
    case "changed-grain":
      return "Grain turned by a quarter, and every group laid along its board again.";
    case "changed-sizes":
      return said.swapsUndone.length === 0
        ? "Sizes changed."
        : `Sizes changed. ${fronts(said.swapsUndone)} went back to their own places, no longer being of one size.`;
    case "moved-part":
      return `Part ${said.piece.replace(/^p/, "")} moved ${way(said.axis === "x" ? { x: said.by, y: um(0) } : { x: um(0), y: said.by }, style)}.`;
    case "evened-gaps":
      return `Gaps are ${printLength(said.gap, style)} now. ${givenUp(said.mostGivenUp, style)}`;
  }
}

function refusalSentence(refusal: CommandRefusal, style: LengthStyle): string {
  switch (refusal.reason) {
    case "nothing-selected":
      return "Choose a front first.";
    case "needs-two-pieces":
      return `Choose two fronts to swap; ${refusal.selected} ${refusal.selected === 1 ? "is" : "are"} chosen. Shift and click adds one.`;
    case "nothing-changes":
      return "That changes nothing.";
    case "not-a-cut-out":
    case "no-such-place":
      return "This face has no such part.";
    case "not-a-divider":
      return "Only a fixed part between two fronts can be moved or taken out.";
    case "not-a-front":
      return "Choose a front: a divider can only stand in one.";
    case "outer-strip":
      return "The outer strips have fronts on one side only. Move the row instead.";
    case "no-room":
      return `There is room for ${printLength(um(-refusal.least), style)} one way and ${printLength(refusal.most, style)} the other.`;
    case "opening-too-short":
      return `The opening is ${printLength(refusal.missing, style)} too short for two fronts and a divider.`;
    case "last-front":
      return "A row keeps one front at least.";
    case "gaps-no-gaps":
      return "There are no gaps that way.";
    case "gaps-not-known":
      return "What the wood will do is not known yet: see the warnings of its movement.";
    case "gaps-no-room":
      return "So wide a gap would leave nothing of a front.";
    case "unknown-piece":
      return `This face has no front ${refusal.piece.replace(/^p/, "")}.`;
    case "unknown-group":
      return "That group is no longer there.";
    case "not-placed":
      return "It does not lie on a board yet. Lay it on one first.";
    case "already-loose":
      return `${fronts([refusal.piece])} is loose already.`;
    case "already-in-set":
      return `${fronts([refusal.piece])} is in the set already.`;
    case "same-piece":
      return "A front cannot change places with itself.";
    case "one-blank":
      return `${fronts(refusal.pieces)} are sawn as one blank and stay together.`;
    case "roles-differ":
      return "A front cannot change places with a part of the rail.";
    case "sizes-differ": {
      const [p, q] = refusal.sizes;
      const size = (of: typeof p) => `${printLength(of.width, style)} × ${printLength(of.height, style)}`;
      return `Only fronts of one size can change places: these are ${size(p)} and ${size(q)}.`;
    }
  }
}

/** "Front 3", "Fronts 1–4". */
export function fronts(pieces: readonly PieceId[]): string {
  const labels = pieces.map((id) => id.replace(/^p/, ""));
  return `${labels.length === 1 ? "Front" : "Fronts"} ${labelRanges(labels)}`;
}

function givenUp(most: Um, style: LengthStyle): string {
  const length = printLength(um(Math.abs(most)), style);
  return most < 0
    ? `Fronts grow by up to ${length}; the face keeps its size.`
    : `Fronts give up ${length} at most; the face keeps its size.`;
}

function way({ x, y }: { readonly x: Um; readonly y: Um }, style: LengthStyle): string {
  const print = (length: number) => printLength(um(Math.abs(length)), style);
  const parts = [];
  if (x !== 0) parts.push(`${print(x)} ${x > 0 ? "right" : "left"}`);
  if (y !== 0) parts.push(`${print(y)} ${y > 0 ? "down" : "up"}`);
  return parts.join(", ");
}
