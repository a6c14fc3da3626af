/**
 * Pixels of the straightened picture from pixels of the photo. Bilinear; where the photo holds more pixels than the picture it
 * averages several samples over each picture pixel, so nothing flickers or turns to moiré. Beyond the photo's rim the rim's
 * colour goes on. Works in bands of rows, so that the caller can report progress and stop in between.
 */
import { composeHomographies, type Homography, type Jacobian, jacobianAt } from "./homography";
import { type Lens, shrinkAt } from "./lens";

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
/** Columns that share one count of samples. */
const BLOCK_COLUMNS = 64;
/** Bilinear reads two pixels each way, so samples this far apart still touch every photo pixel between them. */
const SAMPLE_SPACING_PX = 1.25;
/** Steps of the table of the lens' radial factor; linear between them it is right to 1e-6 px on a 60-megapixel photo. */
const LENS_STEPS = 2048;

/** Fills `picture` from `photo`, both with the same channels, and yields the share done (0..1] after each band. */
export function* warpInBands(photo: Pixels, picture: Pixels, map: WarpMap): Generator<number, void, void> {
  if (photo.channels !== picture.channels) throw new RangeError("photo and picture need the same channels");
  const lens = lensTable(map.lens);
  for (let row = 0; row < picture.height; row += BAND_ROWS) {
    const end = Math.min(picture.height, row + BAND_ROWS);
    for (let y = row; y < end; y++) {
      for (let x = 0; x < picture.width; x += BLOCK_COLUMNS) {
        warpBlock(photo, picture, map.flatFromPicture, lens, y, x, Math.min(picture.width, x + BLOCK_COLUMNS));
      }
    }
    yield end / picture.height;
  }
}

/** The whole warp at once. */
export function warp(photo: Pixels, picture: Pixels, map: WarpMap): void {
  for (const _ of warpInBands(photo, picture, map));
}

/** The lens with its factor tabulated over the squared flat radius; null where it does not bend. */
interface LensTable {
  readonly x: number;
  readonly y: number;
  readonly stepsPerPx2: number;
  readonly factors: Float64Array;
}

function lensTable(lens: Lens): LensTable | null {
  if (lens.k1 === 0) return null;
  // The corner of the picture lies at radius 1; a fifth more leaves room for what the clamped rim is asked for.
  const reach = (1.2 * (1 + Math.abs(lens.k1))) ** 2;
  const factors = Float64Array.from({ length: LENS_STEPS + 2 }, (_, i) => shrinkAt(lens.k1, (reach * i) / LENS_STEPS));
  return { x: lens.centre.x, y: lens.centre.y, stepsPerPx2: LENS_STEPS / (reach * lens.norm * lens.norm), factors };
}

function warpBlock(
  photo: Pixels,
  picture: Pixels,
  h: Homography,
  lens: LensTable | null,
  y: number,
  from: number,
  to: number,
): void {
  const { across, down } = samplesAt(jacobianAt(h, { x: (from + to) / 2, y: y + 0.5 }));
  if (across * down === 1) bilinearRun(photo, picture, h, lens, y, from, to);
  else averagedRun(photo, picture, h, lens, y, from, to, across, down);
}

/** How many samples one picture pixel needs along and down. */
function samplesAt(j: Jacobian): { across: number; down: number } {
  const count = (photoPx: number): number => (Number.isFinite(photoPx) ? Math.max(1, Math.ceil(photoPx / SAMPLE_SPACING_PX)) : 1);
  return { across: count(Math.hypot(j.xx, j.yx)), down: count(Math.hypot(j.xy, j.yy)) };
}

/**
 * One bilinear sample per picture pixel. Numerators and depth of the homography grow by a constant from pixel to pixel; weights
 * hold 8 bits each way, so a level is off by less than one.
 */
function bilinearRun(
  photo: Pixels,
  picture: Pixels,
  h: Homography,
  lens: LensTable | null,
  y: number,
  from: number,
  to: number,
): void {
  const { data, width, height, channels } = photo;
  const out = picture.data;
  const stride = width * channels;
  const lastX = (width - 1) * 256;
  const lastY = (height - 1) * 256;
  let u = h[0] * (from + 0.5) + h[1] * (y + 0.5) + h[2];
  let v = h[3] * (from + 0.5) + h[4] * (y + 0.5) + h[5];
  let w = h[6] * (from + 0.5) + h[7] * (y + 0.5) + h[8];
  let o = (y * picture.width + from) * channels;
  for (let x = from; x < to; x++) {
    let px = u / w;
    let py = v / w;
    u += h[0];
    v += h[3];
    w += h[6];
    if (lens !== null) {
      const dx = px - lens.x;
      const dy = py - lens.y;
      const factor = factorAt(lens, dx * dx + dy * dy);
      px = lens.x + dx * factor;
      py = lens.y + dy * factor;
    }
    // Pixel centres lie at +0.5; 1/256 px steps, clamped to the centres of the rim.
    const sx = Math.round((px - 0.5) * 256);
    const sy = Math.round((py - 0.5) * 256);
    const cx = sx < 0 ? 0 : sx > lastX ? lastX : sx | 0;
    const cy = sy < 0 ? 0 : sy > lastY ? lastY : sy | 0;
    const fx = cx & 255;
    const fy = cy & 255;
    const a = (cy >> 8) * stride + (cx >> 8) * channels;
    const b = fx === 0 ? a : a + channels;
    const below = fy === 0 ? 0 : stride;
    const wa = (256 - fx) * (256 - fy);
    const wb = fx * (256 - fy);
    const wc = (256 - fx) * fy;
    const wd = fx * fy;
    for (let c = 0; c < channels; c++) {
      out[o + c] =
        ((data[a + c] as number) * wa +
          (data[b + c] as number) * wb +
          (data[a + below + c] as number) * wc +
          (data[b + below + c] as number) * wd +
          32768) >>
        16;
    }
    o += channels;
  }
}

/** The mean of across × down bilinear samples spread evenly over each picture pixel. */
function averagedRun(
  photo: Pixels,
  picture: Pixels,
  h: Homography,
  lens: LensTable | null,
  y: number,
  from: number,
  to: number,
  across: number,
  down: number,
): void {
  const channels = photo.channels;
  const columns = (to - from) * across;
  const line: Pixels = { data: new Uint8Array(columns * channels), width: columns, height: 1, channels };
  const sums = new Uint32Array((to - from) * channels);
  for (let s = 0; s < down; s++) {
    // Sample i of sub-row s sits at picture point (from + (i + ½)/across, y + (s + ½)/down).
    const fromSample: Homography = [1 / across, 0, from, 0, 1, y + (s + 0.5) / down - 0.5, 0, 0, 1];
    bilinearRun(photo, line, composeHomographies(h, fromSample), lens, 0, 0, columns);
    let i = 0;
    for (let x = 0; x < to - from; x++) {
      for (let n = 0; n < across; n++) {
        for (let c = 0; c < channels; c++)
          sums[x * channels + c] = (sums[x * channels + c] as number) + (line.data[i++] as number);
      }
    }
  }
  const count = across * down;
  const start = (y * picture.width + from) * channels;
  for (let i = 0; i < sums.length; i++) picture.data[start + i] = Math.round((sums[i] as number) / count);
}

function factorAt(lens: LensTable, radiusPx2: number): number {
  const at = Math.min(LENS_STEPS, radiusPx2 * lens.stepsPerPx2);
  const i = at | 0;
  const low = lens.factors[i] as number;
  return low + ((lens.factors[i + 1] as number) - low) * (at - i);
}
