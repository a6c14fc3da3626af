/** Zooming and panning both sides. A zoom keeps the wood under the pointer where it is on the side it happened on, and the middle of the other. */
import { GREATEST_ZOOM, LEAST_ZOOM, type Pan, type Size, type View, wholeView } from "./geometry";

export type Side = "show" | "stock";

/** One press of + or −. */
export const ZOOM_STEP = 1.25;

/** `at`: pixels on the side the zoom happened on. Where a side starts (`origins`) is what its geometry says before the zoom. */
export function zoomedAt(
  view: View,
  factor: number,
  side: Side,
  at: Pan,
  origins: Readonly<Record<Side, Pan>>,
  sizes: Readonly<Record<Side, Size>>,
): View {
  const zoom = clamped(view.zoom * factor, LEAST_ZOOM, GREATEST_ZOOM);
  if (zoom === LEAST_ZOOM) return wholeView;
  const ratio = zoom / view.zoom;
  const panned = (which: Side): Pan => {
    const fixed = which === side ? at : { x: sizes[which].width / 2, y: sizes[which].height / 2 };
    const shift = (origin: number, still: number) => (origin - still) * (ratio - 1);
    const before = view[which];
    return { x: before.x + shift(origins[which].x, fixed.x), y: before.y + shift(origins[which].y, fixed.y) };
  };
  return { zoom, show: panned("show"), stock: panned("stock") };
}

/** Moves one side by pixels; how far that may go is for the geometry to say. */
export function pannedBy(view: View, side: Side, by: Pan): View {
  return { ...view, [side]: { x: view[side].x + by.x, y: view[side].y + by.y } };
}

/** How much nearer one turn of the wheel brings the wood. */
export function wheelFactor(deltaY: number): number {
  return Math.exp(-clamped(deltaY, -240, 240) / 480);
}

function clamped(value: number, least: number, most: number): number {
  return Math.min(Math.max(value, least), most);
}
