/**
 * The best places of a run by dynamic programming from its end: for each state of a piece the best that can follow it,
 *
 *   value(s) = own(s) + max over states t of the next piece, far enough along, of (seam(s, t) + value(t)).
 *
 * Exact over the states given. States of the next piece are tried best first; once even a perfect seam could not lift one to
 * what is found, none after it can. Of equal runs the one whose places come first along the board, piece by piece from its start.
 */
import type { LooseRun } from "./loose-run";
import { type LooseDesk, ownShares, seamShares } from "./loose-scores";
import type { States } from "./loose-states";
import type { Slices } from "./slices";

export interface ChainBest {
  readonly score: number;
  /** Index of the state of every piece. */
  readonly states: readonly number[];
}

/** States between two slices. */
const SLICE_STATES = 16;

/** Null where the states admit no run. Yields the share done, 0..1. */
export function* bestChain(run: LooseRun, states: readonly States[], desk: LooseDesk): Slices<ChainBest | null> {
  const last = states.length - 1;
  const values: Float64Array[] = [];
  const followers: Int32Array[] = [];
  for (let index = last; index >= 0; index--) {
    const here = states[index] as States;
    const value = ownShares(desk, run.pieces[index] as LooseRun["pieces"][number], here);
    const follower = new Int32Array(value.length).fill(-1);
    if (index < last) {
      const next = { states: states[index + 1] as States, values: values[0] as Float64Array };
      const follow = followWith(run, index, here, next, desk);
      for (let state = 0; state < value.length; state++) {
        const best = follow(state);
        follower[state] = best.state;
        value[state] = (value[state] as number) + best.value;
        if (state % SLICE_STATES === SLICE_STATES - 1) yield (last - index + state / value.length) / states.length;
      }
    }
    values.unshift(value);
    followers.unshift(follower);
    yield (last - index + 1) / states.length;
  }
  return trace(values, followers);
}

interface Next {
  readonly states: States;
  readonly values: Float64Array;
}

/** For a state of the piece at `index`: the best state of the next piece, and the seam's share and what follows. */
function followWith(run: LooseRun, index: number, here: States, next: Next, desk: LooseDesk) {
  const link = run.links[index] as LooseRun["links"][number];
  const seam = seamShares(desk, link, here, next.states);
  const atMost = link.seam === null ? 0 : desk.matchWeight;
  const order = Array.from(next.values.keys()).sort((p, q) => (next.values[q] as number) - (next.values[p] as number) || p - q);
  return (state: number): { readonly state: number; readonly value: number } => {
    const from = (here.columns[state] as number) + link.least;
    let best = { state: -1, value: Number.NEGATIVE_INFINITY };
    for (const t of order) {
      const after = next.values[t] as number;
      if (after === Number.NEGATIVE_INFINITY || atMost + after < best.value) break;
      if ((next.states.columns[t] as number) < from) continue;
      const value = seam(state, t) + after;
      if (value > best.value || (value === best.value && t < best.state)) best = { state: t, value };
    }
    return best;
  };
}

function trace(values: readonly Float64Array[], followers: readonly Int32Array[]): ChainBest | null {
  const [first] = values;
  if (first === undefined) return null;
  let state = -1;
  let score = Number.NEGATIVE_INFINITY;
  for (const [index, value] of first.entries()) if (value > score) [state, score] = [index, value];
  if (state < 0) return null;
  const states: number[] = [];
  for (const follower of followers) {
    states.push(state);
    state = follower[state] as number;
  }
  return { score, states };
}
