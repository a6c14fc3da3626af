import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { CutStep } from "@/lib/layout/program/program";
import type { AsCutEntry } from "@/lib/layout/replan/as-cut";
import { assessRest } from "@/lib/layout/replan/assess-rest";
import { planRest, type RestPlan } from "@/lib/layout/replan/plan-rest";
import { verifyRest } from "@/lib/layout/replan/verify-rest";
import { um } from "@/lib/layout/units/um";
import { anyBench, benchAsPlanned } from "./any-bench";
import { issuedAgain } from "./at-the-bench";

const runs = { numRuns: 40 };

/** Every part the rest begins with lies there, as it is. */
function expectStartsInHand({ inHand }: RestPlan, rest: readonly CutStep[]): void {
  const bench = new Map(inHand.map(({ part }) => [part.id, part.rect]));
  const made = new Set<string>();
  for (const step of rest) {
    if (!made.has(step.part.id)) expect(step.part.rect).toEqual(bench.get(step.part.id));
    for (const { id } of step.yields) made.add(id);
  }
}

describe("whatever the bench found", () => {
  test("the rest is planned from the parts in hand to exactly the pieces left, no wood is lost, and what is cut stays where it is", () => {
    const seen = { planned: 0, refused: 0, troubled: 0, rest: 0, held: 0 };
    fc.assert(
      fc.property(anyBench, ({ asked, request }) => {
        const plan = planRest(request, asked);
        if (!plan.ok) {
          seen.refused++;
          return;
        }
        seen.planned++;
        seen.troubled += Number(plan.assessment.troubles.length > 0);
        expect(verifyRest(asked.board, plan)).toEqual({ ok: true });
        const names = [...plan.pieces, ...plan.assessment.leftOut].map(({ label }) => label).sort();
        expect(names).toEqual(asked.pieces.map(({ label }) => label).sort());
        const rest = plan.program.steps.filter(({ number }) => !plan.done.includes(number));
        seen.rest += Number(rest.length > 0);
        expectStartsInHand(plan, rest);
        for (const pieceId of plan.assessment.finished) {
          seen.held++;
          const before = asked.pieces.find((piece) => piece.pieceId === pieceId);
          const { rect, cleanUp } = plan.pieces.find((piece) => piece.pieceId === pieceId) ?? {};
          expect({ rect, cleanUp }).toEqual({ rect: before?.rect, cleanUp: before?.cleanUp });
        }
      }),
      { numRuns: 60 },
    );
    expect(Math.min(...Object.values(seen)), JSON.stringify(seen)).toBeGreaterThan(0);
  });

  test("every rescue that is offered can be chosen and carried out", () => {
    const chosen = new Map<string, number>();
    fc.assert(
      fc.property(anyBench, fc.nat(99), ({ asked, request }, which) => {
        const before = assessRest(request);
        if (!before.ok) return;
        const choices = Object.fromEntries(
          before.troubles.map(({ key, rescues }, i) => [key, rescues[(which + i) % rescues.length]?.kind ?? "slide"]),
        );
        const plan = planRest(request, { ...asked, budget: 200 }, choices);
        if (!plan.ok) throw new Error("what was assessed is refused");
        expect(verifyRest(asked.board, plan)).toEqual({ ok: true });
        for (const trouble of plan.assessment.troubles) chosen.set(trouble.chosen, (chosen.get(trouble.chosen) ?? 0) + 1);
      }),
      runs,
    );
    for (const kind of ["slide", "elsewhere", "other-board"]) expect(chosen.get(kind) ?? 0).toBeGreaterThan(0);
  });

  test("the revision after it holds whatever is found then", () => {
    let again = 0;
    fc.assert(
      fc.property(anyBench, fc.integer({ min: 0, max: 100 }), fc.nat(9), ({ asked, request }, share, which) => {
        const before = planRest(request, asked);
        if (!before.ok) return;
        const next = issuedAgain(request, before);
        const untouched = planRest(next, asked);
        expect(untouched).toMatchObject({ ok: true, changed: false, program: { steps: before.program.steps } });
        const open = before.program.steps.filter(({ number }) => !before.done.includes(number));
        const done = new Set(open.slice(0, Math.round((open.length * share) / 100)).map(({ number }) => number));
        const step = open[which % Math.max(1, open.length)];
        const pieceId = before.pieces[which % Math.max(1, before.pieces.length)]?.pieceId;
        const part = step?.yields[0];
        const entries: AsCutEntry[] = [
          ...(step && (step.kind === "rip" || step.kind === "crosscut")
            ? [{ kind: "kerf" as const, step: step.number, kerf: um(2_600), reach: "on" as const }]
            : []),
          ...(part ? [{ kind: "size" as const, partId: part.id, edge: "right" as const, by: um(-300) }] : []),
          ...(pieceId && which % 2 === 0 ? [{ kind: "spoiled" as const, pieceId, usable: null }] : []),
        ];
        const plan = planRest({ ...next, done, entries }, asked);
        if (!plan.ok) return;
        again++;
        expect(verifyRest(asked.board, plan)).toEqual({ ok: true });
      }),
      runs,
    );
    expect(again).toBeGreaterThan(10);
  });

  test("the same found again gives the same rest, byte for byte", () => {
    fc.assert(
      fc.property(anyBench, ({ asked, request }) => {
        const again = JSON.stringify(planRest(structuredClone(request), asked));
        expect(again).toBe(JSON.stringify(planRest(request, asked)));
      }),
      { numRuns: 10 },
    );
  });
});

test("entries that say what was planned leave the steps as they were issued", () => {
  let entries = 0;
  fc.assert(
    fc.property(benchAsPlanned, ({ asked, request }) => {
      entries += request.entries.length;
      const plan = planRest(request, asked);
      if (!plan.ok) throw new Error(JSON.stringify(plan));
      expect(plan.changed).toBe(false);
      const left = request.program.steps.filter(({ number }) => !plan.done.includes(number));
      expect(plan.program.steps.slice(plan.done.length)).toEqual(left);
      expect(plan.program.steps).toEqual(request.program.steps);
      expect(plan.program.conservation).toEqual(request.program.conservation);
    }),
    runs,
  );
  expect(entries).toBeGreaterThan(10);
});
