import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { letPiecesLoose } from "@/lib/editor/commands/loose";
import { applyDiff } from "@/lib/editor/diff";
import { createEditor } from "@/lib/editor/editor";
import { previewAt } from "@/lib/editor/tools/drag";
import { idleTool, type PointerAt, type ToolEffect, toolStep } from "@/lib/editor/tools/pointer-tool";
import { boardNear, tableGeometry, wholeView } from "@/lib/editor/view/geometry";
import { groupBounds, groupById, moveGroup, SET_ID, um, umFromMm } from "@/lib/layout";
import { boards, longBoard, rowDocument, shortBoard, tableBoardOf } from "./sample-table";

const { layout } = rowDocument();
const sides = { show: { width: 1000, height: 300 }, stock: { width: 1000, height: 400 } };
const geometry = tableGeometry({ boards, face: layout.face }, sides, wholeView);
const table = { boards, places: geometry.boards };
const topOf = (id: string) => geometry.boards.find(({ stockId }) => stockId === id)?.top ?? 0;
const onLong = { x: 150_000, y: topOf(longBoard.id) + 60_000 };
const free = { snapWithin: null, straight: false };
const coordinate = fc.integer({ min: -300_000, max: 300_000 });

describe("dragging", () => {
  it("is start plus total delta, whatever way the pointer went", () => {
    const path = fc.array(fc.record({ x: coordinate, y: fc.integer({ min: -20_000, max: 20_000 }) }), { maxLength: 30 });
    fc.assert(
      fc.property(path, coordinate, fc.integer({ min: -20_000, max: 20_000 }), (between, x, y) => {
        const end = { x: onLong.x + x, y: onLong.y + y };
        let commit: unknown = null;
        const editor = createEditor({
          document: rowDocument(),
          boards: boards.map(tableBoardOf),
          mayChange: true,
          onChange: (document) => {
            commit = document;
          },
          now: () => 0,
        });
        for (const point of [...between.map((by) => ({ x: onLong.x + by.x, y: onLong.y + by.y })), end]) {
          editor.showPreview(previewAt(editor.get().document.layout, table, { groupIds: [SET_ID], start: onLong }, point, free));
        }
        editor.commitPreview();
        const moved = moveGroup(layout, SET_ID, { x: um(x), y: um(y) });
        const expected = x === 0 && y === 0 ? null : moved.ok && { ...rowDocument(), layout: moved.layout };
        expect(commit).toEqual(expected);
        expect(editor.get().history.past.length).toBe(expected === null ? 0 : 1);
      }),
    );
  });

  it("changes nothing but the preview until it is let go, and nothing at all when dropped", () => {
    const editor = createEditor({
      document: rowDocument(),
      boards: boards.map(tableBoardOf),
      mayChange: true,
      onChange: () => expect.fail("was to be saved"),
      now: () => 0,
    });
    const before = editor.get().document;
    const point = { x: onLong.x + 44_000, y: onLong.y };
    editor.showPreview(previewAt(layout, table, { groupIds: [SET_ID], start: onLong }, point, free));
    expect(editor.get().document).toBe(before);
    expect(editor.get().preview).not.toBeNull();
    editor.dropPreview();
    expect(editor.get()).toMatchObject({ document: before, preview: null, history: { past: [] } });
  });

  it("moves to the board that the pointer reaches, and lies there where it was let go on the screen", () => {
    const at = { x: onLong.x + 10_000, y: topOf(shortBoard.id) + 60_000 };
    const preview = previewAt(layout, table, { groupIds: [SET_ID], start: onLong }, at, free);
    expect(preview?.stockId).toBe(shortBoard.id);
    const before = groupBounds(layout, SET_ID);
    const after = preview && groupBounds(preview.layout, SET_ID);
    expect(after?.x).toBe((before?.x ?? 0) + 10_000);
    expect((after?.y ?? 0) + topOf(shortBoard.id)).toBe((before?.y ?? 0) + topOf(longBoard.id) + (at.y - onLong.y));
  });

  it("snaps to the end of the board and to the saw's loss from another piece", () => {
    const wish = { snapWithin: umFromMm(4), straight: false };
    const toEnd = previewAt(layout, table, { groupIds: [SET_ID], start: onLong }, { x: onLong.x - 97_000, y: onLong.y }, wish);
    expect(toEnd && groupBounds(toEnd.layout, SET_ID)?.x).toBe(200); // the end's clean-up still comes off
    expect(toEnd?.along?.target.kind).toBe("outline");

    const loosened = letPiecesLoose(rowDocument(), ["p4"]);
    if (!loosened.ok) throw new Error("p4 does not come loose");
    const apart = applyDiff(rowDocument(), loosened.diff).layout;
    const loose = apart.groups[1]?.id ?? "";
    const away = moveGroup(apart, loose, { x: umFromMm(1), y: um(0) });
    const back =
      away.ok && previewAt(away.layout, table, { groupIds: [loose], start: onLong }, { x: onLong.x - 2_000, y: onLong.y }, wish);
    const target = back ? back.along?.target : null;
    expect(target).toEqual({ kind: "loss", piece: "p3" });
    const [set, alone] = [back ? groupBounds(back.layout, SET_ID) : null, back ? groupBounds(back.layout, loose) : null];
    expect((alone?.x ?? 0) - (set?.x ?? 0) - (set?.width ?? 0)).toBe(2_800);
  });

  it("keeps to one direction when asked, also where snapping would pull it aside", () => {
    const wish = { snapWithin: umFromMm(40), straight: true };
    const at = { x: onLong.x + 200_000, y: onLong.y + 25_000 };
    const preview = previewAt(layout, table, { groupIds: [SET_ID], start: onLong }, at, wish);
    expect(preview && groupById(preview.layout, SET_ID)?.placement?.at.y).toBe(groupById(layout, SET_ID)?.placement?.at.y);
  });

  it("comes to nothing where the group lies on no board of the table", () => {
    expect(previewAt(layout, { boards: [], places: [] }, { groupIds: [SET_ID], start: onLong }, onLong, free)).toBeNull();
    expect(boardNear([], [], 0)).toBeNull();
  });
});

