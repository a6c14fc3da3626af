import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type FaceLayout, placeGroup, type QuarterTurns, runSlices, turnsAlongGrain, um } from "@/lib/layout";
import { placesOf, scanPlaces } from "@/lib/layout/search/place-scan";
import { placeValue } from "@/lib/layout/search/place-value";
import { isAllowed } from "@/lib/layout/search/present-place";
import { marksOf } from "@/lib/layout/search/really-differ";
import { bruteAt, bruteGround } from "../../support/brute-places";
import { accepted } from "../arbitrary-layout";
import { arbitraryCase, requestOf, sceneOf } from "./case";

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
        const wrong: string[] = [];
        const allowed = (column: number, row: number) => table.blocked[column * table.rows + row] === 0;
        for (let column = 0; column < table.columns; column++) {
          for (let row = 0; row < table.rows; row++) {
            const here = allowed(column, row);
            // All places beside one that is judged otherwise, and some of the rest.
            const isBorder = [-1, 1].some(
              (by) => allowed(column + by, row) !== here || (row + by >= 0 && allowed(column, row + by) !== here),
            );
            if (!isBorder && (column * table.rows + row) % 41 !== 0) continue;
            if (here !== isAllowed(laidAt(request.layout, column * 500, row * 500, turns), "set", scene.side.board))
              wrong.push(`${column},${row}`);
          }
        }
        expect(wrong).toEqual([]);
      }),
      { numRuns: 7 },
    );
  });
});

describe("what a place is worth", () => {
  test("total and parts are those of the brute force, to the last digit", () => {
    fc.assert(
      fc.property(arbitraryCase, fc.integer({ min: 0, max: 96 }), (one, start) => {
        const request = requestOf(one);
        const turns = turnsAlongGrain(request.layout.face.grain)[one.second ? 1 : 0];
        const scene = sceneOf(request, turns);
        const scan = runSlices(scanPlaces(scene, request.weights, null));
        const ground = bruteGround(request);
        for (let place = start; place < scan.totals.length; place += 97) {
          const [column, row] = [Math.floor(place / scan.table.rows), place % scan.table.rows];
          const brute = bruteAt(ground, column * 500, row * 500, turns);
          expect(scan.totals[place]).toBe(brute?.total ?? Number.NaN);
          if (brute === null) continue;
          const { total, parts } = placeValue(scene, column, row, request.weights);
          expect({ total, parts, marks: marksOf(scene, column, row).along }).toEqual(brute);
        }
      }),
      { numRuns: 8 },
    );
  });
});
