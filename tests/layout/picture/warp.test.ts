import { beforeAll, describe, expect, test } from "vitest";
import { applyHomography, type Homography, invertHomography } from "@/lib/layout/picture/homography";
import { flatFromPhoto, lensOf } from "@/lib/layout/picture/lens";
import { type Pixels, warp, warpInBands } from "@/lib/layout/picture/warp";
import { loadOpenCv, type OpenCv } from "../../support/opencv";

const straight = lensOf({ width: 640, height: 480 }, 0);

function blank(width: number, height: number, channels: 3 | 4 = 3): Pixels {
  return { data: new Uint8Array(width * height * channels), width, height, channels };
}

function painted(
  width: number,
  height: number,
  colour: (x: number, y: number, channel: number) => number,
  channels: 3 | 4 = 3,
): Pixels {
  const pixels = blank(width, height, channels);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      for (let c = 0; c < channels; c++) pixels.data[(y * width + x) * channels + c] = Math.round(colour(x + 0.5, y + 0.5, c));
    }
  }
  return pixels;
}

/** Bands like growth rings, soft enough for bilinear to mean something, at full contrast. */
const rings = (x: number, y: number, c: number): number => 128 + 110 * Math.sin(0.16 * x + 0.05 * y + 4 * Math.sin(y / 90) + c);

function differences(a: Uint8Array, b: Uint8Array): { max: number; mean: number } {
  let max = 0;
  let sum = 0;
  a.forEach((value, i) => {
    const difference = Math.abs(value - (b[i] as number));
    max = Math.max(max, difference);
    sum += difference;
  });
  return { max, mean: sum / a.length };
}

describe("warp against OpenCV, where the picture does not shrink", () => {
  let cv: OpenCv;
  beforeAll(async () => {
    ({ cv } = await loadOpenCv());
  });

  /** OpenCV counts pixel centres as whole numbers, we as halves: shift on both sides. */
  function byOpenCv(photo: Pixels, width: number, height: number, h: Homography): Uint8Array {
    const [a, b, c, d, e, f, g, k, i] = h;
    const half = (x: number, y: number, w: number): number[] => [x, y, (x + y) / 2 + w];
    const shifted = [half(a, b, c), half(d, e, f), half(g, k, i)];
    const rows = [0, 1].map((r) =>
      (shifted[r] as number[]).map((value, n) => value - 0.5 * ((shifted[2] as number[])[n] as number)),
    );
    const map = cv.matFromArray(3, 3, cv.CV_64FC1, [
      ...(rows[0] as number[]),
      ...(rows[1] as number[]),
      ...(shifted[2] as number[]),
    ]);
    const from = cv.matFromArray(photo.height, photo.width, cv.CV_8UC3, photo.data);
    const to = new cv.Mat();
    // 16: the matrix leads from the result to the source.
    cv.warpPerspective(from, to, map, new cv.Size(width, height), cv.INTER_LINEAR | 16, cv.BORDER_REPLICATE, new cv.Scalar());
    const result = Uint8Array.from(to.data);
    for (const mat of [map, from, to]) mat.delete();
    return result;
  }

  const maps: readonly (readonly [string, Homography])[] = [
    ["a plain shift by a fraction", [1, 0, 3.3, 0, 1, 7.7, 0, 0, 1]],
    ["a turn", [0.7, 0.3, 40, -0.3, 0.7, 180, 0, 0, 1]],
    ["an oblique board", [0.62, -0.12, 120, 0.08, 0.5, 90, 1.6e-4, -2.4e-4, 1]],
    ["beyond the rim", [1, 0.1, -60, -0.1, 1, -50, 1e-5, 0, 1]],
  ];

  test.each(maps)("%s: no more than one level apart", (_, h) => {
    const photo = painted(640, 480, rings);
    const picture = blank(700, 420);
    warp(photo, picture, { flatFromPicture: h, lens: straight });
    const { max, mean } = differences(picture.data, byOpenCv(photo, 700, 420, h));
    expect(max).toBeLessThanOrEqual(1);
    expect(mean).toBeLessThan(0.3);
  });
});

