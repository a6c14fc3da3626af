import { describe, expect, test } from "vitest";
import {
  defaultApart,
  defaultWeights,
  freshLayout,
  isSettled,
  type PlaceRequest,
  rankStock,
  rowFace,
  runSlices,
  type StockFacts,
  type StockWish,
  searchOrder,
  searchPlaces,
  stockBound,
  stockLeftOut,
  stockResult,
  um,
} from "@/lib/layout";
import { boardOf } from "../arbitrary-layout";
import { woodPicture } from "./arbitrary-search";

const cut = { kerf: um(3_000), cleanUpBefore: um(500), cleanUpAfter: um(500) };
const layout = freshLayout(rowFace([um(50_000), um(50_000)], um(30_000), um(3_000), "horizontal"), {
  crosscut: cut,
  rip: cut,
  spacing: "followGap",
});
const wish: StockWish = { layout, groupId: "set", species: "walnut", thickness: { least: um(20_000), most: um(28_000) } };
// Two fronts, 4 mm lost between them, half a millimetre of clean-up at either end and along either edge.
const fits: StockFacts = {
  stockId: "b1",
  species: "walnut",
  length: um(105_000),
  width: um(31_000),
  thickness: um(27_000),
  isHeld: false,
  hasPicture: true,
};

describe("a board is left out by its tag", () => {
  test("not when what has to be sawn is just as large", () => {
    expect(stockLeftOut(wish, fits)).toEqual([]);
  });

  test.each([
    [{ length: um(104_999) }, { reason: "too-short", by: 1 }],
    [{ width: um(30_000) }, { reason: "too-narrow", by: 1_000 }],
    [{ thickness: um(19_500) }, { reason: "too-thin", by: 500 }],
    [{ thickness: um(40_000) }, { reason: "too-thick", by: 12_000 }],
    [{ species: "ash" }, { reason: "species", has: "ash" }],
    [{ isHeld: true }, { reason: "held" }],
    [{ hasPicture: false }, { reason: "no-picture" }],
  ] as const)("for %j", (change, reason) => {
    expect(stockLeftOut(wish, { ...fits, ...change })).toEqual([reason]);
  });

  test("for all reasons at once, and for none that was not asked about", () => {
    const poor = { ...fits, species: "ash", thickness: um(10_000), length: um(50_000), isHeld: true, hasPicture: false };
    expect(stockLeftOut(wish, poor).map(({ reason }) => reason)).toEqual([
      "species",
      "too-thin",
      "too-short",
      "held",
      "no-picture",
    ]);
    expect(stockLeftOut({ ...wish, species: null, thickness: null }, poor).map(({ reason }) => reason)).toEqual([
      "too-short",
      "held",
      "no-picture",
    ]);
  });
});

describe("the rack", () => {
  const requestOn = (id: string, seed: number, change: Partial<Parameters<typeof boardOf>[3]> = {}): PlaceRequest => {
    const board = boardOf(id, 160_000, 40_000, change);
    return {
      layout,
      groupId: "set",
      sides: [{ side: "face", board, picture: woodPicture(board.length, board.width, seed) }],
      layoutSide: "face",
      neighbours: [],
      weights: defaultWeights,
      stock: seed / 10,
      leastOffcut: { along: um(10_000), across: um(5_000) },
      count: 1,
      apart: defaultApart,
    };
  };
  const knot = {
    shape: "ellipse",
    centre: { x: um(80_000), y: um(20_000) },
    radiusX: um(40_000),
    radiusY: um(18_000),
    turnDeg: 0,
  } as const;
  const requests = [
    requestOn("b3", 3),
    requestOn("b1", 8),
    requestOn("b2", 5),
    requestOn("b4", 9, { keepClear: [{ id: "k", kind: "knot", area: knot }] }),
  ];
  const results = requests.map((request) => stockResult(request.sides[0]?.board.id ?? "", runSlices(searchPlaces(request))));

  test("comes best first, and boards without a place last, with what stands in the way", () => {
    const ranked = rankStock(results);
    const totals = ranked.map(({ place }) => place?.value.total ?? -1);
    expect(totals).toEqual([...totals].sort((p, q) => q - p));
    expect(ranked.at(-1)).toEqual({ stockId: "b4", place: null, leftOut: [{ reason: "no-place", obstacles: ["keep-clear"] }] });
    expect(rankStock([...results].reverse())).toEqual(ranked);
  });

  test("holds no board that is worth more than its bound", () => {
    for (const [index, { place }] of results.entries()) {
      expect(place?.value.total ?? 0).toBeLessThanOrEqual(stockBound(defaultWeights, requests[index]?.stock ?? 0));
    }
  });

  test("is searched in the order of what boards can be worth, and is settled when none that waits can come first", () => {
    const order = searchOrder(
      [
        { stockId: "b", stock: 0.2 },
        { stockId: "c", stock: 0.9 },
        { stockId: "a", stock: 0.2 },
      ],
      defaultWeights,
    );
    expect(order.map(({ stockId }) => stockId)).toEqual(["c", "a", "b"]);
    const best = Math.max(...results.map(({ place }) => place?.value.total ?? 0));
    expect(isSettled(results, [best])).toBe(true);
    expect(isSettled(results, [best, 1])).toBe(false);
    expect(isSettled([], [])).toBe(true);
  });
});
