/** Gradients of a grey picture as products, pixel by pixel, and their sums over rectangles. */
import type { Grey } from "./cell-tensor";
import type { Tensor } from "./structure-tensor";
import { meanOver, type Sums, sumsOf } from "./sums";

/** Products of the gradient's parts, grey values squared a pixel; the picture's rim has none. */
export interface Gradients {
  readonly xx: Float32Array;
  readonly yy: Float32Array;
  readonly xy: Float32Array;
}

export function gradientsOf({ light, width, height }: Grey): Gradients {
  const xx = new Float32Array(width * height);
  const yy = new Float32Array(width * height);
  const xy = new Float32Array(width * height);
  for (let y = 1; y < height - 1; y++) {
    for (let x = 1; x < width - 1; x++) {
      const at = y * width + x;
      const nw = light[at - width - 1] as number;
      const ne = light[at - width + 1] as number;
      const sw = light[at + width - 1] as number;
      const se = light[at + width + 1] as number;
      // Scharr's weights (3, 10, 3), which favour no direction, over 32: slope a pixel.
      const dx = (3 * (ne - nw + se - sw) + 10 * ((light[at + 1] as number) - (light[at - 1] as number))) / 32;
      const dy = (3 * (sw - nw + se - ne) + 10 * ((light[at + width] as number) - (light[at - width] as number))) / 32;
      xx[at] = dx * dx;
      yy[at] = dy * dy;
      xy[at] = dx * dy;
    }
  }
  return { xx, yy, xy };
}

export interface TensorSums {
  readonly xx: Sums;
  readonly yy: Sums;
  readonly xy: Sums;
}

export function tensorSums({ xx, yy, xy }: Gradients, width: number, height: number): TensorSums {
  return { xx: sumsOf(xx, width, height), yy: sumsOf(yy, width, height), xy: sumsOf(xy, width, height) };
}

/** The mean tensor of a rectangle; all nil where it lies off the picture. */
export function tensorOver(sums: TensorSums, left: number, top: number, right: number, bottom: number): Tensor {
  return {
    xx: meanOver(sums.xx, left, top, right, bottom) ?? 0,
    yy: meanOver(sums.yy, left, top, right, bottom) ?? 0,
    xy: meanOver(sums.xy, left, top, right, bottom) ?? 0,
  };
}
