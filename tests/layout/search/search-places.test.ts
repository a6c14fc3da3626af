import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type BoardFace,
  defaultApart,
  defaultWeights,
  type FaceLayout,
  freshLayout,
  letLoose,
  lyingPieces,
  moveGroup,
  type PlaceRequest,
  type PlaceSearch,
  placeGroup,
  problems,
  type QuarterTurns,
  rowFace,
  runSlices,
  searchPlaces,
  turnsAlongGrain,
  um,
} from "@/lib/layout";
import { type BruteValue, bruteAt, bruteGround, bruteValue } from "../../support/brute-places";
import { accepted, boardOf } from "../arbitrary-layout";
import { woodPicture } from "./arbitrary-search";
import { arbitraryCase, requestOf } from "./case";

const cut = { kerf: um(2_400), cleanUpBefore: um(0), cleanUpAfter: um(300) };
const row = freshLayout(rowFace([um(40_000), um(40_000)], um(30_000), um(3_000), "horizontal"), {
  crosscut: cut,
  rip: cut,
  spacing: "followGap",
});

function requestOn(board: BoardFace, change: Partial<PlaceRequest> = {}): PlaceRequest {
  return {
    layout: row,
    groupId: "set",
    sides: [{ side: "face", board, picture: woodPicture(board.length, board.width, 11) }],
    layoutSide: "face",
    neighbours: [],
    weights: defaultWeights,
    stock: 0.5,
    leastOffcut: { along: um(20_000), across: um(10_000) },
    count: 5,
    apart: { along: 20_000, across: 8_000 },
    ...change,
  };
}

const search = (request: PlaceRequest): PlaceSearch => runSlices(searchPlaces(request));

/** What has to be sawn for the set, clean-up and all, and its finished size. */
function needed(layout: FaceLayout) {
  const laid = accepted(placeGroup(layout, "set", "b1", { x: um(0), y: um(0) }, turnsAlongGrain(layout.face.grain)[0]));
  const pieces = lyingPieces(laid).filter(({ groupId }) => groupId === "set");
  const size = (of: "blank" | "spans", axis: "along" | "across") =>
    Math.max(...pieces.map((piece) => piece[of][axis].to)) - Math.min(...pieces.map((piece) => piece[of][axis].from));
  const sizes = (of: "blank" | "spans") => ({ length: size(of, "along"), width: size(of, "across") });
  return { ...sizes("blank"), finished: sizes("spans") };
}

interface BrutePlace extends BruteValue {
  readonly x: number;
  readonly y: number;
  readonly turns: QuarterTurns;
}

/** Every allowed place, in the order in which equals are chosen. */
function everyPlace(request: PlaceRequest): BrutePlace[] {
  const ground = bruteGround(request);
  const found: BrutePlace[] = [];
  const need = needed(request.layout);
  for (const turns of turnsAlongGrain(request.layout.face.grain)) {
    for (let x = 0; x <= ground.board.length - need.finished.length; x += 500) {
      for (let y = 0; y <= ground.board.width - need.finished.width; y += 500) {
        const value = bruteAt(ground, x, y, turns);
        if (value !== null) found.push({ ...value, x, y, turns });
      }
    }
  }
  return found;
}

function bestUnlike(places: readonly BrutePlace[], { count, apart }: PlaceRequest): BrutePlace[] {
  const chosen: BrutePlace[] = [];
  const sorted = places
    .map((place, index) => ({ place, index }))
    .sort((p, q) => q.place.total - p.place.total || p.index - q.index);
  for (const { place } of sorted) {
    const alike = chosen.some(
      (other) =>
        Math.abs(place.y - other.y) < apart.across &&
        place.marks.every((mark, index) => Math.abs(mark - (other.marks[index] ?? 0)) < apart.along),
    );
    if (!alike && chosen.length < count) chosen.push(place);
  }
  return chosen;
}

