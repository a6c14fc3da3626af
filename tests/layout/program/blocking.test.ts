import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { PlacedPiece } from "@/lib/layout/program/cut-request";
import { cutRefusal, planCuts } from "@/lib/layout/program/plan-cuts";
import { front, request } from "./row-of-fronts";

/** Four pieces round a hole, each reaching past the next: no straight cut runs through. Gaps of exactly one kerf. */
function pinwheel(first: number, x: number, y: number, long: number, short: number): PlacedPiece[] {
  const gap = 2.4;
  const far = long + gap;
  return [
    front(first, x, y, long, short),
    front(first + 1, x + far, y, short, long),
    front(first + 2, x + short + gap, y + far, long, short),
    front(first + 3, x, y + short + gap, short, long),
  ];
}

describe("layouts that no straight cut can part", () => {
  test("a pinwheel is refused and its four pieces are named", () => {
    const outcome = planCuts(request(1000, 700, pinwheel(1, 50, 50, 300, 150)));
    expect(outcome).toEqual({ ok: false, reason: "blocked", pieces: ["p1", "p2", "p3", "p4"] });
  });

  test("a piece in the hole of a pinwheel is blocked but blocks nothing, so it is not named", () => {
    const inHole = front(5, 250, 250, 40, 40);
    const outcome = planCuts(request(1000, 700, [inHole, ...pinwheel(1, 50, 50, 300, 150)]));
    expect(outcome).toEqual({ ok: false, reason: "blocked", pieces: ["p1", "p2", "p3", "p4"] });
  });

  test("among free pieces round it, exactly the pieces of the pinwheel are named, wherever it lies and whatever its sizes", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 800 }),
        fc.integer({ min: 160, max: 400 }),
        fc.integer({ min: 40, max: 150 }),
        fc.shuffledSubarray([0, 1, 2]),
        (x, long, short, free) => {
          const reach = long + short + 10;
          const around = [front(10, x, 600, 300, 60), front(11, x + reach, 0, 200, 90), front(12, x + reach, 200, 150, 300)];
          const others = around.filter((_, i) => free.includes(i));
          const outcome = planCuts(request(2000, 700, [...others, ...pinwheel(1, x, 0, long, short)]));
          expect(outcome).toEqual({ ok: false, reason: "blocked", pieces: ["p1", "p2", "p3", "p4"] });
        },
      ),
      { numRuns: 100 },
    );
  });

  test("a pinwheel opened by one kerf can be sawn", () => {
    const [a, b, c, d] = pinwheel(1, 50, 50, 300, 150);
    if (!a || !b || !c || !d) throw new Error("a pinwheel has four pieces");
    const opened = front(2, 50 + 302.4, 50 + 152.4, 150, 300);
    expect(planCuts(request(1000, 700, [a, opened, front(3, 50 + 152.4, 50 + 454.8, 300, 150), d])).ok).toBe(true);
  });

  test("the quick answer for the screen is the same as the planner's", () => {
    const blocked = request(1000, 700, pinwheel(1, 50, 50, 300, 150));
    expect(cutRefusal(blocked)).toEqual(planCuts(blocked));
    expect(cutRefusal(request(1000, 700, [front(1, 50, 50, 300, 150)]))).toBeNull();
  });
});
