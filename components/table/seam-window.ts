/** What of the face is shown of a magnified seam: its whole length, and the same stretch of wood on both sides. */
import { type FaceRect, type Seam, um } from "@/lib/layout";

/** Wood on either side, µm: enough for the eye to take up a line and follow it over. */
const BESIDE = 38_000;

export function seamWindow({ from, to, gap, normal }: Seam): FaceRect {
  const deep = um(2 * BESIDE + gap);
  return normal === "right"
    ? { x: um(from.x - BESIDE), y: from.y, width: deep, height: um(to.y - from.y) }
    : { x: from.x, y: um(from.y - BESIDE), width: um(to.x - from.x), height: deep };
}
