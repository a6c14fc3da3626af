/** What was drawn on the board's other side, turned over onto this one: only what is not here yet. Pure. */
import {
  carryGlueLines,
  carryOutline,
  type KeepClearShape,
  movedPolygon,
  otherSideFrom,
  type StockPoint,
  turnedOver,
  um,
} from "@/lib/layout";
import type { GlueLine, KeepClearArea, Zones } from "@/lib/schemas/zones";
import type { PictureSize, ZonesDoc } from "./zones-doc";

export interface FromOtherSide {
  /** With the ids of the other side: whoever takes them gives them new ones. */
  readonly areas: readonly KeepClearArea[];
  /** Of the other side's areas, how many would lie off this one. */
  readonly off: number;
  readonly outline: readonly StockPoint[] | null;
  readonly glueLines: readonly GlueLine[];
}

export function fromOtherSide(
  other: Pick<Zones, "outline" | "keepClear" | "glueLines">,
  doc: ZonesDoc,
  size: PictureSize,
): FromOtherSide {
  const { areas, off } = turnedOver(other.keepClear, size);
  const here = new Set(doc.keepClear.map(({ kind, area }) => shapeKey(kind, area)));
  const turned = other.outline && movedPolygon(otherSideFrom(size.width), other.outline);
  const lines = other.glueLines.map((line) => ({
    ...line,
    across: um(size.width - line.across),
    aboveBoardId: line.belowBoardId,
    belowBoardId: line.aboveBoardId,
  }));
  return {
    areas: areas.filter(({ kind, area }) => !here.has(shapeKey(kind, area))),
    off,
    outline: doc.outline === null ? carryOutline(turned, size).outline : null,
    glueLines: doc.glueLines.length === 0 ? carryGlueLines(lines, size.width) : [],
  };
}

/** The same area in the same words, wherever its corners begin to be counted. */
function shapeKey(kind: KeepClearArea["kind"], area: KeepClearShape): string {
  if (area.shape === "polygon")
    return `${kind} ${area.points
      .map(({ x, y }) => `${x} ${y}`)
      .sort()
      .join()}`;
  const { centre, radiusX, radiusY, turnDeg } = area;
  return `${kind} ${centre.x} ${centre.y} ${radiusX} ${radiusY} ${turnDeg}`;
}