describe("the places that are found", () => {
  test("are those a greedy choice among all places of the brute force takes, with its totals", () => {
    fc.assert(
      fc.property(arbitraryCase, fc.nat(4_000), fc.nat(2_000), (one, more, wider) => {
        // So near the size of the set that every place can be valued one by one.
        const need = needed(one.layout);
        const board = { ...one.board, length: um(need.length + more), width: um(need.width + wider), outline: null };
        const request = { ...requestOf({ ...one, board }), apart: { along: 2_000, across: 1_500 } };
        const expected = bestUnlike(everyPlace(request), request);
        const { places, allowed } = search(request);
        expect(
          places.map(({ place, value }) => ({ x: place.corner.x, y: place.corner.y, turns: place.turns, total: value.total })),
        ).toEqual(expected.map(({ x, y, turns, total }) => ({ x, y, turns, total })));
        expect(allowed > 0).toBe(expected.length > 0);
        const [best] = search({ ...request, count: 1 }).places;
        expect(best?.place).toEqual(places[0]?.place);
        expect(best?.value).toEqual(places[0]?.value);
      }),
      { numRuns: 3 },
    );
  });

  test("have no problem, laid as they are given", () => {
    const board = boardOf("b1", 260_000, 45_000, {
      keepClear: [
        {
          id: "k1",
          kind: "knot",
          area: {
            shape: "ellipse",
            centre: { x: um(95_000), y: um(20_000) },
            radiusX: um(7_000),
            radiusY: um(5_000),
            turnDeg: 30,
          },
        },
      ],
    });
    const { places } = search(requestOn(board));
    expect(places).toHaveLength(5);
    for (const { place } of places) {
      const laid = accepted(placeGroup(row, "set", place.stockId, place.corner, place.turns));
      expect(problems(laid, [board])).toEqual([]);
    }
  });

  test("of a set of equal fronts are not one place turned end for end; of unequal ones they may be", () => {
    const board = boardOf("b1", 180_000, 31_000);
    const unequal = freshLayout(rowFace([um(30_000), um(60_000)], um(30_000), um(3_000), "horizontal"), row);
    const near = (found: PlaceSearch) =>
      found.places.some((p) =>
        found.places.some((q) => p.place.turns !== q.place.turns && Math.abs(p.place.corner.x - q.place.corner.x) < 20_000),
      );
    expect(near(search(requestOn(board)))).toBe(false);
    expect(near(search(requestOn(board, { layout: unequal })))).toBe(true);
    expect(defaultApart).toEqual({ along: 60_000, across: 10_000 });
  });

  test("are the same however often they are asked for, and the share done only grows, to the end", () => {
    const request = requestOn(boardOf("b1", 150_000, 36_000));
    const shares: number[] = [];
    const slices = searchPlaces(request);
    let slice = slices.next();
    for (; !slice.done; slice = slices.next()) shares.push(slice.value);
    expect(slice.value).toEqual(search(request));
    expect(shares).toEqual([...shares].sort((p, q) => p - q));
    expect(shares[0]).toBe(0);
    expect(shares.at(-1)).toBeLessThanOrEqual(1);
    expect(new Set(shares).size).toBeGreaterThan(100);
  });
});

describe("the present place", () => {
  const board = boardOf("b1", 170_000, 43_000);
  const here = accepted(placeGroup(row, "set", "b1", { x: um(70_123), y: um(9_877) }, 0));

  test("is valued where it is, off the grid too, as the brute force values it", () => {
    const request = requestOn(board, { layout: here });
    const { present } = search(request);
    const { total, parts } = bruteValue(bruteGround(request), here, new Set(["p1", "p2"]));
    expect(present?.value).toMatchObject({ total, parts });
    expect(present?.allowed).toBe(true);
  });

  test("is what every found place is better and worse than, in parts by a twentieth and more", () => {
    const { places, present } = search(requestOn(board, { layout: here }));
    for (const { value, against } of places) {
      for (const { part, by } of [
        ...(against?.better ?? []),
        ...(against?.worse.map((change) => ({ ...change, by: -change.by })) ?? []),
      ]) {
        expect(by).toBeCloseTo((value.parts[part] ?? 0) - (present?.value.parts[part] ?? 0), 12);
        expect(Math.abs(by)).toBeGreaterThanOrEqual(0.05);
      }
    }
    expect(places.some(({ against }) => (against?.better.length ?? 0) > 0)).toBe(true);
  });

  test("is recognised among the found, and is null for a group that lies elsewhere or over the edge", () => {
    const [best] = search(requestOn(board)).places;
    if (best === undefined) throw new Error("no place");
    const laid = accepted(
      placeGroup(row, "set", "b1", { x: um(best.place.corner.x + 400), y: best.place.corner.y }, best.place.turns),
    );
    expect(search(requestOn(board, { layout: laid })).places[0]?.likePresent).toBe(true);
    const over = accepted(moveGroup(here, "set", { x: um(-80_000), y: um(0) }));
    expect(search(requestOn(board, { layout: over })).present).toBeNull();
    const elsewhere = accepted(placeGroup(row, "set", "b9", { x: um(0), y: um(0) }, 0));
    expect(search(requestOn(board, { layout: elsewhere })).present).toBeNull();
  });
});

