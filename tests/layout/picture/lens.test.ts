import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { flatFromPhoto, lensOf, photoFromFlat, STRONGEST_K1 } from "@/lib/layout/picture/lens";

const photo = { width: 4000, height: 3000 };
const anyK1 = fc.double({ min: -STRONGEST_K1, max: STRONGEST_K1, noNaN: true });
const inPhoto = fc.record({ x: fc.double({ min: 0, max: 4000, noNaN: true }), y: fc.double({ min: 0, max: 3000, noNaN: true }) });

describe("the lens", () => {
  test("there and back is where one was, all over the photo", () => {
    fc.assert(
      fc.property(anyK1, inPhoto, (k1, p) => {
        const lens = lensOf(photo, k1);
        const back = photoFromFlat(lens, flatFromPhoto(lens, p));
        expect(Math.hypot(back.x - p.x, back.y - p.y)).toBeLessThan(1e-6);
      }),
      { numRuns: 1000 },
    );
  });

  test("moves the corner by k1 of half the diagonal, and the centre not at all", () => {
    const lens = lensOf(photo, 0.02);
    expect(flatFromPhoto(lens, { x: 4000, y: 3000 })).toEqual({ x: 2000 + 2000 * 1.02, y: 1500 + 1500 * 1.02 });
    expect(flatFromPhoto(lens, { x: 2000, y: 1500 })).toEqual({ x: 2000, y: 1500 });
    expect(photoFromFlat(lens, { x: 2000, y: 1500 })).toEqual({ x: 2000, y: 1500 });
  });

  test("far beyond the photo it stays finite and on the same ray", () => {
    fc.assert(
      fc.property(anyK1, fc.double({ min: 0, max: 2 * Math.PI, noNaN: true }), (k1, angle) => {
        const lens = lensOf(photo, k1);
        const p = photoFromFlat(lens, { x: 2000 + 50_000 * Math.cos(angle), y: 1500 + 50_000 * Math.sin(angle) });
        expect(Number.isFinite(p.x) && Number.isFinite(p.y)).toBe(true);
        expect((p.x - 2000) * Math.sin(angle) - (p.y - 1500) * Math.cos(angle)).toBeCloseTo(0, 6);
        expect((p.x - 2000) * Math.cos(angle) + (p.y - 1500) * Math.sin(angle)).toBeGreaterThan(0);
      }),
    );
  });
});
