"use client";
/** Wood under its tape, as wide as the page; a narrow board is drawn larger and can be scrolled along. */
import { type ReactNode, useRef } from "react";
import { mmFromUm, type Um } from "@/lib/layout";
import { Tape } from "../ui/tape";
import { useSize } from "./use-size";

interface Props {
  label: string;
  length: Um;
  width: Um;
  /** Drawn at this size in CSS px. */
  children: (size: { width: number; height: number; pxPerMm: number }) => ReactNode;
}

/** Wood lower than this shows no figure. */
const LEAST_HEIGHT_PX = 72;
/** A board as good as square would fill the page. */
const MOST_HEIGHT_PX = 420;

export function WoodStrip({ label, length, width, children }: Props) {
  const ref = useRef<HTMLElement>(null);
  const room = useSize(ref);
  const [lengthMm, widthMm] = [mmFromUm(length), mmFromUm(width)];
  const fit = Math.min(room.width / lengthMm, MOST_HEIGHT_PX / widthMm);
  const pxPerMm = Math.max(fit, Math.min(LEAST_HEIGHT_PX / widthMm, (4 * room.width) / lengthMm));
  const size = { width: lengthMm * pxPerMm, height: widthMm * pxPerMm, pxPerMm };
  return (
    // Scrolls sideways, so it must be reachable by keyboard.
    <section
      ref={ref}
      aria-label={label}
      tabIndex={size.width > room.width + 1 ? 0 : undefined}
      className="w-full overflow-x-auto"
    >
      {room.width > 0 && (
        <>
          <Tape lengthUm={length} pxPerMm={pxPerMm} />
          {children(size)}
        </>
      )}
    </section>
  );
}
