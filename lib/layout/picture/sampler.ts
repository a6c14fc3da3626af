/** How a photo is read between its pixels: bilinear samples along a curve of places. `warp.ts` says which places. */
import type { Pixels } from "./pixels";

/** One coordinate of places along a run, px of the photo: a + b·i + c·i² + d·i³ for i = 0, 1, 2 … */
export interface Curve {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
}

/** A curve in steps of 1/256 px from the centre of the photo's first pixel, as its value and its first three differences at i = 0. */
export interface Stepped {
  readonly at: number;
  readonly first: number;
  readonly second: number;
  readonly third: number;
}

/** Half a pixel back, for centres lie at +0.5, and half a step on, which rounds to the nearest. */
const PLACE_OFFSET = -127.5;

export function stepped({ a, b, c, d }: Curve): Stepped {
  return { at: a * 256 + PLACE_OFFSET, first: (b + c + d) * 256, second: (c + 3 * d) * 512, third: d * 1536 };
}

/**
 * Reads one photo. Weights have 8 bits each way, so a level is off by less than one; beyond the photo's rim the rim's colour goes
 * on. Whatever the way it is made in, a sampler gives the same bytes as `plainSampler`.
 */
export interface Sampler {
  /** So many bytes, the same at every call, for samples on their way into a mean. */
  readonly room: (bytes: number) => Uint8Array;
  /** Writes `count` samples into the room or the picture, from byte `offset` on. */
  readonly along: (out: Uint8Array, offset: number, count: number, x: Curve, y: Curve) => void;
}

/** A sampler in plain code. */
export function plainSampler(photo: Pixels): Sampler {
  let room = new Uint8Array(0);
  return {
    room(bytes) {
      if (room.length < bytes) room = new Uint8Array(bytes);
      return room;
    },
    along: (out, offset, count, x, y) => sampleAlong(photo, out, offset, count, x, y),
  };
}

/**
 * The inner loop. `Math.imul` spares the checks for numbers beyond 32 bits; 255 · 65,536 is far from that. A function of the file
 * and not of each sampler, so that it is compiled once.
 */
function sampleAlong(photo: Pixels, out: Uint8Array, offset: number, count: number, x: Curve, y: Curve): void {
  const { data, width, height, channels } = photo;
  const stride = width * channels;
  const lastX = (width - 1) * 256;
  const lastY = (height - 1) * 256;
  const stepsX = stepped(x);
  const stepsY = stepped(y);
  let { at: px, first: dx, second: ddx } = stepsX;
  let { at: py, first: dy, second: ddy } = stepsY;
  for (let i = 0, o = offset; i < count; i++, o += channels) {
    // Written so that what is no number (a place on the vanishing line) becomes the first pixel.
    const cx = px > 0 ? (px < lastX ? px | 0 : lastX) : 0;
    const cy = py > 0 ? (py < lastY ? py | 0 : lastY) : 0;
    px += dx;
    dx += ddx;
    ddx += stepsX.third;
    py += dy;
    dy += ddy;
    ddy += stepsY.third;
    const fx = cx & 255;
    const fy = cy & 255;
    const a = Math.imul(cy >> 8, stride) + Math.imul(cx >> 8, channels);
    // In the last column and row the neighbour has no weight; reading the pixel itself keeps within the photo.
    const b = fx === 0 ? a : a + channels;
    const below = fy === 0 ? 0 : stride;
    const wd = Math.imul(fx, fy);
    const wc = (fy << 8) - wd;
    const wb = (fx << 8) - wd;
    const wa = 65536 - wb - wc - wd;
    const c = a + below;
    const d = b + below;
    out[o] =
      (Math.imul(data[a] as number, wa) +
        Math.imul(data[b] as number, wb) +
        Math.imul(data[c] as number, wc) +
        Math.imul(data[d] as number, wd) +
        32768) >>
      16;
    out[o + 1] =
      (Math.imul(data[a + 1] as number, wa) +
        Math.imul(data[b + 1] as number, wb) +
        Math.imul(data[c + 1] as number, wc) +
        Math.imul(data[d + 1] as number, wd) +
        32768) >>
      16;
    out[o + 2] =
      (Math.imul(data[a + 2] as number, wa) +
        Math.imul(data[b + 2] as number, wb) +
        Math.imul(data[c + 2] as number, wc) +
        Math.imul(data[d + 2] as number, wd) +
        32768) >>
      16;
    if (channels === 4) {
      out[o + 3] =
        (Math.imul(data[a + 3] as number, wa) +
          Math.imul(data[b + 3] as number, wb) +
          Math.imul(data[c + 3] as number, wc) +
          Math.imul(data[d + 3] as number, wd) +
          32768) >>
        16;
    }
  }
}
