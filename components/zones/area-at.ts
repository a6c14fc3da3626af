/** Which keep-clear area lies under a finger. Pure; stock frame, µm. */
import type { StockPoint } from "@/lib/layout";
import type { KeepClearArea } from "@/lib/schemas/zones";

interface Place {
  readonly x: number;
  readonly y: number;
}

/** The one drawn last where several lie there; `reach` widens small ones, so that a fingertip finds them. */
export function areaAt(areas: readonly KeepClearArea[], p: Place, reach: number): KeepClearArea | null {
  return areas.findLast((area) => holds(area.area, p, 0)) ?? areas.findLast((area) => holds(area.area, p, reach)) ?? null;
}

function holds(area: KeepClearArea["area"], p: Place, reach: number): boolean {
  if (area.shape === "polygon") return inside(area.points, p) || nearSides(area.points, p, reach);
  const turn = (area.turnDeg * Math.PI) / 180;
  const [dx, dy] = [p.x - area.centre.x, p.y - area.centre.y];
  const along = (dx * Math.cos(turn) + dy * Math.sin(turn)) / (area.radiusX + reach);
  const across = (dy * Math.cos(turn) - dx * Math.sin(turn)) / (area.radiusY + reach);
  return along * along + across * across <= 1;
}

/** Counts the sides that a ray to the right crosses. */
function inside(points: readonly StockPoint[], p: Place): boolean {
  return (
    points.filter((to, index) => {
      const from = points.at(index - 1) ?? to;
      if (from.y > p.y === to.y > p.y) return false;
      return p.x < from.x + ((p.y - from.y) / (to.y - from.y)) * (to.x - from.x);
    }).length %
      2 ===
    1
  );
}

function nearSides(points: readonly StockPoint[], p: Place, reach: number): boolean {
  return points.some((to, index) => {
    const from = points.at(index - 1) ?? to;
    const [dx, dy] = [to.x - from.x, to.y - from.y];
    const squared = dx * dx + dy * dy;
    const t = squared > 0 ? Math.min(1, Math.max(0, ((p.x - from.x) * dx + (p.y - from.y) * dy) / squared)) : 0;
    return Math.hypot(p.x - from.x - t * dx, p.y - from.y - t * dy) <= reach;
  });
}
