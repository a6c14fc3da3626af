/** Outline and keep-clear areas over the picture, in pixels of the screen. Takes no pointer. */
import { useId } from "react";
import type { StockPoint } from "@/lib/layout";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { toScreen, type View } from "../picture/view";
import type { ZonesState } from "./use-zones";
import { kindNames, middleOf } from "./zone-words";
import type { DocFault } from "./zones-doc";

interface Props {
  zones: ZonesState;
  /** CSS pixels per mm. */
  view: View;
  fault: DocFault | null;
}

const onScreen = (view: View, { x, y }: { x: number; y: number }) => toScreen(view, { x: x / 1000, y: y / 1000 });

export function ZonesDrawing({ zones, view, fault }: Props) {
  const hatch = useId();
  const { doc, size, selection, traced } = zones;
  const ring = (points: readonly StockPoint[]) => {
    const corners = points.map((point) => onScreen(view, point));
    return `M${corners.map(({ x, y }) => `${x} ${y}`).join("L")}`;
  };
  const from = onScreen(view, { x: 0, y: 0 });
  const to = onScreen(view, { x: size.length, y: size.width });
  const at = fault?.fault && onScreen(view, fault.fault.at);
  return (
    <svg className="absolute inset-0 size-full" aria-hidden="true">
      <defs>
        <pattern id={hatch} width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="9" height="9" className="fill-crayon/20" />
          <path d="M0 0V9" className="stroke-crayon" strokeWidth="3" />
        </pattern>
      </defs>
      {doc.outline && (
        <>
          <path
            d={`M${from.x} ${from.y}H${to.x}V${to.y}H${from.x}Z${ring(doc.outline)}Z`}
            fillRule="evenodd"
            className="fill-graphite/55"
          />
          <path d={`${ring(doc.outline)}Z`} fill="none" stroke="#fff" strokeWidth="4" />
          <path
            d={`${ring(doc.outline)}Z`}
            fill="none"
            className={fault?.of === "outline" ? "stroke-crayon" : "stroke-chalk"}
            strokeWidth={selection?.what === "outline" ? 2.5 : 1.5}
          />
        </>
      )}
      {doc.glueLines.map(({ id, across }) => {
        const y = onScreen(view, { x: 0, y: across }).y;
        const chosen = selection?.what === "glue-line" && selection.id === id;
        return (
          <g key={id}>
            <path d={`M${from.x} ${y}H${to.x}`} stroke="#fff" strokeWidth={chosen ? 5 : 3} />
            <path
              d={`M${from.x} ${y}H${to.x}`}
              className="stroke-chalk"
              strokeWidth={chosen ? 2.5 : 1.5}
              strokeDasharray={chosen ? undefined : "2 5"}
            />
          </g>
        );
      })}
      {doc.keepClear.map((area) => (
        <Area
          key={area.id}
          area={area}
          view={view}
          fill={`url(#${hatch})`}
          selected={selection?.what === "area" && selection.id === area.id}
          path={area.area.shape === "polygon" ? `${ring(area.area.points)}Z` : ""}
        />
      ))}
      {traced.length > 0 && <Traced path={ring(traced)} corners={traced.map((point) => onScreen(view, point))} />}
      {at && <path d={`M${at.x - 9} ${at.y - 9}l18 18m0 -18l-18 18`} className="stroke-crayon" strokeWidth="4" />}
    </svg>
  );
}

interface AreaProps {
  area: KeepClearArea;
  view: View;
  fill: string;
  selected: boolean;
  path: string;
}

function Area({ area, view, fill, selected, path }: AreaProps) {
  const shape = area.area;
  const middle = onScreen(view, middleOf(area));
  const look = { fill, className: "stroke-crayon", strokeWidth: selected ? 3.5 : 2 };
  return (
    <>
      {shape.shape === "ellipse" ? (
        <ellipse
          cx={middle.x}
          cy={middle.y}
          rx={(shape.radiusX / 1000) * view.scale}
          ry={(shape.radiusY / 1000) * view.scale}
          transform={`rotate(${shape.turnDeg} ${middle.x} ${middle.y})`}
          {...look}
        />
      ) : (
        <path d={path} {...look} />
      )}
      <text
        x={middle.x}
        y={middle.y}
        textAnchor="middle"
        dominantBaseline="central"
        className="measure fill-crayon text-sm"
        stroke="#fff"
        strokeWidth="4"
        paintOrder="stroke"
      >
        {kindNames[area.kind]}
      </text>
    </>
  );
}

function Traced({ path, corners }: { path: string; corners: readonly { x: number; y: number }[] }) {
  return (
    <>
      <path d={path} fill="none" stroke="#fff" strokeWidth="4" />
      <path d={path} fill="none" className="stroke-chalk" strokeWidth="2" strokeDasharray="6 4" />
      {corners.map(({ x, y }, index) => (
        <circle
          key={`${x} ${y}`}
          cx={x}
          cy={y}
          r={index === 0 ? 8 : 4}
          className="fill-sheet stroke-chalk"
          strokeWidth={index === 0 ? 3 : 2}
        />
      ))}
    </>
  );
}
