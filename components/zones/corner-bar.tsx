"use client";
import { useUnits } from "../shell/units";
import { Button } from "../ui/button";
import { FEWEST_CORNERS, removeCorner } from "./polygon-edit";
import { selectedPolygon } from "./selected-polygon";
import type { ZonesState } from "./use-zones";
import { placeWords } from "./zone-words";

/** The corner last taken hold of: where it is, and the way to take it out without a keyboard. */
export function CornerBar({ zones }: { zones: ZonesState }) {
  const { style } = useUnits();
  const { corner } = zones;
  const shape = selectedPolygon(zones);
  const at = corner === null ? undefined : shape?.points[corner];
  if (corner === null || !shape || !at) return null;
  return (
    <div className="flex flex-wrap items-center justify-between gap-2">
      <p aria-live="polite">
        {shape.name}, corner {corner + 1}: <span className="measure">{placeWords(at, style)}</span>
      </p>
      <Button
        size="small"
        kind="danger"
        disabled={shape.points.length <= FEWEST_CORNERS}
        onClick={() => {
          zones.change(shape.docWith(removeCorner(shape.points, corner)));
          zones.selectCorner(null);
        }}
      >
        Remove corner
      </Button>
    </div>
  );
}
