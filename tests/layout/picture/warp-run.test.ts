import fc from "fast-check";
import { expect, test } from "vitest";
import type { Curve, Sampler } from "@/lib/layout/picture/sampler";
import { sourceOf } from "@/lib/layout/picture/warp-map";
import { sampleRun } from "@/lib/layout/picture/warp-run";
import { anyMap } from "./any-map";

const at = ({ a, b, c, d }: Curve, i: number): number => a + b * i + c * i * i + d * i * i * i;

test("every sample of a run is told once, in order, and within a four-hundredth of a pixel of its place", () => {
  const runs = fc.record({ count: fc.integer({ min: 1, max: 1200 }), step: fc.constantFrom(1, 1 / 2, 1 / 3) });
  fc.assert(
    fc.property(anyMap({ min: 0.3, max: 3 }), runs, (map, { count, step }) => {
      let told = 0;
      const sampler: Sampler = {
        room: () => new Uint8Array(0),
        along(_, offset, samples, x, y) {
          expect(offset).toBe(3 * told);
          for (let i = 0; i < samples; i++) {
            const place = sourceOf(map, { x: 0.5 + (told + i) * step, y: 7.5 });
            expect(Math.hypot(at(x, i) - place.x, at(y, i) - place.y)).toBeLessThan(1 / 400);
          }
          told += samples;
        },
      };
      sampleRun(sampler, 3, map, new Uint8Array(0), 0, { x: 0.5, y: 7.5, step, count });
      expect(told).toBe(count);
    }),
    { numRuns: 60 },
  );
});
