/** Small measures on pictures that the sawmill's tests share. */
import type { RgbPicture } from "@/lib/sawmill/picture";

/** Luminance of every pixel, 0…255. */
export function luminance(picture: RgbPicture): Float64Array {
  return Float64Array.from({ length: picture.width * picture.height }, (_, i) => {
    const [r, g, b] = picture.rgb.subarray(i * 3, i * 3 + 3);
    return 0.2126 * (r ?? 0) + 0.7152 * (g ?? 0) + 0.0722 * (b ?? 0);
  });
}

/** Pearson's correlation of two equally long series. */
export function correlation(a: Float64Array, b: Float64Array): number {
  const mean = (s: Float64Array) => s.reduce((sum, value) => sum + value, 0) / s.length;
  const [ma, mb] = [mean(a), mean(b)];
  let ab = 0;
  let aa = 0;
  let bb = 0;
  a.forEach((value, i) => {
    const da = value - ma;
    const db = (b[i] ?? 0) - mb;
    ab += da * db;
    aa += da * da;
    bb += db * db;
  });
  return ab / Math.sqrt(aa * bb);
}

/** Mean luminance of the pixels whose centre lies within `radiusPx` of a point. */
export function meanWithin(picture: RgbPicture, light: Float64Array, xPx: number, yPx: number, radiusPx: number): number {
  let sum = 0;
  let count = 0;
  for (let y = 0; y < picture.height; y++) {
    for (let x = 0; x < picture.width; x++) {
      if (Math.hypot(x + 0.5 - xPx, y + 0.5 - yPx) > radiusPx) continue;
      sum += light[y * picture.width + x] ?? 0;
      count++;
    }
  }
  return sum / count;
}

/** Each tile's grain angle in degrees from the x axis, by the structure tensor of its luminance. */
export function grainAngles(picture: RgbPicture, tilePx: number): number[] {
  const light = luminance(picture);
  const at = (x: number, y: number) => light[y * picture.width + x] ?? 0;
  const angles: number[] = [];
  for (let top = 1; top + tilePx < picture.height; top += tilePx) {
    for (let left = 1; left + tilePx < picture.width; left += tilePx) {
      let xx = 0;
      let xy = 0;
      let yy = 0;
      for (let y = top; y < top + tilePx; y++) {
        for (let x = left; x < left + tilePx; x++) {
          const dx = at(x + 1, y) - at(x - 1, y);
          const dy = at(x, y + 1) - at(x, y - 1);
          xx += dx * dx;
          xy += dx * dy;
          yy += dy * dy;
        }
      }
      // The gradient stands square to the grain.
      const gradient = 0.5 * Math.atan2(2 * xy, xx - yy);
      const grain = ((gradient + Math.PI / 2 + Math.PI / 2) % Math.PI) - Math.PI / 2;
      angles.push((grain * 180) / Math.PI);
    }
  }
  return angles;
}

/** Root mean square. */
export function rms(values: readonly number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}
