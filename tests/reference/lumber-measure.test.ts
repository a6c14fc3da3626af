/**
 * Lumber measure against published worked examples and tables.
 *
 * Sources: an export council's account of the NHLA rules (board foot, surface measure, the 2 × 6¼ in × 8 ft example, the
 * tally of a 5¼ in × 8½ ft board, stock under 1 in); two tables of rough and surfaced hardwood thickness that agree with one
 * another.
 */
import { describe, expect, test } from "vitest";
import {
  boardFeet,
  boardFeetByRule,
  nominalThicknesses,
  nominalThicknessOf,
  parseLength,
  printLength,
  type Um,
  um,
} from "@/lib/layout";
import { surfaceMeasure, tallyLength, tallyWidth } from "@/lib/layout/units/lumber";

function length(text: string): Um {
  const parsed = parseLength(text, "inch");
  if (!parsed.ok) throw new Error(parsed.reason);
  return parsed.value;
}

describe("board feet", () => {
  test("a board foot is 1 ft × 1 ft × 1 in", () => {
    expect(boardFeet(length("12"), length("1 ft"), length("1"))).toBeCloseTo(1, 12);
  });

  test("2 × 6¼ in × 8 ft: 4 1⁄6 square feet, surface measure 4, 8 board feet", () => {
    const [width, long, thick] = [length("6 1/4"), length("8 ft"), length("2")];
    expect(boardFeet(width, long, length("1"))).toBeCloseTo(4 + 1 / 6, 12);
    expect(surfaceMeasure(width, long, "down")).toBe(4);
    expect(surfaceMeasure(width, long, "up")).toBe(4);
    expect(boardFeetByRule(width, long, thick, "up")).toBe(8);
  });

  test("5¼ in × 8½ ft is tallied as 5 in × 8 ft", () => {
    expect(tallyWidth(length("5 1/4"), "up")).toBe(5);
    expect(tallyLength(length("8' 6\""))).toBe(8);
  });

  test("exact halves go up and down by turns, as told: 5½ in is 6 in or 5 in, 6 in × 9 ft measures 5 or 4", () => {
    expect([tallyWidth(length("5 1/2"), "up"), tallyWidth(length("5 1/2"), "down")]).toEqual([6, 5]);
    expect([surfaceMeasure(length("6"), length("9 ft"), "up"), surfaceMeasure(length("6"), length("9 ft"), "down")]).toEqual([
      5, 4,
    ]);
    expect([tallyWidth(um(length("5 1/2") - 1), "up"), tallyWidth(um(length("5 1/2") + 1), "down")]).toEqual([5, 6]);
  });

  test("a board is counted by its tallied measures: 5¼ in × 8½ ft as 5 in × 8 ft, 3 1⁄3 square feet, surface measure 3", () => {
    expect(boardFeetByRule(length("5 1/4"), length("8' 6\""), length("1"), "up")).toBe(3);
    expect(boardFeet(length("5 1/4"), length("8' 6\""), length("1"))).toBeCloseTo(3.71875, 12);
  });

  test("stock under 1 in counts as 1 in, though its volume is less", () => {
    const [width, long] = [length("6"), length("10 ft")];
    expect(boardFeetByRule(width, long, length("3/4"), "up")).toBe(5);
    expect(boardFeet(width, long, length("3/4"))).toBeCloseTo(3.75, 12);
  });

  test("less than a foot long counts as nothing", () => {
    expect(boardFeetByRule(length("6"), length("11 3/4"), length("1"), "up")).toBe(0);
  });
});

describe("nominal thickness", () => {
  test("rough to surfaced two sides, in inches and, where the tables give them, whole millimetres", () => {
    const printed = nominalThicknesses.map(({ name, surfaced }) => [
      name,
      printLength(surfaced, { unit: "inch", denominator: 64 }),
    ]);
    expect(printed).toEqual([
      ["3/4", "9⁄16″"],
      ["4/4", "13⁄16″"],
      ["5/4", "1 1⁄16″"],
      ["6/4", "1 5⁄16″"],
      ["8/4", "1 3⁄4″"],
      ["12/4", "2 3⁄4″"],
      ["16/4", "3 3⁄4″"],
    ]);
    const inMm = Object.fromEntries(nominalThicknesses.map(({ name, surfaced }) => [name, Math.round(surfaced / 1_000)]));
    expect(inMm).toMatchObject({ "4/4": 21, "5/4": 27, "6/4": 33, "8/4": 44, "12/4": 70, "16/4": 95 });
  });

  test("a measured rough board passes for the thickest size it is not thinner than", () => {
    expect(nominalThicknessOf(length("1 1/16"))?.name).toBe("4/4");
    expect(nominalThicknessOf(length("1 1/4"))?.name).toBe("5/4");
    expect(nominalThicknessOf(length("5/8"))).toBeNull();
  });
});
