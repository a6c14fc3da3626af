/** Sizes one after another along one axis, with the distances between them. */
import { type Um, um } from "../units/um";

export interface Run {
  readonly sizes: readonly Um[];
  /** One fewer than sizes. */
  readonly between: readonly Um[];
}

/** Where each size of a run starts, counted from the start of the first. */
export function startsOf(run: Run): Um[] {
  let next = 0;
  return run.sizes.map((size, index) => {
    const start = um(next);
    next += size + (run.between[index] ?? 0);
    return start;
  });
}

/** From the start of the first to the end of the last. */
export function lengthOf({ sizes, between }: Run): Um {
  return um([...sizes, ...between].reduce((sum, part) => sum + part, 0));
}
