"use client";
/** The yellow tape: a ruler in the shop's units, drawn at the scale of the wood beside it. Horizontal; starts at its left end. */
import { useMemo } from "react";
import { mmFromUm, type Um } from "@/lib/layout";
import { type TapeMark, tapeMarks } from "@/lib/words/tape-marks";
import { useUnits } from "../shell/units";

const heightPx = 26;
const markPx: Record<TapeMark["size"], number> = { short: 5, middle: 9, long: 14 };
/** A figure that would hang over the end of the tape is left out. */
const figureRoomPx = 40;

interface Props {
  lengthUm: Um;
  /** Screen pixels per millimetre of wood. */
  pxPerMm: number;
  className?: string;
}

export function Tape({ lengthUm, pxPerMm, className = "" }: Props) {
  const { units, print } = useUnits();
  const marks = useMemo(() => tapeMarks(lengthUm, pxPerMm, units), [lengthUm, pxPerMm, units]);
  const widthPx = mmFromUm(lengthUm) * pxPerMm;
  const figures = marks.filter(({ mm, figure }) => figure !== "" && mm * pxPerMm + figureRoomPx <= widthPx);
  return (
    <svg
      role="img"
      aria-label={`Tape, 0 to ${print(lengthUm)}`}
      width={widthPx}
      height={heightPx}
      className={`measure block bg-tape text-graphite select-none ${className}`}
    >
      <path
        d={marks.map(({ mm, size }) => `M${crisp(mm * pxPerMm)} ${heightPx}v${-markPx[size]}`).join("")}
        stroke="currentColor"
        strokeWidth="1"
      />
      <text x="4" y="13" fontSize="12" fill="currentColor">
        {units === "mm" ? "mm" : "in"}
      </text>
      {figures.map(({ mm, figure }) => (
        <text key={mm} x={mm * pxPerMm + 3} y="13" fontSize="14" fill="currentColor">
          {figure}
        </text>
      ))}
    </svg>
  );
}

/** A one-pixel line falls on one row of pixels when its middle lies at a half. */
const crisp = (px: number) => Math.floor(px) + 0.5;
