"use client";
import { useEffect, useMemo, useRef } from "react";
import type { MarkingFit } from "@/lib/layout";
import type { Photo } from "@/lib/schemas/photo";
import { useImage } from "../picture/use-image";
import { WoodStrip } from "../picture/wood-strip";
import { usePreview } from "./use-preview";

type Fitted = Extract<MarkingFit, { ok: true }>;

/** Enough pixels for a preview as wide as the page, few enough to be read at once. */
const WANTED_LEVEL_PX = 1000;

/** The board as it would come out, under its tape, redrawn as the marks move. */
export function Preview({ photo, fit }: { photo: Photo; fit: Fitted }) {
  const level =
    photo.levels.findLast(({ widthPx, heightPx }) => Math.max(widthPx, heightPx) >= WANTED_LEVEL_PX) ?? photo.levels[0];
  const { image, state } = useImage(level?.url ?? null);
  if (state === "failed")
    return <p className="text-sm">The photograph could not be loaded. Load the page again for a preview.</p>;
  return (
    <WoodStrip label="Preview of the straightened board" length={fit.length} width={fit.width}>
      {({ width, height, pxPerMm }) => (
        <PreviewPicture image={image} photo={photo} fit={fit} width={width} height={height} pxPerMm={pxPerMm} />
      )}
    </WoodStrip>
  );
}

interface PictureProps {
  image: HTMLImageElement | null;
  photo: Photo;
  fit: Fitted;
  width: number;
  height: number;
  pxPerMm: number;
}

function PreviewPicture({ image, photo, fit, width, height, pxPerMm }: PictureProps) {
  const ref = useRef<HTMLCanvasElement>(null);
  const wanted = useMemo(
    () => ({
      geometry: fit.geometry,
      photoWidthPx: photo.widthPx,
      pxPerMm,
      widthPx: Math.max(1, Math.round(width)),
      heightPx: Math.max(1, Math.round(height)),
    }),
    [fit.geometry, photo.widthPx, pxPerMm, width, height],
  );
  const picture = usePreview(image, wanted);
  useEffect(() => {
    const canvas = ref.current;
    if (!canvas || !picture) return;
    canvas.width = picture.width;
    canvas.height = picture.height;
    canvas.getContext("2d")?.putImageData(picture, 0, 0);
  }, [picture]);
  return (
    <canvas
      ref={ref}
      role="img"
      aria-label="The straightened board"
      data-drawn={picture !== null}
      className="block bg-rule"
      style={{ width, height }}
    />
  );
}
