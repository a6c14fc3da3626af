import { describe, expect, test } from "vitest";
import { defaultCutBudget } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import { verifyProgram } from "@/lib/layout/program/verify-program";
import { front, request } from "./row-of-fronts";

function grid(columns: number, rows: number, widthOf: (column: number) => number, heightMm: number) {
  const fronts = [];
  for (let row = 0; row < rows; row++) {
    let x = 20;
    for (let column = 0; column < columns; column++) {
      fronts.push(front(row * columns + column + 1, x, 10 + row * (heightMm + 3), widthOf(column), heightMm));
      x += widthOf(column) + 3;
    }
  }
  return fronts;
}

describe("large layouts, counted in plans weighed", () => {
  test("24 fronts of one size are solved and proven well inside the budget", () => {
    const asked = request(
      2350,
      630,
      grid(6, 4, () => 243.2, 144),
    );
    const outcome = planCuts(asked);
    if (!outcome.ok) throw new Error(outcome.reason);
    expect(outcome.program.search.proven).toBe(true);
    expect(outcome.program.search.steps).toBeLessThan(40_000);
    expect(verifyProgram(asked, outcome.program)).toEqual({ ok: true });
  });

  test("300 fronts on one board stay inside the budget, come out exactly, and need few settings", () => {
    const asked = request(
      6000,
      1630,
      grid(30, 10, () => 180, 144),
    );
    const outcome = planCuts(asked);
    if (!outcome.ok) throw new Error(outcome.reason);
    expect(outcome.program.search.steps).toBeLessThanOrEqual(defaultCutBudget + outcome.program.steps.length);
    expect(verifyProgram(asked, outcome.program)).toEqual({ ok: true });
    // Clear of the edge, height, sliver between rows, square end, front, sliver between fronts.
    expect(outcome.program.settings).toBe(6);
  });

  test("300 fronts of thirty widths stay inside the budget and come out exactly", () => {
    const asked = request(
      6500,
      1630,
      grid(30, 10, (column) => 150 + ((column * 7) % 30) * 3, 144),
    );
    const outcome = planCuts(asked);
    if (!outcome.ok) throw new Error(outcome.reason);
    expect(outcome.program.search.steps).toBeLessThanOrEqual(defaultCutBudget + outcome.program.steps.length);
    expect(verifyProgram(asked, outcome.program)).toEqual({ ok: true });
  });
});
