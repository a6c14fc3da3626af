/** Which steps are done: those ticked, and those without which a ticked one could not have been done. */
import type { CutStep } from "../program/program";

export interface DoneSteps {
  /** In the order of the program. */
  readonly steps: readonly CutStep[];
  /** Numbers of those that nobody ticked. */
  readonly implied: readonly number[];
}

export function doneSteps(steps: readonly CutStep[], ticked: ReadonlySet<number>): DoneSteps {
  const maker = new Map(steps.flatMap((step) => step.yields.map((part) => [part.id, step] as const)));
  const done = new Set<number>();
  for (const step of steps) {
    let made = ticked.has(step.number) ? step : undefined;
    while (made && !done.has(made.number)) {
      done.add(made.number);
      made = maker.get(made.part.id);
    }
  }
  return {
    steps: steps.filter(({ number }) => done.has(number)),
    implied: [...done].filter((number) => !ticked.has(number)).sort((a, b) => a - b),
  };
}
