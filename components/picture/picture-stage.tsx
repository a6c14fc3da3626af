"use client";
/**
 * A picture one can zoom and move, by wheel, fingers, buttons and keys, with marks drawn over it. Knows nothing of what the marks mean: they come as
 * children, placed by `toScreen`.
 */
import { Maximize, ZoomIn, ZoomOut } from "lucide-react";
import Image from "next/image";
import { type KeyboardEvent, type PointerEvent, type ReactNode, useEffect, useRef } from "react";
import { levelFor } from "@/lib/editor/view/choose-level";
import { wheelFactor } from "@/lib/editor/view/zoom";
import type { ServedLevel } from "@/lib/schemas/photo";
import { type GestureDeed, noGesture, pointerDown, pointerLost, pointerMove, pointerUp, type Step } from "./gesture";
import type { StageView } from "./use-stage-view";
import { type Place, type Size, toPicture, ZOOM_STEP } from "./view";

/** A drag on the bare picture, from and to in units of the picture. */
export interface Stroke {
  readonly phase: "moving" | "end" | "dropped";
  readonly from: Place;
  readonly to: Place;
}

interface Props {
  /** What the picture shows, for those who do not see it. */
  label: string;
  stage: StageView;
  /** In units of the picture. */
  size: Size;
  /** Largest first; all cover the whole picture. */
  levels: readonly ServedLevel[];
  /** A click, a tap, or Enter (then in the middle of the frame). Units of the picture. */
  onTap?: ((at: Place) => void) | undefined;
  /** When given, one finger draws instead of moving the picture. */
  onStroke?: ((stroke: Stroke) => void) | undefined;
  onEscape?: (() => void) | undefined;
  /** Shows where Enter will put something. */
  crossHair?: boolean;
  className?: string;
  children: ReactNode;
}

const PAN_KEY_PX = 60;
const panKeys: Readonly<Record<string, Place>> = {
  ArrowLeft: { x: PAN_KEY_PX, y: 0 },
  ArrowRight: { x: -PAN_KEY_PX, y: 0 },
  ArrowUp: { x: 0, y: PAN_KEY_PX },
  ArrowDown: { x: 0, y: -PAN_KEY_PX },
};

export function PictureStage(props: Props) {
  const { label, stage, onTap, onEscape, crossHair, className = "", children } = props;
  const { frameRef, frame, view } = stage;
  const pointers = usePointers(props);
  useWheel(stage);
  const middle = { x: frame.width / 2, y: frame.height / 2 };

  const onKeyDown = (event: KeyboardEvent) => {
    const pan = panKeys[event.key];
    if (pan) stage.pan(pan);
    else if (event.key === "+" || event.key === "=") stage.zoom(ZOOM_STEP);
    else if (event.key === "-") stage.zoom(1 / ZOOM_STEP);
    else if (event.key === "0") stage.showWhole();
    else if (event.key === "Enter" && onTap) onTap(toPicture(view, middle));
    else if (event.key === "Escape" && onEscape) onEscape();
    else return;
    event.preventDefault();
  };

  return (
    <div ref={frameRef} className={`relative overflow-hidden bg-[#dfe3e2] select-none ${className}`}>
      {frame.width > 0 && <Levels {...props} />}
      {/* One thing in the tab order: arrows move the picture, + and − zoom, Enter acts in the middle. */}
      <button
        type="button"
        aria-label={`${label}. Arrow keys move it, plus and minus zoom, 0 shows all of it.`}
        className={`absolute inset-0 touch-none focus-visible:-outline-offset-2 ${props.onStroke || crossHair ? "cursor-crosshair" : "cursor-grab"}`}
        onKeyDown={onKeyDown}
        {...pointers}
      />
      {frame.width > 0 && <div className="pointer-events-none absolute inset-0">{children}</div>}
      {crossHair && <CrossHair at={middle} />}
      <ZoomButtons stage={stage} />
    </div>
  );
}

/** The smallest level stays underneath, so that nothing flashes while a larger one loads. */
function Levels({ stage, size, levels, label }: Props) {
  const { x, y, scale } = stage.view;
  const sharp = levelFor(levels, size.width, scale * window.devicePixelRatio);
  const smallest = levels.at(-1);
  const shown = [smallest, sharp].filter((level, index, all) => level && all.indexOf(level) === index);
  return shown.map(
    (level) =>
      level && (
        <Image
          key={level.url}
          src={level.url}
          alt={level === smallest ? label : ""}
          width={level.widthPx}
          height={level.heightPx}
          unoptimized
          loading="eager"
          draggable={false}
          className="pointer-events-none absolute top-0 left-0 max-w-none origin-top-left"
          style={{ width: size.width * scale, height: size.height * scale, transform: `translate(${x}px, ${y}px)` }}
        />
      ),
  );
}

