/**
 * Pixels of the straightened picture from pixels of the photo. Bilinear; where the photo holds more pixels than the picture it
 * averages several samples over each picture pixel, so nothing flickers or turns to moiré. Beyond the photo's rim the rim's
 * colour goes on. Works in bands of rows, so that the caller can report progress and stop in between.
 */
import { applyHomography, type Homography, jacobianAt, type PhotoPoint } from "./homography";
import { type Lens, photoFromFlat } from "./lens";

/** 8-bit pixels, row by row, without padding. */
export interface Pixels {
  readonly data: Uint8Array;
  readonly width: number;
  readonly height: number;
  readonly channels: 3 | 4;
}

/** Where a picture point comes from: picture px → flat photo px by the homography, then bent as the lens bends. */
export interface WarpMap {
  readonly flatFromPicture: Homography;
  readonly lens: Lens;
}

/** Rows between two reports of progress. */
const BAND_ROWS = 64;
/** Columns that share one count of samples and, as a rule, one parabola of places. */
const BLOCK_COLUMNS = 64;
/** Bilinear reads two pixels each way, so samples this far apart still touch every photo pixel between them. */
const SAMPLE_SPACING_PX = 1.25;
/** Places may be off by this much, px: four times finer than the steps of 1/256 px at which pixels are read. */
const PLACE_TOLERANCE_PX = 1 / 1024;

/** Fills `picture` from `photo`, both with the same channels, and yields the share done (0..1] after each band. */
export function* warpInBands(photo: Pixels, picture: Pixels, map: WarpMap): Generator<number, void, void> {
  if (photo.channels !== picture.channels) throw new RangeError("photo and picture need the same channels");
  for (let row = 0; row < picture.height; row += BAND_ROWS) {
    const end = Math.min(picture.height, row + BAND_ROWS);
    for (let y = row; y < end; y++) {
      for (let x = 0; x < picture.width; x += BLOCK_COLUMNS)
        warpBlock(photo, picture, map, y, x, Math.min(BLOCK_COLUMNS, picture.width - x));
    }
    yield end / picture.height;
  }
}

/** The whole warp at once. */
export function warp(photo: Pixels, picture: Pixels, map: WarpMap): void {
  for (const _ of warpInBands(photo, picture, map));
}

/** `count` pixels of row y from column x on. */
function warpBlock(photo: Pixels, picture: Pixels, map: WarpMap, y: number, x: number, count: number): void {
  const stretch = jacobianAt(map.flatFromPicture, { x: x + count / 2, y: y + 0.5 });
  const across = samplesFor(Math.hypot(stretch.xx, stretch.yx));
  const down = samplesFor(Math.hypot(stretch.xy, stretch.yy));
  const offset = (y * picture.width + x) * picture.channels;
  if (across * down === 1) sampleRun(photo, map, picture.data, offset, { x: x + 0.5, y: y + 0.5, step: 1, count });
  else averageBlock(photo, picture, map, { x, y, count, across, down });
}

/** How many samples one picture pixel needs that spans so many photo pixels. */
function samplesFor(photoPx: number): number {
  return Number.isFinite(photoPx) ? Math.max(1, Math.ceil(photoPx / SAMPLE_SPACING_PX)) : 1;
}

interface AveragedBlock {
  readonly x: number;
  readonly y: number;
  readonly count: number;
  readonly across: number;
  readonly down: number;
}

/** The mean of across × down samples spread evenly over each picture pixel. */
function averageBlock(photo: Pixels, picture: Pixels, map: WarpMap, { x, y, count, across, down }: AveragedBlock): void {
  const channels = photo.channels;
  const samples = new Uint8Array(count * across * channels);
  const sums = new Uint32Array(count * channels);
  for (let s = 0; s < down; s++) {
    const run = { x: x + 0.5 / across, y: y + (s + 0.5) / down, step: 1 / across, count: count * across };
    sampleRun(photo, map, samples, 0, run);
    for (let i = 0, pixel = 0; pixel < sums.length; pixel += channels) {
      for (let n = 0; n < across; n++) {
        for (let c = 0; c < channels; c++) sums[pixel + c] = (sums[pixel + c] as number) + (samples[i++] as number);
      }
    }
  }
  const start = (y * picture.width + x) * channels;
  for (let i = 0; i < sums.length; i++) picture.data[start + i] = Math.round((sums[i] as number) / (across * down));
}

/** Samples at picture points (x + i·step, y), i from 0 to count − 1. */
interface Run {
  readonly x: number;
  readonly y: number;
  readonly step: number;
  readonly count: number;
}

/** Photo coordinates along a run: a + b·i + c·i². */
interface Parabola {
  readonly a: number;
  readonly b: number;
  readonly c: number;
}