describe("warp", () => {
  const oblique: Homography = [0.62, -0.12, 120, 0.08, 0.5, 90, 1.6e-4, -2.4e-4, 1];

  test("the identity copies every pixel, the last row and column too", () => {
    const photo = painted(65, 67, rings);
    const picture = blank(65, 67);
    warp(photo, picture, { flatFromPicture: [1, 0, 0, 0, 1, 0, 0, 0, 1], lens: lensOf(photo, 0) });
    expect(picture.data).toEqual(photo.data);
  });

  test("halving averages two by two, so a chequered photo turns plain grey", () => {
    const photo = painted(256, 128, (x, y) => ((Math.floor(x) + Math.floor(y)) % 2 === 0 ? 250 : 10));
    const picture = blank(128, 64);
    warp(photo, picture, { flatFromPicture: [2, 0, 0, 0, 2, 0, 0, 0, 1], lens: lensOf(photo, 0) });
    expect(Math.max(...picture.data)).toBe(130);
    expect(Math.min(...picture.data)).toBe(130);
  });

  test("shrinking seven times keeps the mean and leaves no moiré", () => {
    const photo = painted(1400, 700, (x) => (Math.floor(x) % 3 === 0 ? 240 : 30));
    const picture = blank(200, 100);
    warp(photo, picture, { flatFromPicture: [7, 0, 0, 0, 7, 0, 0, 0, 1], lens: lensOf(photo, 0) });
    // The true mean is 100; a point sample would swing from 30 to 240.
    expect(Math.max(...picture.data) - Math.min(...picture.data)).toBeLessThanOrEqual(50);
    expect(picture.data.reduce((sum, value) => sum + value, 0) / picture.data.length).toBeCloseTo(100, -1);
  });

  test("four channels give the same colours as three", () => {
    const three = painted(640, 480, rings);
    const four = painted(640, 480, (x, y, c) => (c === 3 ? 255 : rings(x, y, c)), 4);
    const a = blank(300, 200);
    const b = blank(300, 200, 4);
    warp(three, a, { flatFromPicture: oblique, lens: straight });
    warp(four, b, { flatFromPicture: oblique, lens: straight });
    expect(a.data).toEqual(b.data.filter((_, i) => i % 4 !== 3));
    expect(b.data.filter((_, i) => i % 4 === 3).every((alpha) => alpha === 255)).toBe(true);
  });

  test.each([0.05, -0.08])("takes out a lens of k1 = %f: a picture painted through the lens comes back flat", (k1) => {
    const lens = lensOf({ width: 640, height: 480 }, k1);
    const pictureFromFlat = invertHomography(oblique);
    if (pictureFromFlat === null) throw new Error("singular");
    const colour = (x: number, y: number): number => 128 + 100 * Math.sin(x / 40) * Math.cos(y / 30);
    const photo = painted(640, 480, (x, y) => {
      const p = applyHomography(pictureFromFlat, flatFromPhoto(lens, { x, y }));
      return colour(p.x, p.y);
    });
    const picture = blank(500, 400);
    warp(photo, picture, { flatFromPicture: oblique, lens });
    expect(differences(picture.data, painted(500, 400, colour).data).max).toBeLessThanOrEqual(2);
  });

  test("reports rising shares and ends at 1", () => {
    const shares = [
      ...warpInBands(painted(100, 300, rings), blank(100, 300), { flatFromPicture: [1, 0, 0, 0, 1, 0, 0, 0, 1], lens: straight }),
    ];
    expect(shares.length).toBeGreaterThan(3);
    expect(shares.every((share, i) => i === 0 || share > (shares[i - 1] as number))).toBe(true);
    expect(shares.at(-1)).toBe(1);
  });
});
