/**
 * Turns the pointers, the wheel and pinches on one side of the table into inputs. Pointer events are taken from the page itself and not from fabric, since
 * capture, pens and two fingers are theirs; what they mean is decided in `tools/pointer-tool.ts`.
 */
import type { Pan } from "../view/geometry";
import { type Side, wheelFactor } from "../view/zoom";

/** A pointer on one side, px from its top left corner. */
export interface SidePointer {
  readonly pointerId: number;
  readonly side: Side;
  readonly px: Pan;
  readonly shift: boolean;
  readonly alt: boolean;
  /** A finger. */
  readonly coarse: boolean;
}

export interface PointerListener {
  readonly onPress: (pointer: SidePointer) => void;
  readonly onMove: (pointer: SidePointer) => void;
  readonly onRelease: (pointer: SidePointer) => void;
  readonly onCancel: () => void;
  readonly onZoom: (side: Side, factor: number, at: Pan) => void;
  readonly onPan: (side: Side, by: Pan) => void;
}

/** Returns the way to stop listening. */
export function listenToPointers(host: HTMLElement, side: Side, listener: PointerListener): () => void {
  const stop = new AbortController();
  const { signal } = stop;
  const fingers = new Map<number, Pan>();
  let pinching = false;

  const at = (event: MouseEvent): Pan => {
    const box = host.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };
  const pointer = (event: PointerEvent): SidePointer => ({
    pointerId: event.pointerId,
    side,
    px: at(event),
    shift: event.shiftKey,
    alt: event.altKey,
    coarse: event.pointerType === "touch",
  });

  host.addEventListener(
    "pointerdown",
    (event) => {
      if (event.button !== 0) return;
      host.setPointerCapture(event.pointerId);
      fingers.set(event.pointerId, at(event));
      if (fingers.size === 2) {
        // The second finger turns whatever the first began into a pinch.
        pinching = true;
        listener.onCancel();
      }
      if (!pinching) listener.onPress(pointer(event));
    },
    { signal },
  );
  host.addEventListener(
    "pointermove",
    (event) => {
      const before = new Map(fingers);
      if (fingers.has(event.pointerId)) fingers.set(event.pointerId, at(event));
      if (!pinching) return listener.onMove(pointer(event));
      const was = spanOf([...before.values()]);
      const is = spanOf([...fingers.values()]);
      if (!was || !is) return;
      listener.onPan(side, { x: is.middle.x - was.middle.x, y: is.middle.y - was.middle.y });
      if (was.distance > 0) listener.onZoom(side, is.distance / was.distance, is.middle);
    },
    { signal },
  );
  const lifted = (event: PointerEvent) => {
    fingers.delete(event.pointerId);
    const wasPinching = pinching;
    if (fingers.size === 0) pinching = false;
    return wasPinching;
  };
  host.addEventListener(
    "pointerup",
    (event) => {
      if (!lifted(event)) listener.onRelease(pointer(event));
    },
    { signal },
  );
  host.addEventListener(
    "pointercancel",
    (event) => {
      lifted(event);
      listener.onCancel();
    },
    { signal },
  );
  host.addEventListener(
    "wheel",
    (event) => {
      event.preventDefault();
      const sideways = event.shiftKey || Math.abs(event.deltaX) > Math.abs(event.deltaY);
      if (sideways) listener.onPan(side, { x: -(event.deltaX || event.deltaY), y: 0 });
      else listener.onZoom(side, wheelFactor(event.deltaY), at(event));
    },
    { signal, passive: false },
  );
  return () => stop.abort();
}

function spanOf(points: readonly Pan[]): { readonly middle: Pan; readonly distance: number } | null {
  const [p, q] = points;
  if (!p || !q) return null;
  return { middle: { x: (p.x + q.x) / 2, y: (p.y + q.y) / 2 }, distance: Math.hypot(p.x - q.x, p.y - q.y) };
}
