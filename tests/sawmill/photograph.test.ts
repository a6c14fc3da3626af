import { describe, expect, it } from "vitest";
import { boardFace } from "@/lib/sawmill/board-face";
import { distort, inverse, type LensTruth, through, undistort } from "@/lib/sawmill/camera";
import { growFlitch } from "@/lib/sawmill/flitch";
import { photographBoard, photographLeaf } from "@/lib/sawmill/photograph-board";
import { correlation, luminance, meanWithin } from "./measure";

const BOARD = { species: "walnut", cut: "flat", lengthMm: 400, widthMm: 120, seed: 14 } as const;
const PHOTO = { widthPx: 480, heightPx: 360 } as const;

describe("the lens", () => {
  const lens = (k1: number): LensTruth => ({ k1, center: [2000, 1500], norm: 2500 });

  it("is undone by its own formula to a millionth of a pixel", () => {
    for (const k1 of [-0.08, -0.02, 0, 0.03, 0.1]) {
      for (let x = -200; x <= 4200; x += 275) {
        for (let y = -100; y <= 3100; y += 200) {
          const [bx, by] = undistort(lens(k1), distort(lens(k1), [x, y]));
          expect(Math.hypot(bx - x, by - y)).toBeLessThan(1e-6);
        }
      }
    }
  });

  it("leaves its centre alone and moves the rim by the term's share", () => {
    expect(distort(lens(0.05), [2000, 1500])).toEqual([2000, 1500]);
    // At radius = norm the undistorted radius is (1 + k1) times the distorted one.
    expect(undistort(lens(0.02), [4500, 1500])[0]).toBeCloseTo(2000 + 2500 * 1.02, 9);
  });
});

