/**
 * Structure tensor: the sum of gradients' outer products over a place, which tells the direction of lines there and how much of
 * one mind the place is. Bigün & Granlund, "Optimal orientation detection of linear symmetry", ICCV 1987.
 *
 *   gradient angle = ½ · atan2(2·Jxy, Jxx − Jyy)        lines run square to it
 *   coherence      = √((Jxx − Jyy)² + 4·Jxy²) / (Jxx + Jyy)
 *
 * Summing tensors averages directions in doubled angles, weighted by contrast, so that 1° and 179° make 0° and not 90°.
 */
export interface Tensor {
  readonly xx: number;
  readonly yy: number;
  readonly xy: number;
}

/** Direction of the lines in radians, in (−π/2, π/2], from x towards y (clockwise as seen, y down). 0 where nothing has a direction. */
export function lineDirection({ xx, yy, xy }: Tensor): number {
  if (xx === yy && xy === 0) return 0;
  const gradient = 0.5 * Math.atan2(2 * xy, xx - yy);
  return gradient > 0 ? gradient - Math.PI / 2 : gradient + Math.PI / 2;
}

/** What white noise gives: gradients of every direction, none favoured. */
export const EVEN_NOISE: Tensor = { xx: 1, yy: 1, xy: 0 };

/**
 * 0: no direction at all, or an even place; 1: every line runs the same way. Where the picture was averaged along one direction before,
 * noise looks like lines too; `noise` is the tensor that white noise would then give, and what it gives counts as no direction: the
 * eigenvalues of noise⁻¹·tensor take the place of the tensor's own.
 */
export function coherenceOf({ xx, yy, xy }: Tensor, noise: Tensor = EVEN_NOISE): number {
  const whole = noise.xx * noise.yy - noise.xy * noise.xy;
  const trace = (noise.yy * xx + noise.xx * yy - 2 * noise.xy * xy) / whole;
  const product = (xx * yy - xy * xy) / whole;
  return trace > 0 ? Math.sqrt(Math.max(0, 1 - (4 * product) / (trace * trace))) : 0;
}

/** Sum of tensors: their directions averaged, by contrast. */
export function tensorSum(tensors: readonly Tensor[]): Tensor {
  return tensors.reduce((sum, { xx, yy, xy }) => ({ xx: sum.xx + xx, yy: sum.yy + yy, xy: sum.xy + xy }), {
    xx: 0,
    yy: 0,
    xy: 0,
  });
}
