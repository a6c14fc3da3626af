/** The arithmetic below a seam's reading: lags, parabola, and what chance gives. */
import { describe, expect, test } from "vitest";
import { chanceDeviation, correlations, highPassed, vertex } from "@/lib/layout/figure/correlation";
import { bell, randomFor } from "@/lib/sawmill/random";

/** Noise whose neighbours are alike over about `reach` samples. */
function wander(length: number, reach: number, random: () => number): Float64Array {
  const keep = Math.exp(-1 / reach);
  let value = bell(random);
  return Float64Array.from({ length }, () => {
    value = keep * value + Math.sqrt(1 - keep * keep) * bell(random);
    return value;
  });
}

describe("correlation", () => {
  test("a profile is found again at the lag it was moved by, with a correlation of 1", () => {
    const whole = wander(500, 5, randomFor(1, "lag"));
    for (const lag of [-20, -3, 0, 7, 20]) {
      const likeness = correlations(whole.slice(50, 350), whole.slice(50 - lag, 350 - lag), 20);
      expect(likeness).toHaveLength(41);
      expect(likeness.indexOf(Math.max(...likeness)) - 20).toBe(lag);
      expect(likeness[lag + 20]).toBeCloseTo(1, 12);
    }
  });

  test("an even profile is like nothing", () => {
    expect([...correlations(new Float64Array(50).fill(3), wander(50, 3, randomFor(2, "even")), 2)]).toEqual([0, 0, 0, 0, 0]);
  });

  test("the vertex of a parabola is found exactly", () => {
    const parabola = (x: number) => 5 - 2 * (x - 0.3) ** 2;
    expect(vertex(parabola(-1), parabola(0), parabola(1))).toBeCloseTo(0.3, 12);
    expect(vertex(1, 1, 1)).toBe(0);
  });

  test("the high pass takes out what is even or rises evenly, away from the ends", () => {
    const passed = highPassed(
      Float64Array.from({ length: 200 }, (_, i) => 90 + 0.3 * i),
      41,
    );
    for (let i = 20; i < 180; i++) expect(passed[i]).toBeCloseTo(0, 9);
  });

  test.each([
    [2, 2],
    [8, 8],
    [2, 8],
  ])("two strangers that wander over %i and %i samples correlate as widely as chance is said to make them", (reachA, reachB) => {
    const random = randomFor(3, "strangers");
    const found: number[] = [];
    let said = 0;
    for (let i = 0; i < 400; i++) {
      const [a, b] = [wander(600, reachA, random), wander(600, reachB, random)];
      found.push(correlations(a, b, 0)[0] as number);
      said += chanceDeviation(a, b, 32, 600) / 400;
    }
    const deviation = Math.sqrt(found.reduce((sum, value) => sum + value * value, 0) / found.length);
    // 400 pairs know the deviation to 3.5 %; the estimate from one profile each is itself rough.
    expect(said / deviation).toBeGreaterThan(0.85);
    expect(said / deviation).toBeLessThan(1.15);
  });
});
