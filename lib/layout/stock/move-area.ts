/** Keep-clear areas and outlines taken from one stock frame to another by an isometry: a board turned over, or laid into a blank. */
import type { Isometry } from "../frame/isometry";
import type { StockPoint } from "../frame/point";
import { um } from "../units/um";
import type { KeepClearShape } from "./board";

/** Exact for quarter turns and reflections with whole shifts, else rounded to the micrometre. */
export function movedPoint({ a, b, c, d, tx, ty }: Isometry, { x, y }: StockPoint): StockPoint {
  return { x: um(Math.round(a * x + c * y + tx)), y: um(Math.round(b * x + d * y + ty)) };
}

/** The same corners in the same sense round: a reflection turns their order about. */
export function movedPolygon(map: Isometry, corners: readonly StockPoint[]): StockPoint[] {
  const moved = corners.map((corner) => movedPoint(map, corner));
  return map.a * map.d - map.b * map.c < 0 ? moved.reverse() : moved;
}

/** The same area. The turn of an ellipse comes out above −90° and up to 90°, which is all there is to tell of an ellipse. */
export function movedArea(map: Isometry, area: KeepClearShape): KeepClearShape {
  if (area.shape === "polygon") return { shape: "polygon", points: movedPolygon(map, area.points) };
  return { ...area, centre: movedPoint(map, area.centre), turnDeg: movedTurn(map, area.turnDeg) };
}

/** Degrees, clockwise as seen, of the image of the first radius: the frame's own turn, and the sense of turning kept or reversed. */
function movedTurn({ a, b, c, d }: Isometry, turnDeg: number): number {
  const reflected = a * d - b * c < 0;
  const axis = withinHalfTurn((Math.atan2(b, a) * 180) / Math.PI);
  return withinHalfTurn((reflected ? -turnDeg : turnDeg) + axis);
}

function withinHalfTurn(deg: number): number {
  const within = deg - 180 * Math.ceil((deg - 90) / 180);
  return within === 0 ? 0 : within;
}
