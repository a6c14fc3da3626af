import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type AcrossProfile, acrossProfile, leanFromFaces, um } from "@/lib/layout";
import { growFlitch } from "@/lib/sawmill/flitch";
import { deeper, inward, type Plane, planeFace, pointOn, turned } from "@/lib/sawmill/plane";

/** Growth lines at uneven distances, dark on light, as a face shows them; the back has them `shift` further on, then turned over. */
function lines(seed: number, count: number, stepUm: number, shift: number): { face: AcrossProfile; back: AcrossProfile } {
  let state = seed + 1;
  const random = () => {
    state = (Math.imul(state, 1_103_515_245) + 12_345) & 0x7fffffff;
    return state / 0x7fffffff;
  };
  const places: { readonly at: number; readonly depth: number }[] = [];
  for (let at = -60_000; at < count * stepUm + 60_000; at += 1_500 + 3_500 * random())
    places.push({ at, depth: 30 + 60 * random() });
  const shade = (y: number) =>
    places.reduce(
      (value, { at, depth }) => (Math.abs(y - at) > 3_000 ? value : value - depth * Math.exp(-(((y - at) / 500) ** 2))),
      180,
    );
  const values = (offset: number) => Array.from({ length: count }, (_, index) => shade(index * stepUm - offset));
  return { face: { values: values(0), stepUm }, back: { values: values(shift).reverse(), stepUm } };
}

describe("leanFromFaces", () => {
  test("finds a shift that is no whole number of samples, and the lean it stands for, to a tenth of a millimetre", () => {
    fc.assert(
      fc.property(fc.nat(10_000), fc.integer({ min: -25_000, max: 25_000 }), (seed, shift) => {
        const { face, back } = lines(seed, 600, 250, shift);
        const reading = leanFromFaces(face, back, um(40_000));
        expect(Math.abs((reading?.shift ?? Number.NaN) - shift)).toBeLessThan(100);
        expect(Math.abs((reading?.leanDeg ?? 0) - (Math.atan(shift / 40_000) * 180) / Math.PI)).toBeLessThan(0.2);
        expect(reading?.match).toBeGreaterThan(0.7);
      }),
      { numRuns: 15 },
    );
  });

  test("a mirrored board leans the other way, and the photographs of face and back may be exchanged", () => {
    fc.assert(
      fc.property(fc.nat(10_000), fc.integer({ min: -25_000, max: 25_000 }), (seed, shift) => {
        const { face, back } = lines(seed, 600, 250, shift);
        const flipped = (profile: AcrossProfile) => ({ ...profile, values: Array.from(profile.values).reverse() });
        const lean = leanFromFaces(face, back, um(40_000))?.leanDeg ?? Number.NaN;
        expect(Math.abs((leanFromFaces(flipped(face), flipped(back), um(40_000))?.leanDeg ?? 0) + lean)).toBeLessThan(0.2);
        expect(Math.abs((leanFromFaces(back, face, um(40_000))?.leanDeg ?? 0) - lean)).toBeLessThan(0.2);
      }),
      { numRuns: 10 },
    );
  });

  test("says nothing of unrelated faces, of even lines that fit one line further as well, of a plain face, or of faces of two widths", () => {
    let told = 0;
    for (let seed = 0; seed < 15; seed++) {
      const unrelated = leanFromFaces(lines(seed, 600, 250, 0).face, lines(seed + 1_000, 600, 250, 0).back, um(40_000));
      if (unrelated !== null) told += 1;
    }
    expect(told).toBe(0);
    const even = Array.from({ length: 600 }, (_, index) => 128 + 60 * Math.sin(index / 3));
    expect(leanFromFaces({ values: even, stepUm: 250 }, { values: [...even].reverse(), stepUm: 250 }, um(40_000))).toBeNull();
    const plain = { values: Array.from({ length: 600 }, () => 90), stepUm: 250 };
    expect(leanFromFaces(plain, plain, um(40_000))).toBeNull();
    const { face, back } = lines(1, 600, 250, 3_000);
    expect(leanFromFaces(face, { ...back, values: Array.from(back.values).slice(1) }, um(40_000))).toBeNull();
    expect(leanFromFaces(face, { ...back, stepUm: 251 }, um(40_000))).toBeNull();
  });

  test("boards of the sawmill: what is told of their two faces is how their rings really run, and most of what is not clear is not told", () => {
    const size = { lengthMm: 8, widthMm: 90 };
    const off: number[] = [];
    const seeds = Array.from({ length: 8 }, (_, index) => index + 1);
    for (const seed of seeds) {
      const thicknessMm = 30 + 2 * (seed % 5);
      const species = (["pine", "walnut"] as const)[seed % 2] ?? "pine";
      const { log, plane } = growFlitch({ species, cut: "quarter", lengthMm: 60, widthMm: 200, seed, clear: true });
      const board = turnedAbout(plane, ((seed * 7) % 41) - 15);
      const profile = (of: Plane) => {
        const { rgb, width, height } = planeFace(log, of, size, 4);
        return acrossProfile({ data: rgb, width, height, channels: 3 }, 4, { from: um(0), to: um(8_000) });
      };
      const back = turned(board, thicknessMm, size.widthMm);
      const reading = leanFromFaces(profile(board), profile(back), um(thicknessMm * 1000));
      if (reading !== null) off.push(Math.abs(reading.leanDeg - leanOfRings(board, thicknessMm, size.widthMm)));
    }
    expect(off.length).toBeGreaterThanOrEqual(4);
    expect(Math.max(...off)).toBeLessThan(5);
  });

  /** The plane turned about its own along direction through the middle of its near edge, degrees. */
  function turnedAbout(plane: Plane, degrees: number): Plane {
    const into = inward(plane);
    const [cos, sin] = [Math.cos((degrees * Math.PI) / 180), Math.sin((degrees * Math.PI) / 180)];
    const { across } = plane;
    const origin = pointOn(plane, 10, 36);
    return {
      origin,
      along: plane.along,
      across: { x: across.x * cos + into.x * sin, y: across.y * cos + into.y * sin, z: across.z * cos + into.z * sin },
    };
  }

  /** Rings are circles about the pith (z axis of the log): the mean lean, over the width, of the chord of each ring between the two faces. */
  function leanOfRings(plane: Plane, thicknessMm: number, widthMm: number): number {
    const below = deeper(plane, thicknessMm);
    const leans: number[] = [];
    for (let y = widthMm * 0.2; y <= widthMm * 0.8; y += 2) {
      const ring = radius(pointOn(plane, 0, y));
      let best = { off: Number.POSITIVE_INFINITY, at: y };
      for (let at = y - 60; at <= y + 60; at += 0.1) {
        const off = Math.abs(radius(pointOn(below, 0, at)) - ring);
        if (off < best.off) best = { off, at };
      }
      leans.push((Math.atan((best.at - y) / thicknessMm) * 180) / Math.PI);
    }
    return leans.reduce((sum, lean) => sum + lean, 0) / leans.length;
  }

  const radius = ({ x, y }: { readonly x: number; readonly y: number }) => Math.hypot(x, y);
});
