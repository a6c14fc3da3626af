"use client";
/** The selected mark in photo pixels: drag the picture under the cross-hair, or step it, without a finger on the spot. */
import { ArrowDown, ArrowLeft, ArrowRight, ArrowUp } from "lucide-react";
import { type PointerEvent, useRef, useState } from "react";
import { Loupe } from "../picture/loupe";
import type { Place, Size } from "../picture/view";
import { positionWords } from "./mark-words";

interface Props {
  name: string;
  image: HTMLImageElement | null;
  picture: Size;
  at: Place;
  onMove: (to: Place) => void;
}

/** Four screen pixels to one of the photograph. */
const SCALE = 4;
const LOUPE_PX = 164;
const steps = [0.1, 1, 10] as const;
const arrows = [
  { name: "Up", Icon: ArrowUp, x: 0, y: -1, cell: "col-start-2 row-start-1" },
  { name: "Left", Icon: ArrowLeft, x: -1, y: 0, cell: "col-start-1 row-start-2" },
  { name: "Right", Icon: ArrowRight, x: 1, y: 0, cell: "col-start-3 row-start-2" },
  { name: "Down", Icon: ArrowDown, x: 0, y: 1, cell: "col-start-2 row-start-3" },
] as const;

export function FineAdjust({ name, image, picture, at, onMove }: Props) {
  const drag = useRef<{ id: number; from: Place; at: Place } | null>(null);
  const [step, setStep] = useState<number>(1);

  const onPointerDown = (event: PointerEvent) => {
    event.currentTarget.setPointerCapture(event.pointerId);
    drag.current = { id: event.pointerId, from: { x: event.clientX, y: event.clientY }, at };
  };
  const onPointerMove = (event: PointerEvent) => {
    const now = drag.current;
    if (now?.id !== event.pointerId) return;
    // The picture goes with the finger, so the mark goes the other way over it.
    onMove({ x: now.at.x - (event.clientX - now.from.x) / SCALE, y: now.at.y - (event.clientY - now.from.y) / SCALE });
  };
  const end = () => {
    drag.current = null;
  };

  return (
    <section aria-label="Selected mark" className="flex flex-wrap items-start gap-x-4 gap-y-2">
      <p className="w-full text-sm">
        <strong>{name}</strong>
        <br />
        <span className="measure text-pencil">{positionWords(at)}</span>
      </p>
      <div
        className="cursor-move touch-none overflow-hidden rounded-md border border-line"
        onPointerDown={onPointerDown}
        onPointerMove={onPointerMove}
        onPointerUp={end}
        onPointerCancel={end}
      >
        <Loupe image={image} picture={picture} at={at} scale={SCALE} widthPx={LOUPE_PX} heightPx={LOUPE_PX} />
      </div>
      <div className="flex flex-col gap-2">
        <div className="grid w-fit grid-cols-3 grid-rows-3">
          {arrows.map(({ name: direction, Icon, x, y, cell }) => (
            <button
              key={direction}
              type="button"
              aria-label={`${direction} by ${step} px`}
              className={`grid size-11 place-items-center rounded-md border border-line bg-sheet hover:bg-chalk-wash ${cell}`}
              onClick={() => onMove({ x: at.x + x * step, y: at.y + y * step })}
            >
              <Icon className="size-5" aria-hidden="true" />
            </button>
          ))}
          <label className="measure col-start-2 row-start-2 grid size-11 place-items-center">
            <span className="sr-only">Step, px of the photograph</span>
            <select
              className="h-9 w-11 appearance-none rounded-md bg-chalk-wash text-center"
              value={step}
              onChange={(event) => setStep(Number(event.target.value))}
            >
              {steps.map((px) => (
                <option key={px} value={px}>
                  {px} px
                </option>
              ))}
            </select>
          </label>
        </div>
      </div>
      <p className="w-full text-sm text-pencil">
        Drag the picture under the cross-hair, or step by pixels of the photograph.{" "}
        <span className="pointer-coarse:hidden">On the photograph: arrow keys, Alt for 0.1 px, Shift for ten times as much.</span>
      </p>
    </section>
  );
}
