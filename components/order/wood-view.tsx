"use client";
/** A window on a board's straightened photograph, true to scale, with its fronts. SVG units are millimetres of the wood. */
import { useQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { straighteningQuery } from "@/lib/client/straightening";
import { carpentersTriangle, mmFromUm } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import type { ServedLevel } from "@/lib/schemas/photo";

/** In millimetres of the board's frame. */
export interface WoodWindow {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

interface Props {
  snapshot: OrderSnapshot;
  board: SnapshotBoard;
  window: WoodWindow;
  /** What the drawing shows, for those who do not see it. */
  label: string;
  /** Drawn over wood and fronts. */
  children?: ReactNode;
  className?: string;
}

/** Screens are at most so wide in pixels for one window; two pixels a point on phones. */
const screenPx = 1600;

export function WoodView({ snapshot, board, window, label, children, className = "" }: Props) {
  const { data } = useQuery({ ...straighteningQuery(board.straighteningId), staleTime: Number.POSITIVE_INFINITY });
  const size = { width: mmFromUm(board.length), height: mmFromUm(board.width) };
  const picture = levelFor(data?.levels ?? [], screenPx * (size.width / window.width));
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`${window.x} ${window.y} ${window.width} ${window.height}`}
      className={`block w-full bg-rule ${className}`}
    >
      {picture && <image href={picture.url} x="0" y="0" {...size} preserveAspectRatio="none" />}
      <rect x="0" y="0" {...size} fill="none" stroke="#20262a" strokeWidth="1" vectorEffect="non-scaling-stroke" />
      <GlueLines board={board} window={window} />
      <Fronts snapshot={snapshot} board={board} window={window} />
      {children}
    </svg>
  );
}

/** The smallest level that is fine enough, else the finest there is. */
function levelFor(levels: readonly ServedLevel[], wantedPx: number): ServedLevel | undefined {
  const bySize = [...levels].sort((a, b) => a.widthPx - b.widthPx);
  return bySize.find(({ widthPx }) => widthPx >= wantedPx) ?? bySize.at(-1);
}

/** Quiet, because nothing is cut along them; of a blank yet to be glued up, each strip says at its right end whose it is. */
function GlueLines({ board, window }: Pick<Props, "board" | "window">) {
  const letter = Math.min(window.height * 0.11, window.width * 0.04);
  const length = mmFromUm(board.length);
  return (
    <>
      {board.glueLines?.map((across) => {
        const line = {
          x1: 0,
          x2: length,
          y1: mmFromUm(across),
          y2: mmFromUm(across),
          vectorEffect: "non-scaling-stroke",
        } as const;
        return (
          <g key={across}>
            <line {...line} stroke="#20262a" strokeOpacity="0.5" strokeWidth="3" />
            <line {...line} stroke="#fff" strokeWidth="1.2" strokeDasharray="2 5" />
          </g>
        );
      })}
      {board.gluing?.members.map(({ tag, rect }) => (
        <text
          key={tag}
          x={mmFromUm(rect.x) + mmFromUm(rect.width) - letter * 0.4}
          y={mmFromUm(rect.y) + mmFromUm(rect.height) / 2 + letter * 0.35}
          fontSize={letter}
          textAnchor="end"
          className="measure"
          fill="#fff"
          stroke="#20262a"
          strokeWidth={letter * 0.16}
          paintOrder="stroke"
        >
          {tag}
        </text>
      ))}
    </>
  );
}

/** Outlines, labels and each front's part of the triangle, light on a dark rim so that they show on any wood. */
function Fronts({ snapshot, board, window }: Pick<Props, "snapshot" | "board" | "window">) {
  const letter = Math.min(window.height * 0.22, window.width * 0.08);
  return (
    <g vectorEffect="non-scaling-stroke">
      {trianglePaths(snapshot, board).map((path) => (
        <g key={path}>
          <path d={path} fill="none" stroke="#20262a" strokeOpacity="0.55" strokeWidth="4" vectorEffect="non-scaling-stroke" />
          <path d={path} fill="none" stroke="#fff" strokeWidth="1.8" strokeDasharray="6 4" vectorEffect="non-scaling-stroke" />
        </g>
      ))}
      {board.pieces.map(({ pieceId, label, rect }) => {
        const [x, y] = [mmFromUm(rect.x), mmFromUm(rect.y)];
        const [width, height] = [mmFromUm(rect.width), mmFromUm(rect.height)];
        const size = Math.min(letter, width * 0.5, height * 0.5);
        return (
          <g key={pieceId}>
            <rect
              {...{ x, y, width, height }}
              fill="none"
              stroke="#20262a"
              strokeOpacity="0.5"
              strokeWidth="3.5"
              vectorEffect="non-scaling-stroke"
            />
            <rect {...{ x, y, width, height }} fill="none" stroke="#fff" strokeWidth="1.5" vectorEffect="non-scaling-stroke" />
            <text
              x={x + size * 0.3}
              y={y + size * 1.02}
              fontSize={size}
              className="measure"
              fill="#fff"
              stroke="#20262a"
              strokeWidth={size * 0.16}
              paintOrder="stroke"
            >
              {label}
            </text>
          </g>
        );
      })}
    </g>
  );
}

function trianglePaths({ faces }: OrderSnapshot, board: SnapshotBoard): string[] {
  const here = new Set(board.pieces.map(({ pieceId }) => pieceId));
  const marks = faces.flatMap(({ layout }) => carpentersTriangle(layout)).filter(({ piece }) => here.has(piece));
  return marks.flatMap(({ segments }) =>
    segments.flatMap(({ inWood }) =>
      inWood ? [`M${mmFromUm(inWood.from.x)} ${mmFromUm(inWood.from.y)}L${mmFromUm(inWood.to.x)} ${mmFromUm(inWood.to.y)}`] : [],
    ),
  );
}
