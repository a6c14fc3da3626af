/**
 * Repeatable randomness. Every source of chance in the sawmill starts from a seed that the caller passes in;
 * nothing here may read a clock or the machine's own generator.
 */

/** Gives the next number of its sequence, at least 0 and below 1. */
export type Random = () => number;

/** A sequence for one purpose: the same seed and purpose always give the same numbers, two purposes share none. */
export function randomFor(seed: number, purpose: string): Random {
  let state = seed | 0;
  for (let i = 0; i < purpose.length; i++) state = Math.imul(state ^ purpose.charCodeAt(i), 0x01000193);
  // A counter of odd step through a finalising mix: period 2^32, no state beyond one integer.
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** A number spread evenly between `low` and `high`. */
export function between(random: Random, low: number, high: number): number {
  return low + (high - low) * random();
}

/** A bell-shaped number of mean 0 and standard deviation 1, from the sum of twelve even ones; never beyond ±6. */
export function bell(random: Random): number {
  let sum = -6;
  for (let i = 0; i < 12; i++) sum += random();
  return sum;
}
