import { expect, test } from "vitest";
import { pyramidLevels } from "@/lib/layout/picture/pyramid";

test("levels halve, rounding up, until the long side is 600 px or less", () => {
  expect(pyramidLevels(4321, 801)).toEqual([
    { level: 0, width: 4321, height: 801 },
    { level: 1, width: 2161, height: 401 },
    { level: 2, width: 1081, height: 201 },
    { level: 3, width: 541, height: 101 },
  ]);
});

test("a small picture is its own only level, and no level is empty", () => {
  expect(pyramidLevels(600, 2)).toEqual([{ level: 0, width: 600, height: 2 }]);
  expect(pyramidLevels(16_000, 1).at(-1)).toEqual({ level: 5, width: 500, height: 1 });
  expect(pyramidLevels(3, 3, 0).at(-1)).toEqual({ level: 2, width: 1, height: 1 });
});
