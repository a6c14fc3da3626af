import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Pixels, searchPicture, um } from "@/lib/layout";

function painted(width: number, height: number, grey: (x: number, y: number) => number, channels: 3 | 4 = 3): Pixels {
  const data = new Uint8Array(width * height * channels).fill(255);
  for (let y = 0; y < height; y++)
    for (let x = 0; x < width; x++) data.fill(grey(x, y), (y * width + x) * channels, (y * width + x) * channels + 3);
  return { data, width, height, channels };
}

describe("a picture to search", () => {
  test("has two values a millimetre, each the mean of the pixels under it, column by column", () => {
    // 4 px/mm: two by two pixels a value.
    const picture = searchPicture(
      painted(8, 4, (x, y) => 10 * x + y),
      4,
      { length: um(2_000), width: um(1_000) },
    );
    expect(picture).toEqual({ width: 4, height: 2, grey: Uint8Array.of(6, 8, 26, 28, 46, 48, 66, 68) });
  });

  test("weighs pixels by the share that lies under a value", () => {
    // 3 px/mm: a pixel and a half each way.
    const picture = searchPicture(
      painted(3, 3, (x) => 60 * x),
      3,
      { length: um(1_000), width: um(1_000) },
    );
    expect([...picture.grey]).toEqual([20, 20, 100, 100]);
  });

  test("takes what is there of a coarser picture, and goes on with the rim where a rounded pixel is missing", () => {
    const picture = searchPicture(
      painted(2, 1, (x) => 100 * x),
      1,
      { length: um(3_000), width: um(1_000) },
    );
    expect([...picture.grey]).toEqual([0, 0, 0, 0, 100, 100, 100, 100, 100, 100, 100, 100]);
  });

  test("weighs red, green and blue as eyes do, and takes no notice of transparency", () => {
    const data = Uint8Array.of(255, 0, 0, 0, 0, 255, 0, 9, 0, 0, 255, 255, 255, 255, 255, 7);
    const grey = searchPicture({ data, width: 4, height: 1, channels: 4 }, 2, { length: um(2_000), width: um(500) }).grey;
    expect([...grey]).toEqual([77, 149, 29, 255]);
  });

  test("of a plain picture is plain, at any scale and size", () => {
    const arbitrary = fc.record({
      pxPerMm: fc.double({ min: 0.7, max: 6, noNaN: true }),
      length: fc.integer({ min: 700, max: 9_000 }),
      grey: fc.nat(255),
    });
    fc.assert(
      fc.property(arbitrary, ({ pxPerMm, length, grey }) => {
        const px = Math.max(1, Math.round((length / 1000) * pxPerMm));
        const picture = searchPicture(
          painted(px, px, () => grey),
          pxPerMm,
          { length: um(length), width: um(length) },
        );
        expect(picture.width).toBe(Math.ceil(length / 500));
        expect(picture.grey.every((value) => value === grey)).toBe(true);
      }),
      { numRuns: 100 },
    );
  });
});
