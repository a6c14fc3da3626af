/**
 * What makes a place good, as parts that each run from 0 to 1, higher is better, and weights that the maker moves.
 *
 *   match     mean over the counted seams of the correlation at lag 0, below 0 counted as 0         (`correlation.ts`, `seam-plan.ts`)
 *   step      mean over the same seams of 1 − |step| / 8 mm, where a step can be told, else 0
 *   symmetry  correlation of the face's mean profile across the grain with its mirror                (`symmetry.ts`)
 *   clear     distance to the nearest keep-clear area, up to 30 mm                                    (`clear-room.ts`)
 *   rest      largest rectangle worth keeping that is left of the board, over the largest of the board without the group
 *             (`largest-rest.ts`); the group counts with its whole rectangle as sawn and the cut around it
 *   stock     how glad the shop is to use this board: passed in, from its age or cost; the same wherever the group lies
 *
 *   total = Σ weight·part / Σ weight over the parts that apply, added up in this order.
 *
 * A part applies or not for the group and board as a whole, never for one place: without a counted seam there is no match and no
 * step, without 20 mm across no symmetry, and no rest on a board that has nothing worth keeping even without the group.
 */
export const partNames = ["match", "step", "symmetry", "clear", "rest", "stock"] as const;
export type PartName = (typeof partNames)[number];

/** Null: does not apply. */
export type Parts = Readonly<Record<PartName, number | null>>;

/** Zero or more each; only their ratios matter. */
export type Weights = Readonly<Record<PartName, number>>;

/** A figure that runs on comes first. Our own choice; the maker moves them. */
export const defaultWeights: Weights = { match: 4, step: 3, symmetry: 2, clear: 1, rest: 2, stock: 1 };

/** 0..1; 0 when no part that applies has any weight. `parts` and `weights` in the order of `partNames`, NaN: does not apply. */
export function totalOfValues(parts: Float64Array, weights: readonly number[]): number {
  let [sum, weight] = [0, 0];
  for (let index = 0; index < weights.length; index++) {
    const part = parts[index] as number;
    if (Number.isNaN(part)) continue;
    sum += (weights[index] as number) * part;
    weight += weights[index] as number;
  }
  return weight > 0 ? sum / weight : 0;
}

export function weightsInOrder(weights: Weights): readonly number[] {
  return partNames.map((name) => weights[name]);
}

export function totalOf(parts: Parts, weights: Weights): number {
  return totalOfValues(
    Float64Array.from(partNames, (name) => parts[name] ?? Number.NaN),
    weightsInOrder(weights),
  );
}

export function partsFrom(values: Float64Array): Parts {
  const part = (name: PartName): number | null => {
    const value = values[partNames.indexOf(name)] as number;
    return Number.isNaN(value) ? null : value;
  };
  return {
    match: part("match"),
    step: part("step"),
    symmetry: part("symmetry"),
    clear: part("clear"),
    rest: part("rest"),
    stock: part("stock"),
  };
}
