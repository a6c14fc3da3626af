"use client";
/** Handles of what is selected: corners and the places for new ones, or the radii and the turn of an ellipse. */
import { Plus } from "lucide-react";
import { printLength, type StockPoint, um } from "@/lib/layout";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { Handle, type MovePhase } from "../picture/handle";
import { type Place, toScreen, type View } from "../picture/view";
import { useUnits } from "../shell/units";
import { type Ellipse, type EllipseHandle, ellipseHandles, handlePlace, moveEllipseHandle } from "./ellipse-edit";
import { HandleLook } from "./handle-look";
import { insertCorner, middleOfEdge, moveCorner, removeCorner, snapped } from "./polygon-edit";
import { selectedPolygon } from "./selected-polygon";
import type { ZonesState } from "./use-zones";
import { handleNames, kindNames, placeWords } from "./zone-words";
import { withArea, withGlueLine, withoutGlueLine, type ZonesDoc } from "./zones-doc";

/** Snaps from this near, CSS px. */
const SNAP_PX = 8;
/** Handles of an ellipse stand off its rim by this, CSS px: half of what a fingertip covers, and more than the 24 px that targets need. */
const CLEAR_PX = 30;
/** Movement by an arrow key with Alt, mm. */
const FINE_STEP_MM = 0.1;
/** Closer corners have no room for a new one between them, CSS px. */
const ROOM_FOR_NEW_PX = 70;

interface Props {
  zones: ZonesState;
  /** CSS pixels per mm. */
  view: View;
}

export function ZoneHandles({ zones, view }: Props) {
  if (zones.tool !== "select") return null;
  const polygon = selectedPolygon(zones);
  // Only the outline must stay on the board; a knot may hang over its edge.
  if (polygon) return <Corners {...polygon} bound={zones.selection?.what === "outline"} zones={zones} view={view} />;
  const { selectedArea, selection } = zones;
  if (selection?.what === "glue-line") return <GlueLineHandle id={selection.id} zones={zones} view={view} />;
  return selectedArea && <EllipseHandles area={selectedArea} zones={zones} view={view} />;
}

/** Shows while it moves, makes the change when it rests. */
function settle(zones: ZonesState, next: ZonesDoc, phase: MovePhase, key: string): void {
  if (phase === "dropped") zones.preview(null);
  else if (phase === "moving") zones.preview(next);
  else zones.change(next, phase === "key" ? key : undefined);
}

const toMm = ({ x, y }: StockPoint): Place => ({ x: x / 1000, y: y / 1000 });
const toUm = ({ x, y }: Place): Place => ({ x: x * 1000, y: y * 1000 });

/** In the middle of the line's length; only across does it move. */
function GlueLineHandle({ id, zones, view }: Props & { id: string }) {
  const { style } = useUnits();
  const { doc, size } = zones;
  const index = doc.glueLines.findIndex((line) => line.id === id);
  const line = doc.glueLines[index];
  if (!line) return null;
  return (
    <Handle
      name={`Glue line ${index + 1}`}
      position={`${printLength(line.across, style)} from the upper edge`}
      at={{ x: size.length / 2000, y: line.across / 1000 }}
      view={view}
      fineStep={FINE_STEP_MM}
      selected
      onSelect={() => undefined}
      onMove={({ y }, phase) => {
        const across = um(Math.round(Math.min(Math.max(y * 1000, 1), size.width - 1)));
        settle(zones, withGlueLine(zones.doc, { ...line, across }), phase, `${id} across`);
      }}
      onRemove={() => {
        zones.change(withoutGlueLine(zones.doc, id));
        zones.select(null);
      }}
    >
      <HandleLook shape="middle" selected />
    </Handle>
  );
}

interface CornersProps extends Props {
  name: string;
  points: readonly StockPoint[];
  /** Corners must stay on the board. */
  bound: boolean;
  docWith: (points: readonly StockPoint[]) => ZonesDoc;
}

