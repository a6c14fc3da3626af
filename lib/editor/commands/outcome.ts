/** What a command comes to: one diff and what there is to say about it, or a refusal. Commands are pure: `(document, args) → outcome`. */
import type { CutOutRefusal, FaceLayout, LayoutChange, LayoutRefusal, PieceId, StockId, Um } from "@/lib/layout";
import { type Diff, diffBetween, isEmptyDiff } from "../diff";
import type { TableDocument } from "../document";

/** What happened, for the live region and the status line. The screen puts it into words. */
export type Said =
  | { readonly did: "slid"; readonly pieces: readonly PieceId[]; readonly by: { readonly x: Um; readonly y: Um } }
  | { readonly did: "turned" | "lifted"; readonly pieces: readonly PieceId[] }
  | {
      readonly did: "placed" | "moved-to-board";
      readonly pieces: readonly PieceId[];
      readonly stockId: StockId;
      /** False: the board has no sound place for it, and it lies where that can be seen. */
      readonly sound: boolean;
    }
  | { readonly did: "swapped"; readonly pieces: readonly [PieceId, PieceId] }
  | { readonly did: "let-loose" | "regrouped"; readonly pieces: readonly PieceId[] }
  | { readonly did: "changed-cuts" | "changed-spacing" | "changed-anchor" | "changed-grain" }
  | { readonly did: "changed-sizes"; readonly swapsUndone: readonly PieceId[] }
  /** A divider or a strip of a cut-out, on the show side. */
  | { readonly did: "moved-part"; readonly piece: PieceId; readonly by: Um; readonly axis: "x" | "y" }
  | { readonly did: "evened-gaps"; readonly gap: Um; readonly mostGivenUp: Um };

export type CommandRefusal =
  | LayoutRefusal
  | CutOutRefusal
  | { readonly reason: "nothing-selected" }
  /** Swapping takes exactly two pieces. */
  | { readonly reason: "needs-two-pieces"; readonly selected: number }
  /** Of gaps that were to be as wide as the wood's movement asks for. */
  | { readonly reason: "gaps-no-gaps" | "gaps-not-known" | "gaps-no-room" }
  | { readonly reason: "nothing-changes" };

export type CommandOutcome =
  | { readonly ok: true; readonly diff: Diff; readonly said: Said }
  | { readonly ok: false; readonly refusal: CommandRefusal };

export function refusedBecause(refusal: CommandRefusal): CommandOutcome {
  return { ok: false, refusal };
}

/** The step to another document; refused when it is the same. */
export function stepTo(before: TableDocument, after: TableDocument, said: Said): CommandOutcome {
  const diff = diffBetween(before, after);
  return isEmptyDiff(diff) ? refusedBecause({ reason: "nothing-changes" }) : { ok: true, diff, said };
}

/** The step to another layout under the same saws. */
export function stepToLayout(before: TableDocument, layout: FaceLayout, said: Said): CommandOutcome {
  return stepTo(before, { ...before, layout }, said);
}

/** One change after another, each on the result of the last; the first refusal ends it. */
export function inTurn<Item>(
  layout: FaceLayout,
  items: readonly Item[],
  change: (layout: FaceLayout, item: Item) => LayoutChange,
): LayoutChange {
  let present: LayoutChange = { ok: true, layout };
  for (const item of items) {
    present = change(present.layout, item);
    if (!present.ok) return present;
  }
  return present;
}
