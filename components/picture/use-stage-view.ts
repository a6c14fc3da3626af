"use client";
/** The view of one picture on the screen: whole until somebody zooms or pans, kept in its frame, and as sharp as the picture is deep. */
import { type RefObject, useCallback, useRef, useState } from "react";
import { useSize } from "./use-size";
import {
  keptInFrame,
  MARGIN_PX,
  type Place,
  pannedBy,
  pinched,
  type Size,
  type View,
  viewAround,
  wholeView,
  zoomedAt,
} from "./view";

export interface StageView {
  readonly frameRef: RefObject<HTMLDivElement | null>;
  readonly frame: Size;
  readonly view: View;
  readonly isWhole: boolean;
  zoom: (factor: number, at?: Place) => void;
  pan: (by: Place) => void;
  pinch: (before: readonly [Place, Place], after: readonly [Place, Place]) => void;
  showWhole: () => void;
  /** Scrolls the page so that the picture is in sight: on a phone what belongs to it lies far below. */
  reveal: () => void;
  /** Brings a point of the picture to the middle, at this scale or nearer if it is nearer already. */
  lookAt: (at: Place, leastScale: number) => void;
}

/** Zooming further out than this share of the whole shows nothing new. */
const SMALLEST_SHARE = 0.8;

/** `mostScale`: CSS pixels per unit of the picture at the nearest zoom; `marginPx`: kept free around the whole of it. */
export function useStageView(picture: Size, mostScale: number, marginPx = MARGIN_PX): StageView {
  const frameRef = useRef<HTMLDivElement>(null);
  const frame = useSize(frameRef);
  const [moved, setMoved] = useState<View | null>(null);
  const whole = wholeView(picture, frame, marginPx);
  const view = moved === null ? whole : keptInFrame(moved, picture, frame);
  const limits = { least: whole.scale * SMALLEST_SHARE, most: Math.max(mostScale, whole.scale) };

  // Several events may come before the next drawing, so each starts from what the one before it left.
  const change = (next: (from: View) => View) =>
    setMoved((from) => keptInFrame(next(from === null ? whole : keptInFrame(from, picture, frame)), picture, frame));

  const reveal = useCallback(() => frameRef.current?.scrollIntoView({ block: "nearest" }), []);

  return {
    frameRef,
    frame,
    view,
    isWhole: moved === null,
    zoom: (factor, at = { x: frame.width / 2, y: frame.height / 2 }) => change((from) => zoomedAt(from, factor, at, limits)),
    pan: (by) => change((from) => pannedBy(from, by)),
    pinch: (before, after) => change((from) => pinched(from, before, after, limits)),
    showWhole: useCallback(() => setMoved(null), []),
    reveal,
    lookAt: (at, leastScale) => {
      reveal();
      change((from) => viewAround(at, Math.min(limits.most, Math.max(from.scale, leastScale)), frame));
    },
  };
}
