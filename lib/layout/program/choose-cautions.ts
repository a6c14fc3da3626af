/** The usual cautions that apply to one step. They remind; the machine's manual, local rules and trained practice come first. */
import type { CandidateCut } from "./candidate-cuts";
import { isHeldShort, isNarrowRip } from "./hazard";
import type { Caution, Part, ShopLimits } from "./program";

export function cautionsOf(
  cut: CandidateCut,
  part: Part,
  yields: readonly Part[],
  limits: ShopLimits,
  stage: "rough" | "fine",
): readonly Caution[] {
  const machine = cut.tool?.machine;
  if (!machine) return planeCautions(part, limits);
  const hasFence = machine.kind === "table" || machine.kind === "band";
  const cautions: Caution[] = [];
  if (cut.hazard.beyond > 0) cautions.push("no-machine");
  if (stage === "rough" && machine.kind === "table") cautions.push("not-flat");
  if (cut.kind === "rip" && machine.kind === "table") cautions.push("guard-and-riving-knife");
  if (isNarrowRip(cut, machine, limits)) cautions.push("narrow-rip-push-stick");
  if (isHeldShort(cut, machine, limits)) cautions.push("short-crosscut-clamp");
  // Measured over wood that is cut away: with a fence or stop there it would be caught between it and the blade.
  if (cut.bladeSide === "far" && hasFence) cautions.push("offcut-not-between-fence-and-blade");
  if (yields.some(({ kind, rect }) => kind === "blank" && rect.width < limits.shortestMachined))
    cautions.push("too-short-for-planer");
  return cautions;
}

/** Of a part that goes to jointer, planer or plane. */
export function planeCautions(part: Part, limits: ShopLimits): readonly Caution[] {
  return part.rect.width < limits.shortestMachined ? ["too-short-for-planer"] : [];
}
