/** What a program costs, read from its steps alone: fewer of the first that differs is better. */
import type { CutRequest } from "@/lib/layout/program/cut-request";
import type { CutProgram, CutStep } from "@/lib/layout/program/program";

/** Unsafe holds, rips of shortened parts, settings, turns, cuts, and minus the µm² that go back to the rack. */
export type Cost = readonly [number, number, number, number, number, number];

export function costOfProgram(program: CutProgram, { limits }: CutRequest): Cost {
  const cuts = program.steps.filter((step) => step.kind !== "true");
  const board = cuts[0]?.part.rect.width ?? 0;
  const isShort = (step: CutStep) =>
    (step.kind === "rip" ? step.part.rect.width : Math.max(0, ...step.yields.map((part) => part.rect.width))) <
    limits.shortestCrosscut;
  const isNarrow = (step: CutStep) =>
    step.kind === "rip" && step.setting - (step.bladeSide === "far" ? step.kerf.height : 0) < limits.narrowestRip;
  const isLate = (step: CutStep) => step.kind === "rip" && step.part.rect.width < board;
  const settings = new Set(cuts.map((step) => `${step.kind} ${step.bladeSide} ${step.setting}`));
  return [
    cuts.filter(isShort).length + cuts.filter(isNarrow).length,
    cuts.filter(isLate).length,
    settings.size,
    cuts.filter((step) => step.turn !== "none").length,
    cuts.length,
    -program.offcuts.reduce((sum, { rect }) => sum + rect.width * rect.height, 0),
  ];
}

export function compareCosts(a: Cost, b: Cost): number {
  const at = a.findIndex((value, i) => value !== b[i]);
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}
