import fc from "fast-check";
import { expect, test } from "vitest";
import { boardEdges } from "@/lib/layout/program/cut-request";
import { missingInPart, slidInPart } from "@/lib/layout/replan/fit-in-part";
import type { RestPiece } from "@/lib/layout/replan/part-in-hand";
import { wholeBoardInHand } from "@/lib/layout/replan/part-in-hand";
import { um } from "@/lib/layout/units/um";
import { request } from "../program/row-of-fronts";
import { plainBoard } from "./at-the-bench";

interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Parts of a few micrometres, so that every place can be tried. Pieces lie anyhow: over each other and over the edges. */
const tiny = fc.record({
  length: fc.integer({ min: 3, max: 8 }),
  width: fc.integer({ min: 2, max: 4 }),
  kerf: fc.record({ x: fc.nat(2), y: fc.nat(2) }),
  boxes: fc.array(
    fc.record({
      x: fc.integer({ min: -2, max: 8 }),
      y: fc.integer({ min: -1, max: 4 }),
      width: fc.integer({ min: 1, max: 4 }),
      height: fc.integer({ min: 1, max: 3 }),
    }),
    { minLength: 1, maxLength: 3 },
  ),
});

const range = (count: number) => Array.from({ length: Math.max(0, count) }, (_, i) => i);

/** Every way to lay the boxes into the part. */
function* layings(boxes: readonly Box[], length: number, width: number): Generator<readonly Box[]> {
  const [first, ...others] = boxes;
  if (!first) {
    yield [];
    return;
  }
  for (const x of range(length - first.width + 1))
    for (const y of range(width - first.height + 1))
      for (const rest of layings(others, length, width)) yield [{ ...first, x, y }, ...rest];
}

/** Tries a blade at every position in either direction, again and again; nothing changes sides. */
function comesApart(
  laid: readonly Box[],
  lay: readonly Box[],
  group: readonly number[],
  kerf: { x: number; y: number },
): boolean {
  if (group.length < 2) return true;
  return (["x", "y"] as const).some((axis) => {
    const size = axis === "x" ? "width" : "height";
    const from = (i: number) => laid[i]?.[axis] ?? 0;
    const to = (i: number) => from(i) + (laid[i]?.[size] ?? 0);
    const middle = (i: number) => (lay[i]?.[axis] ?? 0) + (lay[i]?.[size] ?? 0) / 2;
    return range(12).some((at) => {
      const low = group.filter((i) => to(i) <= at);
      const high = group.filter((i) => from(i) >= at + kerf[axis]);
      if (low.length === 0 || high.length === 0 || low.length + high.length < group.length) return false;
      if (low.some((a) => high.some((b) => middle(a) > middle(b) || (middle(a) === middle(b) && a > b)))) return false;
      return comesApart(laid, lay, low, kerf) && comesApart(laid, lay, high, kerf);
    });
  });
}

function leastByBruteForce({
  length,
  width,
  kerf,
  boxes,
}: {
  length: number;
  width: number;
  kerf: { x: number; y: number };
  boxes: readonly Box[];
}) {
  let least = Number.POSITIVE_INFINITY;
  for (const laid of layings(boxes, length, width)) {
    const most = Math.max(
      ...laid.flatMap((box, i) => [Math.abs(box.x - (boxes[i]?.x ?? 0)), Math.abs(box.y - (boxes[i]?.y ?? 0))]),
    );
    if (most < least && comesApart(laid, boxes, range(boxes.length), kerf)) least = most;
  }
  return least;
}

test("pieces fit into a part exactly when some laying of all can be cut apart, and no laying moves its farthest piece less", () => {
  const seen = { fits: 0, slides: 0, not: 0 };
  fc.assert(
    fc.property(tiny, ({ length, width, kerf, boxes }) => {
      const none = { left: um(0), right: um(0), top: um(0), bottom: um(0) };
      const pieces = boxes.map((box, i): RestPiece => {
        const rect = { x: um(box.x), y: um(box.y), width: um(box.width), height: um(box.height) };
        return { pieceId: `p${i + 1}`, label: String(i + 1), rect, cleanUp: none, keepsSize: true };
      });
      const board = { length: um(length), width: um(width) };
      const asked = request(1, 1, [], { board, kerf: { crosscut: um(kerf.x), rip: um(kerf.y) } });
      const sawing = {
        board: plainBoard(asked),
        kerf: asked.kerf,
        machines: undefined,
        asked: { truingTakes: asked.truingTakes },
      };
      const part = { held: wholeBoardInHand(board, boardEdges(true, true), true), pieces, sawing, issued: null };
      const slid = slidInPart(part);
      const least = leastByBruteForce({ length, width, kerf, boxes });
      const { along, across } = missingInPart(part);
      if (!slid) {
        seen.not++;
        expect(least).toBe(Number.POSITIVE_INFINITY);
        return;
      }
      seen.fits++;
      expect([along, across]).toEqual([0, 0]);
      const most = Math.max(
        ...slid.flatMap(({ rect }, i) => [Math.abs(rect.x - (boxes[i]?.x ?? 0)), Math.abs(rect.y - (boxes[i]?.y ?? 0))]),
      );
      expect(most).toBe(least);
      seen.slides += Number(most > 0 && boxes.length > 1);
    }),
    { numRuns: 50 },
  );
  expect(Math.min(...Object.values(seen)), JSON.stringify(seen)).toBeGreaterThan(4);
});
