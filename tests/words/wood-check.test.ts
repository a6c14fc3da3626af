import fc from "fast-check";
import { expect, test } from "vitest";
import { roundedToSum } from "@/lib/words/wood-check";

test("rounded shares add up to the rounded whole, and none moves by a whole unit", () => {
  fc.assert(
    fc.property(fc.array(fc.double({ min: 0, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 6 }), (shares) => {
      const total = Math.round(shares.reduce((sum, share) => sum + share, 0));
      const rounded = roundedToSum(shares, total);
      expect(rounded.reduce((sum, share) => sum + share, 0)).toBe(total);
      for (const [i, share] of shares.entries()) expect(Math.abs((rounded[i] ?? 0) - share)).toBeLessThan(1 + 1e-9);
    }),
  );
});

test("of equal remainders the first is rounded up", () => {
  expect(roundedToSum([1.5, 1.5, 1], 4)).toEqual([2, 1, 1]);
});
