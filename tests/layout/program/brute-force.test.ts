import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { boardEdges, type CutRequest, type PlacedPiece } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import type { ShopLimits } from "@/lib/layout/program/program";
import { um } from "@/lib/layout/units/um";
import { costOfProgram } from "./cost-of-program";
import { type BoardEdge, type Box, leastCost } from "./every-tree";
import { anyBoardEdges } from "./random-layouts";

/** Boards of a few micrometres, so that every position can be tried. */
const limits: ShopLimits = {
  shortestCrosscut: um(7),
  narrowestRip: um(3),
  shortestMachined: um(7),
  offcutLength: um(5),
  offcutWidth: um(3),
};
const none = { left: um(0), right: um(0), top: um(0), bottom: um(0) };

const size = fc.integer({ min: 1, max: 6 });
const spot = fc.record({ x: fc.nat(9), y: fc.nat(7), width: size, height: size });
type Spot = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

const anywhere = (most: number) => fc.array(spot, { minLength: 1, maxLength: most });

/** Those of many that lie clear of the ones before, as tight as they come: among them are layouts that block. */
const crowded = fc.array(spot, { minLength: 20, maxLength: 40 }).map((spots) => {
  const kept: Spot[] = [];
  for (const one of spots) if (kept.every((other) => isClear(one, other))) kept.push(one);
  return kept;
});

function isClear(a: Spot, b: Spot): boolean {
  return a.x + a.width <= b.x || b.x + b.width <= a.x || a.y + a.height <= b.y || b.y + b.height <= a.y;
}

const tinyRequest = (spots: fc.Arbitrary<Spot[]>, budget: number): fc.Arbitrary<CutRequest> =>
  fc
    .record({ pieces: spots, kerf: fc.constantFrom(0, 0, 0, 1, 2), spare: fc.nat(3), deep: fc.nat(1) })
    .map(({ pieces, kerf, spare, deep }) => ({
      board: {
        length: um(Math.max(...pieces.map((one) => one.x + one.width)) + spare),
        width: um(Math.max(...pieces.map((one) => one.y + one.height)) + deep),
      },
      pieces: pieces.map(
        (one, i): PlacedPiece => ({
          pieceId: `p${i + 1}`,
          label: String(i + 1),
          cleanUp: none,
          rect: { x: um(one.x), y: um(one.y), width: um(one.width), height: um(one.height) },
        }),
      ),
      kerf: { rip: um(kerf), crosscut: um(kerf) },
      boardEdges: boardEdges(true, true),
      truingTakes: { longEdge: um(0), end: um(0) },
      limits,
      budget,
    }));

const boxesOf = (request: CutRequest): Box[] =>
  request.pieces.map(({ rect }) => ({ x0: rect.x, x1: rect.x + rect.width, y0: rect.y, y1: rect.y + rect.height }));

/** Tries a blade at every whole position in either direction, again and again. */
function comeApart(boxes: readonly Box[], kerf: number): boolean {
  if (boxes.length < 2) return true;
  const sides: readonly ((one: Box) => readonly [number, number])[] = [(one) => [one.x0, one.x1], (one) => [one.y0, one.y1]];
  return sides.some((side) =>
    Array.from({ length: 24 }, (_, at) => at).some((at) => {
      const low = boxes.filter((one) => side(one)[1] <= at);
      const high = boxes.filter((one) => side(one)[0] >= at + kerf);
      if (low.length === 0 || high.length === 0 || low.length + high.length < boxes.length) return false;
      return comeApart(low, kerf) && comeApart(high, kerf);
    }),
  );
}

describe("against brute force on tiny boards", () => {
  test("a layout is refused exactly when no sequence of cuts at any position parts it, and the pieces named block one another", () => {
    const seen = { ok: 0, blocked: 0, "too-close": 0 };
    fc.assert(
      fc.property(tinyRequest(fc.oneof(anywhere(5), crowded, crowded), 300), (request) => {
        const outcome = planCuts(request);
        const { crosscut: kerf } = request.kerf;
        const possible = comeApart(boxesOf(request), kerf);
        if (outcome.ok) seen.ok++;
        else if (outcome.reason === "nothing-to-cut") return;
        else if (outcome.reason !== "outside") seen[outcome.reason]++;
        expect(outcome.ok).toBe(possible);
        if (outcome.ok || outcome.reason === "outside") return;
        const named = boxesOf({ ...request, pieces: request.pieces.filter(({ pieceId }) => outcome.pieces.includes(pieceId)) });
        expect(comeApart(named, kerf)).toBe(false);
        for (const left of named)
          expect(
            comeApart(
              named.filter((one) => one !== left),
              kerf,
            ),
          ).toBe(true);
      }),
      { numRuns: 1500 },
    );
    expect(Math.min(...Object.values(seen))).toBeGreaterThan(10);
  });

  const costs = (request: CutRequest) => {
    const outcome = planCuts(request);
    if (!outcome.ok || outcome.program.steps.some((step) => step.kind === "true")) return null;
    const { length, width } = request.board;
    const board = { x0: 0, x1: length, y0: 0, y1: width };
    const { left, right, top, bottom } = request.boardEdges;
    const states = { "x low": left, "x high": right, "y low": top, "y high": bottom };
    const edges: BoardEdge[] = ["x low", "x high", "y low", "y high"];
    const rough = new Set(edges.filter((edge) => states[edge] === "rough"));
    const shop = { limits, kerf: { x: request.kerf.crosscut, y: request.kerf.rip }, board, rough, most: 300 };
    return { found: outcome.program, least: leastCost(boxesOf(request), shop) };
  };

  test("no tree is safer, and of the safest none has fewer settings, then turns, then cuts, or gives more wood back", () => {
    let compared = 0;
    fc.assert(
      fc.property(tinyRequest(anywhere(3), 300_000), (request) => {
        const both = costs(request);
        if (!both || both.least === "too many") return;
        compared++;
        expect(both.found.search.proven).toBe(true);
        expect(costOfProgram(both.found, request)).toEqual(both.least);
      }),
      { numRuns: 150 },
    );
    expect(compared).toBeGreaterThan(15);
  });

  test("the same on boards with some edges rough", () => {
    let compared = 0;
    fc.assert(
      fc.property(tinyRequest(anywhere(3), 300_000), anyBoardEdges, (request, boardEdges) => {
        const both = costs({ ...request, boardEdges });
        if (!both || both.least === "too many") return;
        compared++;
        expect(costOfProgram(both.found, request)).toEqual(both.least);
      }),
      { numRuns: 700 },
    );
    expect(compared).toBeGreaterThan(40);
  });
});
