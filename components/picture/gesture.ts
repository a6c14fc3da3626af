/**
 * What fingers and mouse on the bare picture mean: a tap, a drag, or a pinch with two. Pure: takes pointer events one by one, answers with what to do.
 * Handles on the picture keep their pointers to themselves and are not seen here.
 */
import type { Place } from "./view";

/** A finger that rests moves by less than this, CSS px. */
const TAP_SLOP_PX = 6;

interface Touch {
  readonly id: number;
  readonly start: Place;
  readonly now: Place;
}

export interface Gesture {
  readonly touches: readonly Touch[];
  /** "undecided" until the first touch has moved or a second has come; "spent" once two fingers were down, until all are up. */
  readonly kind: "idle" | "undecided" | "drag" | "pinch" | "spent";
}

export type GestureDeed =
  | { readonly deed: "none" }
  | { readonly deed: "tap"; readonly at: Place }
  | { readonly deed: "drag"; readonly start: Place; readonly before: Place; readonly now: Place }
  | { readonly deed: "dragged"; readonly start: Place; readonly now: Place }
  /** A drag that came to nothing: a second finger came down, or the system took the pointer away. */
  | { readonly deed: "drag-dropped" }
  | { readonly deed: "pinch"; readonly before: readonly [Place, Place]; readonly after: readonly [Place, Place] };

export interface Step {
  readonly gesture: Gesture;
  readonly does: GestureDeed;
}

export const noGesture: Gesture = { touches: [], kind: "idle" };
const nothing: GestureDeed = { deed: "none" };

export function pointerDown(gesture: Gesture, id: number, at: Place): Step {
  const touches = [...gesture.touches.filter((touch) => touch.id !== id), { id, start: at, now: at }];
  if (touches.length === 1) return { gesture: { touches, kind: "undecided" }, does: nothing };
  const does: GestureDeed = gesture.kind === "drag" ? { deed: "drag-dropped" } : nothing;
  return { gesture: { touches, kind: touches.length === 2 ? "pinch" : "spent" }, does };
}

export function pointerMove(gesture: Gesture, id: number, at: Place): Step {
  const touch = gesture.touches.find((known) => known.id === id);
  if (!touch) return { gesture, does: nothing };
  const touches = gesture.touches.map((known) => (known.id === id ? { ...known, now: at } : known));
  const [a, b] = touches;
  const [a0, b0] = gesture.touches;
  if (gesture.kind === "pinch" && a && b && a0 && b0) {
    return { gesture: { touches, kind: "pinch" }, does: { deed: "pinch", before: [a0.now, b0.now], after: [a.now, b.now] } };
  }
  if (gesture.kind === "undecided" && Math.hypot(at.x - touch.start.x, at.y - touch.start.y) <= TAP_SLOP_PX) {
    return { gesture, does: nothing };
  }
  if (gesture.kind !== "undecided" && gesture.kind !== "drag") return { gesture: { ...gesture, touches }, does: nothing };
  const before = gesture.kind === "undecided" ? touch.start : touch.now;
  return { gesture: { touches, kind: "drag" }, does: { deed: "drag", start: touch.start, before, now: at } };
}

export function pointerUp(gesture: Gesture, id: number, at: Place): Step {
  const touch = gesture.touches.find((known) => known.id === id);
  if (!touch) return { gesture, does: nothing };
  const touches = gesture.touches.filter((known) => known.id !== id);
  if (touches.length > 0) return { gesture: { touches, kind: "spent" }, does: nothing };
  if (gesture.kind === "undecided") return { gesture: noGesture, does: { deed: "tap", at: touch.start } };
  if (gesture.kind === "drag") return { gesture: noGesture, does: { deed: "dragged", start: touch.start, now: at } };
  return { gesture: noGesture, does: nothing };
}

export function pointerLost(gesture: Gesture, id: number): Step {
  const touches = gesture.touches.filter((known) => known.id !== id);
  const does: GestureDeed = gesture.kind === "drag" ? { deed: "drag-dropped" } : nothing;
  return { gesture: touches.length > 0 ? { touches, kind: "spent" } : noGesture, does };
}
