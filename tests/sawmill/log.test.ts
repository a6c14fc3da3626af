import { describe, expect, it } from "vitest";
import { branchesNear, emptyPlace, growLog, readLog } from "@/lib/sawmill/log";
import { type RingPlace, readRing } from "@/lib/sawmill/rings";
import { speciesLooks } from "@/lib/sawmill/species";
import { woodColor } from "@/lib/sawmill/wood-color";

function growthAt(log: ReturnType<typeof growLog>, x: number, y: number, z: number): number {
  const place = emptyPlace();
  readLog(log, x, y, z, branchesNear(log, z, z), place);
  return place.growthMm;
}

describe("a grown log", () => {
  it("has rings that add up to its radius and follow on without a gap", () => {
    const { rings, radiusMm } = growLog({ species: "walnut", seed: 3, lengthMm: 800 });
    const outer = [...rings.outerMm];
    expect(outer[0]).toBe(0);
    expect(outer.at(-1)).toBeGreaterThan(radiusMm);
    const widths = outer.slice(1).map((to, i) => to - (outer[i] ?? 0));
    expect(Math.min(...widths)).toBeGreaterThanOrEqual(0.25 * speciesLooks.walnut.ringMm - 1e-9);
    expect(Math.max(...widths) / Math.min(...widths)).toBeGreaterThan(1.8);
  });

  it("places a growth radius in the ring whose borders hold it", () => {
    const { rings } = growLog({ species: "pine", seed: 4, lengthMm: 500 });
    const place: RingPlace = { year: 0, share: 0, widthMm: 1, contrast: 1 };
    for (let growth = 0; growth < 150; growth += 0.037) {
      readRing(rings, growth, place);
      const from = rings.outerMm[place.year] ?? Number.NaN;
      const to = rings.outerMm[place.year + 1] ?? Number.NaN;
      expect(growth).toBeGreaterThanOrEqual(from);
      expect(growth).toBeLessThan(to);
      expect(place.share).toBeCloseTo((growth - from) / (to - from), 6);
    }
  });

  it("holds a growth radius outside its rings to the first and the last", () => {
    const { rings } = growLog({ species: "pine", seed: 4, lengthMm: 500 });
    const place: RingPlace = { year: 0, share: 0, widthMm: 1, contrast: 1 };
    readRing(rings, -5, place);
    expect([place.year, place.share]).toEqual([0, 0]);
    readRing(rings, 1e6, place);
    expect(place.year).toBe(rings.contrast.length - 1);
    expect(place.share).toBeLessThan(1);
  });

  it("grows older outwards, and further up the tree at the same distance from the pith", () => {
    const log = growLog({ species: "ash", seed: 9, lengthMm: 2000, clear: true });
    for (let turn = 0; turn < 6; turn += 0.5) {
      const at = (r: number, z: number) => growthAt(log, r * Math.cos(turn), r * Math.sin(turn), z);
      for (let r = 60; r < 180; r += 10) expect(at(r + 10, 700)).toBeGreaterThan(at(r, 700));
    }
    // Round the whole circumference the pith's wander cancels; what is left is the taper over 1.4 m, give or take the waves.
    const mean = (z: number) =>
      Array.from({ length: 72 }, (_, i) => growthAt(log, 100 * Math.cos(i / 11.459), 100 * Math.sin(i / 11.459), z));
    const sum = (values: number[]) => values.reduce((a, b) => a + b, 0) / values.length;
    const rise = sum(mean(1700)) - sum(mean(300));
    expect(rise / 1400).toBeGreaterThan(0.6 * log.species.taper);
    expect(rise / 1400).toBeLessThan(1.4 * log.species.taper);
  });

  it("bends the grain round a branch and leaves it alone beyond the branch's reach", () => {
    const log = growLog({ species: "pine", seed: 12, lengthMm: 1500 });
    const clear = { ...log, branches: [] };
    const branch =
      log.branches.find(({ endMm, rootZMm }) => endMm > 110 && rootZMm > 300) ?? expect.unreachable("no long branch in this log");
    const z = branch.rootZMm + 90 * branch.up;
    const [x, y] = [branch.outX * 90 * branch.out, branch.outY * 90 * branch.out];
    const beside = 1.6 * (1.2 + branch.flare * 90);
    expect(
      Math.abs(
        growthAt(log, x - branch.outY * beside, y + branch.outX * beside, z) -
          growthAt(clear, x - branch.outY * beside, y + branch.outX * beside, z),
      ),
    ).toBeGreaterThan(1);
    const far = log.branches.map((b) => b.rootZMm).sort((a, b) => a - b)[0] ?? 0;
    expect(growthAt(log, 100, 0, far - 200)).toBe(growthAt(clear, 100, 0, far - 200));
  });

  it("is paler in the sap than in the heart where the wood has a coloured heart", () => {
    for (const species of ["walnut", "oak", "cherry"] as const) {
      const log = growLog({ species, seed: 5, lengthMm: 600, clear: true });
      const color = { r: 0, g: 0, b: 0 };
      const place = emptyPlace();
      const meanLight = (r: number) => {
        let sum = 0;
        for (let i = 0; i < 400; i++) {
          const turn = i * 0.1;
          readLog(log, r * Math.cos(turn), r * Math.sin(turn), 300 + (i % 20), [], place);
          woodColor(log, place, color);
          sum += color.r + color.g + color.b;
        }
        return sum / 1200;
      };
      expect(meanLight(log.radiusMm - 4) - meanLight(log.radiusMm * 0.6), species).toBeGreaterThan(12);
    }
  });
});
