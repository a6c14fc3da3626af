import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { letPiecesLoose } from "@/lib/editor/commands/loose";
import { slideGroups } from "@/lib/editor/commands/slide";
import { turnEndForEnd } from "@/lib/editor/commands/turn";
import { applyDiff } from "@/lib/editor/diff";
import type { TableDocument } from "@/lib/editor/document";
import { factsOf } from "@/lib/editor/selectors/facts";
import { levelFor } from "@/lib/editor/view/choose-level";
import { tableGeometry, tablePointAt, type View, wholeView } from "@/lib/editor/view/geometry";
import { chipHeight, jumpChips } from "@/lib/editor/view/jump-chips";
import { pieceOnFaceAt, pieceOnStockAt } from "@/lib/editor/view/piece-at";
import { pannedBy, zoomedAt } from "@/lib/editor/view/zoom";
import { faceSize, gridFace, groupOf, rowFace, umFromMm } from "@/lib/layout";
import { boards, longBoard, right, rowDocument, shortBoard } from "./sample-table";

const { layout } = rowDocument();
const content = { boards, face: layout.face };
const sides = { show: { width: 1000, height: 320 }, stock: { width: 1000, height: 420 } };
const whole = tableGeometry(content, sides, wholeView);

describe("where things lie", () => {
  it("everything fits at the whole view, on screens of every size", () => {
    const pixels = fc.integer({ min: 320, max: 2400 });
    fc.assert(
      fc.property(pixels, fc.integer({ min: 180, max: 900 }), fc.integer({ min: 240, max: 900 }), (width, show, stock) => {
        const on = { show: { width, height: show }, stock: { width, height: stock } };
        const geometry = tableGeometry(content, on, wholeView);
        const face = faceSize(layout.face);
        expect(geometry.showOrigin.x + (face.width / 1000) * geometry.showPxPerMm).toBeLessThanOrEqual(width);
        expect(geometry.showOrigin.y + (face.height / 1000) * geometry.showPxPerMm).toBeLessThanOrEqual(show);
        const last = geometry.boards.at(-1);
        const bottom = ((last?.top ?? 0) + shortBoard.width) / 1000;
        expect(geometry.stockOrigin.x + (longBoard.length / 1000) * geometry.stockPxPerMm).toBeLessThanOrEqual(width);
        expect(geometry.stockOrigin.y + bottom * geometry.stockPxPerMm).toBeLessThanOrEqual(stock);
      }),
    );
  });

  it("one scale on both sides where the face is then large enough, and otherwise it says so", () => {
    const long = { ...content, face: rowFace([500, 500, 500].map(umFromMm), umFromMm(230), umFromMm(3), "horizontal") };
    const alike = tableGeometry(long, sides, wholeView);
    expect(alike.oneScale).toBe(true);
    expect(alike.showPxPerMm).toBe(alike.stockPxPerMm);
    const small = { ...content, face: rowFace([90, 90].map(umFromMm), umFromMm(60), umFromMm(3), "horizontal") };
    const larger = tableGeometry(small, sides, wholeView);
    expect(larger.oneScale).toBe(false);
    expect(larger.showPxPerMm).toBeGreaterThan(larger.stockPxPerMm);
  });

  it("an empty table still has a face to show", () => {
    const bare = tableGeometry({ boards: [], face: layout.face }, sides, wholeView);
    expect(bare.boards).toEqual([]);
    expect(bare.showPxPerMm).toBeGreaterThan(0);
  });

  it("a zoom keeps the wood under the pointer where it is, as far as there is wood", () => {
    const at = { x: 480, y: 200 };
    const before = tablePointAt(whole, at);
    let view: View = wholeView;
    let geometry = whole;
    for (const factor of [1.25, 1.25, 1.25, 1.25]) {
      const origins = { show: geometry.showOrigin, stock: geometry.stockOrigin };
      view = zoomedAt(view, factor, "stock", at, origins, sides);
      geometry = tableGeometry(content, sides, view);
    }
    expect(geometry.stockPxPerMm).toBeCloseTo(whole.stockPxPerMm * 1.25 ** 4, 9);
    expect(tablePointAt(geometry, at).x).toBeCloseTo(before.x, 3);
  });

  it("zooming out all the way shows everything again, and what fits cannot be moved out of sight", () => {
    const origins = { show: whole.showOrigin, stock: whole.stockOrigin };
    const near = zoomedAt(wholeView, 5, "stock", { x: 900, y: 10 }, origins, sides);
    expect(zoomedAt(near, 0.01, "stock", { x: 3, y: 3 }, origins, sides)).toEqual(wholeView);
    const pushed = tableGeometry(content, sides, pannedBy(wholeView, "stock", { x: 4000, y: -4000 }));
    expect(pushed.stockOrigin).toEqual(whole.stockOrigin);
    expect(pushed.view).toEqual(wholeView);
  });
});

