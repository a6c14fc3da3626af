/** Glue lines on the show side: where the wood of a front is joined, however the front was turned. */
import { describe, expect, test } from "vitest";
import { glueSegments } from "@/lib/editor/view/glue-segments";
import { type FacePoint, type FaceRect, type Isometry, quarterTurn, um } from "@/lib/layout";

const rect: FaceRect = { x: um(1_000), y: um(2_000), width: um(400), height: um(150) };
const p = (x: number, y: number): FacePoint => ({ x: um(x), y: um(y) });
const at = (stockFromFace: Isometry, ...glueLines: number[]) => glueSegments({ stockFromFace }, rect, glueLines.map(um));

describe("a glue line", () => {
  test("through the wood of a front runs over the front from edge to edge", () => {
    expect(at(quarterTurn(0, 5_000, 6_000), 8_060)).toEqual([{ from: p(1_000, 2_060), to: p(1_400, 2_060) }]);
  });

  test("of a front turned by a half turn lies as far from its other edge", () => {
    // The wood reaches from 10000 − 2150 to 10000 − 2000.
    expect(at(quarterTurn(2, 9_000, 10_000), 7_910)).toEqual([{ from: p(1_400, 2_090), to: p(1_000, 2_090) }]);
  });

  test("of a front whose grain stands runs upright", () => {
    const [segment] = at(quarterTurn(1, 20_000, 30_000), 31_100);
    expect(segment?.from.x).toBe(segment?.to.x);
    expect(segment?.from.x).toBe(1_100);
  });

  test("beside a front, or along its edge, is not on it", () => {
    expect(at(quarterTurn(0, 5_000, 6_000), 7_999, 8_000, 8_150, 8_151)).toEqual([]);
  });
});
