/** Gaps made as wide as the wood's movement asks for, at the table. */
import { describe, expect, test } from "vitest";
import { evenGaps } from "@/lib/editor/commands/even-gaps";
import { createEditor } from "@/lib/editor/editor";
import { freshLayout, placeGroup, SET_ID, stackFace, um, umFromMm } from "@/lib/layout";
import { cherryFace } from "../layout/movement/moving-face";

const saw = { kerf: umFromMm(3), cleanUpBefore: um(0), cleanUpAfter: um(0) };
const face = stackFace([200, 200, 200].map(umFromMm), umFromMm(600), umFromMm(3), "horizontal");
const fresh = freshLayout(face, { crosscut: saw, rip: saw, spacing: "followGap" });
const step = { um: 100, parts: 1 };

function editorWith(mayChange = true) {
  const laid = placeGroup(fresh, SET_ID, "b1", { x: um(0), y: um(0) }, 0);
  if (!laid.ok) throw new Error("not laid");
  const document = { layout: laid.layout, crosscutSawId: null, ripSawId: null };
  return createEditor({ document, boards: [], mayChange, onChange: () => {}, now: () => 0 });
}

const { layout: _, ...ground } = cherryFace(fresh);

describe("gaps evened by the movement of the wood", () => {
  test("are one step, which undo takes back and redo makes again", () => {
    const editor = editorWith();
    const before = editor.get().document;
    expect(editor.run((document) => evenGaps(document, ground, "upright", step))).toBe(true);
    expect(editor.get().document.layout.face).toMatchObject({ rowGaps: [3_500, 3_502] });
    expect(editor.get().announcement).toMatchObject({ kind: "did", said: { did: "evened-gaps", gap: 3_500, mostGivenUp: 334 } });
    editor.undo();
    expect(editor.get().document).toEqual(before);
    editor.redo();
    expect(editor.get().document.layout.face).toMatchObject({ rowGaps: [3_500, 3_502] });
  });

  test("are refused with a reason, and to those who may only look", () => {
    const editor = editorWith();
    expect(editor.run((document) => evenGaps(document, ground, "sideways", step))).toBe(false);
    expect(editor.get().announcement).toMatchObject({ kind: "refused", refusal: { reason: "gaps-no-gaps" } });
    expect(editor.run((document) => evenGaps(document, { ...ground, woods: new Map() }, "upright", step))).toBe(false);
    expect(editor.get().announcement).toMatchObject({ refusal: { reason: "gaps-not-known" } });
    expect(editorWith(false).run((document) => evenGaps(document, ground, "upright", step))).toBe(false);
  });
});
