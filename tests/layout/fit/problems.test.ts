import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BoardFace,
  type FaceLayout,
  freshLayout,
  gridFace,
  groupOf,
  type KeepClear,
  layOut,
  letLoose,
  lyingPieces,
  moveGroup,
  type Problem,
  placeGroup,
  problems,
  rowFace,
  turnGroup,
  um,
} from "@/lib/layout";
import { accepted, arbitraryBoard, arbitraryLayout, arbitraryRoomyBoard, arbitrarySet, boardOf } from "../arbitrary-layout";

const cut = { kerf: um(2_400), cleanUpBefore: um(200), cleanUpAfter: um(200) };
const cuts = { crosscut: cut, rip: cut, spacing: "followGap" as const };

function row(x: number, y = 20_000): FaceLayout {
  const face = rowFace([um(200_000), um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
  return accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: um(x), y: um(y) }, 0));
}

function knot(id: string, x: number, y: number, radius: number): KeepClear {
  return {
    id,
    kind: "knot",
    area: { shape: "ellipse", centre: { x: um(x), y: um(y) }, radiusX: um(radius), radiusY: um(radius), turnDeg: 0 },
  };
}

const plain = boardOf("b1", 2_400_000, 200_000);

describe("problems", () => {
  test("a row inside its board, off every knot, has none; touching is allowed", () => {
    expect(problems(row(200), [plain])).toEqual([]);
    expect(problems(row(100_000, 49_800), [{ ...plain, keepClear: [knot("k1", 60_000, 100_000, 40_000)] }])).toEqual([]);
  });

  test("front 3 reaches 4.2 mm into the knot at 1 251 mm: slide the set 4.2 mm left", () => {
    // The right-hand edge of front 3 lies 4.2 mm past the left-hand side of the knot.
    const board = { ...plain, keepClear: [knot("k7", 1_251_000, 100_000, 15_000)] };
    expect(problems(row(1_240_200 - 606_000), [board])).toEqual([
      { kind: "keep-clear", piece: "p3", areaId: "k7", area: "knot", by: 4_200, atX: 1_251_000, slide: -4_200 },
    ]);
  });

  test("the slide takes the whole group into account: the other knots, the ends of the board and what lies beside it", () => {
    const board = { ...boardOf("b1", 700_000, 200_000), keepClear: [knot("k1", 640_000, 100_000, 15_000)] };
    const [found] = problems(row(30_000), [board]);
    expect(found).toMatchObject({ kind: "keep-clear", piece: "p3", slide: -11_000 });
    const crowded = { ...board, keepClear: [...board.keepClear, knot("k2", 19_000, 100_000, 1_000)] };
    expect(problems(row(30_000), [crowded])[0]).toMatchObject({ kind: "keep-clear", areaId: "k1", slide: null });
  });

  test("says how far outside, and which pieces the saw cannot get between", () => {
    const layout = accepted(letLoose(row(1_900_000), "p1"));
    const slid = accepted(moveGroup(layout, "loose-1", { x: um(1_000), y: um(0) }));
    expect(problems(slid, [plain])).toEqual([
      { kind: "outside", piece: "p3", by: 106_200 },
      { kind: "too-close", pieces: ["p1", "p2"], missing: 800 },
    ]);
  });

  test("what is cleaned off after sawing needs wood too, but not within the traced outline", () => {
    expect(problems(row(0), [plain])).toEqual([{ kind: "outside", piece: "p1", by: 200 }]);
    const traced = [
      [1_000, 20_000],
      [2_399_000, 20_000],
      [2_399_000, 199_000],
      [1_000, 199_000],
    ].map(([x = 0, y = 0]) => ({ x: um(x), y: um(y) }));
    expect(problems(row(1_000), [{ ...plain, outline: traced }])).toEqual([]);
    expect(problems(row(999), [{ ...plain, outline: traced }])).toEqual([{ kind: "outside", piece: "p1", by: 1 }]);
  });

  test("pieces that pass each other across the board come apart by a rip", () => {
    const layout = accepted(letLoose(row(100_200, 200), "p2"));
    const wide = boardOf("b1", 2_400_000, 400_000);
    const beside = accepted(moveGroup(layout, "loose-1", { x: um(-100_000), y: um(152_800) }));
    expect(problems(beside, [wide])).toEqual([]);
    const nearer = accepted(moveGroup(beside, "loose-1", { x: um(0), y: um(-1) }));
    expect(problems(nearer, [wide])).toEqual([{ kind: "too-close", pieces: ["p1", "p2"], missing: 1 }]);
  });

  test("a piece turned end for end brings its other clean-up to the seam", () => {
    const uneven = { kerf: um(2_400), cleanUpBefore: um(1_000), cleanUpAfter: um(0) };
    const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
    const placed = accepted(
      placeGroup(freshLayout(face, { ...cuts, crosscut: uneven }), "set", "b1", { x: um(0), y: um(20_000) }, 0),
    );
    const turned = accepted(turnGroup(accepted(letLoose(placed, "p2")), "loose-1"));
    expect(problems(placed, [plain])).toEqual([]);
    expect(problems(turned, [plain])).toEqual([{ kind: "too-close", pieces: ["p1", "p2"], missing: 1_000 }]);
  });

  test("names what is not laid on wood, lies on a board that is not there, or against the grain", () => {
    const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
    const fresh = freshLayout(face, cuts);
    expect(problems(fresh, [plain])).toEqual([{ kind: "not-placed", pieces: ["p1", "p2"] }]);
    expect(problems(row(0), [])).toEqual([{ kind: "unknown-stock", pieces: ["p1", "p2", "p3"], stockId: "b1" }]);
    const upright = accepted(placeGroup(fresh, "set", "b1", { x: um(1_000), y: um(1_000) }, 1));
    expect(problems(upright, [boardOf("b1", 2_400_000, 600_000)])).toEqual([{ kind: "grain", pieces: ["p1", "p2"] }]);
  });

  test("after the advised slide a group has no keep-clear problem and is not outside", () => {
    let slid = 0;
    fc.assert(
      fc.property(arbitraryLayout, arbitraryRoomyBoard("b1"), arbitraryRoomyBoard("b2"), (layout, b1, b2) => {
        for (const problem of problems(layout, [b1, b2])) {
          if (problem.kind !== "keep-clear" || problem.slide === null) continue;
          slid += 1;
          const group = groupOf(layout, problem.piece);
          const after = problems(accepted(moveGroup(layout, group?.id ?? "", { x: problem.slide, y: um(0) })), [b1, b2]);
          const left = after.filter((one) => "piece" in one && group?.pieceIds.includes(one.piece));
          expect(left).toEqual([]);
        }
      }),
      { numRuns: 300 },
    );
    expect(slid).toBeGreaterThan(30);
  });

  test("no shorter slide would do, and no slide does when none is advised: tried at random", () => {
    fc.assert(
      fc.property(
        arbitrarySet,
        fc.oneof(arbitraryBoard("b1"), arbitraryRoomyBoard("b1")),
        fc.integer({ min: -400_000, max: 400_000 }),
        (layout, board, x) => {
          const found = problems(layout, [board]).find((one) => one.kind === "keep-clear");
          fc.pre(
            found !== undefined &&
              found.kind === "keep-clear" &&
              (found.slide === null || Math.abs(x) < Math.abs(found.slide) - 1),
          );
          const after = problems(accepted(moveGroup(layout, "set", { x: um(x), y: um(0) })), [board]);
          expect(after.some(({ kind }) => kind === "keep-clear" || kind === "outside")).toBe(true);
        },
      ),
      { numRuns: 300 },
    );
  });

  test("a board turned end for end with everything on it has the same problems, with slides the other way", () => {
    fc.assert(
      fc.property(arbitrarySet, arbitraryBoard("b1"), (layout, board) => {
        const before = problems(layout, [board]);
        const after = problems(turnedLayout(layout, board), [turnedBoard(board)]);
        const turnedBack = after.map((problem): Problem => {
          if (problem.kind !== "keep-clear") return problem;
          return { ...problem, atX: um(board.length - problem.atX), slide: problem.slide === null ? null : um(-problem.slide) };
        });
        // Where two slides are equally long the one to the left is advised, on whichever side that is; halves of a micrometre round up on both.
        const settled = (list: readonly Problem[]) =>
          list.map((one) =>
            one.kind === "keep-clear" ? { ...one, atX: 0, slide: one.slide === null ? null : Math.abs(one.slide) } : one,
          );
        expect(settled(turnedBack)).toEqual(settled(before));
      }),
      { numRuns: 300 },
    );
  });

  test("an undisturbed set is never too close to itself, and what is said to be sound is sound by the corners", () => {
    fc.assert(
      fc.property(arbitrarySet, arbitraryBoard("b1"), (layout, board) => {
        const found = problems(layout, [{ ...board, outline: null }]);
        expect(found.filter(({ kind }) => kind === "too-close" || kind === "grain")).toEqual([]);
        const outside = new Set(found.flatMap((one) => (one.kind === "outside" ? [one.piece] : [])));
        for (const { blankId: id, spans, cleanUp } of lyingPieces(layout)) {
          const { along, across } = spans;
          const inside =
            along.from >= cleanUp.left &&
            across.from >= cleanUp.top &&
            along.to + cleanUp.right <= board.length &&
            across.to + cleanUp.bottom <= board.width;
          expect(outside.has(id)).toBe(!inside);
        }
      }),
    );
  });

  test("the same input gives the same list, byte for byte, and the order of the boards does not matter", () => {
    fc.assert(
      fc.property(arbitraryLayout, arbitraryBoard("b1"), arbitraryBoard("b2"), (layout, b1, b2) => {
        expect(JSON.stringify(problems(structuredClone(layout), [b2, b1]))).toBe(JSON.stringify(problems(layout, [b1, b2])));
      }),
    );
  });

  test("judging 24 pieces among 40 areas takes no more than 40 times of laying them out, so that it can run while dragging", () => {
    const face = gridFace(
      Array.from({ length: 8 }, () => um(150_000)),
      Array.from({ length: 3 }, () => um(100_000)),
      um(3_000),
      um(3_000),
      "horizontal",
    );
    const layout = accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: um(3_000), y: um(3_000) }, 0));
    const outline = Array.from({ length: 60 }, (_, index) => ({ x: um(index * 40_000), y: um((index % 2) * 500) }));
    const board: BoardFace = {
      ...boardOf("b1", 2_400_000, 400_000),
      outline: [...outline, { x: um(2_360_000), y: um(400_000) }, { x: um(0), y: um(400_000) }],
      keepClear: Array.from({ length: 40 }, (_, index) =>
        knot(`k${index}`, 25_000 + index * 31_000, 30_000 + (index % 5) * 70_000, 8_000),
      ),
    };
    expect(layOut(layout)).toHaveLength(24);
    expect(problems(layout, [board]).length).toBeGreaterThan(10);
    const timed = (work: () => unknown, times: number) => {
      const start = performance.now();
      for (let time = 0; time < times; time++) work();
      return (performance.now() - start) / times;
    };
    const pairs = Array.from({ length: 20 }, () => [
      // Copies: what is laid out once is kept by document.
      timed(() => problems({ ...layout }, [board]), 10),
      timed(() => layOut({ ...layout }), 100),
    ]);
    // The fastest of twenty, side by side: other work on the machine can only make a run slower. Measured at 12 to 18.
    const fastest = (which: 0 | 1) => Math.min(...pairs.map((pair) => pair[which] ?? Number.NaN));
    expect(fastest(0) / fastest(1)).toBeLessThan(40);
  });
});

function turnedBoard(board: BoardFace): BoardFace {
  const turned = ({ x, y }: { readonly x: number; readonly y: number }) => ({ x: um(board.length - x), y: um(board.width - y) });
  return {
    ...board,
    outline: board.outline?.map(turned) ?? null,
    keepClear: board.keepClear.map((one) => ({
      ...one,
      area:
        one.area.shape === "ellipse"
          ? { ...one.area, centre: turned(one.area.centre) }
          : { ...one.area, points: one.area.points.map(turned) },
    })),
  };
}

/** The set on the turned board: its rectangle turned about the middle of the board, and its grain with it. */
function turnedLayout(layout: FaceLayout, board: BoardFace): FaceLayout {
  const turned = accepted(turnGroup(layout, "set"));
  const spans = lyingPieces(layout).map((piece) => piece.spans);
  const low = (axis: "along" | "across") => Math.min(...spans.map((one) => one[axis].from));
  const high = (axis: "along" | "across") => Math.max(...spans.map((one) => one[axis].to));
  return accepted(
    moveGroup(turned, "set", {
      x: um(board.length - high("along") - low("along")),
      y: um(board.width - high("across") - low("across")),
    }),
  );
}
