/** Outline, keep-clear areas and glue lines while they are edited, and what makes them unfit to save. Pure; the server judges by the same core functions. */
import { liesOnBoard, liesWithin, outsideFault, type PolygonFault, polygonFault, type StockPoint, type Um } from "@/lib/layout";
import type { GlueLine, KeepClearArea, Zones } from "@/lib/schemas/zones";

export interface ZonesDoc {
  /** null: the whole rectangle is usable. */
  readonly outline: readonly StockPoint[] | null;
  readonly keepClear: readonly KeepClearArea[];
  readonly glueLines: readonly GlueLine[];
}

export interface PictureSize {
  readonly length: Um;
  readonly width: Um;
}

export const docOf = ({ outline, keepClear, glueLines }: Zones): ZonesDoc => ({ outline, keepClear, glueLines });

export type DocFault =
  | { readonly of: "outline"; readonly fault: PolygonFault }
  | { readonly of: "area"; readonly index: number; readonly fault: PolygonFault }
  | { readonly of: "area"; readonly index: number; readonly fault: null }
  | { readonly of: "glue-line"; readonly index: number; readonly fault: null };

/** The first reason why this cannot be saved; `fault` null: the area, or the line, lies wholly off the board. */
export function docFault({ outline, keepClear, glueLines }: ZonesDoc, size: PictureSize): DocFault | null {
  const onOutline = outline && (polygonFault(outline) ?? outsideFault(outline, size));
  if (onOutline) return { of: "outline", fault: onOutline };
  for (const [index, { area }] of keepClear.entries()) {
    const fault = area.shape === "polygon" ? polygonFault(area.points) : null;
    if (fault) return { of: "area", index, fault };
    if (!liesOnBoard(area, size)) return { of: "area", index, fault: null };
  }
  const off = glueLines.findIndex((line) => !liesWithin(line, size.width));
  return off < 0 ? null : { of: "glue-line", index: off, fault: null };
}

/** From the upper edge down, as they are counted. */
export const withGlueLine = (doc: ZonesDoc, line: GlueLine): ZonesDoc => ({
  ...doc,
  glueLines: [...doc.glueLines.filter(({ id }) => id !== line.id), line].sort(
    (a, b) => a.across - b.across || (a.id < b.id ? -1 : 1),
  ),
});

export const withoutGlueLine = (doc: ZonesDoc, id: string): ZonesDoc => ({
  ...doc,
  glueLines: doc.glueLines.filter((line) => line.id !== id),
});

export const withArea = (doc: ZonesDoc, area: KeepClearArea): ZonesDoc => ({
  ...doc,
  keepClear: doc.keepClear.some(({ id }) => id === area.id)
    ? doc.keepClear.map((known) => (known.id === area.id ? area : known))
    : [...doc.keepClear, area],
});

export const withoutArea = (doc: ZonesDoc, id: string): ZonesDoc => ({
  ...doc,
  keepClear: doc.keepClear.filter((area) => area.id !== id),
});
