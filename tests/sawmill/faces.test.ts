import { describe, expect, it } from "vitest";
import { boardFace, sawBoard } from "@/lib/sawmill/board-face";
import { growFlitch, leafFace, leafPlane } from "@/lib/sawmill/flitch";
import { knotsOnFace } from "@/lib/sawmill/knots-on-face";
import { branchesNear, emptyPlace, growLog, readLog } from "@/lib/sawmill/log";
import { inward, type Plane, planeFace, pointOn, turned } from "@/lib/sawmill/plane";
import { woodColor } from "@/lib/sawmill/wood-color";
import { correlation, grainAngles, luminance, meanWithin, rms } from "./measure";

const SMALL = { lengthMm: 300, widthMm: 120, pxPerMm: 1.5 } as const;

describe("board faces", () => {
  it("are the same bytes for the same seed and others for another", () => {
    const one = boardFace({ species: "walnut", cut: "flat", seed: 1, ...SMALL });
    const same = boardFace({ species: "walnut", cut: "flat", seed: 1, ...SMALL });
    const other = boardFace({ species: "walnut", cut: "flat", seed: 2, ...SMALL });
    expect([one.width, one.height]).toEqual([450, 180]);
    expect(Buffer.compare(one.rgb, same.rgb)).toBe(0);
    expect(Buffer.compare(one.rgb, other.rgb)).not.toBe(0);
  });

  it("are refused when they would have no size", () => {
    for (const [lengthMm, widthMm] of [
      [0, 100],
      [100, -1],
      [Number.NaN, 100],
    ] as const) {
      expect(() => sawBoard({ species: "oak", cut: "flat", seed: 1, lengthMm, widthMm })).toThrow(RangeError);
    }
  });

  it("run along the log with unit vectors at right angles, inside the log", () => {
    for (const cut of ["flat", "rift", "quarter"] as const) {
      for (let seed = 0; seed < 20; seed++) {
        const { log, plane, lengthMm, widthMm } = sawBoard({ species: "oak", cut, seed, lengthMm: 1000, widthMm: 230 });
        const { along, across } = plane;
        expect(Math.hypot(along.x, along.y, along.z)).toBeCloseTo(1, 12);
        expect(Math.hypot(across.x, across.y, across.z)).toBeCloseTo(1, 12);
        expect(along.x * across.x + along.y * across.y + along.z * across.z).toBeCloseTo(0, 12);
        expect(along.z).toBeGreaterThan(0.999);
        for (const [x, y] of [
          [0, 0],
          [lengthMm, 0],
          [lengthMm, widthMm],
          [0, widthMm],
        ] as const) {
          const corner = pointOn(plane, x, y);
          expect(Math.hypot(corner.x, corner.y)).toBeLessThan(log.radiusMm);
        }
      }
    }
  });

  it("lie as their cut says: square to the radius when flat, along it when quartered, between when rift", () => {
    const lean = (cut: "flat" | "rift" | "quarter") => {
      const { plane } = sawBoard({ species: "ash", cut, seed: 6, lengthMm: 500, widthMm: 160 });
      const middle = pointOn(plane, 250, 80);
      const into = inward(plane);
      return (Math.acos(Math.abs(middle.x * into.x + middle.y * into.y) / Math.hypot(middle.x, middle.y)) * 180) / Math.PI;
    };
    expect(lean("flat")).toBeLessThan(15);
    expect(lean("rift")).toBeGreaterThan(35);
    expect(lean("rift")).toBeLessThan(55);
    expect(lean("quarter")).toBeGreaterThan(80);
  });

  it("show straighter grain when quartered than when flat-sawn", () => {
    for (const species of ["walnut", "cherry", "ash", "pine"] as const) {
      const spread = (cut: "flat" | "quarter") =>
        rms(
          [1, 2].flatMap((seed) =>
            grainAngles(boardFace({ species, cut, seed, clear: true, lengthMm: 400, widthMm: 160, pxPerMm: 1 }), 16),
          ),
        );
      expect(spread("quarter") * 1.5, species).toBeLessThan(spread("flat"));
    }
  });

  it("agree with any other plane of the log on the line where they meet", () => {
    const log = growLog({ species: "oak", seed: 8, lengthMm: 600 });
    const along = { x: 0, y: 0, z: 1 };
    // At 5 px/mm a pixel is one sample at its centre; both faces have a row of centres on the line x = 70.1, y = 30.1.
    const origin = { x: 70, y: 30, z: 200 };
    const tangential: Plane = { origin, along, across: { x: 0, y: 1, z: 0 } };
    const radial: Plane = { origin, along, across: { x: 1, y: 0, z: 0 } };
    const shift = (plane: Plane, dx: number, dy: number): Plane => ({
      ...plane,
      origin: { x: origin.x + dx, y: origin.y + dy, z: origin.z },
    });
    const size = { lengthMm: 200, widthMm: 4 };
    const a = planeFace(log, shift(tangential, 0.1, 0), size, 5);
    const b = planeFace(log, shift(radial, 0, 0.1), size, 5);
    const row = 3 * a.width;
    const differing = Array.from(a.rgb.subarray(0, row)).filter((value, i) => Math.abs(value - (b.rgb[i] ?? 0)) > 1);
    expect(differing).toEqual([]);
    expect(Buffer.compare(a.rgb.subarray(row, 2 * row), b.rgb.subarray(row, 2 * row))).not.toBe(0);
  });

  it("match the log's own colour at a point", () => {
    const { log, plane } = sawBoard({ species: "pine", cut: "flat", seed: 3, lengthMm: 200, widthMm: 60 });
    const face = planeFace(log, plane, { lengthMm: 200, widthMm: 60 }, 5);
    const place = emptyPlace();
    const color = { r: 0, g: 0, b: 0 };
    for (const [x, y] of [
      [10, 10],
      [333, 120],
      [870, 255],
    ] as const) {
      const point = pointOn(plane, (x + 0.5) / 5, (y + 0.5) / 5);
      readLog(log, point.x, point.y, point.z, branchesNear(log, point.z, point.z), place);
      woodColor(log, place, color);
      const at = (y * face.width + x) * 3;
      expect([...face.rgb.subarray(at, at + 3)]).toEqual([Math.round(color.r), Math.round(color.g), Math.round(color.b)]);
    }
  });
});

