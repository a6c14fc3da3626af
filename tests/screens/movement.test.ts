import { describe, expect, test } from "vitest";
import { checkSpecies, freshSpecies, speciesDraft } from "@/components/movement/species-draft";
import { gapRows } from "@/components/table/gap-rows";
import { diagramScale } from "@/components/table/movement-scale";
import { faceMovement, freshLayout, gridFace, placeGroup, SET_ID, um, umFromMm } from "@/lib/layout";
import { cherryFace } from "../layout/movement/moving-face";

describe("rows of gaps", () => {
  test("put together what is alike in all that is told of it", () => {
    const saw = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };
    const face = gridFace([300, 300, 300].map(umFromMm), [150, 150].map(umFromMm), umFromMm(3), umFromMm(4), "horizontal");
    const laid = placeGroup(
      freshLayout(face, { crosscut: saw, rip: saw, spacing: "followGap" }),
      SET_ID,
      "b1",
      { x: um(0), y: um(0) },
      0,
    );
    if (!laid.ok) throw new Error("not laid");
    const { gaps } = faceMovement(cherryFace(laid.layout, { around: umFromMm(2) }));
    const rows = gapRows(gaps);
    expect(rows.reduce((sum, { count }) => sum + count, 0)).toBe(gaps.length);
    expect(rows.map(({ gap, count }) => [gap.runs, "side" in gap.b ? gap.b.side : "between", count])).toEqual([
      ["sideways", "between", 4],
      ["upright", "between", 3],
      ["sideways", "left", 2],
      ["upright", "top", 3],
      ["sideways", "right", 2],
      ["upright", "bottom", 3],
    ]);
    expect(rows[0]?.pieces).toEqual(["p1", "p2", "p3", "p4", "p5", "p6"]);
  });
});

describe("the diagram of a gap", () => {
  test("has room for a gap that closes, for today outside the year, and for a place that never changes", () => {
    const scale = diagramScale({ driest: 6, dampest: 11, today: 13 }, [3, -1]);
    expect(scale.x(13)).toBeLessThanOrEqual(scale.right);
    expect(scale.x(6)).toBeGreaterThanOrEqual(scale.left);
    expect(scale.y(-1)).toBeGreaterThan(scale.y(0));
    expect(scale.y(3)).toBeLessThan(scale.y(0));
    const still = diagramScale({ driest: 8, dampest: 8, today: null }, [0, 0]);
    expect(still.x(8)).toBeCloseTo((still.left + still.right) / 2, 6);
    expect(Number.isFinite(still.y(0))).toBe(true);
  });
});

describe("a draft of a species", () => {
  const draft = { ...freshSpecies, name: "European beech", radial: 5.8, tangential: 11.8, source: "Own test, winter 2031" };

  test("that is sound becomes what is sent, its other names taken apart, and reads back", () => {
    const checked = checkSpecies({ ...draft, alsoCalled: "Rotbuche,  , hêtre " });
    if (!checked.ok) throw new Error("refused");
    expect(checked.fields).toEqual({
      name: "European beech",
      alsoCalled: ["Rotbuche", "hêtre"],
      movement: { kind: "shrinkage", radial: 5.8, tangential: 11.8 },
      source: "Own test, winter 2031",
    });
    expect(speciesDraft({ id: "s1", ...checked.fields })).toMatchObject({ ...draft, id: "s1", alsoCalled: "Rotbuche, hêtre" });
  });

  test("says below each field what is missing", () => {
    expect(checkSpecies({ ...draft, source: "" })).toMatchObject({ ok: false, errors: { source: expect.any(String) } });
    expect(checkSpecies({ ...draft, name: " " })).toMatchObject({ ok: false, errors: { name: expect.any(String) } });
    expect(checkSpecies({ ...draft, radial: null })).toMatchObject({ ok: false, errors: { movement: "Enter both figures" } });
    const swapped = checkSpecies({ ...draft, radial: 11.8, tangential: 5.8 });
    expect(!swapped.ok && swapped.errors.movement).toMatch(/the larger one/);
  });
});