function CrossHair({ at }: { at: Place }) {
  return (
    <svg className="pointer-events-none absolute inset-0 size-full" aria-hidden="true">
      {[
        ["#fff", 4],
        ["var(--color-chalk)", 1.5],
      ].map(([color, width]) => (
        <path
          key={color}
          d={`M${at.x - 16} ${at.y}h12m8 0h12M${at.x} ${at.y - 16}v12m0 8v12`}
          stroke={String(color)}
          strokeWidth={width}
          fill="none"
        />
      ))}
    </svg>
  );
}

function ZoomButtons({ stage }: { stage: StageView }) {
  const box = "grid size-11 place-items-center bg-sheet/95 hover:bg-chalk-wash disabled:text-line";
  return (
    <div className="absolute right-2 bottom-2 flex divide-x divide-rule overflow-hidden rounded-md border border-line">
      <button type="button" className={box} aria-label="Zoom out" onClick={() => stage.zoom(1 / ZOOM_STEP)}>
        <ZoomOut className="size-5" aria-hidden="true" />
      </button>
      <button type="button" className={box} aria-label="Zoom in" onClick={() => stage.zoom(ZOOM_STEP)}>
        <ZoomIn className="size-5" aria-hidden="true" />
      </button>
      <button type="button" className={box} aria-label="Show all of it" disabled={stage.isWhole} onClick={stage.showWhole}>
        <Maximize className="size-5" aria-hidden="true" />
      </button>
    </div>
  );
}

/** Pointer events of the bare picture, handed to the gesture reckoning, and what comes of them. */
function usePointers({ stage, onTap, onStroke }: Props) {
  const gesture = useRef(noGesture);
  const { view } = stage;

  const act = (does: GestureDeed, pans: boolean) => {
    if (does.deed === "pinch") return stage.pinch(does.before, does.after);
    if (does.deed === "tap") return onTap?.(toPicture(view, does.at));
    if (onStroke && !pans) return drawStroke(does, onStroke, (p) => toPicture(view, p));
    if (does.deed === "drag") stage.pan({ x: does.now.x - does.before.x, y: does.now.y - does.before.y });
  };
  const take = ({ gesture: next, does }: Step, event: PointerEvent) => {
    gesture.current = next;
    // The wheel pressed down moves the picture even where a finger would draw.
    act(does, (event.buttons & 4) !== 0);
  };
  const placeOf = (event: PointerEvent): Place => {
    const box = event.currentTarget.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };
  return {
    onPointerDown: (event: PointerEvent) => {
      if (event.button === 2) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      take(pointerDown(gesture.current, event.pointerId, placeOf(event)), event);
    },
    onPointerMove: (event: PointerEvent) => take(pointerMove(gesture.current, event.pointerId, placeOf(event)), event),
    onPointerUp: (event: PointerEvent) => take(pointerUp(gesture.current, event.pointerId, placeOf(event)), event),
    onPointerCancel: (event: PointerEvent) => take(pointerLost(gesture.current, event.pointerId), event),
  };
}

function drawStroke(does: GestureDeed, onStroke: (stroke: Stroke) => void, toUnits: (p: Place) => Place): void {
  if (does.deed === "drag") onStroke({ phase: "moving", from: toUnits(does.start), to: toUnits(does.now) });
  if (does.deed === "dragged") onStroke({ phase: "end", from: toUnits(does.start), to: toUnits(does.now) });
  if (does.deed === "drag-dropped") onStroke({ phase: "dropped", from: { x: 0, y: 0 }, to: { x: 0, y: 0 } });
}

/** React listens to wheels passively, so the page would scroll with the picture. */
function useWheel(stage: StageView): void {
  const latest = useRef(stage);
  useEffect(() => {
    latest.current = stage;
  });
  const { frameRef } = stage;
  useEffect(() => {
    const frame = frameRef.current;
    if (!frame) return;
    const onWheel = (event: WheelEvent) => {
      event.preventDefault();
      if (!event.ctrlKey && Math.abs(event.deltaX) > Math.abs(event.deltaY))
        return latest.current.pan({ x: -event.deltaX, y: 0 });
      const box = frame.getBoundingClientRect();
      latest.current.zoom(wheelFactor(event.deltaY), { x: event.clientX - box.left, y: event.clientY - box.top });
    };
    frame.addEventListener("wheel", onWheel, { passive: false });
    return () => frame.removeEventListener("wheel", onWheel);
  }, [frameRef]);
}
