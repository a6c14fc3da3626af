/** Movement of wood in words. */
import { describe, expect, test } from "vitest";
import { defaultClimate, type GapThroughYear, type MovementWarning, um } from "@/lib/layout";
import { climateText, movementWarningSentence, surroundChoiceOf } from "@/lib/words/movement";

const ground = { year: { driest: 6.2, dampest: 11 }, leastGap: um(1_500), moistureLimit: 2 };
const said = (warning: MovementWarning) =>
  movementWarningSentence(warning, ground, { unit: "mm" }, () => "B-041").replaceAll("\u00a0", " ");

const gap: GapThroughYear = {
  a: "p1",
  b: { piece: "p2" },
  runs: "upright",
  gap: um(3_000),
  reachA: um(100_000),
  reachB: um(100_000),
  rail: null,
  across: 1,
  figures: null,
};

describe("a warning says what is wrong, by how much, and what would mend it", () => {
  test.each([
    [
      { kind: "closes", season: "dampest", gaps: [gap], least: um(-500) },
      "The gap between 1 and 2 closes when the wood is at its dampest, 0.5 mm short.",
    ],
    [
      { kind: "closes", season: "driest", gaps: [gap], least: um(0) },
      "The gap between 1 and 2 closes when the wood is at its driest.",
    ],
    [
      { kind: "too-narrow", season: "dampest", gaps: [{ ...gap, b: { side: "top" } }, gap], least: um(900) },
      "2 gaps, the first above 1, come down to 0.9 mm, below the shop's least of 1.5 mm, at the dampest.",
    ],
    [
      { kind: "too-narrow", season: "driest", gaps: [gap], least: um(1_490) },
      "The gap between 1 and 2 comes down to just under 1.5 mm, the shop's least, at the driest.",
    ],
    [{ kind: "no-reading", stockId: "b" }, "The moisture of board B-041 was never read. Read it before you cut."],
    [{ kind: "no-species", stockId: "b" }, "Say which species board B-041 is: its name is not in the table."],
    [
      { kind: "outside-place", stockId: "b", moisture: 13.4 },
      "Board B-041 is at 13.4 %, damper than it will ever be there (6.2 % to 11.0 %). Let it settle before you cut.",
    ],
    [
      { kind: "surround-differs", stockId: "b", moisture: 8, surround: 11.5 },
      "Board B-041 is at 8.0 % and what stands round the fronts at 11.5 %: more than 2.0 % apart. Let them settle side by side.",
    ],
    [
      { kind: "range-left", stockId: "b", moistures: [5.2, 15] },
      "The figures for board B-041 hold from 6 to 14 % moisture; here it is 5.2 % and 15.0 %. Leave more room.",
    ],
    [
      { kind: "not-on-wood", pieces: ["p1", "p2", "p3"] },
      "Fronts 1–3 are not laid on wood yet: nothing to work their movement out from.",
    ],
  ] satisfies [MovementWarning, string][])("%o", (warning, sentence) => {
    expect(said(warning)).toBe(sentence);
  });
});

test("a place is told as its air and what that makes of wood, in the degrees of the shop", () => {
  const plain = (...asked: Parameters<typeof climateText>) => climateText(...asked).replaceAll("\u00a0", " ");
  expect(plain(defaultClimate, { unit: "mm" })).toBe("30 to 60 % humidity at 21 °C: wood at 6.2 to 11.0 %");
  expect(plain(defaultClimate, { unit: "inch", denominator: 32 })).toBe("30 to 60 % humidity at 69.8 °F: wood at 6.2 to 11.0 %");
  expect(plain({ kind: "moisture", driest: 7, dampest: 12 }, { unit: "mm" })).toBe("wood at 7.0 to 12.0 %");
});

test("a solid surround is chosen by its grain, the others by their kind", () => {
  expect(surroundChoiceOf({ kind: "sameWood", grain: "across", moisture: null })).toBe("across");
  expect(surroundChoiceOf({ kind: "sheet" })).toBe("sheet");
});