/**
 * Perspective and lens change slowly, so a parabola through both ends and the middle of a run tells its places without a division
 * or a root per pixel. Where it strays, the run is halved; one or two samples are always exact.
 */
function sampleRun(photo: Pixels, map: WarpMap, out: Uint8Array, offset: number, run: Run): void {
  const sourceAt = (i: number): PhotoPoint =>
    photoFromFlat(map.lens, applyHomography(map.flatFromPicture, { x: run.x + i * run.step, y: run.y }));
  const last = run.count - 1;
  const first = sourceAt(0);
  const middle = last > 1 ? sourceAt(last / 2) : null;
  const end = last > 0 ? sourceAt(last) : first;
  const x = parabola(first.x, middle?.x ?? null, end.x, last);
  const y = parabola(first.y, middle?.y ?? null, end.y, last);

  // The cubic that a parabola through three even places misses is greatest close to the quarters.
  const strays = middle !== null && [last / 4, (last * 3) / 4].some((i) => straysAt(i, x, y, sourceAt(i)));
  if (!strays) {
    sampleAlong(photo, out, offset, run.count, x, y);
    return;
  }
  const half = run.count >> 1;
  sampleRun(photo, map, out, offset, { ...run, count: half });
  sampleRun(photo, map, out, offset + half * photo.channels, { ...run, x: run.x + half * run.step, count: run.count - half });
}

function parabola(first: number, middle: number | null, end: number, last: number): Parabola {
  if (last === 0) return { a: first, b: 0, c: 0 };
  const c = middle === null ? 0 : (2 * (first - 2 * middle + end)) / (last * last);
  return { a: first, b: (end - first) / last - c * last, c };
}

function straysAt(i: number, x: Parabola, y: Parabola, exact: PhotoPoint): boolean {
  const off = Math.abs(x.a + (x.b + x.c * i) * i - exact.x) + Math.abs(y.a + (y.b + y.c * i) * i - exact.y);
  return off > PLACE_TOLERANCE_PX;
}

/** The inner loop: one bilinear sample per step, weights of 8 bits each way, so a level is off by less than one. */
function sampleAlong(photo: Pixels, out: Uint8Array, offset: number, count: number, x: Parabola, y: Parabola): void {
  const { data, width, height, channels } = photo;
  const stride = width * channels;
  const lastX = (width - 1) * 256;
  const lastY = (height - 1) * 256;
  // In steps of 1/256 px; pixel centres lie at +0.5, and the half step more rounds to the nearest.
  let px = x.a * 256 - 127.5;
  let dx = (x.b + x.c) * 256;
  const ddx = x.c * 512;
  let py = y.a * 256 - 127.5;
  let dy = (y.b + y.c) * 256;
  const ddy = y.c * 512;
  for (let i = 0, o = offset; i < count; i++, o += channels) {
    // Written so that what is no number (a place on the vanishing line) becomes the first pixel.
    const cx = px > 0 ? (px < lastX ? px | 0 : lastX) : 0;
    const cy = py > 0 ? (py < lastY ? py | 0 : lastY) : 0;
    px += dx;
    dx += ddx;
    py += dy;
    dy += ddy;
    const fx = cx & 255;
    const fy = cy & 255;
    const a = (cy >> 8) * stride + (cx >> 8) * channels;
    // In the last column and row the neighbour has no weight; reading the pixel itself keeps within the photo.
    const b = fx === 0 ? a : a + channels;
    const below = fy === 0 ? 0 : stride;
    const wd = fx * fy;
    const wc = (fy << 8) - wd;
    const wb = (fx << 8) - wd;
    const wa = 65536 - wb - wc - wd;
    const c = a + below;
    const d = b + below;
    out[o] =
      ((data[a] as number) * wa + (data[b] as number) * wb + (data[c] as number) * wc + (data[d] as number) * wd + 32768) >> 16;
    out[o + 1] =
      ((data[a + 1] as number) * wa +
        (data[b + 1] as number) * wb +
        (data[c + 1] as number) * wc +
        (data[d + 1] as number) * wd +
        32768) >>
      16;
    out[o + 2] =
      ((data[a + 2] as number) * wa +
        (data[b + 2] as number) * wb +
        (data[c + 2] as number) * wc +
        (data[d + 2] as number) * wd +
        32768) >>
      16;
    if (channels === 4) {
      out[o + 3] =
        ((data[a + 3] as number) * wa +
          (data[b + 3] as number) * wb +
          (data[c + 3] as number) * wc +
          (data[d + 3] as number) * wd +
          32768) >>
        16;
    }
  }
}
