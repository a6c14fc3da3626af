import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { freshLayout, LEAST_GLUE_LINE, lyingPieces, type Problem, placeGroup, problems, rowFace, um } from "@/lib/layout";
import { accepted, arbitrarySet, boardOf, umBetween } from "../arbitrary-layout";

const cut = { kerf: um(2_400), cleanUpBefore: um(200), cleanUpAfter: um(200) };

/** Two fronts 150 mm high, their upper edge 20 mm from the board's. */
function row() {
  const face = rowFace([um(200_000), um(200_000)], um(150_000), um(3_000), "horizontal");
  const fresh = freshLayout(face, { crosscut: cut, rip: cut, spacing: "followGap" });
  return accepted(placeGroup(fresh, "set", "b1", { x: um(1_000), y: um(20_000) }, 0));
}

const glued = (...lines: number[]) => boardOf("b1", 900_000, 220_000, { glueLines: lines.map(um) });
const near = (found: readonly Problem[]) => found.filter(({ kind }) => kind === "glue-line");

describe("glue lines", () => {
  test("8 mm inside the lower edge both fronts are warned of; in the middle, along the edge and beside the piece none is", () => {
    expect(problems(row(), [glued(162_000)])).toEqual([
      { kind: "glue-line", piece: "p1", at: 162_000, fromEdge: 8_000 },
      { kind: "glue-line", piece: "p2", at: 162_000, fromEdge: 8_000 },
    ]);
    expect(problems(row(), [glued(20_000, 95_000, 170_000, 175_000)])).toEqual([]);
  });

  test("how near is the shop's to say; 10 mm where it says nothing", () => {
    expect(LEAST_GLUE_LINE).toBe(10_000);
    expect(near(problems(row(), [glued(30_000)]))).toEqual([]);
    expect(near(problems(row(), [glued(29_999)]))).toHaveLength(2);
    expect(near(problems(row(), [glued(162_000)], { glueLineFromEdge: um(8_000) }))).toEqual([]);
    expect(near(problems(row(), [glued(162_000)], { glueLineFromEdge: um(8_001) }))).toHaveLength(2);
  });

  test("exactly the pieces with a line inside them and nearer an edge than the least, whatever the pattern", () => {
    fc.assert(
      fc.property(
        arbitrarySet,
        fc.array(umBetween(0, 700_000), { maxLength: 6 }),
        umBetween(0, 60_000),
        (layout, lines, least) => {
          const glueLines = [...new Set(lines)].sort((p, q) => p - q);
          const board = boardOf("b1", 5_000_000, 5_000_000, { glueLines });
          const found = near(problems(layout, [board], { glueLineFromEdge: least })).map((one) => JSON.stringify(one));
          const expected = lyingPieces(layout).flatMap(({ id, blankId, spans: { across } }) =>
            glueLines.flatMap((at) => {
              if (id !== blankId || at <= across.from || at >= across.to) return [];
              const fromEdge = Math.min(at - across.from, across.to - at);
              return fromEdge < least ? [JSON.stringify({ kind: "glue-line", piece: id, at, fromEdge })] : [];
            }),
          );
          expect(found).toEqual(expected);
        },
      ),
      { numRuns: 60 },
    );
  });
});

test("stock too thin for a run or a resawn pair is said, with the board and by how much", () => {
  const leaf = { width: um(150_000), height: um(100_000), thickness: um(12_000) };
  const resaw = { kerf: um(2_000), planing: um(500) };
  const pair = { pattern: "resawn", grain: "horizontal", leaf, opens: "side", resaw, leanDeg: null } as const;
  const fresh = freshLayout(pair, { crosscut: cut, rip: cut, spacing: "tight" });
  const laid = accepted(placeGroup(fresh, "set", "b1", { x: um(1_000), y: um(1_000) }, 0));
  const board = boardOf("b1", 400_000, 150_000);
  expect(problems(laid, [{ ...board, thickness: um(28_000) }])).toEqual([]);
  expect(problems(laid, [{ ...board, thickness: um(27_999) }])).toEqual([
    { kind: "too-thin", stockId: "b1", pieces: ["p1", "p2"], missing: 1 },
  ]);
});
