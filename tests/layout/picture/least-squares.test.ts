import fc from "fast-check";
import { expect, test } from "vitest";
import { leastSquares } from "@/lib/layout/picture/least-squares";

const number = fc.double({ min: -10, max: 10, noNaN: true });

test("the residual stands at right angles to every column", () => {
  fc.assert(
    fc.property(fc.array(fc.tuple(number, number, number, number), { minLength: 4, maxLength: 12 }), (table) => {
      const rows = table.map(([a, b, c]) => [a, b, c]);
      const solution = leastSquares(
        rows,
        table.map((row) => row[3]),
      );
      if (solution === null) return;
      const scale = 1 + Math.max(...solution.map(Math.abs));
      for (let column = 0; column < 3; column++) {
        const dot = table.reduce((sum, row, i) => {
          const residual = row[3] - (rows[i] as number[]).reduce((s, value, j) => s + value * (solution[j] as number), 0);
          return sum + residual * (row[column] as number);
        }, 0);
        expect(Math.abs(dot) / scale).toBeLessThan(1e-8);
      }
    }),
  );
});

test("a line through three points, by hand: y = 1 + x/2", () => {
  const solution = leastSquares(
    [
      [1, 0],
      [1, 2],
      [1, 4],
    ],
    [1.1, 1.8, 3.1],
  );
  expect(solution?.[0]).toBeCloseTo(1, 12);
  expect(solution?.[1]).toBeCloseTo(0.5, 12);
});

test("too few rows, equal columns or nothing at all have no one answer", () => {
  expect(leastSquares([[1, 2]], [3])).toBeNull();
  expect(
    leastSquares(
      [
        [1, 1],
        [2, 2],
        [3, 3],
      ],
      [1, 2, 3],
    ),
  ).toBeNull();
  expect(leastSquares([], [])).toBeNull();
  expect(
    leastSquares(
      [
        [0, 0],
        [0, 0],
      ],
      [0, 0],
    ),
  ).toBeNull();
});
