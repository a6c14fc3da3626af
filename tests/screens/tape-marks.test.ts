import { describe, expect, test } from "vitest";
import { um } from "@/lib/layout";
import { tapeMarks } from "@/lib/words/tape-marks";

const figures = (length: number, pxPerMm: number, unit: "mm" | "inch") =>
  tapeMarks(um(length), pxPerMm, unit)
    .map(({ figure }) => figure)
    .filter((figure) => figure !== "");

describe("marks of the tape", () => {
  test("a rack at 0.4 px/mm has figures every 200 mm, and marks every 10", () => {
    const marks = tapeMarks(um(1_000_000), 0.4, "mm");
    expect(figures(1_000_000, 0.4, "mm")).toEqual(["200", "400", "600", "800", "1000"]);
    expect(marks[1]?.mm).toBe(10);
    expect(marks.filter(({ size }) => size === "middle").map(({ mm }) => mm)).toEqual([100, 300, 500, 700, 900]);
  });

  test("close up, single millimetres are marked", () => {
    const marks = tapeMarks(um(30_000), 5, "mm");
    expect(marks).toHaveLength(31);
    expect(figures(30_000, 5, "mm")).toEqual(["10", "20", "30"]);
  });

  test("inches divide by halves and never by tenths", () => {
    const marks = tapeMarks(um(25_400 * 4), 4, "inch");
    expect(figures(25_400 * 4, 4, "inch")).toEqual(["1⁄2", "1", "1 1⁄2", "2", "2 1⁄2", "3", "3 1⁄2", "4"]);
    expect(marks[1]?.mm).toBeCloseTo(25.4 / 16, 9);
  });

  test.each(["mm", "inch"] as const)("marks in %s are never nearer than 4 px, whatever the scale", (unit) => {
    for (const pxPerMm of [0.02, 0.07, 0.1, 0.25, 0.5, 1, 3, 4, 8]) {
      const marks = tapeMarks(um(2_400_000), pxPerMm, unit);
      const gaps = marks.slice(1).map(({ mm }, index) => (mm - (marks[index]?.mm ?? 0)) * pxPerMm);
      expect(Math.min(...gaps)).toBeGreaterThanOrEqual(4 - 1e-6);
    }
  });

  test("no length, no scale: no marks", () => {
    expect(tapeMarks(um(0), 1, "mm")).toEqual([]);
    expect(tapeMarks(um(1000), 0, "mm")).toEqual([]);
    expect(tapeMarks(um(1000), Number.NaN, "inch")).toEqual([]);
  });
});
