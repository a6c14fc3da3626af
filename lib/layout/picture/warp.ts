/**
 * Pixels of the straightened picture from pixels of the photo. Bilinear; where the photo holds more pixels than the picture it
 * averages several samples over each picture pixel, so nothing flickers or turns to moiré. Beyond the photo's rim the rim's
 * colour goes on. Works in bands of rows, so that the caller can report progress and stop in between.
 */
import type { Pixels } from "./pixels";
import { plainSampler, type Sampler } from "./sampler";
import { stretchAt, type WarpMap } from "./warp-map";
import { sampleRun } from "./warp-run";

export type { Pixels } from "./pixels";
export type { WarpMap } from "./warp-map";

/** Rows between two reports of progress. */
const BAND_ROWS = 64;
/** Columns that share one count of samples. */
const BLOCK_COLUMNS = 64;
/** Bilinear reads two pixels each way, so samples this far apart still touch every photo pixel between them, each by a quarter at least. */
const SINGLE_SAMPLE_PX = 1.5;
/** The spacing of samples that go into a mean. */
const SAMPLE_SPACING_PX = 1.25;
/** Each way and picture pixel. Next to a vanishing line there is no end to what one would need. */
const MOST_SAMPLES = 64;
/** A sampler is asked for room for so many samples at most. */
export const LARGEST_ROOM = BLOCK_COLUMNS * MOST_SAMPLES * MOST_SAMPLES;

/**
 * Fills `picture` from `photo`, both with the same channels, and yields the share done (0..1] after each band. A `sampler` of the
 * same photo may be handed in that is faster than plain code.
 */
export function* warpInBands(
  photo: Pixels,
  picture: Pixels,
  map: WarpMap,
  sampler: Sampler = plainSampler(photo),
): Generator<number, void, void> {
  if (photo.channels !== picture.channels) throw new RangeError("photo and picture need the same channels");
  for (let row = 0; row < picture.height; row += BAND_ROWS) {
    const end = Math.min(picture.height, row + BAND_ROWS);
    for (let y = row; y < end; y++) warpRow(sampler, picture, map, y);
    yield end / picture.height;
  }
}

/** The whole warp at once. */
export function warp(photo: Pixels, picture: Pixels, map: WarpMap): void {
  for (const _ of warpInBands(photo, picture, map));
}

function warpRow(sampler: Sampler, picture: Pixels, map: WarpMap, y: number): void {
  const { data, width, channels } = picture;
  // Depth changes evenly along a row, so a stretch that is small at its ends and its middle is small all along.
  if (isSingle(map, 0, y) && isSingle(map, width / 2, y) && isSingle(map, width, y)) {
    sampleRun(sampler, channels, map, data, y * width * channels, { x: 0.5, y: y + 0.5, step: 1, count: width });
    return;
  }
  for (let x = 0; x < width; x += BLOCK_COLUMNS) {
    const count = Math.min(BLOCK_COLUMNS, width - x);
    const { across, down } = samplesAt(map, x + count / 2, y);
    const offset = (y * width + x) * channels;
    if (across * down === 1) sampleRun(sampler, channels, map, data, offset, { x: x + 0.5, y: y + 0.5, step: 1, count });
    else averageBlock(sampler, picture, map, { x, y, count, across, down });
  }
}

interface Samples {
  readonly across: number;
  readonly down: number;
}

/** How many samples a picture pixel of row y needs at column x. */
function samplesAt(map: WarpMap, x: number, y: number): Samples {
  const stretch = stretchAt(map, { x, y: y + 0.5 });
  const across = samplesFor(Math.hypot(stretch.xx, stretch.yx));
  const down = samplesFor(Math.hypot(stretch.xy, stretch.yy));
  return { across, down };
}

/** Whether one is enough. */
function isSingle(map: WarpMap, x: number, y: number): boolean {
  const { across, down } = samplesAt(map, x, y);
  return across * down === 1;
}

/** How many samples one picture pixel needs that spans so many photo pixels. */
function samplesFor(photoPx: number): number {
  const single = photoPx <= SINGLE_SAMPLE_PX || !Number.isFinite(photoPx);
  return single ? 1 : Math.min(MOST_SAMPLES, Math.ceil(photoPx / SAMPLE_SPACING_PX));
}

interface AveragedBlock {
  readonly x: number;
  readonly y: number;
  readonly count: number;
  readonly across: number;
  readonly down: number;
}

/** The mean of across × down samples spread evenly over each picture pixel. */
function averageBlock(sampler: Sampler, picture: Pixels, map: WarpMap, { x, y, count, across, down }: AveragedBlock): void {
  const { data, width, channels } = picture;
  const perRow = count * across * channels;
  const samples = sampler.room(perRow * down);
  for (let s = 0; s < down; s++) {
    const run = { x: x + 0.5 / across, y: y + (s + 0.5) / down, step: 1 / across, count: count * across };
    sampleRun(sampler, channels, map, samples, s * perRow, run);
  }
  const start = (y * width + x) * channels;
  const all = across * down;
  // Half of `all` more rounds to the nearest.
  const half = all >> 1;
  for (let pixel = 0; pixel < count; pixel++) {
    for (let c = 0; c < channels; c++) {
      let sum = half;
      for (let s = 0, i = pixel * across * channels + c; s < down; s++, i += perRow) {
        for (let n = 0; n < across; n++) sum += samples[i + n * channels] as number;
      }
      data[start + pixel * channels + c] = Math.floor(sum / all);
    }
  }
}
