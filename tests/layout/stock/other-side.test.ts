/** The two faces of a board: what lies where once it is turned over about its long edge. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type KeepClearShape,
  movedArea,
  movedPoint,
  otherSideFrom,
  type StockPoint,
  sidesCheck,
  turnedOver,
  um,
} from "@/lib/layout";
import { arbitraryKeepClear } from "../arbitrary-layout";

const p = (x: number, y: number): StockPoint => ({ x: um(x), y: um(y) });

/** Written out by the definition, not by the core's own test. */
function holds(area: KeepClearShape, { x, y }: { x: number; y: number }): boolean {
  if (area.shape === "polygon") {
    let inside = false;
    for (const [index, to] of area.points.entries()) {
      const from = area.points.at(index - 1) ?? to;
      if (from.y > y !== to.y > y && x < from.x + ((y - from.y) / (to.y - from.y)) * (to.x - from.x)) inside = !inside;
    }
    return inside;
  }
  const turn = (area.turnDeg * Math.PI) / 180;
  const [dx, dy] = [x - area.centre.x, y - area.centre.y];
  return (
    ((dx * Math.cos(turn) + dy * Math.sin(turn)) / area.radiusX) ** 2 +
      ((dy * Math.cos(turn) - dx * Math.sin(turn)) / area.radiusY) ** 2 <=
    1
  );
}

describe("a board turned over about its long edge", () => {
  test("keeps its left end left, and its upper edge becomes the lower one", () => {
    expect(movedPoint(otherSideFrom(um(200_000)), p(30_000, 10_000))).toEqual(p(30_000, 190_000));
  });

  test("is back as it was when turned over once more", () => {
    fc.assert(
      fc.property(arbitraryKeepClear, fc.integer({ min: 1, max: 500_000 }), (area, width) => {
        const map = otherSideFrom(um(width));
        const back = movedArea(map, movedArea(map, area));
        const turned =
          area.shape === "ellipse" ? { ...area, turnDeg: area.turnDeg - 180 * Math.ceil((area.turnDeg - 90) / 180) } : area;
        expect(back).toEqual(turned.shape === "ellipse" ? { ...turned, turnDeg: turned.turnDeg + 0 } : turned);
      }),
      { numRuns: 150 },
    );
  });

  test("has the same wood in the areas that are carried over", () => {
    const place = fc.record({ x: fc.integer({ min: 0, max: 1_000_000 }), y: fc.integer({ min: 0, max: 400_000 }) });
    fc.assert(
      fc.property(arbitraryKeepClear, fc.array(place, { minLength: 20, maxLength: 20 }), (area, places) => {
        const width = um(400_000);
        const {
          areas: [carried],
          off,
        } = turnedOver([{ area }], { length: um(1_000_000), width });
        if (!carried) return expect(off).toBe(1);
        for (const { x, y } of places) expect(holds(carried.area, { x, y: width - y })).toBe(holds(area, { x, y }));
      }),
      { numRuns: 150 },
    );
  });

  test("does not take over what would lie off the other side, and says how many", () => {
    const dot = (x: number, y: number) => ({
      area: { shape: "polygon" as const, points: [p(x, y), p(x + 10, y), p(x, y + 10)] },
    });
    const { areas, off } = turnedOver([dot(50, 50), dot(990, 50)], { length: um(900), width: um(200) });
    expect(areas).toEqual([{ area: { shape: "polygon", points: [p(50, 140), p(60, 150), p(50, 150)] } }]);
    expect(off).toBe(1);
  });
});

describe("the sizes of face and back", () => {
  const face = { length: um(2_400_000), width: um(200_000) };
  test.each([
    ["the same", 0, 0, true],
    ["a length within 0.3 %", 7_200, 0, true],
    ["a length beyond it", 7_201, 0, false],
    ["a width within 2 mm", 0, -2_000, true],
    ["a width beyond it", 0, -2_001, false],
  ])("%s", (_, lengthBy, widthBy, agree) => {
    const back = { length: um(face.length + lengthBy), width: um(face.width + widthBy) };
    expect(sidesCheck(face, back)).toEqual({ agree, lengthBy, widthBy });
  });
});
