"use client";
/** The part in hand with the cut to make: what is cut before lies in the shade, what falls off is hatched, the blade is yellow. */
import { type CutStep, mmFromUm } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { edgeNames } from "@/lib/words/edge-name";
import { WoodView, type WoodWindow } from "../order/wood-view";
import { type CutGeometry, cutGeometry } from "./cut-window";

interface Props {
  snapshot: OrderSnapshot;
  board: SnapshotBoard;
  cut: CutStep;
  title: string;
}

export function CutDrawing({ snapshot, board, cut, title }: Props) {
  const geometry = cutGeometry(cut);
  const { window, part, blade } = geometry;
  const falling = cut.yields.filter(({ kind }) => kind === "waste" || kind === "offcut");
  return (
    <WoodView
      snapshot={snapshot}
      board={board}
      window={window}
      label={`${title}: measured from the ${edgeNames[cut.fromEdge]}`}
      className="max-h-[34dvh] rounded-sm"
    >
      <defs>
        <pattern
          id="falls-off"
          width="10"
          height="10"
          patternUnits="userSpaceOnUse"
          patternTransform={`rotate(45) scale(${window.height / 90})`}
        >
          <rect width="10" height="10" fill="#20262a" fillOpacity="0.35" />
          <path d="M0 0V10" stroke="#fff" strokeWidth="2.5" strokeOpacity="0.8" />
        </pattern>
      </defs>
      <path d={`${box(window)}${box(part)}`} fillRule="evenodd" fill="#20262a" fillOpacity="0.72" />
      {falling.map(({ id, rect }) => (
        <rect
          key={id}
          x={mmFromUm(rect.x)}
          y={mmFromUm(rect.y)}
          width={mmFromUm(rect.width)}
          height={mmFromUm(rect.height)}
          fill="url(#falls-off)"
        />
      ))}
      <Blade blade={blade} window={window} across={cut.kind === "crosscut" || geometry.measure.axis === "x"} />
      <FromEdge geometry={geometry} />
    </WoodView>
  );
}

const box = ({ x, y, width, height }: WoodWindow) => `M${x} ${y}h${width}v${height}h${-width}z`;

/** As wide as it is, yet never so thin that it is missed. */
function Blade({ blade, window, across }: { blade: WoodWindow; window: WoodWindow; across: boolean }) {
  const least = window.width / 130;
  const rim = window.height * 0.05;
  const thick = Math.max(least, across ? blade.width : blade.height);
  const middle = { x: blade.x + blade.width / 2, y: blade.y + blade.height / 2 };
  return across ? (
    <rect
      x={middle.x - thick / 2}
      y={blade.y - rim}
      width={thick}
      height={blade.height + 2 * rim}
      fill="#f0c330"
      stroke="#20262a"
      strokeWidth="1"
      vectorEffect="non-scaling-stroke"
    />
  ) : (
    <rect
      x={blade.x - rim}
      y={middle.y - thick / 2}
      width={blade.width + 2 * rim}
      height={thick}
      fill="#f0c330"
      stroke="#20262a"
      strokeWidth="1"
      vectorEffect="non-scaling-stroke"
    />
  );
}

/** The edge the setting is measured from, thick, and a line from it to the blade. */
function FromEdge({ geometry: { part, window, measure } }: { geometry: CutGeometry }) {
  const { axis, from, to } = measure;
  const arrow = window.height * 0.05;
  const edge = axis === "x" ? `M${from} ${part.y}v${part.height}` : `M${part.x} ${from}h${part.width}`;
  const beside = axis === "x" ? part.y + part.height * 0.9 : Math.max(part.x, window.x) + window.width * 0.12;
  const toward = to >= from ? -1 : 1;
  const line =
    axis === "x"
      ? `M${from} ${beside}H${to}m${toward * arrow} ${-arrow}L${to} ${beside}l${toward * arrow} ${arrow}`
      : `M${beside} ${from}V${to}m${-arrow} ${toward * arrow}L${beside} ${to}l${arrow} ${toward * arrow}`;
  return (
    <g fill="none" vectorEffect="non-scaling-stroke">
      <path d={edge} stroke="#fff" strokeWidth="7" vectorEffect="non-scaling-stroke" />
      <path d={edge} stroke="#1d4f91" strokeWidth="4" vectorEffect="non-scaling-stroke" />
      <path d={line} stroke="#fff" strokeWidth="5" vectorEffect="non-scaling-stroke" />
      <path d={line} stroke="#1d4f91" strokeWidth="2.5" vectorEffect="non-scaling-stroke" />
    </g>
  );
}
