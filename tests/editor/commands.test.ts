import { describe, expect, it } from "vitest";
import { chooseAnchor, chooseSaw } from "@/lib/editor/commands/change-cuts";
import { changeGrain, changeSizes } from "@/lib/editor/commands/change-sizes";
import { letPiecesLoose, takePiecesBack } from "@/lib/editor/commands/loose";
import type { CommandOutcome } from "@/lib/editor/commands/outcome";
import { placeOnBoard } from "@/lib/editor/commands/place";
import { swapTwo } from "@/lib/editor/commands/swap";
import { turnEndForEnd } from "@/lib/editor/commands/turn";
import { applyDiff } from "@/lib/editor/diff";
import type { TableDocument } from "@/lib/editor/document";
import { groupsInHand } from "@/lib/editor/editor";
import { nudgeStep } from "@/lib/editor/nudge-step";
import { blockedBoards } from "@/lib/editor/selectors/blocked";
import { factsOf, piecesOfProblem, problemsOf } from "@/lib/editor/selectors/facts";
import { gridFace, groupBounds, groupOf, moveGroup, SET_ID, um, umFromMm } from "@/lib/layout";
import { boards, longBoard, rowDocument, shortBoard, unplacedDocument } from "./sample-table";

function changedBy(document: TableDocument, outcome: CommandOutcome): TableDocument {
  if (!outcome.ok) throw new Error(`refused: ${outcome.refusal.reason}`);
  return applyDiff(document, outcome.diff);
}
const limits = {
  shortestCrosscut: um(1),
  narrowestRip: um(1),
  shortestMachined: um(1),
  offcutLength: umFromMm(300),
  offcutWidth: umFromMm(60),
};

describe("laying on a board", () => {
  it("puts a set in the first sound place, clear of knots and inside the board", () => {
    for (const board of boards) {
      const outcome = placeOnBoard(unplacedDocument(), [SET_ID], board);
      expect(outcome).toMatchObject({ ok: true, said: { sound: true } });
      const document = changedBy(unplacedDocument(), outcome);
      expect(problemsOf(document.layout, boards)).toEqual([]);
    }
  });

  it("lays a set also where no place is sound, says so, and leaves the problems to be seen", () => {
    const low = { ...shortBoard, width: umFromMm(149) };
    const short = { ...shortBoard, length: umFromMm(960) };
    for (const board of [low, short]) {
      const outcome = placeOnBoard(unplacedDocument(), [SET_ID], board);
      expect(outcome).toMatchObject({ ok: true, said: { did: "placed", sound: false } });
      const { layout } = changedBy(unplacedDocument(), outcome);
      expect(problemsOf(layout, [board]).map(({ kind }) => kind)).toContain("outside");
    }
  });

  it("keeps the saw's loss from what lies there already", () => {
    const apart = changedBy(rowDocument(), letPiecesLoose(rowDocument(), ["p4"]));
    const away = changedBy(apart, placeOnBoard(apart, [groupOf(apart.layout, "p4")?.id ?? ""], shortBoard));
    const back = changedBy(away, placeOnBoard(away, [groupOf(away.layout, "p4")?.id ?? ""], longBoard));
    expect(problemsOf(back.layout, boards)).toEqual([]);
  });
});

describe("commands on what is selected", () => {
  it("refuse an empty selection instead of guessing", () => {
    for (const outcome of [
      turnEndForEnd(rowDocument(), []),
      letPiecesLoose(rowDocument(), []),
      placeOnBoard(rowDocument(), [], longBoard),
    ]) {
      expect(outcome).toEqual({ ok: false, refusal: { reason: "nothing-selected" } });
    }
    expect(swapTwo(rowDocument(), ["p1"])).toEqual({ ok: false, refusal: { reason: "needs-two-pieces", selected: 1 } });
  });

  it("act on the groups of the selected pieces, and on the set where none is selected", () => {
    const document = changedBy(rowDocument(), letPiecesLoose(rowDocument(), ["p2", "p3"]));
    expect(groupsInHand({ document, selection: [] })).toEqual([SET_ID]);
    expect(groupsInHand({ document, selection: ["p3", "p1", "p4"] })).toEqual([SET_ID, groupOf(document.layout, "p3")?.id]);
  });

  it("letting loose and taking back in place leaves the wood where it was", () => {
    const loose = changedBy(rowDocument(), letPiecesLoose(rowDocument(), ["p2", "p4"]));
    expect(factsOf(loose.layout).pieces).toEqual(factsOf(rowDocument().layout).pieces);
    const back = changedBy(loose, takePiecesBack(loose, ["p2", "p4"]));
    expect(back).toEqual(rowDocument());
  });

  it("turning twice is not turning", () => {
    const once = changedBy(rowDocument(), turnEndForEnd(rowDocument(), [SET_ID]));
    expect(groupBounds(once.layout, SET_ID)).toEqual(groupBounds(rowDocument().layout, SET_ID));
    expect(changedBy(once, turnEndForEnd(once, [SET_ID]))).toEqual(rowDocument());
  });
});

