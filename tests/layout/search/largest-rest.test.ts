import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { runSlices, um } from "@/lib/layout";
import { largestRect, restArea, restRect, restTable } from "@/lib/layout/search/largest-rest";
import { usableCells } from "@/lib/layout/search/usable-cells";
import { restGrid } from "../../support/brute-rest";
import { boardOf } from "../arbitrary-layout";
import { arbitrarySmallBoard } from "./arbitrary-search";

interface Grid {
  readonly columns: number;
  readonly rows: number;
  readonly usable: Uint8Array;
}

const arbitraryGrid: fc.Arbitrary<Grid> = fc
  .tuple(fc.integer({ min: 1, max: 14 }), fc.integer({ min: 1, max: 9 }))
  .chain(([columns, rows]) =>
    fc
      .array(fc.integer({ min: 0, max: 3 }), { minLength: columns * rows, maxLength: columns * rows })
      .map((cells) => ({ columns, rows, usable: Uint8Array.from(cells, (cell) => (cell === 0 ? 0 : 1)) })),
  );

/** Every rectangle there is. */
function largestByTrying({ columns, rows, usable }: Grid, least: { along: number; across: number }): number {
  let best = 0;
  for (let left = 0; left < columns; left++)
    for (let top = 0; top < rows; top++)
      for (let right = left + least.along; right <= columns; right++)
        for (let bottom = top + least.across; bottom <= rows; bottom++) {
          const size = (right - left) * (bottom - top);
          if (size > best && isFree({ columns, rows, usable }, left, right, top, bottom)) best = size;
        }
  return best;
}

function isFree({ rows, usable }: Grid, left: number, right: number, top: number, bottom: number): boolean {
  for (let x = left; x < right; x++) for (let y = top; y < bottom; y++) if (usable[x * rows + y] === 0) return false;
  return true;
}

describe("the largest rectangle that is left", () => {
  test("beside any group is that of trying every rectangle, and the rectangle named is that large and free", () => {
    const arbitraryTaken = fc.tuple(
      fc.integer({ min: -2, max: 14 }),
      fc.integer({ min: 0, max: 12 }),
      fc.integer({ min: -2, max: 9 }),
      fc.integer({ min: 0, max: 9 }),
    );
    const arbitraryLeast = fc.record({ along: fc.integer({ min: 1, max: 3 }), across: fc.integer({ min: 1, max: 3 }) });
    fc.assert(
      fc.property(arbitraryGrid, arbitraryTaken, arbitraryLeast, (grid, [left, wide, top, high], least) => {
        const taken = { left, right: left + wide, top, bottom: top + high };
        const beside = { ...grid, usable: grid.usable.slice() };
        for (let x = Math.max(0, left); x < Math.min(grid.columns, taken.right); x++)
          for (let y = Math.max(0, top); y < Math.min(grid.rows, taken.bottom); y++) beside.usable[x * grid.rows + y] = 0;
        const table = runSlices(restTable(grid, least));
        // A group of no size parts the board all the same, as the cut for it would.
        fc.pre(wide > 0 && high > 0);
        const area = restArea(table, taken);
        expect(area).toBe(largestByTrying(beside, least));
        expect(table.whole).toBe(largestByTrying(grid, least));
        const rect = restRect(table, taken);
        expect(rect === null ? 0 : rect.columns * rect.rows).toBe(area);
        if (rect === null) return;
        const { column, row, columns, rows } = rect;
        expect(isFree(beside, column, column + columns, row, row + rows)).toBe(true);
        const whole = runSlices(largestRect(grid, least));
        expect((whole?.columns ?? 0) * (whole?.rows ?? 0)).toBe(table.whole);
      }),
      { numRuns: 150 },
    );
  });
});

describe("usable cells", () => {
  test("lie wholly inside the outline, off every area and out of wood that is spoken for, cell by cell", () => {
    fc.assert(
      fc.property(arbitrarySmallBoard, (board) => {
        const kerfs = { along: 1_100, across: 700 };
        const { columns, rows, usable } = runSlices(usableCells(board, [], kerfs));
        const taken = board.spokenFor.map(({ rect, kerfs: theirs }) => ({
          left: rect.x - Math.max(kerfs.along, theirs.along),
          right: rect.x + rect.width + Math.max(kerfs.along, theirs.along),
          top: rect.y - Math.max(kerfs.across, theirs.across),
          bottom: rect.y + rect.height + Math.max(kerfs.across, theirs.across),
        }));
        const { free } = restGrid(board, taken, { along: um(500), across: um(500) });
        const wrong: string[] = [];
        for (let x = 0; x < columns; x++)
          for (let y = 0; y < rows; y++) if ((usable[x * rows + y] === 1) !== free[y]?.[x]) wrong.push(`${x},${y}`);
        expect(wrong).toEqual([]);
      }),
      { numRuns: 12 },
    );
  });

  test("of a whole board are all of it, but for a last bit of less than half a millimetre", () => {
    const { columns, rows, usable } = runSlices(usableCells(boardOf("b1", 10_400, 5_000), [], { along: 0, across: 0 }));
    expect([columns, rows, usable.every((cell) => cell === 1)]).toEqual([20, 10, true]);
  });
});
