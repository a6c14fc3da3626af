import fc from "fast-check";
import { expect, test } from "vitest";
import { type FaceLayout, freshLayout, type LooseRequest, rowFace, runSlices, um } from "@/lib/layout";
import { bestChain } from "@/lib/layout/search/loose-chain";
import { type LooseRun, looseRun } from "@/lib/layout/search/loose-run";
import { type LooseDesk, looseDesk, ownShares, seamShares } from "@/lib/layout/search/loose-scores";
import type { States } from "@/lib/layout/search/loose-states";
import { boundedArea } from "@/lib/layout/search/place-areas";
import { woodSums } from "@/lib/layout/search/wood-sums";
import { boardOf } from "../arbitrary-layout";
import { woodPicture } from "./arbitrary-search";

const cut = { kerf: um(2_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const layout: FaceLayout = freshLayout(
  rowFace([um(22_000), um(22_000), um(22_000), um(22_000)], um(22_000), um(2_000), "horizontal"),
  {
    crosscut: cut,
    rip: cut,
    spacing: "followGap",
  },
);
const knot = {
  shape: "ellipse",
  centre: { x: um(60_000), y: um(20_000) },
  radiusX: um(5_000),
  radiusY: um(5_000),
  turnDeg: 0,
} as const;
const board = boardOf("b1", 160_000, 40_000);

function runOn(seed: number, second: boolean): { run: LooseRun; desk: LooseDesk } {
  const picture = woodPicture(board.length, board.width, seed);
  const request: LooseRequest = {
    layout,
    run: ["p1", "p2", "p3", "p4"],
    locked: [],
    side: { side: "face", board, picture },
    neighbours: [],
    weights: { match: 2, clear: 1 },
    leastOffcut: { along: um(1_000), across: um(1_000) },
    grid: { along: um(500), across: um(500) },
    mostPairs: 1,
  };
  const run = looseRun(request, second ? 2 : 0, () => picture);
  return { run, desk: looseDesk(run, woodSums(picture), [boundedArea(knot)], request.weights) };
}

/** Columns on a short scale, so that states often share one and runs often tie. */
const arbitraryStates: fc.Arbitrary<States[]> = fc
  .array(fc.array(fc.tuple(fc.integer({ min: 0, max: 6 }), fc.nat(2)), { minLength: 1, maxLength: 5 }), {
    minLength: 4,
    maxLength: 4,
  })
  .map((all) =>
    all.map((places, piece) => {
      const sorted = places
        .map(([column, row]) => [piece * 40 + column * 16, row * 9] as const)
        .sort((p, q) => p[0] - q[0] || p[1] - q[1]);
      return { columns: Int32Array.from(sorted, ([column]) => column), rows: Int32Array.from(sorted, ([, row]) => row) };
    }),
  );

test("the chain is the best of all there are, of equal ones the first, added up from its end", () => {
  fc.assert(
    fc.property(arbitraryStates, fc.integer({ min: 1, max: 200 }), fc.boolean(), (states, seed, second) => {
      const { run, desk } = runOn(seed, second);
      const own = states.map((one, index) => ownShares(desk, run.pieces[index] as LooseRun["pieces"][number], one));
      const seams = run.links.map((link, index) => seamShares(desk, link, states[index] as States, states[index + 1] as States));
      let best: { score: number; states: number[] } | null = null;
      const from = (piece: number, state: number): { score: number; states: number[] } | null => {
        const share = own[piece]?.[state] ?? 0;
        if (piece === states.length - 1) return { score: share, states: [state] };
        let most: { score: number; states: number[] } | null = null;
        for (const next of (states[piece + 1] as States).columns.keys()) {
          const apart = ((states[piece + 1] as States).columns[next] ?? 0) - ((states[piece] as States).columns[state] ?? 0);
          const rest = apart >= (run.links[piece]?.least ?? 0) ? from(piece + 1, next) : null;
          const score = rest === null ? Number.NEGATIVE_INFINITY : (seams[piece]?.(state, next) ?? 0) + rest.score;
          if (rest !== null && (most === null || score > most.score)) most = { score, states: rest.states };
        }
        return most === null ? null : { score: share + most.score, states: [state, ...most.states] };
      };
      for (const state of (states[0] as States).columns.keys()) {
        const run = from(0, state);
        if (run !== null && (best === null || run.score > best.score)) best = run;
      }
      expect(runSlices(bestChain(run, states, desk))).toEqual(best);
    }),
    { numRuns: 50 },
  );
});
