/**
 * The shadow of an ellipse: how far it reaches along one axis within a band of the other. Exact closed form, for any turn.
 *
 * With s the matrix R·diag(rx², ry²)·Rᵀ of the turned ellipse, u the axis asked for and v the other, both from the centre:
 *   reach along u: U = √s_uu, at v = s_uv / U;   reach along v: V = √s_vv
 *   at a given v the ellipse spans u = (s_uv / s_vv)·v ± w·√(1 − v²/s_vv),   w = rx·ry / V
 * The upper end is concave in v, so its largest value in a band is at v = s_uv / U, or at the end of the band nearest to it;
 * the lower end likewise at −s_uv / U.
 */
import type { KeepClearShape } from "../stock/board";
import { coordinateOf, otherAxis, type Span, type StockAxis } from "./span";

type Ellipse = Extract<KeepClearShape, { shape: "ellipse" }>;

/** The reach along `axis` of the part of the ellipse inside the open band of the other axis; null where there is none. */
export function ellipseShadow(ellipse: Ellipse, axis: StockAxis, band: Span): Span | null {
  const { centre, radiusX, radiusY } = ellipse;
  if (!(radiusX > 0 && radiusY > 0)) return null;
  const { uu, vv, uv } = spread(ellipse, axis);
  const reachU = Math.sqrt(uu);
  const reachV = Math.sqrt(vv);
  const centreV = coordinateOf(centre, otherAxis(axis));
  const from = Math.max(band.from - centreV, -reachV);
  const to = Math.min(band.to - centreV, reachV);
  if (!(from < to)) return null;

  const middle = (v: number) => (uv / vv) * v;
  const half = (v: number) => ((radiusX * radiusY) / reachV) * Math.sqrt(Math.max(0, 1 - (v * v) / vv));
  const high = clamped(uv / reachU, from, to);
  const low = clamped(-uv / reachU, from, to);
  const centreU = coordinateOf(centre, axis);
  return { from: centreU + middle(low) - half(low), to: centreU + middle(high) + half(high) };
}

function spread({ radiusX, radiusY, turnDeg }: Ellipse, axis: StockAxis): { uu: number; vv: number; uv: number } {
  const turn = (turnDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
  const [xx, yy] = [radiusX * radiusX, radiusY * radiusY];
  const alongAlong = xx * cos * cos + yy * sin * sin;
  const acrossAcross = xx * sin * sin + yy * cos * cos;
  const uv = (xx - yy) * sin * cos;
  return axis === "along" ? { uu: alongAlong, vv: acrossAcross, uv } : { uu: acrossAcross, vv: alongAlong, uv };
}

function clamped(value: number, from: number, to: number): number {
  return Math.min(Math.max(value, from), to);
}
