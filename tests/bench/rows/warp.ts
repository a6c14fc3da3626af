/** The inner work of straightening against a general computer-vision library, both compiled and warm, both on one thread. */

import { type Pixels, type WarpMap, warpInBands } from "@/lib/layout";
import { lensOf } from "@/lib/layout/picture/lens";
import { warpRoom } from "@/lib/server/pictures/simd/warp-room";
import { openCvWarp } from "../opencv-warp";
import type { Effort, Outcome, Row } from "../row";
import { sideBySide } from "../side-by-side";

export const warpRow: Row = {
  name: "warp",
  what: "the warp alone, bilinear, one thread, pictures in memory",
  against: "OpenCV compiled to WebAssembly, warm",
  aim: { kind: "at most", ratio: 1 },
  measure,
};

async function measure({ quick }: Effort): Promise<Outcome> {
  const size = quick ? { width: 400, height: 300 } : { width: 4000, height: 3000 };
  const turns = quick ? { warmUps: 1, repetitions: 3 } : { warmUps: 3, repetitions: 15 };
  const photo: Pixels = { ...size, data: slopes(size), channels: 3 };
  const map = obliqueMap(size);
  const same = await openCvWarp(photo, size.width, size.height, map);
  const half = { width: size.width / 2, height: size.height / 2 };
  const halved: WarpMap = { ...map, flatFromPicture: timesTwo(map.flatFromPicture) };
  const smaller = await openCvWarp(photo, half.width, half.height, halved);
  const room = roomFor(photo, size);
  const asServed = await sideBySide("as the server runs it", { ours: () => warpAll(room, map), theirs: same.run }, turns);
  expectAlike(room.picture.data, same.pixels());
  const inPlainCode = plain(photo, size);
  const asBrowsers = await sideBySide(
    "in plain code, as browsers run it",
    { ours: () => warpAll(inPlainCode, map), theirs: same.run },
    turns,
  );
  const small = roomFor(photo, half);
  const averaging = await sideBySide(
    "to half the size, averaging; the other by the mean over areas",
    { ours: () => warpAll(small, halved), theirs: smaller.runFiner },
    turns,
  );
  expectAlike(small.picture.data, smaller.pixels());
  const cases = [asServed, asBrowsers, averaging];
  return { kind: "measured", cases };
}

type Warped = Pick<NonNullable<ReturnType<typeof warpRoom>>, "photo" | "picture"> & Partial<ReturnType<typeof warpRoom>>;

function roomFor(photo: Pixels, { width, height }: { width: number; height: number }): Warped {
  return warpRoom(photo, width, height) ?? plain(photo, { width, height });
}

function plain(photo: Pixels, { width, height }: { width: number; height: number }): Warped {
  return { photo, picture: { data: new Uint8Array(width * height * 3), width, height, channels: 3 } };
}

function warpAll({ photo, picture, sampler }: Warped, map: WarpMap): void {
  for (const _ of warpInBands(photo, picture, map, sampler));
}

/** A board seen at an angle, a little turned: about as many photo pixels as picture pixels. */
function obliqueMap({ width, height }: { width: number; height: number }): WarpMap {
  const [tilt, lean] = [0.04 / width, -0.06 / height];
  return {
    flatFromPicture: [0.96, -0.03, 0.03 * height, 0.02, 0.95, 0.01 * height, tilt, lean, 1],
    lens: lensOf({ width, height }, 0),
  };
}

function timesTwo([a, b, c, d, e, f, g, h, i]: WarpMap["flatFromPicture"]): WarpMap["flatFromPicture"] {
  return [2 * a, 2 * b, c, 2 * d, 2 * e, f, 2 * g, 2 * h, i];
}

/** Soft enough for two ways of reading between pixels to agree. */
function slopes({ width, height }: { width: number; height: number }): Uint8Array {
  const data = new Uint8Array(width * height * 3);
  for (let y = 0, i = 0; y < height; y++) {
    for (let x = 0; x < width; x++, i += 3) {
      data[i] = Math.abs(((3 * x + 2 * y) & 511) - 255);
      data[i + 1] = Math.abs(((x + 4 * y) & 511) - 255);
      data[i + 2] = Math.abs(((2 * x - y) & 511) - 255);
    }
  }
  return data;
}

/** A measurement of work that went wrong would say nothing. */
function expectAlike(ours: Uint8Array, theirs: Uint8Array): void {
  let sum = 0;
  for (let i = 0; i < ours.length; i++) sum += Math.abs((ours[i] as number) - (theirs[i] as number));
  if (ours.length !== theirs.length || sum / ours.length > 1)
    throw new Error(`the two warps differ by ${sum / ours.length} levels`);
}
