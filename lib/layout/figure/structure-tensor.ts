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

/** 0: no direction at all, or an even place; 1: every line runs the same way. */
export function coherenceOf({ xx, yy, xy }: Tensor): number {
  const trace = xx + yy;
  return trace > 0 ? Math.hypot(xx - yy, 2 * xy) / trace : 0;
}
