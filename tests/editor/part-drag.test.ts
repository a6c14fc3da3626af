/** Dividers and strips of a cut-out dragged on the show side. */
import { describe, expect, it } from "vitest";
import { movablePart, partPreviewAt } from "@/lib/editor/tools/part-drag";
import { idleTool, type PointerAt, toolStep } from "@/lib/editor/tools/pointer-tool";
import { type CutOutFace, type FaceLayout, freshCutOut, freshLayout, um, umFromMm } from "@/lib/layout";

const loss = { kerf: um(3_000), cleanUpBefore: um(200), cleanUpAfter: um(200) };

/** Strip 1; parts 2 to 6: end, front, divider, front, end; strip 7; parts 8 to 12; strip 13. */
function rail(): FaceLayout {
  const fresh = freshCutOut({
    grain: "horizontal",
    length: umFromMm(700),
    rows: 2,
    fronts: 2,
    rowHeight: umFromMm(90),
    strip: umFromMm(30),
    end: umFromMm(40),
    divider: umFromMm(20),
    gap: umFromMm(1.5),
  });
  if (!fresh.ok) throw new Error(fresh.reason);
  return freshLayout(fresh.face, { crosscut: loss, rip: loss, spacing: "followGap" });
}

const widths = ({ face }: FaceLayout, row: number) => (face as CutOutFace).rows[row]?.parts.map(({ width }) => width / 1000);

describe("a part of a cut-out under the pointer", () => {
  it("is movable when it is a divider or an inner strip, and no other", () => {
    const layout = rail();
    const movable = Array.from({ length: 13 }, (_, index) => `p${index + 1}`).filter((id) => movablePart(layout, id) !== null);
    expect(movable).toEqual(["p4", "p7", "p10"]);
  });

  it("gives one opening what the other loses, in half millimetres", () => {
    const moved = partPreviewAt(rail(), "p4", { x: 12_260, y: 99_000 });
    expect(moved?.by).toBe(12_500);
    expect(moved && widths(moved.layout, 0)).toEqual([40, 312.5, 20, 287.5, 40]);
    expect(moved && widths(moved.layout, 1)).toEqual([40, 300, 20, 300, 40]);
  });

  it("stops where the front beside it would become too small", () => {
    const moved = partPreviewAt(rail(), "p4", { x: 9_999_000, y: 0 });
    // 10 mm of a front are left between two gaps of 1.5 mm.
    expect(moved && widths(moved.layout, 0)?.[3]).toBe(13);
  });

  it("moves a strip across the grain", () => {
    const moved = partPreviewAt(rail(), "p7", { x: 50_000, y: -10_000 });
    expect(moved && (moved.layout.face as CutOutFace).rows.map(({ height }) => height / 1000)).toEqual([80, 100]);
  });
});

describe("the tool on the show side", () => {
  const at = (x: number): PointerAt => ({
    pointerId: 1,
    side: "show",
    px: { x, y: 0 },
    point: { x: 0, y: 0 },
    shift: false,
    alt: false,
  });

  it("drags a part, and pans from any other piece", () => {
    for (const [part, wanted] of [
      [true, "preview-part"],
      [false, "pan"],
    ] as const) {
      const pressed = toolStep(idleTool, { kind: "press", pointer: at(0), piece: "p4", part }, () => true);
      const moved = toolStep(pressed.state, { kind: "move", pointer: at(30) }, () => true);
      expect(moved.effects.map((effect) => effect.do)).toEqual([wanted]);
    }
  });

  it("makes a drag of a part one step when the pointer is let go", () => {
    const pressed = toolStep(idleTool, { kind: "press", pointer: at(0), piece: "p4", part: true }, () => true);
    const moved = toolStep(pressed.state, { kind: "move", pointer: at(30) }, () => true);
    const released = toolStep(moved.state, { kind: "release", pointer: at(31) }, () => true);
    expect(released.effects).toEqual([{ do: "preview-part", piece: "p4", by: { x: 31, y: 0 } }, { do: "commit-preview" }]);
  });
});