describe("pointers", () => {
  const at = (x: number, part: Partial<PointerAt> = {}): PointerAt => ({
    pointerId: 1,
    side: "stock",
    px: { x, y: 10 },
    point: { x: x * 1000, y: 10_000 },
    shift: false,
    alt: false,
    ...part,
  });
  const play = (inputs: Parameters<typeof toolStep>[1][], selected: string[] = []) => {
    let state = idleTool;
    const effects: ToolEffect[] = [];
    for (const input of inputs) {
      const step = toolStep(state, input, (piece) => selected.includes(piece));
      state = step.state;
      effects.push(...step.effects);
    }
    return { state, effects };
  };

  it("a tap selects and moves nothing, however the hand trembles", () => {
    const { effects, state } = play([
      { kind: "press", pointer: at(100), piece: "p2", part: false },
      { kind: "move", pointer: at(102) },
      { kind: "release", pointer: at(103) },
    ]);
    expect(effects.map((effect) => effect.do)).toEqual(["select", "select"]);
    expect(state).toEqual(idleTool);
  });

  it("a drag previews from the point of the press and commits once", () => {
    const { effects } = play([
      { kind: "press", pointer: at(100), piece: "p2", part: false },
      { kind: "move", pointer: at(120) },
      { kind: "move", pointer: at(150) },
      { kind: "release", pointer: at(151) },
    ]);
    expect(effects.map((effect) => effect.do)).toEqual(["select", "preview", "preview", "preview", "commit-preview"]);
    expect(effects[3]).toMatchObject({ from: { x: 100_000 }, at: { x: 151_000 } });
  });

  it("Escape drops a drag; what the pointer does afterwards means nothing", () => {
    const { effects } = play([
      { kind: "press", pointer: at(100), piece: "p2", part: false },
      { kind: "move", pointer: at(120) },
      { kind: "cancel" },
      { kind: "move", pointer: at(180) },
      { kind: "release", pointer: at(180) },
    ]);
    expect(effects.map((effect) => effect.do)).toEqual(["select", "preview", "drop-preview"]);
  });

  it("a press beside the pieces moves the view, or selects nothing when it does not move", () => {
    const pan = play([
      { kind: "press", pointer: at(100), piece: null, part: false },
      { kind: "move", pointer: at(110) },
      { kind: "move", pointer: at(130) },
      { kind: "release", pointer: at(130) },
    ]);
    const total = pan.effects.reduce((sum, effect) => sum + (effect.do === "pan" ? effect.by.x : 0), 0);
    expect(total).toBe(30);
    const tap = play([
      { kind: "press", pointer: at(100), piece: null, part: false },
      { kind: "release", pointer: at(100) },
    ]);
    expect(tap.effects).toEqual([{ do: "select-nothing" }]);
  });

  it("pieces on the show side are selected but not dragged", () => {
    const show = { side: "show" } as const;
    const { effects } = play([
      { kind: "press", pointer: at(100, show), piece: "p1", part: false },
      { kind: "move", pointer: at(140, show) },
      { kind: "release", pointer: at(140, show) },
    ]);
    expect(effects.map((effect) => effect.do)).toEqual(["select", "pan", "pan"]);
  });

  it("a second finger does not disturb a drag", () => {
    const { effects } = play([
      { kind: "press", pointer: at(100), piece: "p1", part: false },
      { kind: "move", pointer: at(140) },
      { kind: "press", pointer: at(300, { pointerId: 2 }), piece: "p3", part: false },
      { kind: "move", pointer: at(310, { pointerId: 2 }) },
      { kind: "release", pointer: at(310, { pointerId: 2 }) },
      { kind: "release", pointer: at(141) },
    ]);
    expect(effects.map((effect) => effect.do)).toEqual(["select", "preview", "preview", "commit-preview"]);
  });
});
