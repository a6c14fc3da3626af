/** Other ways to the same answers, for the tests of this room only: none of them shares a formula with lib/layout/fit. */
import type { KeepClearShape, Spans } from "@/lib/layout";

interface Place {
  readonly x: number;
  readonly y: number;
}

function corners({ along, across }: Spans): Place[] {
  return [
    { x: along.from, y: across.from },
    { x: along.to, y: across.from },
    { x: along.to, y: across.to },
    { x: along.from, y: across.to },
  ];
}

function distanceToSegment(p: Place, a: Place, b: Place): number {
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const t = Math.min(1, Math.max(0, ((p.x - a.x) * dx + (p.y - a.y) * dy) / (dx * dx + dy * dy)));
  return Math.hypot(p.x - a.x - t * dx, p.y - a.y - t * dy);
}

/**
 * Squeezes the plane so that the ellipse becomes the unit circle; the piece becomes a parallelogram. Positive: it reaches
 * into the circle by that share of the radius; negative: it misses it.
 */
export function shareInsideEllipse(piece: Spans, area: Extract<KeepClearShape, { shape: "ellipse" }>): number {
  const turn = (area.turnDeg * Math.PI) / 180;
  const squeezed = corners(piece).map(({ x, y }) => {
    const [dx, dy] = [x - area.centre.x, y - area.centre.y];
    return {
      x: (dx * Math.cos(turn) + dy * Math.sin(turn)) / area.radiusX,
      y: (-dx * Math.sin(turn) + dy * Math.cos(turn)) / area.radiusY,
    };
  });
  const sides = squeezed.map((a, index) => [a, squeezed[(index + 1) % 4] ?? a] as const);
  const centreInside = sides.every(([a, b]) => (b.x - a.x) * -a.y - (b.y - a.y) * -a.x >= 0);
  const nearest = Math.min(...sides.map(([a, b]) => distanceToSegment({ x: 0, y: 0 }, a, b)));
  return centreInside ? 1 : 1 - nearest;
}

/**
 * Area of a simple polygon inside a rectangle, by cutting it along one side after the other (Sutherland and Hodgman 1974).
 * µm².
 */
export function areaInside(polygon: readonly Place[], { along, across }: Spans): number {
  const halfPlanes: ((p: Place) => number)[] = [
    (p) => p.x - along.from,
    (p) => along.to - p.x,
    (p) => p.y - across.from,
    (p) => across.to - p.y,
  ];
  const rest = halfPlanes.reduce<Place[]>(
    (points, depth) => {
      return points.flatMap((p, index) => {
        const q = points[(index + 1) % points.length] ?? p;
        const [dp, dq] = [depth(p), depth(q)];
        const kept = dp >= 0 ? [p] : [];
        if (dp < 0 === dq < 0) return kept;
        const t = dp / (dp - dq);
        return [...kept, { x: p.x + t * (q.x - p.x), y: p.y + t * (q.y - p.y) }];
      });
    },
    [...polygon],
  );
  const doubled = rest.reduce((sum, p, index) => {
    const q = rest[(index + 1) % rest.length] ?? p;
    return sum + (p.x - along.from) * (q.y - across.from) - (q.x - along.from) * (p.y - across.from);
  }, 0);
  return Math.abs(doubled) / 2;
}

export function areaOf({ along, across }: Spans): number {
  return (along.to - along.from) * (across.to - across.from);
}

export function shifted({ along, across }: Spans, x: number, y: number): Spans {
  return { along: { from: along.from + x, to: along.to + x }, across: { from: across.from + y, to: across.to + y } };
}
