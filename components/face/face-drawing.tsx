"use client";
import { useRef } from "react";
import { useSize } from "@/components/picture/use-size";
import { type Face, facePieces, faceSize } from "@/lib/layout";

/** A number is read at arm's length at this size, CSS px, and never fills more than this share of its front. */
const labelPx = 18;
const labelShare = 0.8;
/** Half the line and a little air around the outermost fronts, CSS px. */
const marginPx = 2;

/**
 * The fronts of a face as outlines, to scale, with their numbers. A drawing only: the wood is on the layout table.
 * `className` gives it its room; the face lies in the middle of that.
 */
export function FaceDrawing({ face, className = "" }: { face: Face; className?: string }) {
  const box = useRef<HTMLDivElement>(null);
  const room = useSize(box);
  const { width, height } = faceSize(face);
  const pieces = facePieces({ face });
  const pxPerUm = Math.min((room.width - 2 * marginPx) / width, (room.height - 2 * marginPx) / height);
  const left = (room.width - width * pxPerUm) / 2;
  const top = (room.height - height * pxPerUm) / 2;
  return (
    <div ref={box} className={className}>
      {pxPerUm > 0 && (
        <svg width={room.width} height={room.height} role="img" aria-label={`${pieces.length} fronts`} className="block">
          {pieces.map(({ id, label, rect }) => {
            const w = rect.width * pxPerUm;
            const h = rect.height * pxPerUm;
            const x = left + rect.x * pxPerUm;
            const y = top + rect.y * pxPerUm;
            return (
              <g key={id}>
                <rect x={x} y={y} width={w} height={h} className="fill-sheet stroke-graphite" strokeWidth={1.5} />
                <text
                  x={x + w / 2}
                  y={y + h / 2}
                  fontSize={Math.min(labelPx, w * labelShare, h * labelShare)}
                  textAnchor="middle"
                  dominantBaseline="central"
                  className="fill-graphite font-measure font-semibold"
                >
                  {label}
                </text>
              </g>
            );
          })}
        </svg>
      )}
    </div>
  );
}
