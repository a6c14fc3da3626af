/** How far a key moves a handle. Pure. */
import type { Place } from "./view";

const directions: Readonly<Record<string, Place>> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
};

interface Pressed {
  readonly key: string;
  readonly altKey: boolean;
  readonly shiftKey: boolean;
}

/**
 * In units of the picture; null for any other key. An arrow alone is one CSS pixel at the present scale, with Alt the fine step whatever the scale, Shift
 * makes either ten times as much.
 */
export function moveByKey({ key, altKey, shiftKey }: Pressed, scale: number, fineStep: number): Place | null {
  const direction = directions[key];
  if (!direction) return null;
  const step = (altKey ? fineStep : 1 / scale) * (shiftKey ? 10 : 1);
  return { x: direction.x * step, y: direction.y * step };
}
