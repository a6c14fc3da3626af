import { describe, expect, test } from "vitest";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import type { CutProgram, CutStep } from "@/lib/layout/program/program";
import { verifyProgram } from "@/lib/layout/program/verify-program";
import { um } from "@/lib/layout/units/um";
import { request, row } from "./row-of-fronts";

const asked = request(2350, 230, row(3, 96, 14, 243.2, 184, 3));
const outcome = planCuts(asked);
if (!outcome.ok) throw new Error(outcome.reason);
const { program } = outcome;
const first = program.steps[0]?.number ?? 0;

function withStep(number: number, change: Partial<CutStep>): CutProgram {
  return { ...program, steps: program.steps.map((step) => (step.number === number ? { ...step, ...change } : step)) };
}

describe("verifyProgram finds what has been spoilt", () => {
  test("nothing, in the program as planned", () => {
    expect(verifyProgram(asked, program)).toEqual({ ok: true });
  });

  test("a setting off by one micrometre", () => {
    const crosscut = program.steps.find((step) => step.yields[0]?.pieceId === "p1");
    const spoilt = withStep(crosscut?.number ?? 0, { setting: um((crosscut?.setting ?? 0) + 1) });
    expect(verifyProgram(asked, spoilt)).toMatchObject({ ok: false, reason: "piece-differs", piece: "p1" });
  });

  test("a blade of another width", () => {
    const thick = { ...program, kerf: { ...program.kerf, crosscut: um(2_500) } };
    expect(verifyProgram(asked, thick)).toMatchObject({ ok: false, reason: "piece-differs", piece: "p2" });
  });

  test("a cut measured from a rough edge", () => {
    const rough = { ...asked, boardEdges: { ...asked.boardEdges, top: "rough" as const } };
    const fault = { reason: "cannot-be-carried-out", step: first, fault: "edge-not-straight" };
    expect(verifyProgram(rough, program)).toMatchObject(fault);
  });

  test("a part taken in hand before it exists", () => {
    const [one, ...rest] = program.steps;
    const spoilt = { ...program, steps: one ? [...rest, one] : rest };
    expect(verifyProgram(asked, spoilt)).toMatchObject({ reason: "cannot-be-carried-out", fault: "part-not-in-hand" });
  });

  test("a blade that misses the part, and a yield that does not come off", () => {
    expect(verifyProgram(asked, withStep(first, { setting: um(230_000) }))).toMatchObject({ fault: "blade-misses" });
    expect(verifyProgram(asked, withStep(first, { setting: um(228_000) }))).toMatchObject({ fault: "yields-differ" });
  });

  test("wood that the sum leaves out", () => {
    const conservation = { ...program.conservation, waste: program.conservation.waste - 1 };
    expect(verifyProgram(asked, { ...program, conservation })).toEqual({
      ok: false,
      reason: "wood-is-lost",
      share: "waste",
      by: -1,
    });
  });
});
