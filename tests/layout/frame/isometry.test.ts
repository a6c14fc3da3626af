import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  composed,
  type FacePoint,
  type Isometry,
  identity,
  inverted,
  polygonToStock,
  type QuarterTurns,
  quarterTurn,
  rectToStock,
  type StockPoint,
  toFace,
  toStock,
  um,
} from "@/lib/layout";
import { umBetween } from "../arbitrary-layout";

const length = umBetween(-5_000_000, 5_000_000);
const arbitraryPoint = fc.record({ x: length, y: length });
const arbitraryQuarterTurn = fc
  .tuple(fc.constantFrom<QuarterTurns>(0, 1, 2, 3), length, length)
  .map(([turns, x, y]) => quarterTurn(turns, x, y));
/** Any turn, and the same reflected: the map of a turned leaf. */
const arbitraryIsometry: fc.Arbitrary<Isometry> = fc
  .tuple(fc.double({ min: -Math.PI, max: Math.PI, noNaN: true }), fc.boolean(), length, length)
  .map(([turn, reflected, tx, ty]) => {
    const side = reflected ? -1 : 1;
    return { a: Math.cos(turn), b: Math.sin(turn), c: -side * Math.sin(turn), d: side * Math.cos(turn), tx, ty };
  });

/** For maps within one frame: the same numbers, read as the face's. */
const asFace = ({ x, y }: StockPoint): FacePoint => ({ x, y });

describe("isometries", () => {
  test("a quarter turn takes right to down, down to left, left to up: clockwise as seen with y pointing down", () => {
    const right = { x: um(10), y: um(0) };
    expect(([0, 1, 2, 3] as const).map((turns) => toStock(quarterTurn(turns), right))).toEqual([
      { x: 10, y: 0 },
      { x: 0, y: 10 },
      { x: -10, y: 0 },
      { x: 0, y: -10 },
    ]);
  });

  test("quarter turns are exact: there and back again, and four of them are none", () => {
    fc.assert(
      fc.property(arbitraryQuarterTurn, arbitraryPoint, (map, point) => {
        expect(toFace(map, toStock(map, point))).toEqual(point);
        expect(composed(map, inverted(map))).toEqual(identity);
        expect(composed(inverted(map), map)).toEqual(identity);
        const twice = composed({ ...map, tx: 0, ty: 0 }, { ...map, tx: 0, ty: 0 });
        expect(composed(twice, twice)).toEqual(identity);
      }),
    );
  });

  test("a composition does first the inner, then the outer map", () => {
    fc.assert(
      fc.property(arbitraryQuarterTurn, arbitraryQuarterTurn, arbitraryPoint, (outer, inner, point) => {
        expect(toStock(composed(outer, inner), point)).toEqual(toStock(outer, asFace(toStock(inner, point))));
      }),
    );
  });

  test("any isometry keeps distances to the rounding of a micrometre, and its inverse brings a point back within one", () => {
    fc.assert(
      fc.property(arbitraryIsometry, arbitraryPoint, arbitraryPoint, (map, p, q) => {
        const [p2, q2] = [toStock(map, p), toStock(map, q)];
        expect(Math.abs(Math.hypot(p.x - q.x, p.y - q.y) - Math.hypot(p2.x - q2.x, p2.y - q2.y))).toBeLessThan(1.5);
        const back = toFace(map, p2);
        expect(Math.hypot(back.x - p.x, back.y - p.y)).toBeLessThan(1.5);
      }),
    );
  });

  test("a rectangle after a quarter turn is the bounds of its corners, with sides exchanged by odd turns", () => {
    fc.assert(
      fc.property(
        arbitraryQuarterTurn,
        arbitraryPoint,
        umBetween(1, 900_000),
        umBetween(1, 900_000),
        (map, corner, width, height) => {
          const rect = rectToStock(map, { ...corner, width, height });
          expect([rect.width, rect.height]).toEqual(map.a === 0 ? [height, width] : [width, height]);
          const outline = polygonToStock(map, [corner, { x: um(corner.x + width), y: um(corner.y + height) }]);
          expect([rect.x, rect.y]).toEqual([Math.min(...outline.map(({ x }) => x)), Math.min(...outline.map(({ y }) => y))]);
        },
      ),
    );
  });
});
