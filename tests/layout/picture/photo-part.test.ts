import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyHomography } from "@/lib/layout/picture/homography";
import { lensOf } from "@/lib/layout/picture/lens";
import { photoPartFor, windowOf } from "@/lib/layout/picture/photo-part";
import { sourceOf } from "@/lib/layout/picture/warp-map";
import { anyMap, photoSize } from "./any-map";

const picture = { width: 300, height: 120 };
const share = fc.double({ min: 0, max: 1, noNaN: true });

describe("the part of a photo that a picture needs", () => {
  test("holds every place of the picture that lies in the photo, with the pixels round it", () => {
    fc.assert(
      fc.property(anyMap({ min: 0.3, max: 5 }), share, share, (map, u, v) => {
        const { left, top, width, height } = photoPartFor(map, picture, photoSize);
        const { x, y } = sourceOf(map, { x: u * picture.width, y: v * picture.height });
        fc.pre(x >= 0 && y >= 0 && x <= photoSize.width && y <= photoSize.height);
        expect(Math.min(x - 1, photoSize.width - 1)).toBeGreaterThanOrEqual(left - 1);
        expect(Math.max(0, x - 1)).toBeGreaterThanOrEqual(left);
        expect(Math.max(0, y - 1)).toBeGreaterThanOrEqual(top);
        expect(Math.min(photoSize.width, x + 1)).toBeLessThanOrEqual(left + width);
        expect(Math.min(photoSize.height, y + 1)).toBeLessThanOrEqual(top + height);
      }),
      { numRuns: 300 },
    );
  });

  test("lies in the photo and has a pixel at least, wherever the map leads", () => {
    fc.assert(
      fc.property(anyMap({ min: 0.3, max: 5 }), fc.integer({ min: -9000, max: 9000 }), (map, away) => {
        const [a, b, c, d, e, f, g, h, i] = map.flatFromPicture;
        const part = photoPartFor({ ...map, flatFromPicture: [a, b, c + away, d, e, f, g, h, i] }, picture, photoSize);
        expect(part.left).toBeGreaterThanOrEqual(0);
        expect(part.top).toBeGreaterThanOrEqual(0);
        expect(Math.min(part.width, part.height, part.madeWidth, part.madeHeight)).toBeGreaterThanOrEqual(1);
        expect(part.left + part.width).toBeLessThanOrEqual(photoSize.width);
        expect(part.top + part.height).toBeLessThanOrEqual(photoSize.height);
      }),
    );
  });

  test("is made smaller where the photo is finer than the picture, but leaves a pixel for each of the picture's", () => {
    const map = { flatFromPicture: [3, 0, 100, 0, 3, 100, 0, 0, 1] as const, lens: lensOf(photoSize, 0) };
    const part = photoPartFor(map, picture, photoSize);
    expect(part.madeWidth).toBe(Math.ceil(part.width / 3));
    const fine = { ...map, flatFromPicture: [1, 0, 100, 0, 1, 100, 0, 0, 1] as const };
    expect(photoPartFor(fine, picture, photoSize)).toMatchObject({ width: 332, madeWidth: 332 });
    // Three photo pixels a picture pixel at one end, two at the other: two are what may be taken away.
    const oblique = { ...map, flatFromPicture: [3, 0, 100, 0, 3, 100, 0.5 / 300, 0, 1] as const };
    const least = Math.min(
      ...[0, 299].map((x) => {
        const [p, q] = [x, x + 1].map((at) => applyHomography(oblique.flatFromPicture, { x: at, y: 0 }));
        return Math.hypot((q?.x ?? 0) - (p?.x ?? 0), (q?.y ?? 0) - (p?.y ?? 0));
      }),
    );
    const made = photoPartFor(oblique, picture, photoSize);
    expect(made.madeWidth / made.width).toBeGreaterThan(0.95 / least);
  });

  test("a window tells the same place in the part's own pixels", () => {
    fc.assert(
      fc.property(anyMap({ min: 0.3, max: 5 }), share, share, (map, u, v) => {
        const part = photoPartFor(map, picture, photoSize);
        const p = { x: u * picture.width, y: v * picture.height };
        const whole = sourceOf(map, p);
        const inPart = sourceOf({ ...map, window: windowOf(part) }, p);
        expect((inPart.x * part.width) / part.madeWidth + part.left).toBeCloseTo(whole.x, 6);
        expect((inPart.y * part.height) / part.madeHeight + part.top).toBeCloseTo(whole.y, 6);
      }),
    );
  });
});
