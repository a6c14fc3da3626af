/**
 * The least slide along one axis that gives every block its room and the blade its own: the largest slide of any block is as small as
 * can be, and with that the first blocks stay nearest to where they lie.
 *
 * Blocks a before b ask for start(b) ≥ start(a) + size(a) + kerf. Earliest and latest starts follow along the pairs; a slide of at most
 * d is possible exactly when, with every start kept within d of where it was, no block's earliest start is after its latest.
 */
import type { Axis } from "../program/region";
import type { Block } from "./ways-apart";

/** Where each block's edge nearer the origin comes to lie; null when there is no room at all. */
export function leastSlide(
  blocks: readonly Block[],
  pairs: readonly (readonly [number, number])[],
  axis: Axis,
  kerf: number,
): readonly number[] | null {
  const slack = (most: number) => missingWithin(blocks, pairs, axis, kerf, most) <= 0;
  if (!slack(Number.POSITIVE_INFINITY)) return null;
  let [no, yes] = [-1, 1];
  while (!slack(yes)) [no, yes] = [yes, yes * 2];
  while (yes - no > 1) {
    const middle = no + Math.floor((yes - no) / 2);
    if (slack(middle)) yes = middle;
    else no = middle;
  }
  return settled(blocks, pairs, axis, kerf, yes);
}

/** µm that the room is too short for the blocks however they slide; 0 when they fit. */
export function missingAlong(
  blocks: readonly Block[],
  pairs: readonly (readonly [number, number])[],
  axis: Axis,
  kerf: number,
): number {
  return Math.max(0, missingWithin(blocks, pairs, axis, kerf, Number.POSITIVE_INFINITY));
}

/** How far the earliest start of some block is after its latest when none slides by more than `most`. */
function missingWithin(
  blocks: readonly Block[],
  pairs: readonly (readonly [number, number])[],
  axis: Axis,
  kerf: number,
  most: number,
): number {
  const { earliest, latest } = limits(blocks, pairs, axis, kerf, most);
  return Math.max(...earliest.map((from, i) => from - (latest[i] ?? from)));
}

interface Starts {
  readonly earliest: readonly number[];
  readonly latest: readonly number[];
}

function limits(
  blocks: readonly Block[],
  pairs: readonly (readonly [number, number])[],
  axis: Axis,
  kerf: number,
  most: number,
): Starts {
  const size = (i: number) => blocks[i]?.size[axis] ?? 0;
  const earliest = blocks.map((block) => Math.max(block.room[axis].from, block.from[axis] - most));
  const latest = blocks.map((block) => Math.min(block.room[axis].to, block.from[axis] + most));
  // Pairs make no circle, so as many rounds as there are blocks always settle; one more would change nothing.
  for (let round = 0, moved = true; moved && round < blocks.length; round++) {
    moved = false;
    for (const [a, b] of pairs) {
      const after = (earliest[a] ?? 0) + size(a) + kerf;
      const before = (latest[b] ?? 0) - kerf - size(a);
      if (after > (earliest[b] ?? 0)) {
        earliest[b] = after;
        moved = true;
      }
      if (before < (latest[a] ?? 0)) {
        latest[a] = before;
        moved = true;
      }
    }
  }
  return { earliest, latest };
}

/** One block after another is put as near as it can be to where it lies. */
function settled(
  blocks: readonly Block[],
  pairs: readonly (readonly [number, number])[],
  axis: Axis,
  kerf: number,
  most: number,
): readonly number[] {
  let fixed = blocks;
  const places: number[] = [];
  for (const [i, block] of blocks.entries()) {
    const { earliest, latest } = limits(fixed, pairs, axis, kerf, most);
    const at = Math.min(Math.max(block.from[axis], earliest[i] ?? 0), latest[i] ?? 0);
    places.push(at);
    fixed = fixed.map((one, j) => (j === i ? { ...one, room: { ...one.room, [axis]: { from: at, to: at } } } : one));
  }
  return places;
}
