/**
 * Where a picture lies in its frame on the screen, zooming and panning. Pure. A picture has a unit of its own (pixels of a photograph,
 * millimetres of wood); the screen has CSS pixels from the top left of the frame.
 */

export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface Place {
  readonly x: number;
  readonly y: number;
}

export interface View {
  /** CSS pixels per unit of the picture. */
  readonly scale: number;
  /** Where the picture's origin lies on the screen. */
  readonly x: number;
  readonly y: number;
}

/** Kept free around a picture that is shown whole. */
export const MARGIN_PX = 24;
/** At least this much of a picture stays in the frame, so that nobody loses it. */
const KEPT_PX = 64;
/** One press of + or −. */
export const ZOOM_STEP = 1.5;

/** The whole picture in the middle of the frame. A frame without size shows it at scale 1. */
export function wholeView(picture: Size, frame: Size, marginPx = MARGIN_PX): View {
  const room = (length: number) => Math.max(1, length - 2 * marginPx);
  if (!(picture.width > 0) || !(picture.height > 0) || !(frame.width > 0) || !(frame.height > 0)) return { scale: 1, x: 0, y: 0 };
  const scale = Math.min(room(frame.width) / picture.width, room(frame.height) / picture.height);
  return { scale, x: (frame.width - picture.width * scale) / 2, y: (frame.height - picture.height * scale) / 2 };
}

export const toScreen = (view: View, p: Place): Place => ({ x: view.x + p.x * view.scale, y: view.y + p.y * view.scale });

export const toPicture = (view: View, p: Place): Place => ({ x: (p.x - view.x) / view.scale, y: (p.y - view.y) / view.scale });

export interface ZoomLimits {
  readonly least: number;
  readonly most: number;
}

/** Zooms by a factor; what lies under `at` (screen) stays there. */
export function zoomedAt(view: View, factor: number, at: Place, { least, most }: ZoomLimits): View {
  const scale = Math.min(Math.max(view.scale * factor, least), most);
  const ratio = scale / view.scale;
  return { scale, x: at.x + (view.x - at.x) * ratio, y: at.y + (view.y - at.y) * ratio };
}

export const pannedBy = (view: View, by: Place): View => ({ ...view, x: view.x + by.x, y: view.y + by.y });

/** Two fingers moved from `before` to `after`: what lay under each stays under it, as far as a zoom without turning can. */
export function pinched(view: View, before: readonly [Place, Place], after: readonly [Place, Place], limits: ZoomLimits): View {
  const from = middleOf(before);
  const to = middleOf(after);
  const apart = Math.hypot(before[1].x - before[0].x, before[1].y - before[0].y);
  const factor = apart > 0 ? Math.hypot(after[1].x - after[0].x, after[1].y - after[0].y) / apart : 1;
  return pannedBy(zoomedAt(view, factor, from, limits), { x: to.x - from.x, y: to.y - from.y });
}

/** A point of the picture in the middle of the frame, at this scale. */
export function viewAround(at: Place, scale: number, frame: Size): View {
  return { scale, x: frame.width / 2 - at.x * scale, y: frame.height / 2 - at.y * scale };
}

/** The same view, moved as little as leaves some of the picture in the frame. */
export function keptInFrame(view: View, picture: Size, frame: Size): View {
  const kept = (offset: number, length: number, room: number) =>
    Math.min(Math.max(offset, Math.min(KEPT_PX, room / 2) - length), room - Math.min(KEPT_PX, room / 2));
  return {
    ...view,
    x: kept(view.x, picture.width * view.scale, frame.width),
    y: kept(view.y, picture.height * view.scale, frame.height),
  };
}

const middleOf = ([a, b]: readonly [Place, Place]): Place => ({ x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 });
