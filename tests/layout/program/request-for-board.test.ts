import { describe, expect, test } from "vitest";
import type { FaceLayout } from "@/lib/layout/pattern/face-layout";
import { boardEdges, defaultCutBudget } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import { cutRequestFor } from "@/lib/layout/program/request-for-board";
import { verifyProgram } from "@/lib/layout/program/verify-program";
import { um, umFromMm } from "@/lib/layout/units/um";
import { limits } from "./row-of-fronts";

const loss = { kerf: umFromMm(2.4), cleanUpBefore: umFromMm(0.2), cleanUpAfter: umFromMm(0.1) };

function layoutOf(turns: 0 | 2, spacing: FaceLayout["spacing"]): FaceLayout {
  return {
    face: {
      pattern: "grid",
      columns: [umFromMm(300), umFromMm(300)],
      rows: [umFromMm(120), umFromMm(150)],
      columnGaps: [umFromMm(3)],
      rowGaps: [umFromMm(3)],
      grain: "horizontal",
    },
    crosscut: loss,
    rip: loss,
    spacing,
    anchorX: "left",
    anchorY: "top",
    groups: [
      {
        id: "set",
        pieceIds: ["p1", "p2", "p3", "p4"],
        placement: {
          stockId: "board-1",
          at: { x: umFromMm(turns === 0 ? 200 : 1000), y: umFromMm(turns === 0 ? 20 : 320) },
          turns,
        },
        takesPlaceOf: {},
      },
    ],
  };
}

describe("a layout as the pattern spaces it", () => {
  test.each([
    [0, "followGap"],
    [0, "tight"],
    [2, "followGap"],
    [2, "tight"],
  ] as const)("laid with %i quarter turns, spaced %s, can be sawn to exactly its pieces", (turns, spacing) => {
    const board = { id: "board-1", length: umFromMm(1800), width: umFromMm(340) };
    const shop = {
      boardEdges: boardEdges(false, false),
      truingTakes: { longEdge: um(2_000), end: um(0) },
      limits,
      budget: defaultCutBudget,
    };
    const request = cutRequestFor(layoutOf(turns, spacing), board, shop);
    expect(request.pieces.map(({ label }) => label)).toEqual(["1", "2", "3", "4"]);
    const outcome = planCuts(request);
    if (!outcome.ok) throw new Error(outcome.reason);
    expect(verifyProgram(request, outcome.program)).toEqual({ ok: true });
    // With loss 2.7 < gap 3.0 the rest is taken out between the pieces only where the gap is followed; 0.3 is for the plane.
    const slivers = outcome.program.steps.filter((step) => step.kind === "plane" && step.setting === 300);
    expect(slivers.length > 0).toBe(spacing === "followGap");
  });

  test("pieces on another board are not asked for", () => {
    const board = { id: "board-2", length: umFromMm(1800), width: umFromMm(340) };
    const shop = { boardEdges: boardEdges(true, true), truingTakes: { longEdge: um(0), end: um(0) }, limits, budget: 0 };
    expect(planCuts(cutRequestFor(layoutOf(0, "tight"), board, shop))).toEqual({ ok: false, reason: "nothing-to-cut" });
  });
});
