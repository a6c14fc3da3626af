import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BoardFace,
  type FaceLayout,
  freshLayout,
  lyingPieces,
  moveGroup,
  type Problem,
  placeGroup,
  problems,
  rowFace,
  type SpokenFor,
  snapSlide,
  turnGroup,
  um,
  woodTaken,
} from "@/lib/layout";
import { accepted, arbitraryLayout, arbitraryRoomyBoard, arbitrarySet, boardOf, umBetween } from "../arbitrary-layout";

const cut = { kerf: um(3_000), cleanUpBefore: um(200), cleanUpAfter: um(200) };
const plain = boardOf("b1", 2_400_000, 400_000);

/** Two fronts of 200 by 150 mm, 3.4 mm apart in the wood. */
function pair(x: number, y = 20_000, kerf = 3_000): FaceLayout {
  const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_400), "horizontal");
  const cuts = { crosscut: { ...cut, kerf: um(kerf) }, rip: { ...cut, kerf: um(kerf) }, spacing: "followGap" as const };
  return accepted(placeGroup(freshLayout(face, cuts), "set", "b1", { x: um(x), y: um(y) }, 0));
}

/** The board with what another layout takes of it. */
function takenBy(other: FaceLayout, board: BoardFace = plain): BoardFace {
  return { ...board, spokenFor: woodTaken(other, board.id).map(({ piece, ...wood }) => ({ ...wood, id: piece })) };
}

type OnSpokenFor = Extract<Problem, { kind: "spoken-for" }>;
const onSpokenFor = (layout: FaceLayout, boards: readonly BoardFace[]): OnSpokenFor[] =>
  problems(layout, boards).flatMap((problem) => (problem.kind === "spoken-for" ? [problem] : []));

const arbitrarySpokenFor: fc.Arbitrary<SpokenFor[]> = fc
  .array(
    fc.record({
      rect: fc.record({
        x: umBetween(-100_000, 900_000),
        y: umBetween(-100_000, 900_000),
        width: umBetween(1, 400_000),
        height: umBetween(1, 400_000),
      }),
      kerfs: fc.record({ along: umBetween(0, 5_000), across: umBetween(0, 5_000) }),
    }),
    { maxLength: 4 },
  )
  .map((woods) => woods.map((wood, index) => ({ ...wood, id: `w${index + 1}` })));

const movedWood = (woods: readonly SpokenFor[], x: number, y: number): SpokenFor[] =>
  woods.map((wood) => ({ ...wood, rect: { ...wood.rect, x: um(wood.rect.x + x), y: um(wood.rect.y + y) } }));

