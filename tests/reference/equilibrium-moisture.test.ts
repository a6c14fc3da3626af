/**
 * Equilibrium moisture against published figures.
 *
 * Sources: Wood Handbook (FPL-GTR-190) Table 4-2, its cells as a lumber seller reprints them; Eq. 4-5 worked out independently in its
 * °F form with the constants of the Handbook (W 330 + 0.452T + 0.00415T², …) and in its °C form, not rounded.
 */
import { describe, expect, test } from "vitest";
import { equilibriumMoisture } from "@/lib/layout";

const celsius = (fahrenheit: number) => ((fahrenheit - 32) * 5) / 9;

describe("Wood Handbook Table 4-2", () => {
  const cells: [humidity: number, at30F: number, at50F: number, at70F: number, at90F: number][] = [
    [20, 4.6, 4.6, 4.5, 4.3],
    [25, 5.5, 5.5, 5.4, 5.1],
    [30, 6.3, 6.3, 6.2, 5.9],
    [35, 7.1, 7.1, 6.9, 6.7],
    [40, 7.9, 7.9, 7.7, 7.4],
    [45, 8.7, 8.7, 8.5, 8.1],
    [50, 9.5, 9.5, 9.2, 8.9],
    [55, 10.4, 10.3, 10.1, 9.7],
    [60, 11.3, 11.2, 11.0, 10.5],
    [65, 12.4, 12.3, 12.0, 11.5],
    [70, 13.5, 13.4, 13.1, 12.6],
    [75, 14.9, 14.8, 14.4, 13.9],
    [80, 16.5, 16.4, 16.0, 15.4],
    [85, 18.5, 18.4, 17.9, 17.3],
  ];

  test.each(cells)("at %i %% relative humidity: %f, %f, %f and %f %% at 30, 50, 70 and 90 °F", (humidity, ...printed) => {
    for (const [index, fahrenheit] of [30, 50, 70, 90].entries()) {
      const moisture = equilibriumMoisture({ celsius: celsius(fahrenheit), humidity });
      // Printed to a tenth, from the other of the two forms of the equation: half a tenth and a little.
      expect(Math.abs(moisture - (printed[index] ?? Number.NaN))).toBeLessThanOrEqual(0.055);
    }
  });
});

describe("Eq. 4-5, not rounded", () => {
  test.each([
    [20, 50, 9.271],
    [21, 40, 7.701],
  ])("at %i °C and %i %%: %f %%", (degrees, humidity, moisture) => {
    expect(equilibriumMoisture({ celsius: degrees, humidity })).toBeCloseTo(moisture, 3);
  });

  test.each([
    [30, 6.172],
    [50, 9.246],
    [65, 11.964],
  ])("at 70 °F and %i %%: %f %% by the °F form, which agrees to a hundredth", (humidity, moisture) => {
    expect(Math.abs(equilibriumMoisture({ celsius: celsius(70), humidity }) - moisture)).toBeLessThanOrEqual(0.01);
  });
});
