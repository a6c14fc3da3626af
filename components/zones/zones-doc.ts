/** Outline and keep-clear areas while they are edited, and what makes them unfit to save. Pure; the server judges by the same core functions. */
import { liesOnBoard, outsideFault, type PolygonFault, polygonFault, type StockPoint, type Um } from "@/lib/layout";
import type { KeepClearArea, Zones } from "@/lib/schemas/zones";

export interface ZonesDoc {
  /** null: the whole rectangle is usable. */
  readonly outline: readonly StockPoint[] | null;
  readonly keepClear: readonly KeepClearArea[];
}

export interface PictureSize {
  readonly length: Um;
  readonly width: Um;
}

export const docOf = ({ outline, keepClear }: Zones): ZonesDoc => ({ outline, keepClear });

export type DocFault =
  | { readonly of: "outline"; readonly fault: PolygonFault }
  | { readonly of: "area"; readonly index: number; readonly fault: PolygonFault }
  | { readonly of: "area"; readonly index: number; readonly fault: null };

/** The first reason why this cannot be saved; `fault` null: the area lies wholly off the board. */
export function docFault({ outline, keepClear }: ZonesDoc, size: PictureSize): DocFault | null {
  const onOutline = outline && (polygonFault(outline) ?? outsideFault(outline, size));
  if (onOutline) return { of: "outline", fault: onOutline };
  for (const [index, { area }] of keepClear.entries()) {
    const fault = area.shape === "polygon" ? polygonFault(area.points) : null;
    if (fault) return { of: "area", index, fault };
    if (!liesOnBoard(area, size)) return { of: "area", index, fault: null };
  }
  return null;
}

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
