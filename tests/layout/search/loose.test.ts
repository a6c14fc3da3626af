import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BoardFace,
  type FaceLayout,
  freshLayout,
  groupOf,
  type LooseRequest,
  type LooseSearch,
  letLoose,
  lyingPieces,
  placeGroup,
  problems,
  type QuarterTurns,
  rowFace,
  runSlices,
  searchLoose,
  stackFace,
  turnsAlongGrain,
  um,
} from "@/lib/layout";
import { type BruteGround, bruteGround, bruteValue } from "../../support/brute-places";
import { accepted, arbitraryCut, boardOf, umBetween } from "../arbitrary-layout";
import { woodPicture } from "./arbitrary-search";

const search = (request: LooseRequest): LooseSearch => runSlices(searchLoose(request));
const weights = { match: 3, clear: 1 };
const finest = { along: um(500), across: um(500) };
const leastOffcut = { along: um(20_000), across: um(10_000) };

type Found = Extract<LooseSearch, { found: true }>;

function found(request: LooseRequest): Found {
  const answer = search(request);
  if (!answer.found) throw new Error(`no run: ${JSON.stringify(answer)}`);
  return answer;
}

/** Mean match and mean clear by the plain loops of the brute force, as the request weighs them. */
function bruteTotal(ground: BruteGround, layout: FaceLayout, moving: readonly string[]): number {
  const { parts } = bruteValue(ground, layout, new Set(moving));
  const clear = moving.map((id) => bruteValue(ground, layout, new Set([id])).parts.clear ?? 1);
  const meanClear = clear.reduce((sum, one) => sum + one, 0) / clear.length;
  if (parts.match === null) return meanClear;
  return (weights.match * parts.match + weights.clear * meanClear) / (weights.match + weights.clear);
}

/** Every way to lay two loose pieces on the grid in order, the loss apart, without a problem. */
function* everyRun(layout: FaceLayout, request: LooseRequest): Generator<FaceLayout> {
  const { board } = request.side;
  for (const turns of turnsAlongGrain(layout.face.grain)) {
    const forward = layout.face.grain === "horizontal" ? turns === 0 : turns === 3;
    const [left = "", right = ""] = forward ? request.run : [...request.run].reverse();
    const ends = placesOf(layout, right, board, turns).map((place) => ({
      place,
      from: edgesOf(layAt(layout, right, place, turns), right).from,
    }));
    for (const start of placesOf(layout, left, board, turns)) {
      const first = layAt(layout, left, start, turns);
      const { to } = edgesOf(first, left);
      for (const { place, from } of ends) {
        if (from - to < layout.crosscut.kerf) continue;
        const run = layAt(first, right, place, turns);
        if (problems(run, [board]).length === 0) yield run;
      }
    }
  }
}

type Corner = readonly [number, number];

function layAt(layout: FaceLayout, id: string, [x, y]: Corner, turns: QuarterTurns): FaceLayout {
  return accepted(placeGroup(layout, groupOf(layout, id)?.id ?? "", "b1", { x: um(x), y: um(y) }, turns));
}

/** Every grid place of a piece where it has no problem by itself. */
function placesOf(layout: FaceLayout, id: string, board: BoardFace, turns: QuarterTurns): Corner[] {
  const places: Corner[] = [];
  for (let x = 0; x + 21_000 <= board.length; x += 500) {
    for (let y = 0; y + 21_000 <= board.width; y += 500) {
      const laid = layAt(layout, id, [x, y], turns);
      if (!problems(laid, [board]).some((problem) => "piece" in problem && problem.piece === id)) places.push([x, y]);
    }
  }
  return places;
}

/** Where what is sawn for a piece begins and ends along the board. */
function edgesOf(layout: FaceLayout, id: string) {
  const piece = lyingPieces(layout).find((one) => one.id === id);
  if (piece === undefined) throw new Error(`no piece ${id}`);
  return piece.blank.along;
}

