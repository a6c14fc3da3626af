/**
 * What a cut costs, and what that does to the figure (closed forms; `seam/seams.ts` finds the same from the piece maps).
 *
 * Neighbours cut from one board at spacing s and hung with gap g lie s − g nearer together on the face than they grew: that much
 * of the figure is missing at the seam. Lengths in µm.
 */
import { type Um, um } from "../units/um";
import type { Grain } from "./face";
import type { CutLoss, Spacing } from "./face-layout";

export type CutDirection = "crosscut" | "rip";

/** Which cut parts two columns, and which two rows: a crosscut goes across the grain, a rip along it. */
export function cutBetween(parted: "columns" | "rows", grain: Grain): CutDirection {
  return (parted === "columns") === (grain === "horizontal") ? "crosscut" : "rip";
}

/** Wood that is gone between two show edges once both are clean. */
export function lossOf(cut: CutLoss): Um {
  return um(cut.kerf + cut.cleanUpBefore + cut.cleanUpAfter);
}

/** Distance in the wood between the show edges of neighbours. */
export function spacingOf(cut: CutLoss, gap: Um, spacing: Spacing): Um {
  return spacingAt(lossOf(cut), gap, spacing);
}

/** The same where the loss is known. */
export function spacingAt(loss: Um, gap: Um, spacing: Spacing): Um {
  return spacing === "followGap" ? um(Math.max(loss, gap)) : loss;
}

/**
 * How far the figure jumps at the seam, along its normal: positive where wood is missing, negative where some is seen twice
 * over.
 */
export function jumpAcrossGap(cut: CutLoss, gap: Um, spacing: Spacing): Um {
  return um(spacingOf(cut, gap, spacing) - gap);
}

/** Width of the strip that a second cut takes out as waste so that the figure runs on; 0 where the loss fills the gap. */
export function sliverOf(cut: CutLoss, gap: Um, spacing: Spacing): Um {
  return um(spacingOf(cut, gap, spacing) - lossOf(cut));
}