describe("what lies under a point", () => {
  const top = whole.boards[0]?.top ?? 0;
  const inFirst = { x: 150_000, y: top + 60_000 };

  it("is the piece there, or one within reach of a finger, or none", () => {
    expect(pieceOnStockAt(layout, whole.boards, inFirst, 0)).toBe("p1");
    const beside = { x: 98_000, y: top + 60_000 };
    expect(pieceOnStockAt(layout, whole.boards, beside, 0)).toBeNull();
    expect(pieceOnStockAt(layout, whole.boards, beside, 3_000)).toBe("p1");
    expect(pieceOnFaceAt(layout, { x: 300_000, y: 20_000 }, 0)).toBe("p2");
    expect(pieceOnFaceAt(layout, { x: 241_500, y: 20_000 }, 0)).toBeNull();
  });

  it("is nothing where the board is not on the table", () => {
    expect(pieceOnStockAt(layout, [], inFirst, 1_000_000)).toBeNull();
  });
});

describe("which picture is drawn from", () => {
  const levels = [9600, 4800, 2400].map((widthPx) => ({ url: String(widthPx), widthPx, heightPx: widthPx / 10 }));

  it("is the smallest that is sharp enough, and the largest when none is", () => {
    expect(levelFor(levels, 2400, 0.4)?.widthPx).toBe(2400);
    expect(levelFor(levels, 2400, 1)?.widthPx).toBe(2400);
    expect(levelFor(levels, 2400, 1.01)?.widthPx).toBe(4800);
    expect(levelFor(levels, 2400, 9)?.widthPx).toBe(9600);
    expect(levelFor([], 2400, 1)).toBeNull();
  });
});

describe("jumps beside the seams", () => {
  const mm = { unit: "mm" } as const;
  const chipsOf = ({ layout: of }: TableDocument, pxPerMm = 1) => {
    const { seams, pieceById } = factsOf(of);
    return jumpChips(seams, pieceById, faceSize(of.face), { showPxPerMm: pxPerMm }, mm);
  };
  const changed = (document: TableDocument, command: (d: TableDocument) => ReturnType<typeof slideGroups>) => {
    const outcome = command(document);
    if (!outcome.ok) throw new Error(outcome.refusal.reason);
    return applyDiff(document, outcome.diff);
  };
  const apart = changed(rowDocument(), (d) => letPiecesLoose(d, ["p2"]));
  const loose = groupOf(apart.layout, "p2")?.id ?? "";

  it("tell none where the figure runs on, and along and across where a loose piece was slid", () => {
    expect(chipsOf(rowDocument()).map(({ lines }) => lines)).toEqual([["jump 0.0"], ["jump 0.0"], ["jump 0.0"]]);
    const slid = changed(apart, (d) => slideGroups(d, [loose], right(4.5)));
    expect(chipsOf(slid).flatMap(({ lines, jumps }) => (jumps ? [lines] : []))).toEqual([
      ["along 4.5", "across 0.0"],
      ["along −4.5", "across 0.0"],
    ]);
  });

  it("give no figure where one side is turned", () => {
    const turned = changed(apart, (d) => turnEndForEnd(d, [loose]));
    expect(chipsOf(turned).map(({ lines }) => lines[0])).toEqual(["turned", "turned", "jump 0.0"]);
  });

  it("never lie on each other, and those with a jump come first", () => {
    const face = gridFace([80, 80, 80, 80, 80].map(umFromMm), [60, 60, 60].map(umFromMm), umFromMm(3), umFromMm(3), "horizontal");
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 3, noNaN: true }), fc.integer({ min: -9, max: 9 }), (pxPerMm, by) => {
        const grid = { ...rowDocument(), layout: { ...layout, face } };
        const ids = Array.from({ length: 15 }, (_, index) => `p${index + 1}`);
        const groups = layout.groups.map((group) => ({ ...group, pieceIds: ids }));
        const all = { ...grid, layout: { ...grid.layout, groups } };
        const one = changed(all, (d) => letPiecesLoose(d, ["p7"]));
        const id = groupOf(one.layout, "p7")?.id ?? "";
        const chips = chipsOf(by === 0 ? one : changed(one, (d) => slideGroups(d, [id], right(by))), pxPerMm);
        for (const [index, a] of chips.entries()) {
          for (const b of chips.slice(index + 1)) {
            const clear = Math.abs(a.x - b.x) >= 78 || Math.abs(a.y - b.y) >= (chipHeight(a) + chipHeight(b)) / 2;
            expect(clear).toBe(true);
          }
        }
        expect(chips.some(({ jumps }) => jumps)).toBe(by !== 0);
      }),
    );
  });
});