describe("loose pieces", () => {
  test("get the best run there is on the grid, as trying every one finds it", () => {
    const arbitraryRun = fc.record({
      sizes: fc.array(fc.constantFrom(21_000, 22_300).map(um), { minLength: 2, maxLength: 2 }),
      spare: fc.tuple(fc.nat(3_000), fc.nat(700)),
      crosscut: arbitraryCut,
      seed: fc.integer({ min: 1, max: 500 }),
      vertical: fc.boolean(),
      knot: fc.tuple(umBetween(0, 50_000), umBetween(0, 24_000)),
    });
    fc.assert(
      fc.property(arbitraryRun, ({ sizes, spare, crosscut, seed, vertical, knot }) => {
        const rip = { kerf: um(2_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };
        const face = vertical
          ? stackFace(sizes, um(21_000), um(2_000), "vertical")
          : rowFace(sizes, um(21_000), um(2_000), "horizontal");
        const layout = freshLayout(face, { crosscut, rip, spacing: "followGap" });
        const loss = crosscut.kerf + crosscut.cleanUpBefore + crosscut.cleanUpAfter;
        const length = sizes.reduce((sum, size) => sum + size, 0) + 2 * loss + spare[0];
        const area = {
          shape: "ellipse",
          centre: { x: knot[0], y: knot[1] },
          radiusX: um(900),
          radiusY: um(700),
          turnDeg: 15,
        } as const;
        const board = boardOf("b1", length, 21_000 + spare[1], { keepClear: [{ id: "k", kind: "knot", area }] });
        const request: LooseRequest = {
          layout,
          run: ["p1", "p2"],
          locked: [],
          side: { side: "face", board, picture: woodPicture(board.length, board.width, seed) },
          neighbours: [],
          weights,
          leastOffcut,
          grid: finest,
          mostPairs: 10_000_000,
        };
        const ground = bruteGround({ ...request, ...asPlaces(request) });
        const loose = accepted(letLoose(layout, "p2"));
        let best = -1;
        for (const run of everyRun(loose, request)) best = Math.max(best, bruteTotal(ground, run, ["p1", "p2"]));
        const answer = search(request);
        expect(answer.found).toBe(best >= 0);
        if (!answer.found) return;
        expect(answer.value.total).toBeCloseTo(best, 12);
        expect(answer.value.total).toBe(bruteTotal(ground, answer.layout, ["p1", "p2"]));
        expect(problems(answer.layout, [board])).toEqual([]);
      }),
      { numRuns: 3 },
    );
  });

  const cut = { kerf: um(3_000), cleanUpBefore: um(0), cleanUpAfter: um(0) };
  const three = freshLayout(rowFace([um(60_000), um(60_000), um(60_000)], um(40_000), um(3_000), "horizontal"), {
    crosscut: cut,
    rip: cut,
    spacing: "followGap",
  });
  const knotAt = (x: number) => ({
    id: `k${x}`,
    kind: "knot" as const,
    area: { shape: "ellipse", centre: { x: um(x), y: um(30_000) }, radiusX: um(5_000), radiusY: um(5_000), turnDeg: 0 } as const,
  });
  const board = boardOf("b1", 420_000, 60_000, { keepClear: [knotAt(100_000), knotAt(230_000)] });
  const request: LooseRequest = {
    layout: three,
    run: ["p1", "p2", "p3"],
    locked: [],
    side: { side: "face", board, picture: woodPicture(board.length, board.width, 21) },
    neighbours: [],
    weights,
    leastOffcut,
    grid: { along: um(6_000), across: um(3_000) },
    mostPairs: 200_000,
  };

  test("go round knots that the set cannot, in their order and the loss apart", () => {
    const { layout, places, value } = found(request);
    expect(problems(layout, [board])).toEqual([]);
    const turns = places[0]?.turns;
    const starts = places.map(({ corner }) => (turns === 0 ? corner.x : -corner.x));
    expect(starts).toEqual([...starts].sort((p, q) => p - q));
    expect(value.seams).toHaveLength(2);
    expect(value.leaves).not.toBeNull();
    expect(places.map(({ piece }) => piece)).toEqual(["p1", "p2", "p3"]);
  });

  test("are valued as they lie, the found as the present", () => {
    const answer = found(request);
    const again = found({ ...request, layout: answer.layout });
    expect(again.present).toEqual(answer.value);
    expect(again.value.total).toBeGreaterThanOrEqual(answer.value.total - 1e-12);
    expect(answer.present).toBeNull();
  });

  test("leave a locked piece where it is and match up with it", () => {
    const lone = ["p1", "p2", "p3"].reduce(
      (layout, id) => (groupOf(layout, id)?.pieceIds.length === 1 ? layout : accepted(letLoose(layout, id))),
      three,
    );
    const laid = accepted(placeGroup(lone, groupOf(lone, "p2")?.id ?? "", "b1", { x: um(150_123), y: um(12_345) }, 0));
    const answer = found({ ...request, layout: laid, locked: ["p2"] });
    const spansOf = (layout: FaceLayout) => lyingPieces(layout).find(({ id }) => id === "p2")?.spans;
    expect(spansOf(answer.layout)).toEqual(spansOf(laid));
    expect(problems(answer.layout, [board])).toEqual([]);
    expect(answer.places.map(({ piece }) => piece)).toEqual(["p1", "p3"]);
    const [first, last] = answer.places;
    if (first?.turns === 0) {
      expect(first.corner.x).toBeLessThanOrEqual(150_123 - 63_000);
      expect(last?.corner.x).toBeGreaterThanOrEqual(150_123 + 63_000);
    }
    expect(answer.value.seams).toHaveLength(2);
  });

  test("a budget makes the grid coarser, never the run impossible", () => {
    const tight = { ...request, side: { ...request.side, board: { ...board, keepClear: [], length: um(186_500) } } };
    const answer = found({ ...tight, mostPairs: 1 });
    expect(answer.grid.along).toBeGreaterThan(6_000);
    expect(problems(answer.layout, [tight.side.board])).toEqual([]);
  });

  test("say why there is no run", () => {
    expect(search({ ...request, locked: request.run })).toEqual({ found: false, reason: "nothing-to-move" });
    const short = { ...board, keepClear: [], length: um(180_000) };
    expect(search({ ...request, side: { ...request.side, board: short } })).toEqual({ found: false, reason: "no-order" });
    const narrow = { ...board, keepClear: [knotAt(30_000)], length: um(65_000), width: um(45_000) };
    expect(search({ ...request, side: { ...request.side, board: narrow } })).toEqual({
      found: false,
      reason: "no-place",
      piece: "p1",
      obstacles: ["keep-clear"],
    });
    const small = { ...board, length: um(50_000) };
    expect(search({ ...request, side: { ...request.side, board: small } })).toMatchObject({ reason: "no-place", obstacles: [] });
  });
});

/** The rest of a request for places, which the brute force is made from. */
function asPlaces({ side }: LooseRequest) {
  return {
    groupId: "set",
    sides: [side],
    layoutSide: "face" as const,
    weights: { match: 0, step: 0, symmetry: 0, clear: 0, rest: 0, stock: 0 },
    stock: 0,
    count: 1,
    apart: { along: 0, across: 0 },
  };
}
