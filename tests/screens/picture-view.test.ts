import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { keptInFrame, pinched, toPicture, toScreen, viewAround, wholeView, zoomedAt } from "@/components/picture/view";

const picture = { width: 4000, height: 3000 };
const frame = { width: 390, height: 400 };
const limits = { least: 0.01, most: 12 };
const place = fc.record({
  x: fc.double({ min: -500, max: 500, noNaN: true }),
  y: fc.double({ min: -500, max: 500, noNaN: true }),
});
const view = fc.record({
  scale: fc.double({ min: 0.05, max: 10, noNaN: true }),
  x: fc.double({ min: -3000, max: 3000, noNaN: true }),
  y: fc.double({ min: -3000, max: 3000, noNaN: true }),
});

describe("the view of a picture", () => {
  test("without a size, the frame shows the picture at scale 1 and nothing divides by zero", () => {
    expect(wholeView(picture, { width: 0, height: 0 })).toEqual({ scale: 1, x: 0, y: 0 });
    expect(wholeView({ width: 0, height: 0 }, frame)).toEqual({ scale: 1, x: 0, y: 0 });
  });

  test("the whole picture lies inside the margins, in the middle", () => {
    const whole = wholeView(picture, frame, 24);
    const a = toScreen(whole, { x: 0, y: 0 });
    const b = toScreen(whole, { x: picture.width, y: picture.height });
    expect(a.x).toBeCloseTo(24);
    expect(b.x).toBeCloseTo(frame.width - 24);
    expect(a.y).toBeCloseTo(frame.height - b.y);
  });

  test("a place on the screen and its place in the picture lead back to each other", () => {
    fc.assert(
      fc.property(view, place, (v, p) => {
        const back = toScreen(v, toPicture(v, p));
        expect(Math.hypot(back.x - p.x, back.y - p.y)).toBeLessThan(1e-6);
      }),
    );
  });

  test("zooming keeps what lies under the pointer there, also at the limits", () => {
    fc.assert(
      fc.property(view, place, fc.double({ min: 0.001, max: 1000, noNaN: true }), (v, at, factor) => {
        const zoomed = zoomedAt(v, factor, at, limits);
        const under = toScreen(zoomed, toPicture(v, at));
        expect(Math.hypot(under.x - at.x, under.y - at.y)).toBeLessThan(1e-5);
        expect(zoomed.scale).toBeGreaterThanOrEqual(limits.least);
        expect(zoomed.scale).toBeLessThanOrEqual(limits.most);
      }),
    );
  });

  test("two fingers moved apart without turning keep the wood under both", () => {
    const v = { scale: 0.5, x: 10, y: -20 };
    const before = [
      { x: 100, y: 100 },
      { x: 200, y: 150 },
    ] as const;
    const after = [
      { x: 60, y: 90 },
      { x: 260, y: 190 },
    ] as const;
    const next = pinched(v, before, after, limits);
    for (const i of [0, 1] as const) {
      const under = toScreen(next, toPicture(v, before[i]));
      expect(under.x).toBeCloseTo(after[i].x);
      expect(under.y).toBeCloseTo(after[i].y);
    }
  });

  test("two fingers on one spot move the picture and do not zoom", () => {
    const spot = { x: 50, y: 50 };
    expect(pinched({ scale: 2, x: 0, y: 0 }, [spot, spot], [spot, { x: 60, y: 50 }], limits)).toEqual({ scale: 2, x: 5, y: 0 });
  });

  test("however it is moved, some of the picture stays in the frame", () => {
    fc.assert(
      fc.property(view, (v) => {
        const kept = keptInFrame(v, picture, frame);
        const right = kept.x + picture.width * kept.scale;
        const bottom = kept.y + picture.height * kept.scale;
        expect(right).toBeGreaterThanOrEqual(63.99);
        expect(bottom).toBeGreaterThanOrEqual(63.99);
        expect(kept.x).toBeLessThanOrEqual(frame.width - 63.99);
        expect(kept.y).toBeLessThanOrEqual(frame.height - 63.99);
      }),
    );
  });

  test("looking at a point brings it to the middle", () => {
    const at = toScreen(viewAround({ x: 1234, y: 567 }, 0.7, frame), { x: 1234, y: 567 });
    expect(at.x).toBeCloseTo(195);
    expect(at.y).toBeCloseTo(200);
  });
});
