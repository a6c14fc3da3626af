/** An ellipse drawn by a box, then sized and turned by handles. Pure; stock frame, µm, angles clockwise as seen. */
import { type StockPoint, um } from "@/lib/layout";
import type { KeepClearArea } from "@/lib/schemas/zones";

export type Ellipse = Extract<KeepClearArea["area"], { shape: "ellipse" }>;

/** Smaller than any knot worth keeping clear of, and still large enough to be seen and taken hold of. */
export const LEAST_RADIUS = um(500);

export const ellipseHandles = ["centre", "along", "across", "turn"] as const;
export type EllipseHandle = (typeof ellipseHandles)[number];

interface Place {
  readonly x: number;
  readonly y: number;
}

/** The largest ellipse in a box between two corners; null where the box is too small to have been meant. */
export function ellipseInBox(a: Place, b: Place): Ellipse | null {
  const [radiusX, radiusY] = [Math.abs(b.x - a.x) / 2, Math.abs(b.y - a.y) / 2];
  if (radiusX < LEAST_RADIUS || radiusY < LEAST_RADIUS) return null;
  const centre = { x: um(Math.round((a.x + b.x) / 2)), y: um(Math.round((a.y + b.y) / 2)) };
  return { shape: "ellipse", centre, radiusX: um(Math.round(radiusX)), radiusY: um(Math.round(radiusY)), turnDeg: 0 };
}

/**
 * Where a handle stands: off the rim by `clear`, so that a finger covers neither the rim nor another handle of a small knot. The one that turns stands opposite
 * to the first radius.
 */
export function handlePlace({ centre, radiusX, radiusY, turnDeg }: Ellipse, handle: EllipseHandle, clear: number): StockPoint {
  const turn = (turnDeg * Math.PI) / 180;
  const from = (along: number, across: number): StockPoint => ({
    x: um(Math.round(centre.x + along * Math.cos(turn) - across * Math.sin(turn))),
    y: um(Math.round(centre.y + along * Math.sin(turn) + across * Math.cos(turn))),
  });
  if (handle === "centre") return centre;
  if (handle === "along") return from(radiusX + clear, 0);
  if (handle === "across") return from(0, radiusY + clear);
  return from(-radiusX - clear, 0);
}

/** The ellipse with a handle moved to a place; whole degrees, and whole tenths of a millimetre for the radii. */
export function moveEllipseHandle(ellipse: Ellipse, handle: EllipseHandle, to: Place, clear: number): Ellipse {
  const { centre, turnDeg } = ellipse;
  if (handle === "centre") return { ...ellipse, centre: { x: um(Math.round(to.x)), y: um(Math.round(to.y)) } };
  const [dx, dy] = [to.x - centre.x, to.y - centre.y];
  if (handle === "turn") {
    const turned = Math.round((Math.atan2(-dy, -dx) * 180) / Math.PI);
    return { ...ellipse, turnDeg: turned === 180 ? -180 : turned === 0 ? 0 : turned };
  }
  const turn = (turnDeg * Math.PI) / 180;
  const reach = handle === "along" ? dx * Math.cos(turn) + dy * Math.sin(turn) : dy * Math.cos(turn) - dx * Math.sin(turn);
  const radius = um(Math.max(LEAST_RADIUS, Math.round((reach - clear) / 100) * 100));
  return handle === "along" ? { ...ellipse, radiusX: radius } : { ...ellipse, radiusY: radius };
}
