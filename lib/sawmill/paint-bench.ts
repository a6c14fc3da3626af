/**
 * Fills a picture with the bench as the camera sees it, before anything lies on it but the board's shadow.
 *
 * Pictures in the making hold three display values a pixel as floats, so that light and noise are rounded once, at the end.
 */
import { type Bench, benchScratches, benchSpeckle, benchStain, shadowLeft } from "./bench";
import { type Camera, distort, type Frame, inverse, through, undistort } from "./camera";
import type { Random } from "./random";
import type { Subject } from "./subject";

// The bench's slow stains are computed every so many pixels and drawn out between.
const STAIN_GRID_PX = 8;

/** The bench's own surface and the shadow on it. */
export function paintBench(linear: Float32Array, photo: Frame, camera: Camera, bench: Bench, subject: Subject): void {
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

/** Scratches over it. */
export function scratchBench(linear: Float32Array, photo: Frame, camera: Camera, subject: Subject, random: Random): void {
  const { lengthMm, widthMm } = subject;
  const room = 0.7 * lengthMm;
  for (const scratch of benchScratches(random, 90, -0.1 * lengthMm, -room, 1.1 * lengthMm, widthMm + room)) {
    const [ax, ay] = distort(camera.lens, through(camera.benchPxFromMm, scratch.fromMm));
    const [bx, by] = distort(camera.lens, through(camera.benchPxFromMm, scratch.toMm));
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
