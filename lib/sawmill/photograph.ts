/**
 * Photographs a face lying on a bench: perspective, the lens's bend, uneven light, fall-off to the corners and the sensor's noise,
 * together with the exact truth of where everything is.
 */
import { type Bench, benchScratches, benchSpeckle, benchStain, chooseBench, shadowLeft } from "./bench";
import {
  type Camera,
  cornersOf,
  type Frame,
  type Homography,
  inverse,
  type LensTruth,
  type PointXy,
  setUpCamera,
  through,
  toPixel,
  undistort,
  type View,
} from "./camera";
import { hashAt } from "./noise";
import type { FacePicture, RgbPicture } from "./picture";
import { between, randomFor } from "./random";

export interface PhotoOptions {
  readonly photo: Frame;
  readonly seed: number;
  /** Radial lens term; 0 unless given. Phones: between about −0.05 and 0.05. */
  readonly lens?: { readonly k1: number };
  /** Whatever is not given is chosen by the seed, within what a careful hand-held photograph shows. */
  readonly view?: Partial<View>;
  /** Standard deviation of the sensor's noise, display values; 1.5 unless given. */
  readonly noise?: number;
  /** Strength of uneven light and corner fall-off; 1 unless given, 0 = even light. */
  readonly unevenness?: number;
}

/** Lengths in mm in the face frame; pixels from the outer corner of the first pixel. */
export interface PhotoTruth {
  readonly sizeMm: PointXy;
  /** Corners (0, 0), (L, 0), (L, W), (0, W) as they lie in the picture, lens included. */
  readonly cornersPx: readonly [PointXy, PointXy, PointXy, PointXy];
  /** From face mm to pixels before the lens bends them, row-major. */
  readonly homographyMmToPx: Homography;
  readonly distortion: LensTruth;
  readonly pxPerMmCentre: number;
}

export interface Photograph extends RgbPicture {
  readonly truth: PhotoTruth;
}

/** The thing in front of the camera; `render` gives its face at a scale of the photographer's choosing. */
export interface Subject {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
  readonly render: (pxPerMm: number) => FacePicture;
}

// The face is rendered this much finer than the photograph shows it anywhere, so that resampling costs little sharpness.
const OVERSAMPLING = 1.3;
// Samples a pixel takes on the wood, along each side.
const SUBSAMPLES = 2;
// The bench's slow stains are computed every so many pixels and drawn out between.
const STAIN_GRID_PX = 8;

/** Photographs a subject. The same subject and options give the same bytes. */
export function photographSubject(subject: Subject, options: PhotoOptions): Photograph {
  const { photo } = options;
  const random = randomFor(options.seed, "photograph");
  const view: View = {
    tiltDeg: between(random, -9, 9),
    panDeg: between(random, -5, 5),
    rollDeg: between(random, -1.5, 1.5),
    fill: between(random, 0.86, 0.92),
    ...options.view,
  };
  const camera = setUpCamera(subject, photo, view, options.lens?.k1 ?? 0);
  const light = chooseLight(options, random);
  const bench = chooseBench(options.seed, random);
  const face = subject.render(OVERSAMPLING * largestScale(camera, subject));

  const linear = new Float32Array(photo.widthPx * photo.heightPx * 3);
  paintBench(linear, photo, camera, bench, subject);
  scratchBench(linear, photo, camera, subject, random);
  layWood(linear, photo, camera, subject, face);
  const rgb = expose(linear, photo, light, options.noise ?? 1.5, options.seed);

  const [c0, c1, c2, c3] = cornersOf(subject.lengthMm, subject.widthMm);
  return {
    rgb,
    width: photo.widthPx,
    height: photo.heightPx,
    truth: {
      sizeMm: [subject.lengthMm, subject.widthMm],
      cornersPx: [toPixel(camera, c0), toPixel(camera, c1), toPixel(camera, c2), toPixel(camera, c3)],
      homographyMmToPx: camera.topPxFromMm,
      distortion: camera.lens,
      pxPerMmCentre: scaleAt(camera, [subject.lengthMm / 2, subject.widthMm / 2]),
    },
  };
}

