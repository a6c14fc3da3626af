/**
 * Puts the steps of several parts in hand in one order of work: a part is cut after the cut that made it, and cuts of one setting
 * follow each other where the parts allow. Only the order of the list changes, no step does but the number of its setting.
 */
import { type CutStep, isSawn } from "../program/program";

/** The same setting as the last cut first, else rips before the rest, else the list that came first. */
export function inOrderOfWork(lists: readonly (readonly CutStep[])[], before: CutStep | undefined): readonly CutStep[] {
  const waiting = lists.flat();
  const madeBy = new Set(waiting.flatMap(({ yields }) => yields.map(({ id }) => id)));
  const order: CutStep[] = [];
  let dialled = before && settingOf(before);
  while (waiting.length > 0) {
    const ready = waiting.filter(({ part }) => !madeBy.has(part.id));
    const next =
      ready.find((step) => isSawn(step.kind) && settingOf(step) === dialled) ??
      ready.find(({ kind }) => !isSawn(kind)) ??
      ready.find(({ kind }) => kind === "rip") ??
      ready[0];
    if (!next) throw new Error("steps wait for parts that nothing makes");
    waiting.splice(waiting.indexOf(next), 1);
    for (const { id } of next.yields) madeBy.delete(id);
    order.push(next);
    if (isSawn(next.kind)) dialled = settingOf(next);
  }
  return order;
}

/** Settings numbered again: equal ones alike, those of steps already done first. */
export function withSettingNumbers(done: readonly CutStep[], rest: readonly CutStep[]): readonly CutStep[] {
  const numbers = new Map<string, number>();
  let highest = 0;
  for (const step of done) {
    if (!isSawn(step.kind)) continue;
    numbers.set(settingOf(step), step.settingNumber);
    highest = Math.max(highest, step.settingNumber);
  }
  return rest.map((step) => {
    if (!isSawn(step.kind)) return step;
    const number = numbers.get(settingOf(step)) ?? ++highest;
    numbers.set(settingOf(step), number);
    return { ...step, settingNumber: number };
  });
}

/** Everything that makes two cuts share a setting of a machine. */
function settingOf({ kind, machineId, stage, bladeSide, setting }: CutStep): string {
  return [kind, machineId ?? "", stage ?? "", bladeSide, setting].join(" ");
}
