import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Draft, draftFrom, freshDraft, sheetSize } from "@/components/marking/draft";
import { differenceFrom, markingOf } from "@/components/marking/marking-of";
import { type MarkId, markAt, marksOf, moveMark, nearestEdge, removeMark, turnCorners } from "@/components/marking/marks";
import { fitMarking, um } from "@/lib/layout";

const photo = { width: 4000, height: 3000 };
const measured = { length: um(2_400_000), width: um(200_000) };
const unmeasured = { length: um(0), width: um(0) };

function placedAll(draft: Draft): Draft {
  return marksOf(draft).reduce((from, mark) => moveMark(from, mark, markAt(from, mark) ?? { x: 0, y: 0 }), draft);
}

describe("the first guess", () => {
  test("once accepted, it is a rectangle the core can use, whatever the board's ratio and the photograph's", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 600, max: 9000 }),
        fc.integer({ min: 600, max: 9000 }),
        fc.integer({ min: 200, max: 4000 }),
        fc.integer({ min: 40, max: 199 }),
        (width, height, lengthMm, widthMm) => {
          const draft = placedAll(freshDraft({ width, height }, { length: um(lengthMm * 1000), width: um(widthMm * 1000) }));
          const outcome = markingOf(draft);
          const fit = outcome.complete ? fitMarking(outcome.marking, { width, height }) : null;
          // A very narrow board in a very small photograph has too few pixels; nothing else may be wrong.
          expect(["fits", "tiny"]).toContain(fit?.ok ? "fits" : fit?.refusal.reason);
        },
      ),
    );
  });

  test("in an upright photograph the board stands, its left end at the bottom", () => {
    const [first, second] = freshDraft({ width: 3000, height: 4000 }, measured).corners;
    expect(first.y).toBeGreaterThan(second.y);
    expect(first.x).toBeCloseTo(second.x);
  });

  test("is not a marking: all four corners wait to be placed, and each only once", () => {
    let draft = freshDraft(photo, measured);
    expect(markingOf(draft)).toEqual({ complete: false, missing: { what: "board-corners", count: 4 } });
    draft = moveMark(draft, { of: "board", index: 2 }, { x: 3000, y: 2000 });
    draft = moveMark(draft, { of: "board", index: 2 }, { x: 3001, y: 2000 });
    expect(markingOf(draft)).toEqual({ complete: false, missing: { what: "board-corners", count: 3 } });
  });
});

describe("what is still missing", () => {
  test("comes in the order in which it is asked for", () => {
    const bare = freshDraft(photo, unmeasured);
    expect(markingOf(bare)).toMatchObject({ missing: { what: "board-size" } });
    expect(markingOf({ ...bare, reference: "sheet" })).toMatchObject({ missing: { what: "sheet-corners", count: 4 } });
    const own = { ...bare, reference: "sheet" as const, sheet: { ...bare.sheet, paper: "own" as const } };
    expect(markingOf(own)).toMatchObject({ missing: { what: "sheet-size" } });
  });

  test("a further point without its place is left out, and residuals still find back to their points", () => {
    const at = (x: number | null) => ({ photo: { x: 5, y: 5 }, x: x === null ? null : um(x), y: um(7) });
    const outcome = markingOf({ ...placedAll(freshDraft(photo, measured)), extraPoints: [at(null), at(1), at(null), at(2)] });
    expect(outcome).toMatchObject({ complete: true, extraIndexes: [1, 3] });
    expect(outcome.complete && outcome.marking.extraPoints.map((point) => point.at.x)).toEqual([1, 2]);
  });
});

describe("a sheet", () => {
  const { sheet } = freshDraft(photo, measured);
  test("upright, its first edge is the short one", () => {
    expect(sheetSize({ ...sheet, upright: true })).toEqual({ length: 210_000, width: 297_000 });
    expect(sheetSize({ ...sheet, paper: "letter" })).toEqual({ length: 279_400, width: 215_900 });
  });

  test("of an earlier marking is known again, by its name or as one of its own size", () => {
    const corners = freshDraft(photo, measured).corners;
    const marking = (length: number, width: number) => ({
      reference: {
        kind: "sheet" as const,
        length: um(length),
        width: um(width),
        corners: [...corners] as [(typeof corners)[0], (typeof corners)[0], (typeof corners)[0], (typeof corners)[0]],
      },
      corners: [...corners] as [(typeof corners)[0], (typeof corners)[0], (typeof corners)[0], (typeof corners)[0]],
      extraPoints: [],
      edgePoints: [],
    });
    for (const [length, width] of [
      [297_000, 210_000],
      [210_000, 297_000],
      [215_900, 279_400],
      [85_600, 53_980],
    ] as const) {
      const again = markingOf(draftFrom(marking(length, width), photo, measured));
      expect(again).toMatchObject({ complete: true, marking: marking(length, width) });
    }
  });
});

describe("marks", () => {
  const draft = placedAll(freshDraft(photo, measured));

  test("turned four times, the corners and the edges' points are as before", () => {
    const edgePoints = (["top", "right", "bottom", "left"] as const).map((edge) => ({ photo: { x: 1, y: 1 }, edge }));
    const marked = { ...draft, edgePoints };
    const turned = turnCorners(marked);
    expect(turned.corners[0]).toEqual(marked.corners[1]);
    expect([1, 2, 3].reduce(turnCorners, turned)).toEqual(marked);
  });

  test("a point keeps lying on its side of the board when the corners are turned", () => {
    const [a, b] = draft.corners;
    const middle = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
    const edge = nearestEdge(draft.corners, middle);
    expect(edge).toBe("top");
    const turned = turnCorners({ ...draft, edgePoints: [{ photo: middle, edge }] });
    expect(turned.edgePoints[0]?.edge).toBe(nearestEdge(turned.corners, middle));
  });

  test("a further point forgets its place when the corner it was told from has changed", () => {
    const extraPoints = [{ photo: { x: 1, y: 1 }, x: um(5), y: um(6) }];
    expect(turnCorners({ ...draft, extraPoints }).extraPoints[0]).toMatchObject({ x: null, y: null });
    expect(turnCorners({ ...draft, reference: "sheet", extraPoints }).extraPoints[0]).toMatchObject({ x: 5, y: 6 });
  });

  test("moving and removing change one mark and no other", () => {
    const full: Draft = {
      ...draft,
      reference: "sheet",
      extraPoints: [1, 2].map((x) => ({ photo: { x, y: 0 }, x: null, y: null })),
      edgePoints: [{ photo: { x: 3, y: 0 }, edge: "top" }],
      known: { from: { x: 4, y: 0 }, to: { x: 5, y: 0 }, trueLength: um(1000) },
    };
    const marks = marksOf(full);
    expect(marks).toHaveLength(13);
    for (const mark of marks) {
      const moved = moveMark(full, mark, { x: 77, y: 88 });
      for (const other of marks) {
        const same = other.of === mark.of && other.index === mark.index;
        expect(markAt(moved, other)).toEqual(same ? { x: 77, y: 88 } : markAt(full, other));
      }
    }
    const second: MarkId = { of: "extra", index: 1 };
    expect(marksOf(removeMark(full, second), "extra")).toHaveLength(1);
    expect(removeMark(full, { of: "board", index: 0 })).toEqual(full);
  });
});

test("the difference from a true distance is signed, in mm and per cent", () => {
  expect(differenceFrom(um(500_000), 501)).toEqual({ mm: 1, percent: 0.2 });
  expect(differenceFrom(um(500_000), 498.5).mm).toBeCloseTo(-1.5);
});
