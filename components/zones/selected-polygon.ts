/** Outline and polygons have corners alike: the one that is selected, and the document with other corners for it. Pure. */
import type { StockPoint } from "@/lib/layout";
import type { ZonesState } from "./use-zones";
import { kindNames } from "./zone-words";
import { withArea, type ZonesDoc } from "./zones-doc";

interface SelectedPolygon {
  readonly name: string;
  readonly points: readonly StockPoint[];
  readonly docWith: (points: readonly StockPoint[]) => ZonesDoc;
}

/** The outline or polygon whose corners are to be moved; null when neither is selected. */
export function selectedPolygon({
  doc,
  selection,
  selectedArea,
}: Pick<ZonesState, "doc" | "selection" | "selectedArea">): SelectedPolygon | null {
  if (selection?.what === "outline" && doc.outline) {
    return { name: "Outline", points: doc.outline, docWith: (outline) => ({ ...doc, outline }) };
  }
  if (selectedArea?.area.shape !== "polygon") return null;
  return {
    name: kindNames[selectedArea.kind],
    points: selectedArea.area.points,
    docWith: (points) => withArea(doc, { ...selectedArea, area: { shape: "polygon", points: [...points] } }),
  };
}
