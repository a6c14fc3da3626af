/**
 * Photographs a face lying on a bench: perspective, the lens's bend, uneven light, fall-off to the corners and the sensor's noise,
 * together with the exact truth of where everything is.
 */
import { chooseBench } from "./bench";
import {
  type Camera,
  cornersOf,
  type Frame,
  type Homography,
  type LensTruth,
  type PointXy,
  setUpCamera,
  toPixel,
  type View,
} from "./camera";
import { chooseLight, expose } from "./expose";
import { layWood } from "./lay-wood";
import { paintBench, scratchBench } from "./paint-bench";
import type { RgbPicture } from "./picture";
import { between, randomFor } from "./random";
import type { Subject } from "./subject";

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

export type FourPoints = readonly [PointXy, PointXy, PointXy, PointXy];

/** Lengths in mm in the face frame; pixels from the outer corner of the first pixel. */
export interface PhotoTruth {
  readonly sizeMm: PointXy;
  /** Corners (0, 0), (L, 0), (L, W), (0, W) as they lie in the picture, lens included. */
  readonly cornersPx: FourPoints;
  /** From face mm to pixels before the lens bends them, row-major. */
  readonly homographyMmToPx: Homography;
  readonly distortion: LensTruth;
  /** Corners of the card in the same order, when one lies on the face. */
  readonly cardCornersPx: FourPoints | null;
  readonly pxPerMmCentre: number;
}

export interface Photograph extends RgbPicture {
  readonly truth: PhotoTruth;
}

// The face is rendered this much finer than the photograph shows it anywhere, so that resampling costs little sharpness.
const OVERSAMPLING = 1.3;

/** Photographs a subject. The same subject and options give the same bytes. */
export function photographSubject(subject: Subject, options: PhotoOptions): Photograph {
  const { photo } = options;
  const { card } = subject;
  const random = randomFor(options.seed, "photograph");
  const view: View = {
    tiltDeg: between(random, -9, 9),
    panDeg: between(random, -5, 5),
    rollDeg: between(random, -1.5, 1.5),
    fill: between(random, 0.86, 0.92),
    ...options.view,
  };
  const camera = setUpCamera(subject, photo, view, options.lens?.k1 ?? 0);
  const light = chooseLight(options.unevenness ?? 1, random);
  const bench = chooseBench(options.seed, random);
  const face = subject.render(OVERSAMPLING * largestScale(camera, subject));

  const linear = new Float32Array(photo.widthPx * photo.heightPx * 3);
  paintBench(linear, photo, camera, bench, subject);
  scratchBench(linear, photo, camera, subject, random);
  layWood(linear, photo, camera, subject, face);
  const rgb = expose(linear, photo, light, options.noise ?? 1.5, options.seed);

  return {
    rgb,
    width: photo.widthPx,
    height: photo.heightPx,
    truth: {
      sizeMm: [subject.lengthMm, subject.widthMm],
      cornersPx: rectanglePx(camera, 0, 0, subject.lengthMm, subject.widthMm),
      homographyMmToPx: camera.topPxFromMm,
      distortion: camera.lens,
      cardCornersPx: card === undefined ? null : rectanglePx(camera, card.xMm, card.yMm, card.lengthMm, card.widthMm),
      pxPerMmCentre: scaleAt(camera, [subject.lengthMm / 2, subject.widthMm / 2]),
    },
  };
}

function rectanglePx(camera: Camera, xMm: number, yMm: number, lengthMm: number, widthMm: number): FourPoints {
  const [a, b, c, d] = cornersOf(lengthMm, widthMm);
  const at = ([x, y]: PointXy) => toPixel(camera, [x + xMm, y + yMm]);
  return [at(a), at(b), at(c), at(d)];
}

/** Pixels per millimetre round a point of the face, the geometric mean of both directions. */
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
