/** Moisture of a place and size change of one piece of wood. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { coefficientAt, equilibriumMoisture, strainAcross, yearlyMoisture } from "@/lib/layout";
import { outsideRange } from "@/lib/layout/movement/size-change";
import { arbitraryWoodMovement, cherry } from "./moving-face";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe("equilibrium moisture", () => {
  test("rises with the humidity and falls with the temperature", () => {
    fc.assert(
      fc.property(between(0, 50), between(5, 94), between(0.1, 1), (celsius, humidity, more) => {
        const here = equilibriumMoisture({ celsius, humidity });
        expect(equilibriumMoisture({ celsius, humidity: humidity + more })).toBeGreaterThan(here);
        if (celsius <= 40) expect(equilibriumMoisture({ celsius: celsius + 10, humidity })).toBeLessThan(here);
      }),
      { numRuns: 200 },
    );
  });

  test("of a place told in moisture is that moisture", () => {
    expect(yearlyMoisture({ kind: "moisture", driest: 7.2, dampest: 11 })).toEqual({ driest: 7.2, dampest: 11 });
  });
});

describe("size change", () => {
  test("from one moisture to another and back by Eq. 13-3 ends at the size it began with", () => {
    fc.assert(
      fc.property(between(2, 12), between(0, 30), between(0, 30), (tangential, from, to) => {
        const wood = { kind: "shrinkage" as const, radial: tangential / 2, tangential };
        const there = 1 + (strainAcross(wood, 0, from, to) ?? Number.NaN);
        const back = 1 + (strainAcross(wood, 0, to, from) ?? Number.NaN);
        expect(there * back).toBeCloseTo(1, 12);
      }),
      { numRuns: 200 },
    );
  });

  test("grows with the moisture, and not at all without a change", () => {
    fc.assert(
      fc.property(arbitraryWoodMovement, between(0, 90), between(0, 29), between(0.1, 1), (wood, angle, from, more) => {
        expect(strainAcross(wood, angle, from, from)).toBe(0);
        expect(strainAcross(wood, angle, from, from + more)).toBeGreaterThan(0);
        expect(strainAcross(wood, angle, from + more, from)).toBeLessThan(0);
      }),
      { numRuns: 200 },
    );
  });

  test("lies between quarter and flat sawn at every ring angle, halfway at 45°", () => {
    fc.assert(
      fc.property(arbitraryWoodMovement, between(0, 90), (wood, angle) => {
        const [flat, quarter] = [coefficientAt(wood, 0, 10), coefficientAt(wood, 90, 10)];
        expect(coefficientAt(wood, angle, 10)).toBeGreaterThanOrEqual(quarter - 1e-15);
        expect(coefficientAt(wood, angle, 10)).toBeLessThanOrEqual(flat + 1e-15);
        expect(coefficientAt(wood, 45, 10)).toBeCloseTo((flat + quarter) / 2, 12);
      }),
      { numRuns: 200 },
    );
  });

  test("is not told above fibre saturation", () => {
    expect(strainAcross(cherry, 0, 30.1, 8)).toBeNull();
    expect(strainAcross(cherry, 0, 8, 30.1)).toBeNull();
  });

  test("the range of the coefficients is 6 to 14 %, ends included; shrinkage goes up to 30 %", () => {
    expect(outsideRange(cherry, [5.9, 6, 14, 14.1])).toEqual([5.9, 14.1]);
    expect(outsideRange({ kind: "shrinkage", radial: 4, tangential: 8 }, [0, 5, 30])).toEqual([]);
  });
});
