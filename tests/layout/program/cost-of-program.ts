/** What a program costs, read from its steps alone: fewer of the first that differs is better. */
import type { CutRequest } from "@/lib/layout/program/cut-request";
import type { CutProgram, CutStep } from "@/lib/layout/program/program";

/**
 * Cuts that no machine may take, unsafe holds, rips of shortened parts, cuts away from the preferred machines, settings, turns, steps,
 * and minus the µm² that go back to the rack.
 */
export type Cost = readonly [number, number, number, number, number, number, number, number];

/** Of the fine steps of a program; truing and the rough stage are not counted. */
export function costOfProgram(program: CutProgram, request: CutRequest): Cost {
  const { limits, machines } = request;
  const steps = program.steps.filter((step) => step.kind !== "true");
  const cuts = steps.filter((step) => step.kind !== "plane");
  const kindOf = (step: CutStep) => program.machines?.find(({ id }) => id === step.machineId)?.kind ?? "table";
  const isShort = (step: CutStep) =>
    kindOf(step) !== "hand" &&
    (step.kind === "rip" ? step.part.rect.width : Math.max(0, ...step.yields.map((part) => part.rect.width))) <
      limits.shortestCrosscut;
  const isNarrow = (step: CutStep) =>
    ["table", "band"].includes(kindOf(step)) &&
    step.kind === "rip" &&
    step.setting - (step.bladeSide === "far" ? step.kerf.height : 0) < limits.narrowestRip;
  const shortened = new Set<string>();
  for (const step of steps)
    if (step.kind === "crosscut" || shortened.has(step.part.id)) for (const part of step.yields) shortened.add(part.id);
  const isStray = ({ kind, machineId }: CutStep) =>
    machines !== undefined && (kind === "rip" || kind === "crosscut") && machineId !== machines[kind].id;
  return [
    cuts.filter((step) => step.cautions.includes("no-machine")).length,
    cuts.filter(isShort).length + cuts.filter(isNarrow).length,
    cuts.filter((step) => step.kind === "rip" && shortened.has(step.part.id)).length,
    cuts.filter(isStray).length,
    new Set(cuts.map((step) => `${step.machineId} ${step.kind} ${step.bladeSide} ${step.setting}`)).size,
    cuts.filter((step) => step.turn !== "none").length,
    steps.length,
    -program.offcuts.reduce((sum, { rect }) => sum + rect.width * rect.height, 0),
  ];
}

export function compareCosts(a: Cost, b: Cost): number {
  const at = a.findIndex((value, i) => value !== b[i]);
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}