function Corners({ name, points, zones, view, bound, docWith }: CornersProps) {
  const { style } = useUnits();
  const corners = points.map((at, index) => ({ at, index, key: `corner-${index}` }));
  return (
    <>
      {corners.map(({ index, key }) => (
        <NewCorner
          key={`new-${key}`}
          name={`${name}: new corner after ${index + 1}`}
          points={points}
          edge={index}
          view={view}
          onPress={() => zones.change(docWith(insertCorner(points, index)))}
        />
      ))}
      {corners.map(({ at, index, key }) => (
        <Handle
          key={key}
          name={`${name}, corner ${index + 1}`}
          position={placeWords(at, style)}
          at={toMm(at)}
          view={view}
          fineStep={FINE_STEP_MM}
          selected={zones.corner === index}
          onSelect={() => zones.selectCorner(index)}
          onMove={(to, phase) => {
            // A key goes exactly as far as it says; a hand is helped to the edge.
            const reach = phase === "key" ? 0 : (SNAP_PX / view.scale) * 1000;
            settle(
              zones,
              docWith(moveCorner(points, index, snapped(toUm(to), zones.size, reach, bound))),
              phase,
              `${name} ${key}`,
            );
          }}
          onRemove={() => {
            zones.change(docWith(removeCorner(points, index)));
            zones.selectCorner(null);
          }}
        >
          <HandleLook shape="corner" selected={zones.corner === index} />
        </Handle>
      ))}
    </>
  );
}

interface NewCornerProps {
  name: string;
  points: readonly StockPoint[];
  edge: number;
  view: View;
  onPress: () => void;
}

function NewCorner({ name, points, edge, view, onPress }: NewCornerProps) {
  const [from, to, at] = [points[edge], points[(edge + 1) % points.length], middleOfEdge(points, edge)];
  if (!from || !to || !at || (Math.hypot(to.x - from.x, to.y - from.y) / 1000) * view.scale < ROOM_FOR_NEW_PX) return null;
  const { x, y } = toScreen(view, toMm(at));
  return (
    <button
      type="button"
      aria-label={name}
      className="pointer-events-auto absolute top-0 left-0 grid size-8 place-items-center rounded-full"
      style={{ transform: `translate(${x - 16}px, ${y - 16}px)` }}
      onClick={onPress}
    >
      <span className="grid size-5 place-items-center rounded-full border border-chalk bg-sheet text-chalk">
        <Plus className="size-3.5" aria-hidden="true" />
      </span>
    </button>
  );
}

function EllipseHandles({ area, zones, view }: Props & { area: KeepClearArea }) {
  const { style } = useUnits();
  if (area.area.shape !== "ellipse") return null;
  const ellipse = area.area;
  const clear = (CLEAR_PX / view.scale) * 1000;
  const handles = ellipseHandles.map((handle) => {
    const at = handlePlace(ellipse, handle, clear);
    return (
      <Handle
        key={handle}
        name={`${kindNames[area.kind]}, ${handleNames[handle]}`}
        position={handle === "turn" ? `${ellipse.turnDeg}°` : placeWords(at, style)}
        at={toMm(at)}
        view={view}
        fineStep={FINE_STEP_MM}
        selected={false}
        onSelect={() => undefined}
        onMove={(to, phase) => {
          const moved = moveEllipseHandle(ellipse, handle, toUm(to), clear);
          settle(zones, withArea(zones.doc, { ...area, area: moved }), phase, `${area.id} ${handle}`);
        }}
        onRemove={handle === "centre" ? zones.removeSelected : undefined}
      >
        <HandleLook shape={handle === "turn" ? "turn" : handle === "centre" ? "middle" : "corner"} />
      </Handle>
    );
  });
  return (
    <>
      <Stems ellipse={ellipse} view={view} clear={clear} />
      {handles}
    </>
  );
}

/** From the middle to the handles, so that it is seen what they belong to. */
function Stems({ ellipse, view, clear }: { ellipse: Ellipse; view: View; clear: number }) {
  const place = (handle: EllipseHandle) => {
    const { x, y } = toScreen(view, toMm(handlePlace(ellipse, handle, clear)));
    return `${x} ${y}`;
  };
  const d = `M${place("turn")}L${place("along")}M${place("centre")}L${place("across")}`;
  return (
    <svg className="absolute inset-0 size-full" aria-hidden="true">
      <path d={d} stroke="#fff" strokeWidth="3.5" />
      <path d={d} className="stroke-chalk" strokeWidth="1.5" />
    </svg>
  );
}