function scaleAt(camera: Camera, [x, y]: PointXy): number {
  const [ax, ay] = toPixel(camera, [x - 0.5, y]);
  const [bx, by] = toPixel(camera, [x + 0.5, y]);
  const [cx, cy] = toPixel(camera, [x, y - 0.5]);
  const [dx, dy] = toPixel(camera, [x, y + 0.5]);
  return Math.sqrt(Math.hypot(bx - ax, by - ay) * Math.hypot(dx - cx, dy - cy));
}

function largestScale(camera: Camera, subject: Subject): number {
  return Math.max(...cornersOf(subject.lengthMm, subject.widthMm).map((corner) => scaleAt(camera, corner)));
}

function paintBench(linear: Float32Array, photo: Frame, camera: Camera, bench: Bench, subject: Subject): void {
  const mmFromPx = inverse(camera.benchPxFromMm);
  const columns = Math.ceil(photo.widthPx / STAIN_GRID_PX) + 1;
  const stainRow = (j: number): Float64Array =>
    Float64Array.from({ length: columns }, (_, i) => {
      const [x, y] = through(mmFromPx, undistort(camera.lens, [i * STAIN_GRID_PX, j * STAIN_GRID_PX]));
      return benchStain(bench, x, y);
    });
  let upper = stainRow(0);
  let lower = stainRow(1);
  for (let py = 0; py < photo.heightPx; py++) {
    const down = (py % STAIN_GRID_PX) / STAIN_GRID_PX;
    if (py > 0 && down === 0) {
      upper = lower;
      lower = stainRow(py / STAIN_GRID_PX + 1);
    }
    for (let px = 0; px < photo.widthPx; px++) {
      const cell = Math.floor(px / STAIN_GRID_PX);
      const over = (px % STAIN_GRID_PX) / STAIN_GRID_PX;
      const up = (upper[cell] ?? 1) * (1 - over) + (upper[cell + 1] ?? 1) * over;
      const low = (lower[cell] ?? 1) * (1 - over) + (lower[cell + 1] ?? 1) * over;
      const [x, y] = through(mmFromPx, undistort(camera.lens, [px + 0.5, py + 0.5]));
      const shade = shadowLeft(x, y, subject.lengthMm, subject.widthMm, subject.thicknessMm);
      const brightness = (up * (1 - down) + low * down + benchSpeckle(bench, x, y)) * shade;
      const at = (py * photo.widthPx + px) * 3;
      linear[at] = bench.tone.r * brightness;
      linear[at + 1] = bench.tone.g * brightness;
      linear[at + 2] = bench.tone.b * brightness;
    }
  }
}

function scratchBench(linear: Float32Array, photo: Frame, camera: Camera, subject: Subject, random: () => number): void {
  const { lengthMm, widthMm } = subject;
  const room = 0.7 * lengthMm;
  for (const scratch of benchScratches(random, 90, -0.1 * lengthMm, -room, 1.1 * lengthMm, widthMm + room)) {
    const [ax, ay] = through(camera.benchPxFromMm, scratch.fromMm);
    const [bx, by] = through(camera.benchPxFromMm, scratch.toMm);
    const steps = Math.ceil(2 * Math.hypot(bx - ax, by - ay));
    for (let step = 0; step <= steps; step++) {
      const share = step / Math.max(1, steps);
      const px = Math.floor(ax + (bx - ax) * share);
      const py = Math.floor(ay + (by - ay) * share);
      if (px < 0 || py < 0 || px >= photo.widthPx || py >= photo.heightPx) continue;
      const at = (py * photo.widthPx + px) * 3;
      const factor = 1 + 0.5 * scratch.change * Math.sin(Math.PI * share);
      for (let c = at; c < at + 3; c++) linear[c] = (linear[c] ?? 0) * factor;
    }
  }
}

