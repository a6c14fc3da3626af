/** The recommended gap put into a layout. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  faceMovement,
  faceSize,
  freshLayout,
  layoutFaults,
  placeGroup,
  recommendedGap,
  roundedUp,
  SET_ID,
  stackFace,
  um,
  umFromMm,
  withRecommendedGap,
} from "@/lib/layout";
import { accepted } from "../arbitrary-layout";
import { arbitraryRequest, cherryFace } from "./moving-face";

const tenthMm = { um: 100, parts: 1 };
const thirtySecond = { um: 25_400, parts: 32 };
const saw = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };

function stack(heightsMm: readonly number[], gapMm: number) {
  const face = stackFace(heightsMm.map(umFromMm), umFromMm(600), umFromMm(gapMm), "horizontal");
  const fresh = freshLayout(face, { crosscut: saw, rip: saw, spacing: "followGap" });
  return accepted(placeGroup(fresh, SET_ID, "b1", { x: um(0), y: um(0) }, 0));
}

describe("used in a stack of three of 200 mm with gaps of 3 mm", () => {
  const outcome = withRecommendedGap(cherryFace(stack([200, 200, 200], 3)), "upright", tenthMm);
  if (!outcome.ok) throw new Error(outcome.reason);

  test("makes both gaps 3.5 mm; each front gives up a third of the millimetre, the rest widens the last gap", () => {
    expect(outcome.gap).toBe(3_500);
    expect(outcome.mostGivenUp).toBe(334);
    expect(outcome.layout.face).toMatchObject({ rows: [199_666, 199_666, 199_666], rowGaps: [3_500, 3_502] });
  });

  test("a second time changes nothing but what was left over", () => {
    const again = withRecommendedGap(cherryFace(outcome.layout), "upright", tenthMm);
    expect(again.ok && again.gap).toBe(3_500);
  });
});

test("is refused where there are no gaps, where wood is not known, and where no front would be left", () => {
  const row = cherryFace(stack([200], 3));
  expect(withRecommendedGap(row, "upright", tenthMm)).toEqual({ ok: false, reason: "no-gaps" });
  expect(withRecommendedGap(row, "sideways", tenthMm)).toEqual({ ok: false, reason: "no-gaps" });
  const unread = { ...cherryFace(stack([200, 200], 3)), woods: new Map() };
  expect(withRecommendedGap(unread, "upright", tenthMm)).toEqual({ ok: false, reason: "not-known" });
  const slivers = cherryFace(stack([1, 1], 0.1), { leastGap: umFromMm(9) });
  expect(withRecommendedGap(slivers, "upright", tenthMm)).toEqual({ ok: false, reason: "no-room" });
});

test("goes up to the next step of the rule", () => {
  expect(roundedUp(3_484, tenthMm)).toBe(3_500);
  expect(roundedUp(3_500, tenthMm)).toBe(3_500);
  // 5/32 in is 3.96875 mm.
  expect(roundedUp(3_176, thirtySecond)).toBe(3_969);
});

describe("in any face", () => {
  const lines = fc.constantFrom("sideways" as const, "upright" as const);

  test("it asks for no more afterwards than the gaps that were made, and the face keeps its size", () => {
    fc.assert(
      fc.property(arbitraryRequest, lines, (request, runs) => {
        const outcome = withRecommendedGap(request, runs, tenthMm);
        if (!outcome.ok) return;
        expect(layoutFaults(outcome.layout)).toEqual([]);
        expect(faceSize(outcome.layout.face)).toEqual(faceSize(request.layout.face));
        const movement = faceMovement({ ...request, layout: outcome.layout });
        const made = movement.gaps.filter((gap) => gap.runs === runs && "piece" in gap.b);
        for (const { gap, figures } of made) expect(figures?.toCut).toBeLessThanOrEqual(gap);
        if (made.length > 0) expect(recommendedGap(movement, runs, tenthMm)).toBeLessThanOrEqual(outcome.gap);
      }),
      { numRuns: 40 },
    );
  });

  test("fronts of a grid give up the same, so that those that are equal stay equal", () => {
    fc.assert(
      fc.property(arbitraryRequest, lines, (request, runs) => {
        const outcome = withRecommendedGap(request, runs, tenthMm);
        const [before, after] = [request.layout.face, outcome.ok ? outcome.layout.face : null];
        if (before.pattern !== "grid" || after?.pattern !== "grid") return;
        const axis = runs === "sideways" ? "columns" : "rows";
        expect(new Set(after[axis].map((size, index) => size - (before[axis][index] ?? 0))).size).toBe(1);
      }),
      { numRuns: 40 },
    );
  });
});
