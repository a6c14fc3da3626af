/**
 * The last step of a photograph: uneven light, fall-off to the corners, the sensor's noise, rounding to bytes.
 */
import type { Frame } from "./camera";
import { hashAt } from "./noise";
import { between, type Random } from "./random";

export interface Light {
  /** Change of brightness from the picture's middle to its right and lower rims. */
  readonly acrossX: number;
  readonly acrossY: number;
  /** Loss of brightness in the corners. */
  readonly vignette: number;
  /** Change of warmth from left to right. */
  readonly warmth: number;
}

/** Light by chance, as strong as `strength` says: 0 = even. */
export function chooseLight(strength: number, random: Random): Light {
  return {
    acrossX: strength * between(random, -0.1, 0.02),
    acrossY: strength * between(random, -0.08, 0.02),
    vignette: strength * between(random, 0.06, 0.14),
    warmth: strength * between(random, -0.02, 0.02),
  };
}

/** The finished bytes; `noise` is the standard deviation of the noise in display values. */
export function expose(linear: Float32Array, photo: Frame, light: Light, noise: number, seed: number): Uint8Array {
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
