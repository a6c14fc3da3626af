import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { slideGroups } from "@/lib/editor/commands/slide";
import { applyDiff, combined, diffBetween, inverted, isEmptyDiff } from "@/lib/editor/diff";
import { createEditor } from "@/lib/editor/editor";
import { MOST_STEPS, RUN_GAP_MS } from "@/lib/editor/history";
import { layoutFaults, SET_ID } from "@/lib/layout";
import { anyCommand } from "./any-command";
import { longBoard, right, rowDocument, shortBoard, tableBoardOf } from "./sample-table";

function newEditor(now: () => number = () => 0) {
  const saved: unknown[] = [];
  const editor = createEditor({
    document: rowDocument(),
    boards: [longBoard, shortBoard].map(tableBoardOf),
    mayChange: true,
    onChange: (document) => saved.push(document),
    now,
  });
  return { editor, saved };
}
const bytes = (value: unknown) => JSON.stringify(value);

describe("undo and redo", () => {
  it("undoing every step of any sequence of commands gives the document back byte for byte, redoing them the result", () => {
    fc.assert(
      fc.property(fc.array(anyCommand, { maxLength: 12 }), (commands) => {
        const { editor } = newEditor();
        const start = bytes(editor.get().document);
        for (const command of commands) editor.run(command);
        const end = bytes(editor.get().document);
        const steps = editor.get().history.past.length;
        for (let step = 0; step < steps; step++) editor.undo();
        expect(bytes(editor.get().document)).toBe(start);
        for (let step = 0; step < steps; step++) editor.redo();
        expect(bytes(editor.get().document)).toBe(end);
      }),
      { numRuns: 300 },
    );
  });

  it("no sequence of commands leads to a document that does not hold together", () => {
    fc.assert(
      fc.property(fc.array(anyCommand, { maxLength: 12 }), (commands) => {
        const { editor } = newEditor();
        for (const command of commands) editor.run(command);
        expect(layoutFaults(editor.get().document.layout)).toEqual([]);
      }),
      { numRuns: 300 },
    );
  });

  it("a diff leads from one document to the other, its inverse back, and two in a row are one", () => {
    fc.assert(
      fc.property(anyCommand, anyCommand, (first, second) => {
        const a = rowDocument();
        const step = (document: typeof a, command: typeof first) => {
          const outcome = command(document);
          return outcome.ok ? applyDiff(document, outcome.diff) : document;
        };
        const b = step(a, first);
        const c = step(b, second);
        expect(bytes(applyDiff(a, diffBetween(a, c)))).toBe(bytes(c));
        expect(bytes(applyDiff(c, inverted(diffBetween(a, c))))).toBe(bytes(a));
        const both = combined(diffBetween(a, b), diffBetween(b, c));
        expect(bytes(applyDiff(a, both))).toBe(bytes(c));
        expect(bytes(applyDiff(c, inverted(both)))).toBe(bytes(a));
      }),
    );
  });

  it("a new step gives up what was undone", () => {
    const { editor } = newEditor();
    editor.run((d) => slideGroups(d, [SET_ID], right(5)));
    editor.undo();
    editor.run((d) => slideGroups(d, [SET_ID], right(7)));
    expect(editor.get().history.future).toEqual([]);
    editor.redo();
    expect(editor.get().announcement?.kind).toBe("nothing-to-redo");
  });

  it("presses of an arrow key in a run are undone as one; after a pause, or another key, they are not", () => {
    let clock = 0;
    const { editor } = newEditor(() => clock);
    const start = bytes(editor.get().document);
    const nudge = (key: string) => editor.run((d) => slideGroups(d, [SET_ID], right(0.5)), key);
    for (let press = 0; press < 5; press++) {
      clock += 30;
      nudge("right");
    }
    expect(editor.get().history.past).toHaveLength(1);
    clock += RUN_GAP_MS + 1;
    nudge("right");
    clock += 1;
    nudge("left");
    expect(editor.get().history.past).toHaveLength(3);
    editor.undo();
    editor.undo();
    editor.undo();
    expect(bytes(editor.get().document)).toBe(start);
  });

  it("keeps no more than so many steps", () => {
    const { editor } = newEditor();
    for (let step = 0; step < MOST_STEPS + 10; step++) editor.run((d) => slideGroups(d, [SET_ID], right(1)));
    expect(editor.get().history.past).toHaveLength(MOST_STEPS);
  });

  it("hands every new document on to be saved, and refusals not", () => {
    const { editor, saved } = newEditor();
    editor.run((d) => slideGroups(d, ["no such group"], right(1)));
    expect(saved).toHaveLength(0);
    expect(editor.get().announcement).toMatchObject({ kind: "refused", refusal: { reason: "unknown-group" } });
    editor.run((d) => slideGroups(d, [SET_ID], right(1)));
    editor.undo();
    expect(saved.map(bytes)).toEqual([bytes(saved[0]), bytes(rowDocument())]);
  });

  it("a step that changes nothing is refused and leaves no trace", () => {
    const { editor } = newEditor();
    editor.run((d) => slideGroups(d, [SET_ID], right(0)));
    expect(editor.get().history.past).toHaveLength(0);
    expect(isEmptyDiff(diffBetween(rowDocument(), rowDocument()))).toBe(true);
  });

  it("who may only look changes nothing", () => {
    const editor = createEditor({
      document: rowDocument(),
      boards: [],
      mayChange: false,
      onChange: () => expect.fail("was to be saved"),
      now: () => 0,
    });
    editor.run((d) => slideGroups(d, [SET_ID], right(1)));
    expect(bytes(editor.get().document)).toBe(bytes(rowDocument()));
    expect(editor.get().announcement?.kind).toBe("read-only");
  });
});