/** Lays the face, and the edges of the board that the camera sees, over the bench. */
function layWood(linear: Float32Array, photo: Frame, camera: Camera, subject: Subject, face: FacePicture): void {
  const topFromPx = inverse(camera.topPxFromMm);
  const benchFromPx = inverse(camera.benchPxFromMm);
  const color = { r: 0, g: 0, b: 0 };
  const box = woodBox(camera, subject, photo);
  const share = 1 / (SUBSAMPLES * SUBSAMPLES);
  for (let py = box.top; py < box.bottom; py++) {
    for (let px = box.left; px < box.right; px++) {
      const at = (py * photo.widthPx + px) * 3;
      let r = 0;
      let g = 0;
      let b = 0;
      let covered = 0;
      for (let k = 0; k < SUBSAMPLES * SUBSAMPLES; k++) {
        const sx = px + ((k % SUBSAMPLES) + 0.5) / SUBSAMPLES;
        const sy = py + (Math.floor(k / SUBSAMPLES) + 0.5) / SUBSAMPLES;
        const straight = undistort(camera.lens, [sx, sy]);
        const [x, y] = through(topFromPx, straight);
        if (x >= 0 && y >= 0 && x <= subject.lengthMm && y <= subject.widthMm) {
          sampleFace(face, x, y, color);
        } else {
          const [bx, by] = through(benchFromPx, straight);
          const shade = edgeSeen(x, y, bx, by, subject, face, color);
          if (!shade) continue;
        }
        covered++;
        r += color.r;
        g += color.g;
        b += color.b;
      }
      if (covered === 0) continue;
      const rest = 1 - covered * share;
      linear[at] = (linear[at] ?? 0) * rest + r * share;
      linear[at + 1] = (linear[at + 1] ?? 0) * rest + g * share;
      linear[at + 2] = (linear[at + 2] ?? 0) * rest + b * share;
    }
  }
}

function woodBox(camera: Camera, subject: Subject, photo: Frame) {
  const corners = cornersOf(subject.lengthMm, subject.widthMm);
  const seen = corners.map((corner) => toPixel(camera, corner));
  const below = corners.map((corner) => toPixel({ ...camera, topPxFromMm: camera.benchPxFromMm }, corner));
  const all = [...seen, ...below];
  // A bent lens bows the long edges outwards between corners by at most k1 · norm / 2; a few pixels more cost nothing.
  const bow = Math.abs(camera.lens.k1) * camera.lens.norm * 0.5 + 3;
  const hold = (value: number, most: number) => Math.max(0, Math.min(most, Math.round(value)));
  return {
    left: hold(Math.min(...all.map(([x]) => x)) - bow, photo.widthPx),
    right: hold(Math.max(...all.map(([x]) => x)) + bow, photo.widthPx),
    top: hold(Math.min(...all.map(([, y]) => y)) - bow, photo.heightPx),
    bottom: hold(Math.max(...all.map(([, y]) => y)) + bow, photo.heightPx),
  };
}

/**
 * A sight line that misses the face may still meet the board's edge on its way from (x, y) at the top to (bx, by) at the bench.
 * Fills the colour there: the face's own at its rim, darker, because the edge looks away from the light.
 */
function edgeSeen(
  x: number,
  y: number,
  bx: number,
  by: number,
  subject: Subject,
  face: FacePicture,
  color: { r: number; g: number; b: number },
): boolean {
  let enter = 0;
  let leave = 1;
  for (const [from, to, size] of [
    [x, bx, subject.lengthMm],
    [y, by, subject.widthMm],
  ] as const) {
    const run = to - from;
    if (Math.abs(run) < 1e-9) {
      if (from < 0 || from > size) return false;
      continue;
    }
    const a = -from / run;
    const b = (size - from) / run;
    enter = Math.max(enter, Math.min(a, b));
    leave = Math.min(leave, Math.max(a, b));
  }
  if (enter >= leave) return false;
  sampleFace(face, x + (bx - x) * enter, y + (by - y) * enter, color);
  const shade = 0.62 - 0.2 * enter;
  color.r *= shade;
  color.g *= shade;
  color.b *= shade;
  return true;
}

