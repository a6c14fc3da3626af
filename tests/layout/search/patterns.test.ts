import { describe, expect, test } from "vitest";
import {
  type Face,
  freshCutOut,
  freshLayout,
  freshWrap,
  lyingPieces,
  type PlaceRequest,
  placeGroup,
  runSlices,
  searchPlaces,
  turnsAlongGrain,
  um,
} from "@/lib/layout";
import { scanPlaces } from "@/lib/layout/search/place-scan";
import { placeValue } from "@/lib/layout/search/place-value";
import { isAllowed } from "@/lib/layout/search/present-place";
import { bruteAt, bruteGround } from "../../support/brute-places";
import { accepted, boardOf } from "../arbitrary-layout";
import { woodPicture } from "./arbitrary-search";
import { sceneOf } from "./case";

const crosscut = { kerf: um(1_200), cleanUpBefore: um(0), cleanUpAfter: um(200) };
const rip = { kerf: um(900), cleanUpBefore: um(150), cleanUpAfter: um(0) };

function cutOut(grain: "horizontal" | "vertical"): Face {
  const fresh = freshCutOut({
    grain,
    length: um(90_000),
    rows: 1,
    fronts: 2,
    rowHeight: um(24_000),
    strip: um(9_000),
    end: um(8_000),
    divider: um(7_000),
    gap: um(1_000),
  });
  if (!fresh.ok) throw new Error(fresh.reason);
  return fresh.face;
}

const wrap = freshWrap({
  sides: [um(30_000), um(26_000), um(30_000)],
  height: um(25_000),
  thickness: um(9_000),
  grain: "horizontal",
  closed: false,
  corner: { kind: "mitre", turnDeg: 90, parting: "squareThenBevels" },
});

const pair: Face = {
  pattern: "resawn",
  grain: "horizontal",
  leaf: { width: um(40_000), height: um(25_000), thickness: um(6_000) },
  opens: "side",
  resaw: { kerf: um(1_500), planing: um(500) },
  leanDeg: null,
};

/** Seams that a place can change: between the ends of fronts and what stands beside them, or round the corners. */
const faces: readonly (readonly [string, Face, number])[] = [
  ["a cut-out", cutOut("horizontal"), 4],
  ["an upright cut-out", cutOut("vertical"), 4],
  ["a wrap", wrap, 2],
  // One picture cannot tell two mirrored leaves from one place apart.
  ["a resawn pair", pair, 0],
];

function requestFor(face: Face): PlaceRequest {
  const layout = freshLayout(face, { crosscut, rip, spacing: "followGap" });
  const knot = {
    shape: "ellipse",
    centre: { x: um(4_000), y: um(3_000) },
    radiusX: um(3_500),
    radiusY: um(2_000),
    turnDeg: 10,
  } as const;
  const board = boardOf("b1", 112_000, 52_000, { keepClear: [{ id: "k", kind: "knot", area: knot }] });
  return {
    layout,
    groupId: "set",
    sides: [{ side: "face", board, picture: woodPicture(board.length, board.width, 3) }],
    layoutSide: "face",
    neighbours: [],
    weights: { match: 4, step: 3, symmetry: 2, clear: 1, rest: 2, stock: 1 },
    stock: 0.25,
    leastOffcut: { along: um(5_000), across: um(4_000) },
    count: 3,
    apart: { along: 10_000, across: 5_000 },
  };
}

describe.each(faces)("%s", (_, face, seams) => {
  const request = requestFor(face);
  const board = request.sides[0]?.board ?? boardOf("b1", 1, 1);

  test("is searched as the brute force values it, both ways round", () => {
    const ground = bruteGround(request);
    for (const turns of turnsAlongGrain(face.grain)) {
      const scene = sceneOf(request, turns);
      const { table, totals } = runSlices(scanPlaces(scene, request.weights, null));
      for (let place = 0; place < totals.length; place += 97) {
        const [column, row] = [Math.floor(place / table.rows), place % table.rows];
        const brute = bruteAt(ground, column * 500, row * 500, turns);
        expect(totals[place]).toBe(brute?.total ?? Number.NaN);
        if (brute !== null) expect(placeValue(scene, column, row, request.weights).parts).toEqual(brute.parts);
      }
    }
  });

  test("gets places without a problem, and every seam that a place can change counts", () => {
    const found = runSlices(searchPlaces(request));
    expect(found.seams?.counted).toBe(seams);
    expect(found.places.length).toBeGreaterThan(0);
    for (const { place, value } of found.places) {
      const laid = accepted(placeGroup(request.layout, "set", "b1", place.corner, place.turns));
      expect(isAllowed(laid, "set", board)).toBe(true);
      expect(value.seams).toHaveLength(seams);
      expect(lyingPieces(laid).length).toBeGreaterThan(1);
    }
  });
});