describe("changing what the cuts cost", () => {
  it("takes kerf and clean-up from the saw and remembers which", () => {
    const saw = { id: longBoard.id, name: "Table saw", kind: "table" as const, kerf: um(3200), cleanUp: um(300) };
    const document = changedBy(rowDocument(), chooseSaw(rowDocument(), "crosscut", saw));
    expect(document).toMatchObject({
      crosscutSawId: saw.id,
      ripSawId: null,
      layout: { crosscut: { kerf: 3200, cleanUpBefore: 300, cleanUpAfter: 300 } },
    });
  });

  it("another anchor moves no wood", () => {
    const document = changedBy(rowDocument(), chooseAnchor(rowDocument(), "left", "bottom"));
    expect(factsOf(document.layout).pieces).toEqual(factsOf(rowDocument().layout).pieces);
  });
});

describe("changing the face", () => {
  it("keeps swaps between pieces that stay of one size and says which it undid", () => {
    const swapped = changedBy(rowDocument(), swapTwo(rowDocument(), ["p1", "p2"]));
    const { face } = swapped.layout;
    if (face.pattern !== "grid") throw new Error("the sample is a row");
    const outcome = changeSizes(swapped, { ...face, columns: face.columns.with(0, umFromMm(200)) });
    expect(outcome).toMatchObject({ ok: true, said: { did: "changed-sizes", swapsUndone: ["p1", "p2"] } });
  });

  it("grain the other way lays every group along its board again", () => {
    const upright = gridFace([120, 120].map(umFromMm), [umFromMm(300)], umFromMm(3), umFromMm(3), "horizontal");
    const start = changedBy(rowDocument(), changeSizes(rowDocument(), upright));
    const document = changedBy(start, changeGrain(start, "vertical"));
    expect(problemsOf(document.layout, boards).filter(({ kind }) => kind === "grain")).toEqual([]);
    expect(groupBounds(document.layout, SET_ID)).toMatchObject({ x: groupBounds(start.layout, SET_ID)?.x, width: 300_000 });
  });
});

describe("problems", () => {
  it("name the pieces they are about", () => {
    const moved = moveGroup(rowDocument().layout, SET_ID, { x: umFromMm(800), y: um(0) });
    const found = moved.ok ? problemsOf(moved.layout, boards) : [];
    expect(found).toMatchObject([{ kind: "keep-clear", piece: "p4", area: "knot" }]);
    expect(found.flatMap(piecesOfProblem)).toEqual(["p4"]);
  });

  it("tell of boards that no straight cut can part, and only of those", () => {
    expect(blockedBoards(rowDocument().layout, boards, limits)).toEqual([]);
    // Four blocks laid round a middle like a whirl: every line from edge to edge runs through one of them.
    const [a, b] = [umFromMm(60), umFromMm(100)];
    const face = gridFace([b, a], [a, b], umFromMm(3), umFromMm(3), "horizontal");
    const start = changedBy(unplacedDocument(), changeSizes(unplacedDocument(), face));
    const all = changedBy(start, placeOnBoard(start, [SET_ID], shortBoard));
    let document = changedBy(all, letPiecesLoose(all, ["p2", "p3", "p4"]));
    const put = (piece: string, x: number, y: number) => {
      const group = groupOf(document.layout, piece);
      const bounds = group && groupBounds(document.layout, group.id);
      if (!group || !bounds) throw new Error(`${piece} lies nowhere`);
      const by = { x: um(umFromMm(x) - bounds.x), y: um(umFromMm(y) - bounds.y) };
      const change = moveGroup(document.layout, group.id, by);
      if (change.ok) document = { ...document, layout: change.layout };
    };
    // p1 100×60, p2 60×60, p3 100×100, p4 60×100
    put("p1", 100, 20);
    put("p4", 204, 20);
    put("p3", 164, 124);
    put("p2", 100, 84);
    const found = blockedBoards(document.layout, boards, limits);
    expect(found).toMatchObject([{ kind: "blocked", stockId: shortBoard.id }]);
  });
});

describe("a press of an arrow key", () => {
  it("goes half a millimetre or a sixty-fourth of an inch, ten times as far with Shift", () => {
    expect([nudgeStep({ unit: "mm" }, false), nudgeStep({ unit: "mm" }, true)]).toEqual([500, 5000]);
    const inch = { unit: "inch", denominator: 64 } as const;
    expect([nudgeStep(inch, false), nudgeStep(inch, true)]).toEqual([397, 3969]);
  });
});
