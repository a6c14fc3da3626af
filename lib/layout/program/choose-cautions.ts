/** The usual cautions that apply to one cut. They remind; the machine's manual, local rules and trained practice come first. */
import type { CandidateCut } from "./candidate-cuts";
import { isHeldShort, isNarrowRip } from "./cut-plan";
import type { Caution, Part, ShopLimits } from "./program";

export function cautionsOf(cut: CandidateCut, yields: readonly Part[], limits: ShopLimits): readonly Caution[] {
  const cautions: Caution[] = [];
  if (cut.kind === "rip") cautions.push("guard-and-riving-knife");
  if (isNarrowRip(cut, limits)) cautions.push("narrow-rip-push-stick");
  if (isHeldShort(cut, limits)) cautions.push("short-crosscut-clamp");
  // Measured over wood that is cut away: with a fence or stop there it would be caught between it and the blade.
  if (cut.bladeSide === "far") cautions.push("offcut-not-between-fence-and-blade");
  if (yields.some((part) => part.kind === "blank" && part.rect.width < limits.shortestMachined))
    cautions.push("too-short-for-planer");
  return cautions;
}
