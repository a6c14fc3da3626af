/** Whether the steps that were issued for a part in hand still hold as they are: then they are kept, to the letter. */
import { bladeOf, type CutProgram, type CutStep, isSawn } from "../program/program";
import type { Holding } from "./hold-pieces";
import { stepsOf } from "./issued-way";
import { blankRect, sameRect } from "./rect-edge";
import type { Sawing } from "./stands";

/** The steps; null when anything about the part, its pieces or the blades is not as it was planned. */
export function keptSteps(
  { held, pieces }: Holding,
  open: readonly CutStep[],
  program: CutProgram,
  sawing: Sawing,
): readonly CutStep[] | null {
  const steps = stepsOf(held.part.id, open);
  const [first] = steps;
  if (!first || !sameRect(first.part.rect, held.part.rect)) return null;
  const made = new Set(steps.flatMap(({ yields }) => yields.map(({ id }) => id)));
  const planned = program.pieces.filter(({ id }) => made.has(id));
  if (planned.length !== pieces.length) return null;
  const parts = new Map(steps.flatMap(({ yields }) => yields.map((part) => [part.id, part] as const)));
  const asPlanned = pieces.every((piece) => {
    const part = planned.find(({ pieceId }) => pieceId === piece.pieceId);
    const blank = part && parts.get(part.id);
    return part && blank && sameRect(part.rect, piece.rect) && sameRect(blank.rect, blankRect(piece));
  });
  return asPlanned && steps.every((step) => bladeOf(step, program) === bladeNow(step, sawing)) ? steps : null;
}

/** Width of the blade that will make a step. */
export function bladeNow({ kind, machineId }: CutStep, { kerf, machines }: Sawing): number {
  if (!isSawn(kind)) return 0;
  const all = machines ? [machines.rip, machines.crosscut, ...machines.others] : [];
  return all.find(({ id }) => id === machineId)?.kerf ?? kerf[kind];
}