describe("wood that is spoken for", () => {
  test("is what leaves the saw for the pieces that lie on the board, and what their cuts take", () => {
    const kerfs = { along: 3_000, across: 3_000 };
    expect(woodTaken(pair(100_000), "b1")).toEqual([
      { piece: "p1", label: "1", rect: { x: 99_800, y: 19_800, width: 200_400, height: 150_400 }, kerfs },
      { piece: "p2", label: "2", rect: { x: 303_200, y: 19_800, width: 200_400, height: 150_400 }, kerfs },
    ]);
    expect(woodTaken(pair(100_000), "b2")).toEqual([]);
    expect(woodTaken({ ...pair(0), groups: pair(0).groups.map((group) => ({ ...group, placement: null })) }, "b1")).toEqual([]);
  });

  test("front 2 lies 12 mm over front 1 of another face: 15 mm to the left clear it, with a kerf of 3 mm", () => {
    // Sawn for the set: 99.8 to 503.6 mm; for the other face from 491.6 mm on.
    expect(problems(pair(100_000), [takenBy(pair(491_800))])).toEqual([
      { kind: "spoken-for", piece: "p2", spokenForId: "p1", over: 12_000, missing: 15_000, slide: -15_000 },
    ]);
    expect(problems(pair(85_000), [takenBy(pair(491_800))])).toEqual([]);
  });

  test("with less than a kerf between them nothing would be cut twice, but the saw does not get through", () => {
    expect(problems(pair(86_000), [takenBy(pair(491_800))])).toEqual([
      { kind: "spoken-for", piece: "p2", spokenForId: "p1", over: 0, missing: 1_000, slide: -1_000 },
    ]);
  });

  test("the wider of the two kerfs is kept free, whoever saws first", () => {
    expect(problems(pair(85_000), [takenBy(pair(491_800, 20_000, 3_200))])).toMatchObject([{ over: 0, missing: 200 }]);
    expect(problems(pair(85_000, 20_000, 3_200), [takenBy(pair(491_800))])).toMatchObject([{ piece: "p2", missing: 400 }]);
  });

  test("a rip parts them as well as a crosscut", () => {
    // 20 + 150 + 0.2 + 3 + 0.2 mm.
    expect(problems(pair(100_000), [takenBy(pair(100_000, 173_400))])).toEqual([]);
    expect(problems(pair(100_000), [takenBy(pair(100_000, 173_399))])).toMatchObject([
      { piece: "p1", spokenForId: "p1", over: 0, missing: 1 },
      { piece: "p2", spokenForId: "p2", over: 0, missing: 1 },
    ]);
  });

  test("no slide is advised where none clears it", () => {
    const short = boardOf("b1", 600_000, 200_000);
    expect(problems(pair(100_000), [takenBy(pair(100_000), short)])[0]).toMatchObject({ over: 150_400, slide: null });
  });

  test("a slide comes to lie the kerf from it, and the guide says from what", () => {
    expect(snapSlide(pair(100_000), takenBy(pair(800_000)), ["set"], { x: um(294_000), y: um(0) }, um(3_000))).toMatchObject({
      // 800 − 0.2 − 3 − 0.2 mm is as far as the right-hand edge may go.
      delta: { x: 293_200 },
      along: { target: { kind: "spoken-for", spokenForId: "p1" }, edge: 796_600 },
    });
  });

  test("nothing spoken for, no problem of this kind, and none with wood of another board", () => {
    fc.assert(
      fc.property(arbitraryLayout, arbitrarySpokenFor, (layout, spokenFor) => {
        expect(onSpokenFor(layout, [plain, boardOf("b2", 900_000, 400_000)])).toEqual([]);
        expect(onSpokenFor(layout, [{ ...plain, id: "b3", spokenFor }])).toEqual([]);
      }),
    );
  });

  test("a piece is in trouble when its blank reaches into the wood grown by the kerfs, by the shortest way out of that", () => {
    let troubled = 0;
    fc.assert(
      fc.property(arbitraryLayout, arbitrarySpokenFor, (layout, spokenFor) => {
        const found = onSpokenFor(layout, [{ ...plain, spokenFor }]);
        for (const { id: own, blankId: id, stockId, blank } of lyingPieces(layout)) {
          if (own !== id) continue;
          for (const wood of spokenFor) {
            const problem = found.find((one) => one.piece === id && one.spokenForId === wood.id);
            const meets = (x: number, y: number, kerfs: { along: number; across: number }) =>
              overlap(
                {
                  left: blank.along.from + x,
                  right: blank.along.to + x,
                  top: blank.across.from + y,
                  bottom: blank.across.to + y,
                },
                grown(wood, kerfs),
              );
            const kerfs = {
              along: Math.max(layout.crosscut.kerf, wood.kerfs.along),
              across: Math.max(layout.rip.kerf, wood.kerfs.across),
            };
            const stays = stockId === "b1" && meets(0, 0, kerfs);
            expect(problem !== undefined).toBe(stays);
            if (!problem) continue;
            troubled += 1;
            const ways = (by: number) => [[by, 0] as const, [-by, 0] as const, [0, by] as const, [0, -by] as const];
            expect(ways(problem.missing).some(([x, y]) => !meets(x, y, kerfs))).toBe(true);
            expect(ways(problem.missing - 1).every(([x, y]) => meets(x, y, kerfs))).toBe(true);
            const bare = { along: 0, across: 0 };
            expect(problem.over > 0).toBe(meets(0, 0, bare));
            expect(ways(problem.over).some(([x, y]) => !meets(x, y, bare))).toBe(true);
            if (problem.over > 0) expect(ways(problem.over - 1).every(([x, y]) => meets(x, y, bare))).toBe(true);
          }
        }
      }),
      { numRuns: 300 },
    );
    expect(troubled).toBeGreaterThan(100);
  });

  test("moving the layout and the wood alike changes nothing", () => {
    fc.assert(
      fc.property(
        arbitrarySet,
        arbitrarySpokenFor,
        umBetween(-300_000, 300_000),
        umBetween(-300_000, 300_000),
        (layout, spokenFor, x, y) => {
          const moved = accepted(moveGroup(layout, "set", { x, y }));
          const told = (list: OnSpokenFor[]) => list.map(({ slide: _, ...rest }) => rest);
          expect(told(onSpokenFor(moved, [{ ...plain, spokenFor: movedWood(spokenFor, x, y) }]))).toEqual(
            told(onSpokenFor(layout, [{ ...plain, spokenFor }])),
          );
        },
      ),
    );
  });

  test("each of two layouts is told the same of the other", () => {
    let told = 0;
    fc.assert(
      fc.property(arbitraryLayout, arbitraryLayout, (a, b) => {
        const pairs = (list: OnSpokenFor[], mineFirst: boolean) =>
          list
            .map(({ piece, spokenForId, over, missing }) => [
              mineFirst ? [piece, spokenForId] : [spokenForId, piece],
              over,
              missing,
            ])
            .map((entry) => JSON.stringify(entry))
            .sort();
        const ofA = onSpokenFor(a, [takenBy(b, plain)]);
        told += ofA.length;
        expect(pairs(ofA, true)).toEqual(pairs(onSpokenFor(b, [takenBy(a, plain)]), false));
      }),
    );
    expect(told).toBeGreaterThan(50);
  });

  test("after the advised slide the group is in order, no shorter one would do, and none does when none is advised", () => {
    let slid = 0;
    fc.assert(
      fc.property(
        arbitrarySet,
        arbitraryRoomyBoard("b1"),
        arbitrarySpokenFor,
        umBetween(-400_000, 400_000),
        (set, b1, spokenFor, x) => {
          const board = { ...b1, spokenFor };
          const [problem] = onSpokenFor(set, [board]);
          if (!problem) return;
          const wrong = (by: number) => problems(accepted(moveGroup(set, "set", { x: um(by), y: um(0) })), [board]);
          if (problem.slide !== null) {
            slid += 1;
            expect(wrong(problem.slide)).toEqual([]);
          }
          if (problem.slide === null || Math.abs(x) < Math.abs(problem.slide) - 1) expect(wrong(x)).not.toEqual([]);
        },
      ),
      { numRuns: 300 },
    );
    expect(slid).toBeGreaterThan(30);
  });

  test("a layout turned end for end in place takes the wood it took, where clean-up is the same on both sides", () => {
    const rects = (layout: FaceLayout) => woodTaken(layout, "b1").map(({ rect }) => JSON.stringify(rect));
    expect(rects(accepted(turnGroup(pair(100_000), "set"))).sort()).toEqual(rects(pair(100_000)).sort());
  });
});

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

const overlap = (a: Box, b: Box) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

function grown({ rect }: SpokenFor, { along, across }: { readonly along: number; readonly across: number }): Box {
  return {
    left: rect.x - along,
    right: rect.x + rect.width + along,
    top: rect.y - across,
    bottom: rect.y + rect.height + across,
  };
}