describe("leaves", () => {
  it("correlate strongly with the next leaf and hardly with one far below", () => {
    for (const [species, cut, least] of [
      ["walnut", "flat", 0.7],
      ["cherry", "flat", 0.55],
      ["ash", "quarter", 0.7],
    ] as const) {
      const flitch = growFlitch({ species, cut, seed: 31, lengthMm: 400, widthMm: 140, clear: true });
      const light = (leaf: number) => luminance(leafFace(flitch, leaf, 1));
      const first = light(0);
      const next = correlation(first, light(1));
      expect(next, `${species} ${cut}, next leaf`).toBeGreaterThan(least);
      // A quartered flitch turns slowly round the pith, so only the flat ones have left their figure behind 36 mm below.
      if (cut === "flat") expect(Math.abs(correlation(first, light(60))), `${species}, 60 leaves below`).toBeLessThan(0.45);
    }
  });

  it("have the board's face as leaf 0 and slip by what they are told", () => {
    const options = { species: "cherry", cut: "quarter", seed: 5, lengthMm: 120, widthMm: 80 } as const;
    const flitch = growFlitch(options);
    expect(Buffer.compare(leafFace(flitch, 0, 2).rgb, boardFace({ ...options, pxPerMm: 2 }).rgb)).toBe(0);
    const still = leafPlane(flitch, 3);
    const slipped = leafPlane(flitch, 3, { alongMm: 4, acrossMm: -2 });
    expect(slipped.origin).toEqual(pointOn(still, 4, -2));
  });

  it("show, turned over, the mirrored face of the leaf below", () => {
    const flitch = growFlitch({ species: "ash", cut: "flat", seed: 5, lengthMm: 100, widthMm: 60 });
    // At 5 px/mm each pixel is one sample at its centre, so mirrored rows hold the very same points.
    const back = leafFace(flitch, 2, 5, undefined, "pith");
    const below = leafFace(flitch, 3, 5);
    const row = 3 * back.width;
    for (let y = 0; y < back.height; y += 7) {
      const mirrored = below.rgb.subarray((below.height - 1 - y) * row, (below.height - y) * row);
      const worst = Math.max(
        ...Array.from(back.rgb.subarray(y * row, (y + 1) * row), (value, i) => Math.abs(value - (mirrored[i] ?? 0))),
      );
      expect(worst).toBeLessThanOrEqual(1);
    }
  });

  it("come back to the first side when turned twice", () => {
    const { plane } = sawBoard({ species: "oak", cut: "rift", seed: 2, lengthMm: 100, widthMm: 50 });
    const again = turned(turned(plane, 20, 50), 20, 50);
    expect(again.origin.x).toBeCloseTo(plane.origin.x, 9);
    expect(again.origin.y).toBeCloseTo(plane.origin.y, 9);
    expect(again.origin.z).toBeCloseTo(plane.origin.z, 9);
    expect(again.across).toEqual(plane.across);
  });
});

describe("knots", () => {
  it("are darker than the wood about them where the truth says they are", () => {
    let seen = 0;
    for (let seed = 1; seed <= 7; seed++) {
      const board = sawBoard({ species: "pine", cut: "flat", seed, lengthMm: 1000, widthMm: 180 });
      const knots = knotsOnFace(board.log, board.plane, board).filter((knot) => !knot.touchesEdge && knot.radiusMm > 4);
      if (knots.length === 0) continue;
      const face = planeFace(board.log, board.plane, board, 0.8);
      const light = luminance(face);
      const whole = light.reduce((sum, value) => sum + value, 0) / light.length;
      for (const { centerMm, radiusMm } of knots) {
        seen++;
        expect(meanWithin(face, light, 0.8 * centerMm[0], 0.8 * centerMm[1], 0.65 * radiusMm)).toBeLessThan(whole - 25);
      }
    }
    expect(seen).toBeGreaterThan(4);
  });

  it("are none on a clear board, and keep inside their boxes", () => {
    const clear = sawBoard({ species: "pine", cut: "flat", seed: 3, lengthMm: 1200, widthMm: 180, clear: true });
    expect(knotsOnFace(clear.log, clear.plane, clear)).toEqual([]);
    const board = sawBoard({ species: "pine", cut: "flat", seed: 3, lengthMm: 1200, widthMm: 180 });
    for (const { boxMm, centerMm, radiusMm } of knotsOnFace(board.log, board.plane, board)) {
      const [left, top, right, bottom] = boxMm;
      expect(left).toBeGreaterThanOrEqual(0);
      expect(bottom).toBeLessThanOrEqual(180);
      expect(centerMm[0]).toBeGreaterThan(left);
      expect(centerMm[0]).toBeLessThan(right);
      expect(centerMm[1]).toBeGreaterThan(top);
      expect(centerMm[1]).toBeLessThan(bottom);
      expect(Math.PI * radiusMm ** 2).toBeLessThanOrEqual((right - left) * (bottom - top));
    }
  });
});
