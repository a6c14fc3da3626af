import { describe, expect, test } from "vitest";
import { boardEdges } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import { front, request, row } from "./row-of-fronts";

describe("placements refused before any cut is sought", () => {
  test("no pieces, or one that is the board: nothing to cut", () => {
    expect(planCuts(request(1000, 200, []))).toEqual({ ok: false, reason: "nothing-to-cut" });
    expect(planCuts(request(1000, 200, [front(1, 0, 0, 1000, 200)]))).toEqual({ ok: false, reason: "nothing-to-cut" });
  });

  test("a piece over the edge is named with how far it reaches, clean-up counted", () => {
    const over = planCuts(request(1000, 200, [front(1, 10, 10, 300, 100), front(2, 750, 10, 254.2, 100)]));
    expect(over).toEqual({ ok: false, reason: "outside", piece: "p2", by: 4_200 });
    const cleaned = planCuts(request(1000, 200, [front(1, 0.4, 10, 300, 100, 1)]));
    expect(cleaned).toEqual({ ok: false, reason: "outside", piece: "p1", by: 600 });
  });

  test("two pieces closer than the loss are named with what is missing: kerf 2.4 + 2 × clean-up 0.5 − spacing 3.0 = 0.4", () => {
    const pieces = [front(1, 100, 50, 200, 100, 0.5), front(2, 303, 50, 200, 100, 0.5)];
    expect(planCuts(request(1000, 200, pieces))).toEqual({ ok: false, reason: "too-close", pieces: ["p1", "p2"], missing: 400 });
  });

  test("the loss exactly is enough", () => {
    const pieces = [front(1, 100, 50, 200, 100, 0.5), front(2, 303.4, 50, 200, 100, 0.5)];
    expect(planCuts(request(1000, 200, pieces)).ok).toBe(true);
  });

  test("pieces that overlap lack the overlap too", () => {
    const outcome = planCuts(request(1000, 400, [front(1, 100, 50, 200, 100), front(2, 290, 60, 200, 100)]));
    expect(outcome).toEqual({ ok: false, reason: "too-close", pieces: ["p1", "p2"], missing: 12_400 });
  });

  test("where both long edges are rough and truing either would eat into a piece, the lesser lack is told", () => {
    const outcome = planCuts(request(2000, 186, row(2, 100, 0.5, 300, 184, 3), { boardEdges: boardEdges(false, true) }));
    // Truing takes 2.0; there is 0.5 above and 1.5 below.
    expect(outcome).toEqual({ ok: false, reason: "outside", piece: "p1", by: 500 });
  });
});

describe("truing before the first cut", () => {
  const kinds = (edges: ReturnType<typeof boardEdges>, pieces = row(2, 100, 10, 300, 184, 3)) => {
    const outcome = planCuts(request(2000, 230, pieces, { boardEdges: edges }));
    return outcome.ok ? outcome.program.steps.filter((step) => step.kind === "true").map((step) => step.fromEdge) : outcome;
  };

  test("true edges need none, rough ones one each way", () => {
    expect(kinds(boardEdges(true, true))).toEqual([]);
    expect(kinds(boardEdges(true, false))).toEqual(["left"]);
    expect(kinds(boardEdges(false, true))).toEqual(["top"]);
    expect(kinds(boardEdges(false, false))).toEqual(["top", "left"]);
  });

  test("one true edge is reference enough", () => {
    expect(kinds({ left: "rough", right: "trued", top: "rough", bottom: "trued" })).toEqual([]);
  });

  test("a strip the whole length of the board leaves the ends as they are when their clean-up is allowed for", () => {
    expect(kinds(boardEdges(false, false), [front(1, 1, 10, 1998, 184, 1)])).toEqual(["top"]);
  });

  test("of two rough edges the one is trued that leaves the pieces alone", () => {
    expect(kinds(boardEdges(false, true), row(2, 100, 1, 300, 184, 3))).toEqual(["bottom"]);
  });
});
