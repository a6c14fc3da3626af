import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  defaultWeights,
  type FaceLayout,
  freshLayout,
  letLoose,
  placeGroup,
  type QuarterTurns,
  rowFace,
  runSlices,
  turnsAlongGrain,
  um,
} from "@/lib/layout";
import { placesOf, scanPlaces } from "@/lib/layout/search/place-scan";
import type { PlaceTable } from "@/lib/layout/search/place-table";
import { placeValue } from "@/lib/layout/search/place-value";
import { isAllowed } from "@/lib/layout/search/present-place";
import { marksOf } from "@/lib/layout/search/really-differ";
import { bruteAt, bruteGround } from "../../support/brute-places";
import { accepted, boardOf } from "../arbitrary-layout";
import { arbitraryCase, requestOf, sceneOf } from "./case";

const STRIDE = 331;

/** Places that the table judges otherwise: all that lie beside one judged differently are asked about, and some of the rest. */
function wrongPlaces({ columns, rows, blocked }: PlaceTable, allowed: (x: number, y: number) => boolean): string[] {
  const isFree = (column: number, row: number) =>
    column >= 0 && column < columns && row >= 0 && row < rows && blocked[column * rows + row] === 0;
  const wrong: string[] = [];
  for (let place = 0; place < blocked.length; place++) {
    const [column, row] = [Math.floor(place / rows), place % rows];
    const here = isFree(column, row);
    const isBorder = [-1, 1].some((by) => isFree(column + by, row) !== here || isFree(column, row + by) !== here);
    if (!isBorder && place % 41 !== 0) continue;
    if (here !== allowed(column * 500, row * 500)) wrong.push(`${column},${row}`);
  }
  return wrong;
}

const laidAt = (layout: FaceLayout, x: number, y: number, turns: QuarterTurns) =>
  accepted(placeGroup(layout, "set", "b1", { x: um(x), y: um(y) }, turns));

describe("which places are allowed", () => {
  test("the table says of every place what problems() says", () => {
    fc.assert(
      fc.property(arbitraryCase, (one) => {
        const request = requestOf(one);
        const turns = turnsAlongGrain(request.layout.face.grain)[one.second ? 1 : 0];
        const scene = sceneOf(request, turns);
        const { table } = runSlices(placesOf(scene, false));
        const wrong = wrongPlaces(table, (x, y) => isAllowed(laidAt(request.layout, x, y, turns), "set", scene.side.board));
        expect(wrong).toEqual([]);
      }),
      { numRuns: 7 },
    );
  });
});

test("keep the loss to other pieces, each edge with its own clean-up, whichever way round they lie", () => {
  const cut = { kerf: um(1_100), cleanUpBefore: um(1_400), cleanUpAfter: um(100) };
  const set = freshLayout(rowFace([um(21_000), um(21_000)], um(12_000), um(2_000), "horizontal"), {
    crosscut: cut,
    rip: { ...cut, kerf: um(700) },
    spacing: "tight",
  });
  const loose = accepted(letLoose(accepted(placeGroup(set, "set", "b1", { x: um(0), y: um(0) }, 0)), "p2"));
  const layout = accepted(placeGroup(loose, "loose-1", "b1", { x: um(30_300), y: um(16_200) }, 2));
  const board = boardOf("b1", 80_000, 45_000);
  const request = requestOf({ layout, board, weights: defaultWeights, seed: 1, elsewhere: false, second: false });
  for (const turns of [0, 2] as const) {
    const { table } = runSlices(placesOf(sceneOf(request, turns), false));
    expect(wrongPlaces(table, (x, y) => isAllowed(laidAt(layout, x, y, turns), "set", board))).toEqual([]);
  }
});

describe("what a place is worth", () => {
  test("total and parts are those of the brute force, to the last digit", () => {
    fc.assert(
      fc.property(arbitraryCase, fc.nat(1_000), (one, start) => {
        const request = requestOf(one);
        const turns = turnsAlongGrain(request.layout.face.grain)[one.second ? 1 : 0];
        const scene = sceneOf(request, turns);
        const scan = runSlices(scanPlaces(scene, request.weights, null));
        const ground = bruteGround(request);
        // A few places of many boards rather than many of a few.
        for (let place = start % STRIDE; place < scan.totals.length; place += STRIDE) {
          const [column, row] = [Math.floor(place / scan.table.rows), place % scan.table.rows];
          const brute = bruteAt(ground, column * 500, row * 500, turns);
          expect(scan.totals[place]).toBe(brute?.total ?? Number.NaN);
          if (brute === null) continue;
          const { total, parts, seams } = placeValue(scene, column, row, request.weights);
          expect({ total, parts, seams, marks: marksOf(scene, column, row).along }).toEqual(brute);
        }
      }),
      { numRuns: 30 },
    );
  });

  test("of two steps equally good the shorter counts, and of two equally short the one back along the seam", () => {
    const set = freshLayout(rowFace([um(24_000), um(24_000)], um(24_000), um(0), "horizontal"), {
      crosscut: { kerf: um(0), cleanUpBefore: um(0), cleanUpAfter: um(0) },
      rip: { kerf: um(0), cleanUpBefore: um(0), cleanUpAfter: um(0) },
      spacing: "tight",
    });
    const board = boardOf("b1", 48_000, 24_000);
    const one = { layout: set, board, weights: defaultWeights, seed: 1, elsewhere: false, second: false };
    // Stripes that come again after so many rows, and lie so many rows further on beyond the seam: the same at several lags.
    const stepOn = (turns: QuarterTurns, period: number, shift: number) => {
      const grey = Uint8Array.from({ length: 96 * 48 }, (_, at) => {
        const [x, y] = [Math.floor(at / 48), at % 48];
        return 100 + 20 * ((y + (x < 48 ? 0 : shift)) % period);
      });
      const request = { ...requestOf(one), sides: [{ side: "face" as const, board, picture: { width: 96, height: 48, grey } }] };
      return placeValue(sceneOf(request, turns), 0, 0, defaultWeights).seams[0]?.step;
    };
    for (const turns of [0, 2] as const) {
      expect(stepOn(turns, 6, 0)).toBe(0);
      expect(stepOn(turns, 6, 3)).toBe(-1_500);
    }
    expect([stepOn(0, 6, 2), stepOn(2, 6, 2)]).toEqual([-1_000, -1_000]);
  });
});
