"use client";
/** A face, or a window of it, painted from the photographs of its boards. */
import { useEffect, useRef } from "react";
import { type PaintedBoard, paintFace } from "@/lib/editor/canvas/paint-face";
import { readPalette } from "@/lib/editor/canvas/palette";
import { factsOf } from "@/lib/editor/selectors/facts";
import type { FaceLayout, FaceRect } from "@/lib/layout";
import type { PicturesAtHand } from "./use-pictures";

interface Props {
  label: string;
  layout: FaceLayout;
  boards: readonly PaintedBoard[];
  view: FaceRect;
  pxPerMm: number;
  atHand: PicturesAtHand | null;
  className?: string;
}

export function FacePicture({ label, layout, boards, view, pxPerMm, atHand, className }: Props) {
  const ref = useRef<HTMLCanvasElement>(null);
  const width = (view.width / 1000) * pxPerMm;
  const height = (view.height / 1000) * pxPerMm;

  useEffect(() => {
    const canvas = ref.current;
    const context = canvas?.getContext("2d");
    if (!canvas || !context || atHand === null) return;
    const density = window.devicePixelRatio;
    canvas.width = Math.max(1, Math.round(width * density));
    canvas.height = Math.max(1, Math.round(height * density));
    context.setTransform(density, 0, 0, density, 0, 0);
    const { facePieces, pieceById } = factsOf(layout);
    paintFace(context, { facePieces, pieceById, boards, view, pxPerMm, density }, atHand.pictures, readPalette());
  }, [layout, boards, view, pxPerMm, width, height, atHand]);

  return <canvas ref={ref} role="img" aria-label={label} style={{ width, height }} className={className} />;
}
