import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { carryOutline, liesOnBoard, outsideFault, polygonFault, type StockPoint, um, umFromMm } from "@/lib/layout";

const p = (x: number, y: number): StockPoint => ({ x: um(x), y: um(y) });
const size = { length: um(1000), width: um(200) };

describe("faults of a polygon", () => {
  test.each([
    ["a square", [p(0, 0), p(10, 0), p(10, 10), p(0, 10)], null],
    ["a concave outline", [p(0, 0), p(100, 0), p(50, 20), p(100, 40), p(0, 40)], null],
    ["a straight run of corners", [p(0, 0), p(50, 0), p(100, 0), p(100, 40)], null],
    ["a bow tie", [p(0, 0), p(10, 10), p(10, 0), p(0, 10)], { fault: "crosses", edges: [0, 2], at: p(5, 5) }],
    [
      "a corner on another edge",
      [p(0, 0), p(100, 0), p(100, 40), p(50, 0), p(0, 40)],
      { fault: "crosses", edges: [0, 2], at: p(50, 0) },
    ],
    ["a spike", [p(0, 0), p(100, 0), p(40, 0)], { fault: "crosses", edges: [0, 1], at: p(100, 0) }],
    ["a doubled corner", [p(0, 0), p(10, 0), p(10, 0), p(0, 10)], { fault: "doubled", corner: 1, at: p(10, 0) }],
  ])("%s", (_, corners, fault) => {
    expect(polygonFault(corners)).toEqual(fault);
  });

  test("the farthest corner outside is named, with how far; touching is inside", () => {
    expect(outsideFault([p(0, 0), p(1000, 0), p(1000, 200)], size)).toBeNull();
    expect(outsideFault([p(-3, 0), p(1007, 0), p(500, 204)], size)).toEqual({
      fault: "outside",
      corner: 1,
      at: p(1007, 0),
      by: 7,
    });
  });
});

describe("an outline taken over", () => {
  test("that fits is kept as it is", () => {
    const outline = [p(10, 10), p(990, 0), p(980, 190)];
    expect(carryOutline(outline, size)).toEqual({ fate: "kept", outline });
    expect(carryOutline(null, size)).toEqual({ fate: "none", outline: null });
  });

  test("that reaches over is cut at the board's edge", () => {
    expect(carryOutline([p(0, 0), p(1100, 0), p(1100, 200), p(0, 200)], size)).toEqual({
      fate: "cut",
      outline: [p(0, 0), p(1000, 0), p(1000, 200), p(0, 200)],
    });
  });

  test("that lies off the board, or falls into two parts, is dropped", () => {
    expect(carryOutline([p(1100, 0), p(1200, 0), p(1200, 100)], size).fate).toBe("dropped");
    const horseshoe = [p(800, 0), p(1200, 0), p(1200, 200), p(800, 200), p(800, 150), p(1100, 150), p(1100, 50), p(800, 50)];
    expect(carryOutline(horseshoe, size).fate).toBe("dropped");
  });

  test("always lies on the board and never crosses itself", () => {
    const corner = fc.record({ x: fc.integer({ min: -400, max: 1400 }), y: fc.integer({ min: -100, max: 300 }) });
    fc.assert(
      fc.property(fc.array(corner, { minLength: 3, maxLength: 8 }), (corners) => {
        const outline = corners.map(({ x, y }) => p(x, y));
        fc.pre(polygonFault(outline) === null);
        const carried = carryOutline(outline, size);
        if (carried.outline === null) return;
        expect(outsideFault(carried.outline, size)).toBeNull();
        expect(polygonFault(carried.outline)).toBeNull();
      }),
      { numRuns: 500 },
    );
  });
});

describe("an area", () => {
  test("counts as on the board as soon as it reaches in, by its turned bounds", () => {
    const area = { shape: "ellipse", centre: p(umFromMm(1), -60), radiusX: um(100), radiusY: um(10), turnDeg: 0 } as const;
    const board = { length: umFromMm(2), width: um(200) };
    expect(liesOnBoard(area, board)).toBe(false);
    expect(liesOnBoard({ ...area, turnDeg: 90 }, board)).toBe(true);
    expect(liesOnBoard({ shape: "polygon", points: [p(-5, -5), p(1, 1), p(-5, 5)] }, board)).toBe(true);
  });
});