function sampleFace(face: FacePicture, xMm: number, yMm: number, color: { r: number; g: number; b: number }): void {
  const u = Math.min(Math.max(xMm * face.pxPerMm - 0.5, 0), face.width - 1.001);
  const v = Math.min(Math.max(yMm * face.pxPerMm - 0.5, 0), face.height - 1.001);
  const i = Math.floor(u);
  const j = Math.floor(v);
  const fu = u - i;
  const fv = v - j;
  const a = (j * face.width + i) * 3;
  const right = face.width > 1 ? 3 : 0;
  const down = face.height > 1 ? face.width * 3 : 0;
  const rgb = face.rgb;
  const w00 = (1 - fu) * (1 - fv);
  const w10 = fu * (1 - fv);
  const w01 = (1 - fu) * fv;
  const w11 = fu * fv;
  const b = a + right;
  const c = a + down;
  const d = c + right;
  color.r = (rgb[a] ?? 0) * w00 + (rgb[b] ?? 0) * w10 + (rgb[c] ?? 0) * w01 + (rgb[d] ?? 0) * w11;
  color.g = (rgb[a + 1] ?? 0) * w00 + (rgb[b + 1] ?? 0) * w10 + (rgb[c + 1] ?? 0) * w01 + (rgb[d + 1] ?? 0) * w11;
  color.b = (rgb[a + 2] ?? 0) * w00 + (rgb[b + 2] ?? 0) * w10 + (rgb[c + 2] ?? 0) * w01 + (rgb[d + 2] ?? 0) * w11;
}

interface Light {
  /** Change of brightness from the picture's middle to its right and lower rims. */
  readonly acrossX: number;
  readonly acrossY: number;
  /** Loss of brightness in the corners. */
  readonly vignette: number;
  /** Change of warmth from left to right. */
  readonly warmth: number;
}

function chooseLight(options: PhotoOptions, random: () => number): Light {
  const strength = options.unevenness ?? 1;
  return {
    acrossX: strength * between(random, -0.1, 0.02),
    acrossY: strength * between(random, -0.08, 0.02),
    vignette: strength * between(random, 0.06, 0.14),
    warmth: strength * between(random, -0.02, 0.02),
  };
}

/** Light, corner fall-off and noise, and the rounding to bytes. */
function expose(linear: Float32Array, photo: Frame, light: Light, noise: number, seed: number): Uint8Array {
  const rgb = new Uint8Array(linear.length);
  for (let py = 0; py < photo.heightPx; py++) {
    const ny = (py + 0.5) / (photo.heightPx / 2) - 1;
    for (let px = 0; px < photo.widthPx; px++) {
      const nx = (px + 0.5) / (photo.widthPx / 2) - 1;
      const level = (1 + light.acrossX * nx + light.acrossY * ny) * (1 - (light.vignette * (nx * nx + ny * ny)) / 2);
      const warm = light.warmth * nx;
      const bits = hashAt(px, py, 17, seed ^ 0x71);
      // Sum of three even bytes: bell-shaped enough; its standard deviation is 128 (to 0.2 %).
      const grain = (noise * ((bits & 255) + ((bits >>> 8) & 255) + ((bits >>> 16) & 255) - 382.5)) / 128;
      const tint = (noise * 0.5 * (((bits >>> 24) & 255) - 127.5)) / 74;
      const at = (py * photo.widthPx + px) * 3;
      rgb[at] = toByte((linear[at] ?? 0) * level * (1 + warm) + grain + tint);
      rgb[at + 1] = toByte((linear[at + 1] ?? 0) * level + grain);
      rgb[at + 2] = toByte((linear[at + 2] ?? 0) * level * (1 - warm) + grain - tint);
    }
  }
  return rgb;
}

function toByte(value: number): number {
  return value <= 0 ? 0 : value >= 255 ? 255 : Math.round(value);
}
