import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Graduation, type Opening, type SizeStep, sizesFromOpening, um } from "@/lib/layout";
import { umBetween } from "../arbitrary-layout";

const HALF_MM: SizeStep = { um: 500, parts: 1 };
const IN64: SizeStep = { um: 25_400, parts: 64 };

function opening(more: Partial<Opening>): Opening {
  return {
    opening: um(700_000),
    count: 4,
    gap: um(3_000),
    outerBefore: um(2_000),
    outerAfter: um(2_000),
    graduation: { kind: "equal" },
    ...more,
  };
}

function sizes(more: Partial<Opening>): readonly number[] {
  const graduated = sizesFromOpening(opening(more));
  if (!graduated.ok) throw new Error(graduated.reason);
  return graduated.sizes;
}

const arbitraryGraduation: fc.Arbitrary<Graduation> = fc.oneof(
  fc.constant<Graduation>({ kind: "equal" }),
  umBetween(-40_000, 40_000).map((step): Graduation => ({ kind: "step", step })),
  fc.double({ min: 0.5, max: 2, noNaN: true }).map((ratio): Graduation => ({ kind: "ratio", ratio })),
);

const arbitraryOpening = fc.record({
  opening: umBetween(1, 3_000_000),
  count: fc.integer({ min: 1, max: 24 }),
  gap: umBetween(0, 6_000),
  outerBefore: umBetween(0, 9_000),
  outerAfter: umBetween(0, 9_000),
  graduation: arbitraryGraduation,
  sizeStep: fc.constantFrom<SizeStep | undefined>(undefined, HALF_MM, IN64),
});

describe("sizesFromOpening", () => {
  test("four equal fronts in 700 mm with 3 mm between and 2 mm around are 171.75 mm each", () => {
    expect(sizes({})).toEqual([171_750, 171_750, 171_750, 171_750]);
  });

  test("a constant step of 20 mm grows downwards and still fills the opening", () => {
    expect(sizes({ graduation: { kind: "step", step: um(20_000) } })).toEqual([141_750, 161_750, 181_750, 201_750]);
  });

  test("a constant ratio of 2 over three fronts parts the room 1 : 2 : 4", () => {
    expect(sizes({ opening: um(710_000), count: 3, graduation: { kind: "ratio", ratio: 2 } })).toEqual([
      100_000, 200_000, 400_000,
    ]);
  });

  test("rounded to half a millimetre the fronts of 171.75 mm come to 171.5 mm, and 1 mm is left over for the last outer gap", () => {
    expect(sizesFromOpening(opening({ sizeStep: HALF_MM }))).toEqual({
      ok: true,
      sizes: [171_500, 171_500, 171_500, 171_500],
      gaps: [3_000, 3_000, 3_000],
      outerBefore: 2_000,
      outerAfter: 3_000,
      remainder: 1_000,
    });
  });

  test("outer gap, fronts, gaps and outer gap come to the opening to the last micrometre", () => {
    fc.assert(
      fc.property(arbitraryOpening, (wish) => {
        const made = sizesFromOpening(wish);
        if (!made.ok) return;
        const total = [made.outerBefore, ...made.sizes, ...made.gaps, made.outerAfter].reduce((sum, part) => sum + part, 0);
        expect(total).toBe(wish.opening);
        expect(made.outerAfter - wish.outerAfter).toBe(made.remainder);
        const step = wish.sizeStep === undefined ? 1 : wish.sizeStep.um / wish.sizeStep.parts;
        expect(made.remainder).toBeGreaterThanOrEqual(0);
        // Each size loses less than one division, and 1 µm more where the division itself is no whole number of them.
        expect(made.remainder).toBeLessThan(wish.count * (step + 1));
        for (const size of made.sizes) {
          expect(size).toBeGreaterThan(0);
          expect(Math.abs(size - Math.round(size / step) * step)).toBeLessThanOrEqual(0.5);
        }
      }),
    );
  });

  test("equal fronts are equal and constant steps constant, whatever the opening divides into", () => {
    fc.assert(
      fc.property(arbitraryOpening, umBetween(-40_000, 40_000), (wish, step) => {
        const equal = sizesFromOpening({ ...wish, graduation: { kind: "equal" } });
        if (equal.ok) expect(new Set(equal.sizes).size).toBe(1);
        const stepped = sizesFromOpening({ ...wish, sizeStep: undefined, graduation: { kind: "step", step } });
        if (!stepped.ok) return;
        stepped.sizes.slice(1).forEach((size, index) => {
          expect(size - (stepped.sizes[index] ?? 0)).toBe(step);
        });
      }),
    );
  });

  test("fronts from bottom to top with the inverse graduation are the same fronts, to the rounding", () => {
    fc.assert(
      fc.property(arbitraryOpening, fc.double({ min: 0.5, max: 2, noNaN: true }), (wish, ratio) => {
        const down = sizesFromOpening({ ...wish, sizeStep: undefined, graduation: { kind: "ratio", ratio } });
        const up = sizesFromOpening({ ...wish, sizeStep: undefined, graduation: { kind: "ratio", ratio: 1 / ratio } });
        if (!down.ok || !up.ok) return;
        up.sizes.toReversed().forEach((size, index) => {
          expect(Math.abs(size - (down.sizes[index] ?? 0))).toBeLessThanOrEqual(1);
        });
      }),
    );
  });

  test("refusals name what is missing", () => {
    expect(sizesFromOpening(opening({ opening: um(13_000) }))).toEqual({ ok: false, reason: "no-room", smallest: 0 });
    expect(sizesFromOpening(opening({ graduation: { kind: "step", step: um(120_000) } }))).toEqual({
      ok: false,
      reason: "no-room",
      smallest: -8_250,
    });
    expect(sizesFromOpening(opening({ count: 0 }))).toEqual({ ok: false, reason: "bad-count" });
    expect(sizesFromOpening(opening({ count: 2.5 }))).toEqual({ ok: false, reason: "bad-count" });
    expect(sizesFromOpening(opening({ graduation: { kind: "ratio", ratio: 0 } }))).toEqual({ ok: false, reason: "bad-ratio" });
    expect(sizesFromOpening(opening({ sizeStep: { um: 0, parts: 1 } }))).toEqual({ ok: false, reason: "bad-size-step" });
  });
});
