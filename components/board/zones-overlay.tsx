/** Outline, keep-clear areas and glue lines drawn over a board's picture, in the stock frame's own millimetres. Shows only; drawing them is elsewhere. */
import { useId } from "react";
import { mmFromUm, type StockPoint, type Um } from "@/lib/layout";
import type { KeepClearArea, Zones } from "@/lib/schemas/zones";

interface Props {
  length: Um;
  width: Um;
  zones: Zones;
}

const corner = ({ x, y }: StockPoint) => `${mmFromUm(x)},${mmFromUm(y)}`;
const ring = (points: readonly StockPoint[]) => `M${points.map(corner).join("L")}Z`;

export function ZonesOverlay({ length, width, zones }: Props) {
  const hatch = useId();
  const [lengthMm, widthMm] = [mmFromUm(length), mmFromUm(width)];
  return (
    <svg
      role="img"
      aria-label={zonesWords(zones)}
      viewBox={`0 0 ${lengthMm} ${widthMm}`}
      preserveAspectRatio="none"
      className="pointer-events-none absolute inset-0 size-full"
    >
      <defs>
        <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="7" height="7" className="fill-crayon/25" />
          <path d="M0 0V7" className="stroke-crayon" strokeWidth="2.5" />
        </pattern>
      </defs>
      {zones.outline && (
        <path
          d={`M0,0H${lengthMm}V${widthMm}H0Z${ring(zones.outline)}`}
          fillRule="evenodd"
          className="fill-graphite/55 stroke-white"
          strokeWidth="1.5"
          vectorEffect="non-scaling-stroke"
        />
      )}
      {zones.glueLines.map(({ id, across }) => (
        <GlueLine key={id} y={mmFromUm(across)} length={lengthMm} />
      ))}
      {zones.keepClear.map((area) => (
        <Area key={area.id} area={area} fill={`url(#${hatch})`} />
      ))}
    </svg>
  );
}

/** Quiet: it says where the wood is joined, and asks for nothing. */
function GlueLine({ y, length }: { y: number; length: number }) {
  const line = { x1: 0, x2: length, y1: y, y2: y, vectorEffect: "non-scaling-stroke" } as const;
  return (
    <>
      <line {...line} className="stroke-graphite/50" strokeWidth="3" />
      <line {...line} stroke="#fff" strokeWidth="1.2" strokeDasharray="2 5" />
    </>
  );
}

function Area({ area: { area }, fill }: { area: KeepClearArea; fill: string }) {
  const look = { fill, className: "stroke-crayon", strokeWidth: 2, vectorEffect: "non-scaling-stroke" } as const;
  if (area.shape === "polygon") return <path d={ring(area.points)} {...look} />;
  const [x, y] = [mmFromUm(area.centre.x), mmFromUm(area.centre.y)];
  return (
    <ellipse
      cx={x}
      cy={y}
      rx={mmFromUm(area.radiusX)}
      ry={mmFromUm(area.radiusY)}
      transform={`rotate(${area.turnDeg} ${x} ${y})`}
      {...look}
    />
  );
}

/** "Usable outline drawn; keep clear: 2 knots, 1 check; 1 glue line". */
export function zonesWords({ outline, keepClear, glueLines }: Zones): string {
  const kinds = [...new Set(keepClear.map(({ kind }) => kind))].map((kind) => {
    const count = keepClear.filter((area) => area.kind === kind).length;
    return `${count} ${kind}${count > 1 && kind !== "other" && kind !== "sapwood" ? "s" : ""}`;
  });
  return [
    outline ? "Usable outline drawn" : "Whole rectangle usable",
    kinds.length > 0 ? `keep clear: ${kinds.join(", ")}` : "nothing to keep clear",
    ...(glueLines.length > 0 ? [glueLines.length === 1 ? "1 glue line" : `${glueLines.length} glue lines`] : []),
  ].join("; ");
}
