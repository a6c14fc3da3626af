"use client";
/** The blank as it will lie, from the photographs of its boards, to scale under the tape. A board is slid along the grain by dragging it. */
import { type PointerEvent, useId, useRef } from "react";
import { ZonesOverlay } from "@/components/board/zones-overlay";
import { WoodStrip } from "@/components/picture/wood-strip";
import { type BlankStrip, type ComposedBlank, mmFromUm, type Um, um } from "@/lib/layout";
import type { Straightening } from "@/lib/schemas/straightening";
import type { Zones } from "@/lib/schemas/zones";
import type { DraftMember } from "./blank-draft";

interface Props {
  blank: ComposedBlank;
  members: readonly DraftMember[];
  pictures: ReadonlyMap<string, Straightening>;
  onSlide: OnSlide;
}

/** How far a board was slid since it was taken hold of, in all: null when it is taken hold of. */
export type OnSlide = (boardId: string, by: Um | null) => void;

export function BlankPreview({ blank, members, pictures, onSlide }: Props) {
  const { length, width, strips } = blank;
  return (
    <WoodStrip label="The blank under the tape" length={length} width={width}>
      {({ width: widthPx, height: heightPx, pxPerMm }) => (
        <div className="relative bg-rule" style={{ width: widthPx, height: heightPx }}>
          <svg
            role="img"
            aria-label={`Blank of ${members.map(({ board }) => board.tag).join(", ")}`}
            viewBox={`0 0 ${mmFromUm(length)} ${mmFromUm(width)}`}
            preserveAspectRatio="none"
            className="absolute inset-0 size-full"
          >
            {strips.map((strip, index) => {
              const member = members[index];
              const picture = member && pictures.get(member.board.id);
              if (!member || !picture) return null;
              return <Strip key={strip.id} strip={strip} member={member} picture={picture} pxPerMm={pxPerMm} onSlide={onSlide} />;
            })}
          </svg>
          <ZonesOverlay length={length} width={width} zones={zonesOf(blank)} />
        </div>
      )}
    </WoodStrip>
  );
}

/** As they are drawn on any picture; ids only tell them apart here. */
function zonesOf({ outline, keepClear, glueLines }: ComposedBlank): Zones {
  return {
    outline: outline && [...outline],
    keepClear: keepClear.map(({ kind, area }, index) => ({
      id: `area ${index}`,
      kind,
      area: area.shape === "polygon" ? { ...area, points: [...area.points] } : area,
      note: "",
    })),
    glueLines: glueLines.map(({ across }, index) => ({ id: `line ${index}`, across, aboveBoardId: null, belowBoardId: null })),
    revision: 0,
  };
}

interface StripProps {
  strip: BlankStrip;
  member: DraftMember;
  picture: Straightening;
  pxPerMm: number;
  onSlide: OnSlide;
}

/** Screens are at most so wide in pixels for one board; two pixels a point on phones. */
const SCREEN_PX = 2400;

function Strip({ strip, member, picture, pxPerMm, onSlide }: StripProps) {
  const clip = useId();
  const { rect, blankFromMember: map } = strip;
  const level = picture.levels.findLast(({ widthPx }) => widthPx >= SCREEN_PX) ?? picture.levels[0];
  const [x, y, w, h] = [mmFromUm(rect.x), mmFromUm(rect.y), mmFromUm(rect.width), mmFromUm(rect.height)];
  const letter = Math.min(h * 0.4, 16 / pxPerMm);
  const drag = useDrag(member, pxPerMm, onSlide);
  return (
    <g className="cursor-ew-resize touch-pan-y" {...drag}>
      <clipPath id={clip}>
        <rect x={x} y={y} width={w} height={h} />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        <g transform={`matrix(${map.a} ${map.b} ${map.c} ${map.d} ${map.tx / 1000} ${map.ty / 1000})`}>
          {level && (
            <image
              href={level.url}
              width={mmFromUm(picture.length)}
              height={mmFromUm(picture.width)}
              preserveAspectRatio="none"
              className="pointer-events-none"
            />
          )}
        </g>
      </g>
      <rect x={x} y={y} width={w} height={h} fill="transparent" />
      <text
        x={x + letter * 0.5}
        y={y + letter * 1.2}
        fontSize={letter}
        className="measure pointer-events-none"
        fill="#fff"
        stroke="#20262a"
        strokeWidth={letter * 0.2}
        paintOrder="stroke"
      >
        {member.board.tag}
      </text>
    </g>
  );
}

/** Start and total, never step by step, so that nothing adds up on the way; at the scale it began with, which changes as the blank grows. */
function useDrag({ board }: DraftMember, pxPerMm: number, onSlide: OnSlide) {
  const held = useRef<{ readonly pointerId: number; readonly fromX: number; readonly pxPerMm: number } | null>(null);
  const end = () => {
    held.current = null;
  };
  return {
    onPointerDown: (event: PointerEvent<SVGGElement>) => {
      if (event.button !== 0) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      held.current = { pointerId: event.pointerId, fromX: event.clientX, pxPerMm };
      onSlide(board.id, null);
    },
    onPointerMove: (event: PointerEvent<SVGGElement>) => {
      const now = held.current;
      if (now?.pointerId !== event.pointerId) return;
      // To whole tenths of a millimetre: finer than a board can be laid.
      onSlide(board.id, um(Math.round(((event.clientX - now.fromX) / now.pxPerMm) * 10) * 100));
    },
    onPointerUp: end,
    onPointerCancel: end,
  };
}
