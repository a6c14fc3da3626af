"use client";
/** A point on a picture that is moved by mouse, finger or arrow keys. A press without a move only selects it. */
import { type KeyboardEvent, type PointerEvent, type ReactNode, useRef } from "react";
import { moveByKey } from "./handle-key";
import { type Place, toScreen, type View } from "./view";

/** "moving" may come many times; then one "end", or "dropped" with the place it had before. "key" stands alone. */
export type MovePhase = "moving" | "end" | "dropped" | "key";

interface Props {
  name: string;
  /** Where it is, in words. */
  position: string;
  /** Units of the picture. */
  at: Place;
  view: View;
  /** Movement by an arrow key with Alt, units of the picture. */
  fineStep: number;
  selected: boolean;
  onSelect: () => void;
  onMove: (to: Place, phase: MovePhase) => void;
  onRemove?: (() => void) | undefined;
  /** Drawn around the point, 44 × 44 px with the point in the middle. */
  children: ReactNode;
}

/** A finger that only selects moves by less than this, CSS px. */
const SLOP_PX = 4;

interface Drag {
  readonly pointerId: number;
  readonly from: Place;
  readonly at: Place;
  readonly moving: boolean;
}

export function Handle({ name, position, at, view, fineStep, selected, onSelect, onMove, onRemove, children }: Props) {
  const drag = useRef<Drag | null>(null);
  const { x, y } = toScreen(view, at);

  const moved = ({ from, at: start }: Drag, event: PointerEvent): Place => ({
    x: start.x + (event.clientX - from.x) / view.scale,
    y: start.y + (event.clientY - from.y) / view.scale,
  });
  const onPointerDown = (event: PointerEvent) => {
    if (event.button !== 0 || drag.current) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    drag.current = { pointerId: event.pointerId, from: { x: event.clientX, y: event.clientY }, at, moving: false };
    onSelect();
  };
  const onPointerMove = (event: PointerEvent) => {
    const now = drag.current;
    if (now?.pointerId !== event.pointerId) return;
    if (!now.moving && Math.hypot(event.clientX - now.from.x, event.clientY - now.from.y) <= SLOP_PX) return;
    drag.current = { ...now, moving: true };
    onMove(moved(now, event), "moving");
  };
  const onPointerUp = (event: PointerEvent) => {
    const now = drag.current;
    if (now?.pointerId !== event.pointerId) return;
    drag.current = null;
    if (now.moving) onMove(moved(now, event), "end");
  };
  const drop = () => {
    const now = drag.current;
    drag.current = null;
    if (now?.moving) onMove(now.at, "dropped");
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const by = moveByKey(event, view.scale, fineStep);
    if (by) onMove({ x: at.x + by.x, y: at.y + by.y }, "key");
    else if (event.key === "Escape" && drag.current) drop();
    else if ((event.key === "Delete" || event.key === "Backspace") && onRemove) onRemove();
    else return;
    // Alt with an arrow would leave the page.
    event.preventDefault();
  };

  return (
    <button
      type="button"
      aria-label={`${name}, ${position}`}
      aria-pressed={selected}
      className={`pointer-events-auto absolute top-0 left-0 grid size-11 cursor-move touch-none place-items-center rounded-full ${selected ? "z-10" : ""}`}
      style={{ transform: `translate(${x - 22}px, ${y - 22}px)` }}
      onFocus={onSelect}
      onKeyDown={onKeyDown}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={onPointerUp}
      onPointerCancel={drop}
    >
      {children}
    </button>
  );
}
