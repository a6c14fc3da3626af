"use client";
/** The surroundings of a point, enlarged, with a cross-hair on it. */
import { useEffect, useRef } from "react";
import type { Place, Size } from "./view";

interface Props {
  /** Any level of the picture; null while it loads. */
  image: HTMLImageElement | null;
  /** The picture in its own unit, and the point in it. */
  picture: Size;
  at: Place;
  /** CSS pixels per unit of the picture. */
  scale: number;
  widthPx: number;
  heightPx: number;
  className?: string;
}

export function Loupe({ image, picture, at, scale, widthPx, heightPx, className = "" }: Props) {
  const ref = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const canvas = ref.current;
    const context = canvas?.getContext("2d");
    if (!canvas || !context) return;
    const ratio = window.devicePixelRatio;
    canvas.width = Math.round(widthPx * ratio);
    canvas.height = Math.round(heightPx * ratio);
    context.setTransform(ratio, 0, 0, ratio, 0, 0);
    context.fillStyle = "#20262a";
    context.fillRect(0, 0, widthPx, heightPx);
    if (!image) return;
    const level = image.naturalWidth / picture.width;
    // Once a pixel of the photograph is as large as this, its own square says more than a blur.
    context.imageSmoothingEnabled = scale / level < 3;
    context.translate(widthPx / 2, heightPx / 2);
    context.scale(scale / level, scale / level);
    context.drawImage(image, -at.x * level, -at.y * level);
  }, [image, picture.width, at.x, at.y, scale, widthPx, heightPx]);

  const [cx, cy] = [widthPx / 2, heightPx / 2];
  const hair = `M0 ${cy}H${cx - 6}M${cx + 6} ${cy}H${widthPx}M${cx} 0V${cy - 6}M${cx} ${cy + 6}V${heightPx}`;
  return (
    <div
      aria-hidden="true"
      className={`pointer-events-none relative overflow-hidden ${className}`}
      style={{ width: widthPx, height: heightPx }}
    >
      <canvas ref={ref} style={{ width: widthPx, height: heightPx }} />
      <svg className="absolute inset-0 size-full" aria-hidden="true">
        <path d={hair} stroke="#fff" strokeWidth="3" opacity="0.8" />
        <path d={hair} stroke="var(--color-chalk)" strokeWidth="1.5" />
        <circle cx={cx} cy={cy} r="1" fill="var(--color-chalk)" />
      </svg>
    </div>
  );
}
