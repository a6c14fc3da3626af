import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { CutRequest } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import { verifyProgram } from "@/lib/layout/program/verify-program";
import { costOfProgram } from "./cost-of-program";
import { leastCost } from "./every-tree";
import { anyBoardEdges } from "./random-layouts";
import { anywhere, crowded, tinyRequest, withMachines } from "./tiny-requests";

interface Box {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
}

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

  /** How often a program was found and held against every tree of its request. */
  function compareWithAll(requests: fc.Arbitrary<CutRequest>, numRuns: number): number {
    let compared = 0;
    fc.assert(
      fc.property(requests, (request) => {
        const outcome = planCuts(request);
        if (!outcome.ok || outcome.program.steps.some((step) => step.kind === "true")) return;
        expect(verifyProgram(request, outcome.program)).toEqual({ ok: true });
        const least = leastCost(request, 300);
        if (least === "too many") return;
        compared++;
        expect(outcome.program.search.proven).toBe(true);
        expect(costOfProgram(outcome.program, request)).toEqual(least);
      }),
      { numRuns },
    );
    return compared;
  }

  test("no tree is safer, and of the safest none has fewer settings, then turns, then cuts, or gives more wood back", () => {
    expect(compareWithAll(tinyRequest(anywhere(3), 300_000), 150)).toBeGreaterThan(15);
  });

  test("the same where what is too thin for the saw goes to the plane", () => {
    expect(compareWithAll(tinyRequest(anywhere(3), 300_000, 2), 200)).toBeGreaterThan(15);
  });

  test("the same on boards with some edges rough, and ends that a line can only be marked from", () => {
    const requests = fc
      .record({ request: tinyRequest(anywhere(3), 300_000), boardEdges: anyBoardEdges })
      .map(({ request, boardEdges }) => ({ ...request, boardEdges }));
    expect(compareWithAll(requests, 700)).toBeGreaterThan(40);
  });

  test("the same with machines of all kinds, each with its own kerf, clean-up and limits", () => {
    const requests = fc
      .record({ request: withMachines(tinyRequest(anywhere(3), 300_000, 2)), boardEdges: anyBoardEdges })
      .map(({ request, boardEdges }) => ({ ...request, boardEdges }));
    expect(compareWithAll(requests, 700)).toBeGreaterThan(40);
  });
});
