/**
 * Lays the face of a board, the edges of it that the camera sees, and a card if there is one, over a bench already painted.
 */
import { type Camera, cornersOf, type Frame, inverse, through, toPixel, undistort } from "./camera";
import type { FacePicture } from "./picture";
import type { Card, Subject } from "./subject";
import type { MutableTone } from "./wood-color";

// Samples a pixel takes on the wood, along each side.
const SUBSAMPLES = 2;
const CARD_TONE = { r: 236, g: 234, b: 228 };

/** Mixes the wood into every pixel by the share of its samples that meet it. */
export function layWood(linear: Float32Array, photo: Frame, camera: Camera, subject: Subject, face: FacePicture): void {
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
          if (subject.card !== undefined) layCard(subject.card, x, y, color);
        } else {
          const [bx, by] = through(benchFromPx, straight);
          if (!edgeSeen(x, y, bx, by, subject, face, color)) continue;
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
  // Within the frame the lens moves nothing by more than k1 · norm, so no edge bows further out than that; 3 px for rounding.
  const bow = Math.abs(camera.lens.k1) * camera.lens.norm + 3;
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
  color: MutableTone,
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

/** White card where it lies, and its thin shadow on the wood about it. */
function layCard(card: Card, x: number, y: number, color: MutableTone): void {
  const dx = Math.max(card.xMm - x, x - card.xMm - card.lengthMm);
  const dy = Math.max(card.yMm - y, y - card.yMm - card.widthMm);
  if (dx <= 0 && dy <= 0) {
    color.r = CARD_TONE.r;
    color.g = CARD_TONE.g;
    color.b = CARD_TONE.b;
    return;
  }
  const away = Math.hypot(Math.max(0, dx), Math.max(0, dy));
  const shade = 1 - 0.35 * Math.exp(-away / 0.9);
  color.r *= shade;
  color.g *= shade;
  color.b *= shade;
}

/** The face's colour at a point, between pixel centres by bilinear weights, held at the rim. */
function sampleFace(face: FacePicture, xMm: number, yMm: number, color: MutableTone): void {
  const u = Math.max(0, Math.min(xMm * face.pxPerMm - 0.5, face.width - 1.001));
  const v = Math.max(0, Math.min(yMm * face.pxPerMm - 0.5, face.height - 1.001));
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
