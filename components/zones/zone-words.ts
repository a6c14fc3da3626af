/** Names of kinds and areas, and why a drawing cannot be saved, in words. */
import { type LengthStyle, printLength, type StockPoint, um } from "@/lib/layout";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { polygonFaultWords } from "@/lib/words/polygon-fault";
import type { EllipseHandle } from "./ellipse-edit";
import type { DocFault } from "./zones-doc";

export const kindNames: Readonly<Record<KeepClearArea["kind"], string>> = {
  knot: "Knot",
  check: "Check",
  sapwood: "Sapwood",
  stain: "Stain",
  other: "Other",
};

export const handleNames: Readonly<Record<EllipseHandle, string>> = {
  centre: "middle",
  along: "first radius",
  across: "second radius",
  turn: "turn",
};

export function faultWords(fault: DocFault, style: LengthStyle): string {
  if (fault.of === "outline") return polygonFaultWords("The outline", fault.fault, style);
  if (fault.of === "glue-line") {
    return `Glue line ${fault.index + 1} lies off the board. Move it between its edges or remove it.`;
  }
  const name = `Area ${fault.index + 1}`;
  if (fault.fault) return polygonFaultWords(name, fault.fault, style);
  return `${name} lies wholly off the board. Move it onto the wood or remove it.`;
}

export const placeWords = ({ x, y }: StockPoint, style: LengthStyle): string =>
  `${printLength(x, style)} along, ${printLength(y, style)} across`;

/** The middle of an area, where a maker looks for it with a tape. */
export function middleOf({ area }: KeepClearArea): StockPoint {
  if (area.shape === "ellipse") return area.centre;
  const xs = area.points.map(({ x }) => x);
  const ys = area.points.map(({ y }) => y);
  const half = (values: readonly number[]) => um(Math.round((Math.min(...values) + Math.max(...values)) / 2));
  return { x: half(xs), y: half(ys) };
}