describe("both sides of a board", () => {
  const board = boardOf("b1", 120_000, 38_000);
  const picture = woodPicture(board.length, board.width, 5);

  /** The picture and board as they would be if the face were what is the back: y counted from the other edge. */
  const turnedOver = () => {
    const grey = new Uint8Array(picture.grey.length);
    for (let x = 0; x < picture.width; x++)
      for (let y = 0; y < picture.height; y++)
        grey[x * picture.height + y] = picture.grey[x * picture.height + picture.height - 1 - y] as number;
    return { ...picture, grey };
  };

  test("the back is searched like a face, and the better of the two comes first", () => {
    const back = { side: "back", board, picture: woodPicture(board.length, board.width, 6) } as const;
    const face = { side: "face", board, picture } as const;
    const both = search(requestOn(board, { sides: [face, back] }));
    const faceOnly = search(requestOn(board, { sides: [face] }));
    const backOnly = search(requestOn(board, { sides: [back] }));
    const bestOf = (found: PlaceSearch) => found.places[0]?.value.total ?? 0;
    expect(bestOf(both)).toBe(Math.max(bestOf(faceOnly), bestOf(backOnly)));
    expect(new Set(both.places.map(({ place }) => place.side)).size).toBe(2);
    expect(both.positions).toBe(faceOnly.positions + backOnly.positions);
  });

  test("a mirrored picture has the mirrored places, with the same matches", () => {
    const weights = { ...defaultWeights, rest: 0, clear: 0, stock: 0 };
    const layout = { ...row, rip: { ...cut, cleanUpAfter: um(0) } };
    const plain = search(requestOn(board, { layout, weights, count: 1, sides: [{ side: "face", board, picture }] })).places[0];
    const mirrored = search(
      requestOn(board, { layout, weights, count: 1, sides: [{ side: "back", board, picture: turnedOver() }] }),
    ).places[0];
    expect(mirrored?.value.total).toBeCloseTo(plain?.value.total ?? 0, 12);
  });

  test("a set among other pieces stays on the side they lie on", () => {
    const set = accepted(placeGroup(row, "set", "b1", { x: um(0), y: um(0) }, 0));
    const loose = accepted(letLoose(set, "p2"));
    const sides = (["face", "back"] as const).map((side) => ({ side, board, picture }));
    const found = search(requestOn(board, { layout: loose, sides }));
    expect(found.sidesLeftOut).toEqual(["back"]);
    expect(found.places.every(({ place }) => place.side === "face")).toBe(true);
    expect(search(requestOn(board, { layout: loose, sides, layoutSide: "back" })).sidesLeftOut).toEqual(["face"]);
  });
});

describe("no place", () => {
  const none = (board: BoardFace, change: Partial<PlaceRequest> = {}) => search(requestOn(board, change)).none;

  test("a board too small says by how much, for what has to be sawn", () => {
    // Two fronts of 40 mm, the loss between them, and 0.3 mm of clean-up at the right end and the lower edge.
    expect(none(boardOf("b1", 80_000, 30_000))).toEqual({ reason: "too-large", tooShortBy: 3_300, tooNarrowBy: 300 });
  });

  test("what stands in the way is named, the fewest of it", () => {
    const area = {
      shape: "ellipse",
      centre: { x: um(45_000), y: um(16_000) },
      radiusX: um(4_000),
      radiusY: um(4_000),
      turnDeg: 0,
    } as const;
    const wood = {
      id: "w",
      rect: { x: um(0), y: um(0), width: um(30_000), height: um(9_000) },
      kerfs: { along: um(0), across: um(0) },
    };
    const board = boardOf("b1", 90_000, 32_000, { keepClear: [{ id: "k", kind: "knot", area }] });
    expect(none(board)).toEqual({ reason: "in-the-way", obstacles: ["keep-clear"] });
    expect(none({ ...board, spokenFor: [wood] })).toEqual({ reason: "in-the-way", obstacles: ["keep-clear", "spoken-for"] });
    expect(none(board, { sides: [] })).toEqual({ reason: "no-side" });
    expect(none({ ...board, keepClear: [] })).toBeNull();
  });
});

test("seams that no place could change are left out and counted", () => {
  const board = boardOf("b1", 200_000, 70_000);
  const stack = freshLayout(
    {
      ...row.face,
      pattern: "grid",
      columns: [um(40_000)],
      rows: [um(30_000), um(30_000)],
      columnGaps: [],
      rowGaps: [um(3_000)],
      grain: "horizontal",
    },
    row,
  );
  const { seams, places } = search(requestOn(board, { layout: stack }));
  expect(seams).toMatchObject({ counted: 0, leftOut: { alongGrain: 1 } });
  expect(places[0]?.value.parts).toMatchObject({ match: null, step: null });
  const low = freshLayout(rowFace([um(40_000), um(40_000)], um(15_000), um(3_000), "horizontal"), row);
  expect(search(requestOn(board, { layout: low })).seams).toMatchObject({ counted: 0, leftOut: { tooShort: 1 } });
});