describe("a photograph of a board", () => {
  it("is the same bytes for the same seed", () => {
    const one = photographBoard({ ...BOARD, photo: PHOTO, lens: { k1: 0.02 } });
    const two = photographBoard({ ...BOARD, photo: PHOTO, lens: { k1: 0.02 } });
    expect(one.rgb.length).toBe(480 * 360 * 3);
    expect(Buffer.compare(one.rgb, two.rgb)).toBe(0);
    expect(one.truth).toEqual(two.truth);
    const other = photographBoard({ ...BOARD, seed: 15, photo: PHOTO, lens: { k1: 0.02 } });
    expect(Buffer.compare(one.rgb, other.rgb)).not.toBe(0);
  });

  it("has its corners where homography and lens put them, in order and in the frame", () => {
    for (const k1 of [0, 0.03, -0.04]) {
      const { truth } = photographBoard({ ...BOARD, photo: PHOTO, lens: { k1 } });
      const { homographyMmToPx: h, cornersPx, distortion } = truth;
      expect(distortion).toEqual({ k1, center: [240, 180], norm: 300 });
      const mm = [
        [0, 0],
        [400, 0],
        [400, 120],
        [0, 120],
      ] as const;
      mm.forEach(([x, y], i) => {
        const w = h[6] * x + h[7] * y + h[8];
        const straight = [(h[0] * x + h[1] * y + h[2]) / w, (h[3] * x + h[4] * y + h[5]) / w];
        const [px, py] = cornersPx[i] ?? [Number.NaN, Number.NaN];
        const factor = 1 + (k1 * ((px - 240) ** 2 + (py - 180) ** 2)) / 300 ** 2;
        expect(240 + (px - 240) * factor).toBeCloseTo(straight[0] ?? Number.NaN, 6);
        expect(180 + (py - 180) * factor).toBeCloseTo(straight[1] ?? Number.NaN, 6);
        expect(px).toBeGreaterThan(0);
        expect(px).toBeLessThan(480);
        expect(py).toBeGreaterThan(0);
        expect(py).toBeLessThan(360);
      });
      expect(cornersPx[0][0]).toBeLessThan(cornersPx[1][0]);
      expect(cornersPx[0][1]).toBeLessThan(cornersPx[3][1]);
    }
  });

  it("changes from bench to wood at the edges the truth names", () => {
    const photo = photographBoard({ ...BOARD, photo: PHOTO, lens: { k1: 0.04 }, noise: 0, unevenness: 0 });
    const { homographyMmToPx, distortion } = photo.truth;
    // Redness tells walnut from any bench.
    const redAt = (xMm: number, yMm: number) => {
      const [x, y] = distort(distortion, through(homographyMmToPx, [xMm, yMm]));
      const at = (Math.floor(y) * photo.width + Math.floor(x)) * 3;
      return (photo.rgb[at] ?? 0) - (photo.rgb[at + 2] ?? 0);
    };
    const mm = 2.5 / photo.truth.pxPerMmCentre;
    for (let x = 30; x < 400; x += 40) {
      expect(redAt(x, mm), `inside the near edge at ${x}`).toBeGreaterThan(20);
      expect(redAt(x, 120 - mm), `inside the far edge at ${x}`).toBeGreaterThan(20);
      // Board edges 26 mm deep may show outside the face, by no more than their height seen at 15°.
      expect(redAt(x, -12), `outside the near edge at ${x}`).toBeLessThan(12);
      expect(redAt(x, 132), `outside the far edge at ${x}`).toBeLessThan(12);
    }
    for (let y = 10; y < 120; y += 20) {
      expect(redAt(mm, y), `inside the left end at ${y}`).toBeGreaterThan(20);
      expect(redAt(400 - mm, y), `inside the right end at ${y}`).toBeGreaterThan(20);
      expect(redAt(-8, y), `outside the left end at ${y}`).toBeLessThan(12);
      expect(redAt(408, y), `outside the right end at ${y}`).toBeLessThan(12);
    }
  });

  it("gives the flat face back in every part of it when it is straightened by its truth", () => {
    for (const k1 of [0, 0.06]) {
      const photo = photographBoard({ ...BOARD, photo: { widthPx: 720, heightPx: 540 }, lens: { k1 }, noise: 0, unevenness: 0 });
      const face = boardFace({ ...BOARD, pxPerMm: 1 });
      const [seen, sawn] = [luminance(photo), luminance(face)];
      const tile = 40;
      for (let left = 0; left + tile <= face.width; left += tile) {
        const straightened: number[] = [];
        const expected: number[] = [];
        for (let y = 2; y < face.height - 2; y++) {
          for (let x = left; x < left + tile; x++) {
            const [px, py] = distort(photo.truth.distortion, through(photo.truth.homographyMmToPx, [x + 0.5, y + 0.5]));
            straightened.push(betweenPixels(seen, photo.width, px, py));
            expected.push(sawn[y * face.width + x] ?? 0);
          }
        }
        expect(
          correlation(Float64Array.from(straightened), Float64Array.from(expected)),
          `k1 ${k1}, from ${left} mm`,
        ).toBeGreaterThan(0.93);
      }
    }
  });

  it("grows lighter or darker towards the rim only when the light is uneven", () => {
    const even = photographBoard({ ...BOARD, photo: PHOTO, noise: 0, unevenness: 0 });
    const uneven = photographBoard({ ...BOARD, photo: PHOTO, noise: 0, unevenness: 1 });
    const ratio = (x: number, y: number) =>
      meanWithin(uneven, luminance(uneven), x, y, 12) / meanWithin(even, luminance(even), x, y, 12);
    expect(ratio(240, 180)).toBeCloseTo(1, 1);
    expect(ratio(466, 346)).toBeLessThan(0.95);
  });

  it("carries as much noise as asked", () => {
    const still = photographBoard({ ...BOARD, photo: PHOTO, noise: 0 });
    const noisy = photographBoard({ ...BOARD, photo: PHOTO, noise: 3 });
    let sum = 0;
    let squares = 0;
    const count = noisy.rgb.length / 3;
    for (let i = 1; i < noisy.rgb.length; i += 3) {
      const difference = (noisy.rgb[i] ?? 0) - (still.rgb[i] ?? 0);
      sum += difference;
      squares += difference * difference;
    }
    expect(Math.abs(sum / count)).toBeLessThan(0.1);
    expect(Math.sqrt(squares / count)).toBeCloseTo(3, 0);
  });

  it("shows a card of known size where the truth says it lies", () => {
    const card = { xMm: 150, yMm: 30, lengthMm: 85.6, widthMm: 54 };
    const photo = photographBoard({ ...BOARD, photo: PHOTO, card, lens: { k1: 0.03 }, noise: 0, unevenness: 0 });
    const corners = photo.truth.cardCornersPx ?? expect.unreachable("no card in the truth");
    const light = luminance(photo);
    const middle = [0, 1].map((axis) => corners.reduce((sum, corner) => sum + (corner[axis] ?? 0), 0) / 4);
    for (const [x, y] of corners) {
      // From the card's middle to a corner: white nine tenths of the way, wood at twelve tenths.
      const at = (share: number) => {
        const px = (middle[0] ?? 0) + share * (x - (middle[0] ?? 0));
        const py = (middle[1] ?? 0) + share * (y - (middle[1] ?? 0));
        return light[Math.floor(py) * photo.width + Math.floor(px)] ?? 0;
      };
      expect(at(0.9)).toBeGreaterThan(225);
      expect(at(1.2)).toBeLessThan(180);
    }
    expect(photographBoard({ ...BOARD, photo: { widthPx: 80, heightPx: 60 } }).truth.cardCornersPx).toBeNull();
  });

  it("has a homography that its inverse undoes", () => {
    const { homographyMmToPx } = photographBoard({ ...BOARD, photo: { widthPx: 160, heightPx: 120 } }).truth;
    const [x, y] = through(inverse(homographyMmToPx), through(homographyMmToPx, [123, 45]));
    expect(x).toBeCloseTo(123, 8);
    expect(y).toBeCloseTo(45, 8);
  });
});

describe("photographs of leaves", () => {
  it("carry the leaf's own knots and size", () => {
    const flitch = growFlitch({ species: "pine", cut: "flat", seed: 3, lengthMm: 500, widthMm: 160 });
    const first = photographLeaf(flitch, { leaf: 0, seed: 1, photo: PHOTO });
    const next = photographLeaf(flitch, { leaf: 1, seed: 2, photo: PHOTO });
    expect(first.truth.sizeMm).toEqual([500, 160]);
    expect(first.truth.knots.length).toBeGreaterThan(0);
    const partners = first.truth.knots.flatMap((knot) =>
      next.truth.knots.filter((other) => other.branch === knot.branch).map((other) => [knot, other] as const),
    );
    expect(partners.length).toBeGreaterThan(0);
    for (const [knot, other] of partners) {
      expect(Math.hypot(knot.centerMm[0] - other.centerMm[0], knot.centerMm[1] - other.centerMm[1])).toBeLessThan(2);
    }
  });
});

/** Luminance at a point, between the four nearest pixel centres by bilinear weights. */
function betweenPixels(light: Float64Array, width: number, x: number, y: number): number {
  const i = Math.floor(x - 0.5);
  const j = Math.floor(y - 0.5);
  const [fx, fy] = [x - 0.5 - i, y - 0.5 - j];
  const at = (dx: number, dy: number) => light[(j + dy) * width + i + dx] ?? 0;
  return (at(0, 0) * (1 - fx) + at(1, 0) * fx) * (1 - fy) + (at(0, 1) * (1 - fx) + at(1, 1) * fx) * fy;
}
