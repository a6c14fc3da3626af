import { describe, expect, test } from "vitest";
import {
  type GestureDeed,
  noGesture,
  pointerDown,
  pointerLost,
  pointerMove,
  pointerUp,
  type Step,
} from "@/components/picture/gesture";
import { moveByKey } from "@/components/picture/handle-key";
import { loupeCorner } from "@/components/picture/loupe-place";

type Event = readonly ["down" | "move" | "up" | "lost", number, number, number];

function played(events: readonly Event[]): GestureDeed[] {
  let gesture = noGesture;
  const deeds: GestureDeed[] = [];
  for (const [kind, id, x, y] of events) {
    const at = { x, y };
    const steps: Record<Event[0], () => Step> = {
      down: () => pointerDown(gesture, id, at),
      move: () => pointerMove(gesture, id, at),
      up: () => pointerUp(gesture, id, at),
      lost: () => pointerLost(gesture, id),
    };
    const step = steps[kind]();
    gesture = step.gesture;
    if (step.does.deed !== "none") deeds.push(step.does);
  }
  return deeds;
}

describe("what fingers on the picture mean", () => {
  test("a finger that trembles and lifts taps where it came down", () => {
    expect(
      played([
        ["down", 1, 10, 10],
        ["move", 1, 13, 12],
        ["up", 1, 13, 12],
      ]),
    ).toEqual([{ deed: "tap", at: { x: 10, y: 10 } }]);
  });

  test("a finger that moves drags from where it came down, then on from move to move", () => {
    expect(
      played([
        ["down", 1, 0, 0],
        ["move", 1, 20, 0],
        ["move", 1, 30, 5],
        ["up", 1, 30, 5],
      ]),
    ).toEqual([
      { deed: "drag", start: { x: 0, y: 0 }, before: { x: 0, y: 0 }, now: { x: 20, y: 0 } },
      { deed: "drag", start: { x: 0, y: 0 }, before: { x: 20, y: 0 }, now: { x: 30, y: 5 } },
      { deed: "dragged", start: { x: 0, y: 0 }, now: { x: 30, y: 5 } },
    ]);
  });

  test("a second finger makes a pinch of it, drops the drag, and lifting either taps nothing", () => {
    expect(
      played([
        ["down", 1, 0, 0],
        ["move", 1, 20, 0],
        ["down", 2, 100, 0],
        ["move", 2, 120, 0],
        ["up", 2, 120, 0],
        ["move", 1, 50, 0],
        ["up", 1, 50, 0],
      ]),
    ).toEqual([
      { deed: "drag", start: { x: 0, y: 0 }, before: { x: 0, y: 0 }, now: { x: 20, y: 0 } },
      { deed: "drag-dropped" },
      {
        deed: "pinch",
        before: [
          { x: 20, y: 0 },
          { x: 100, y: 0 },
        ],
        after: [
          { x: 20, y: 0 },
          { x: 120, y: 0 },
        ],
      },
    ]);
  });

  test("a drag that the system takes away comes to nothing", () => {
    expect(
      played([
        ["down", 1, 0, 0],
        ["move", 1, 20, 0],
        ["lost", 1, 0, 0],
      ]).at(-1),
    ).toEqual({ deed: "drag-dropped" });
  });

  test("a pointer that never came down is not listened to", () => {
    expect(
      played([
        ["move", 7, 5, 5],
        ["up", 7, 5, 5],
      ]),
    ).toEqual([]);
  });
});

describe("moving a handle by key", () => {
  const key = (name: string, altKey = false, shiftKey = false) => moveByKey({ key: name, altKey, shiftKey }, 0.25, 0.1);

  test("an arrow goes one pixel of the screen, with Shift ten", () => {
    expect(key("ArrowRight")).toEqual({ x: 4, y: 0 });
    expect(key("ArrowUp", false, true)).toEqual({ x: 0, y: -40 });
  });

  test("with Alt it goes the fine step at any zoom, with Shift ten of them", () => {
    expect(key("ArrowLeft", true)).toEqual({ x: -0.1, y: 0 });
    expect(key("ArrowDown", true, true)).toEqual({ x: 0, y: 1 });
  });

  test("other keys move nothing", () => {
    expect(key("a")).toBeNull();
  });
});

test("the loupe stands on the side away from the handle", () => {
  expect(loupeCorner({ x: 20, y: 20 }, { width: 390, height: 400 })).toBe("right");
  expect(loupeCorner({ x: 380, y: 20 }, { width: 390, height: 400 })).toBe("left");
});
