import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { CutRequest } from "@/lib/layout/program/cut-request";
import { mirrorProgram, mirrorRequest } from "@/lib/layout/program/mirror";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import type { CutProgram } from "@/lib/layout/program/program";
import { verifyProgram } from "@/lib/layout/program/verify-program";
import { compareCosts, costOfProgram } from "./cost-of-program";
import { sawableRequest, tiledRequest } from "./random-layouts";

const runs = { numRuns: 120 };

/** The program of a layout that can be sawn; nothing to cut (the piece is the board) counts as none. */
function programOf(request: CutRequest): CutProgram | null {
  const outcome = planCuts(request);
  if (!outcome.ok && outcome.reason === "nothing-to-cut") return null;
  expect(outcome).toMatchObject({ ok: true });
  return outcome.ok ? outcome.program : null;
}

describe("planCuts on layouts made by cutting a board up at random", () => {
  test("finds a program, and carried out it leaves exactly the pieces, loses no wood and measures from straight edges only", () => {
    let found = 0;
    fc.assert(
      fc.property(sawableRequest, (request) => {
        const program = programOf(request);
        if (!program) return;
        found++;
        expect(verifyProgram(request, program)).toEqual({ ok: true });
      }),
      runs,
    );
    expect(found).toBeGreaterThan(runs.numRuns / 2);
  });

  test("never takes a plan for a part with straight edges to one that looks alike but has a rough edge", () => {
    fc.assert(
      fc.property(tiledRequest, (request) => {
        const program = programOf(request);
        if (program) expect(verifyProgram(request, program)).toEqual({ ok: true });
      }),
      { numRuns: 150 },
    );
  });

  test("dials in whole positive settings, inside the part in hand, one number per setting", () => {
    fc.assert(
      fc.property(sawableRequest, (request) => {
        const numbers = new Map<string, number>();
        for (const step of programOf(request)?.steps ?? []) {
          if (step.kind !== "rip" && step.kind !== "crosscut") continue;
          const size = step.kind === "crosscut" ? step.part.rect.width : step.part.rect.height;
          expect(Number.isInteger(step.setting) && step.setting > 0 && step.setting < size).toBe(true);
          const key = `${step.kind} ${step.bladeSide} ${step.setting}`;
          expect(numbers.get(key) ?? numbers.size + 1).toBe(step.settingNumber);
          numbers.set(key, step.settingNumber);
        }
      }),
      runs,
    );
  });

  test("keeps to a setting as long as a part in hand is next cut at it", () => {
    fc.assert(
      fc.property(sawableRequest, (request) => {
        const steps = programOf(request)?.steps.filter((step) => step.settingNumber > 0) ?? [];
        for (const [i, step] of steps.entries()) {
          const before = steps[i - 1];
          if (!before || step.settingNumber === before.settingNumber) continue;
          const later = steps.slice(i).filter((one) => one.settingNumber === before.settingNumber);
          const madeLater = new Set(steps.slice(i).flatMap((one) => one.yields.map((part) => part.id)));
          expect(later.every((one) => madeLater.has(one.part.id))).toBe(true);
        }
      }),
      runs,
    );
  });

  test("names every part once, with no I and no O, and sorts offcuts from waste by the shop's limits", () => {
    fc.assert(
      fc.property(sawableRequest, (request) => {
        const program = programOf(request);
        if (!program) return;
        const ids = program.steps.flatMap((step) => step.yields.map((part) => part.id));
        expect(new Set(ids).size).toBe(ids.length);
        expect(program.offcuts.map((part) => part.label)).toEqual(program.offcuts.map((_, i) => `C${i + 1}`));
        const keep = ({ rect }: { rect: { width: number; height: number } }) =>
          rect.width >= request.limits.offcutLength && rect.height >= request.limits.offcutWidth;
        expect(program.offcuts.every(keep)).toBe(true);
        expect(program.waste.some(keep)).toBe(false);
        for (const step of program.steps) for (const part of step.yields) expect(part.label ?? "").not.toMatch(/[IO]/);
      }),
      runs,
    );
  });

  test("gives the same program for the same layout, byte for byte", () => {
    fc.assert(
      fc.property(sawableRequest, (request) => {
        expect(JSON.stringify(planCuts(structuredClone(request)))).toBe(JSON.stringify(planCuts(request)));
      }),
      { numRuns: 60 },
    );
  });

  test("gives a mirrored layout the mirrored program", () => {
    fc.assert(
      fc.property(sawableRequest, fc.constantFrom("x", "y", "xy"), (request, axes) => {
        const view = { x: axes.includes("x"), y: axes.includes("y"), board: request.board };
        const mirrored = mirrorRequest(request, view);
        const program = programOf(request);
        // A layout that is its own mirror image has one program, which then is not its own mirror image.
        const own = ["x", "y"].some((axis) => {
          const one = { x: axis === "x" && view.x, y: axis === "y" && view.y, board: request.board };
          return (one.x || one.y) && JSON.stringify(mirrorRequest(request, one)) === JSON.stringify(request);
        });
        if (program && !own) expect(programOf(mirrored)).toEqual(mirrorProgram(program, view));
      }),
      { numRuns: 80 },
    );
  });

  test("needs no budget to find a program, only to find a better one", () => {
    fc.assert(
      fc.property(sawableRequest, (request) => {
        const hasty = programOf({ ...request, budget: 0 });
        if (!hasty) return;
        expect(verifyProgram(request, hasty)).toEqual({ ok: true });
        expect(hasty.search.proven).toBe(hasty.steps.every((step) => step.kind === "true"));
        expect(hasty.search.steps).toBe(0);
        const patient = programOf(request);
        if (patient) expect(compareCosts(costOfProgram(patient, request), costOfProgram(hasty, request))).toBeLessThanOrEqual(0);
      }),
      { numRuns: 60 },
    );
  });
});
