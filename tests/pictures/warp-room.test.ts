/** The vector kernel is nothing but a quicker plain sampler. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Pixels, type WarpMap, warpInBands } from "@/lib/layout";
import { hasVectors } from "@/lib/server/pictures/simd/bilinear-kernel";
import { warpRoom } from "@/lib/server/pictures/simd/warp-room";
import { anyMap, photoSize } from "../layout/picture/any-map";
import { grainPixels } from "../support/grain-pixels";

const photo: Pixels = { ...photoSize, data: grainPixels(photoSize.width, photoSize.height), channels: 3 };

function plain(map: WarpMap, width: number, height: number): Uint8Array {
  const picture: Pixels = { data: new Uint8Array(width * height * 3), width, height, channels: 3 };
  for (const _ of warpInBands(photo, picture, map));
  return picture.data;
}

function byVectors(map: WarpMap, width: number, height: number): Uint8Array {
  const room = warpRoom(photo, width, height);
  if (room === null) throw new Error("no vectors here");
  for (const _ of warpInBands(room.photo, room.picture, map, room.sampler));
  return room.picture.data.slice();
}

describe.skipIf(!hasVectors)(hasVectors ? "the vector kernel" : "the vector kernel (skipped: this processor has none)", () => {
  test("gives the bytes of the plain sampler, in the photo and beyond its rim, enlarging and averaging", () => {
    const sizes = fc.record({ width: fc.integer({ min: 1, max: 300 }), height: fc.integer({ min: 1, max: 40 }) });
    fc.assert(
      fc.property(anyMap({ min: 0.2, max: 6 }), sizes, (map, { width, height }) => {
        expect(Buffer.compare(byVectors(map, width, height), plain(map, width, height))).toBe(0);
      }),
      { numRuns: 60 },
    );
  });

  test("gives them in the photo's last row and column, where there is no neighbour", () => {
    const { lens } = fc.sample(anyMap({ min: 1, max: 1 }), 1)[0] as WarpMap;
    const corner: WarpMap = { flatFromPicture: [1, 0, 1590, 0, 1, 1190, 0, 0, 1], lens: { ...lens, k1: 0 } };
    expect(byVectors(corner, 20, 20)).toEqual(plain(corner, 20, 20));
  });

  test("gives them across the vanishing line, where places are no numbers", () => {
    const { lens } = fc.sample(anyMap({ min: 1, max: 1 }), 1)[0] as WarpMap;
    const over: WarpMap = { flatFromPicture: [1, 0, 10, 0, 1, 10, 0.01, 0, -0.505], lens: { ...lens, k1: 0 } };
    expect(byVectors(over, 100, 8)).toEqual(plain(over, 100, 8));
  });

  test("leaves four channels to plain code", () => {
    expect(warpRoom({ data: new Uint8Array(400), width: 10, height: 10, channels: 4 }, 10, 10)).toBeNull();
  });
});
