/** How far points are from lying in one straight line that nobody knows. */
import type { MmPoint } from "./homography";

/**
 * Signed distances from the line that makes their squares least (total least squares: the line through the centroid along the
 * principal direction). All zero for fewer than three points.
 */
export function distancesFromOwnLine(points: readonly MmPoint[]): readonly number[] {
  if (points.length < 3) return points.map(() => 0);
  const x = points.reduce((sum, p) => sum + p.x, 0) / points.length;
  const y = points.reduce((sum, p) => sum + p.y, 0) / points.length;
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (const p of points) {
    xx += (p.x - x) ** 2;
    xy += (p.x - x) * (p.y - y);
    yy += (p.y - y) ** 2;
  }
  const angle = Math.atan2(2 * xy, xx - yy) / 2;
  const normal = { x: -Math.sin(angle), y: Math.cos(angle) };
  return points.map((p) => normal.x * (p.x - x) + normal.y * (p.y - y));
}
