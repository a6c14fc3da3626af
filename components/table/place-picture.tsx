"use client";
/** The show side as it would be at a place that is offered. */
import { useMemo, useRef } from "react";
import { FacePicture } from "@/components/picture/face-picture";
import type { PicturesAtHand } from "@/components/picture/use-pictures";
import { useSize } from "@/components/picture/use-size";
import type { PaintedBoard } from "@/lib/editor/canvas/paint-face";
import { type FaceLayout, type FaceRect, faceSize, um } from "@/lib/layout";

interface Props {
  label: string;
  layout: FaceLayout;
  boards: readonly PaintedBoard[];
  atHand: PicturesAtHand | null;
}

const MOST_HEIGHT_PX = 180;

export function PlacePicture({ label, layout, boards, atHand }: Props) {
  const ref = useRef<HTMLDivElement>(null);
  const room = useSize(ref);
  const view = useMemo<FaceRect>(() => ({ x: um(0), y: um(0), ...faceSize(layout.face) }), [layout.face]);
  const pxPerMm = Math.min(room.width / (view.width / 1000), MOST_HEIGHT_PX / (view.height / 1000));
  return (
    <div ref={ref} className="w-full">
      {room.width > 0 && (
        <FacePicture label={label} layout={layout} boards={boards} view={view} pxPerMm={pxPerMm} atHand={atHand} />
      )}
    </div>
  );
}
