/**
 * Fractions of an inch against published sizes.
 *
 * Sources: general and magazine articles on saw blades give 1/8 in = 3.18 mm, 3/32 in = 2.38 mm, 1/10 in = 2.54 mm, 5/64 in =
 * 1.98 mm; the Architectural Woodwork Standards give 1/4 in = 6.4 mm, 1/8 in = 3.2 mm, 1/2 in = 12.7 mm; machine settings of
 * 1/64 in = 0.397 mm and 1/32 in = 0.794 mm follow from the international inch of 25.4 mm.
 */
import { expect, test } from "vitest";
import { parseLength, printLength } from "@/lib/layout";

test.each([
  ["1/8 in", 3.18, 2],
  ["3/32 in", 2.38, 2],
  ["0.1 in", 2.54, 2],
  ["5/64 in", 1.98, 2],
  ["1/4 in", 6.4, 1],
  ["1/8 in", 3.2, 1],
  ["1/2 in", 12.7, 1],
  ["1/64 in", 0.397, 3],
  ["1/32 in", 0.794, 3],
] as const)("%s is %f mm", (inches, mm, digits) => {
  const parsed = parseLength(inches, "mm");
  if (!parsed.ok) throw new Error(parsed.reason);
  // The sources round to their last digit, halves upwards: 1/8 in is 3.175 mm.
  expect(Math.abs(parsed.value / 1_000 - mm)).toBeLessThanOrEqual(0.5 * 10 ** -digits + 1e-9);
});

test.each([
  ["23 5/16", "23 5⁄16″"],
  ["10/64", "5⁄32″"],
  ["48/64", "3⁄4″"],
  ["7' 6 1/2\"", "90 1⁄2″"],
])("%s prints reduced as %s", (typed, printed) => {
  const parsed = parseLength(typed, "inch");
  expect(parsed.ok && printLength(parsed.value, { unit: "inch", denominator: 64 })).toBe(printed);
});
