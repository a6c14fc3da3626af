/** Where the loupe stands while a handle moves: in the upper corner away from it, since the hand comes from below. Pure. */
import type { Place, Size } from "./view";

export type LoupeCorner = "left" | "right";

/** Left or right of the frame's top. A loupe is narrower than half of any frame, so it never covers the handle. */
export function loupeCorner(handle: Place, frame: Size): LoupeCorner {
  return handle.x < frame.width / 2 ? "right" : "left";
}
