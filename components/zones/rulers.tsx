"use client";
/** Tapes along the upper edge and the right end of the picture, at its scale; they stay in the frame when those run out of it. */
import { mmFromUm } from "@/lib/layout";
import type { StageView } from "../picture/use-stage-view";
import { Tape } from "../ui/tape";
import type { PictureSize } from "./zones-doc";

/** Thickness of a tape, CSS px. */
export const TAPE_PX = 26;

export function Rulers({ stage, size }: { stage: StageView; size: PictureSize }) {
  const { x, y, scale } = stage.view;
  const above = Math.max(0, y - TAPE_PX);
  const right = Math.min(stage.frame.width, x + mmFromUm(size.length) * scale + TAPE_PX);
  return (
    <>
      <div className="absolute top-0 left-0" style={{ transform: `translate(${x}px, ${above}px)` }}>
        <Tape lengthUm={size.length} pxPerMm={scale} />
      </div>
      <div className="absolute top-0 left-0 origin-top-left" style={{ transform: `translate(${right}px, ${y}px) rotate(90deg)` }}>
        <Tape lengthUm={size.width} pxPerMm={scale} />
      </div>
    </>
  );
}
