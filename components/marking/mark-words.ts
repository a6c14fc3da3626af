/** Names of marks, and what is still to be done, in words. The ends and edges are those of the straightened picture, its grain from left to right. */
import type { BoardEdge, LengthStyle, LensOutcome, PhotoPoint } from "@/lib/layout";
import { printLength, umFromMm } from "@/lib/layout";
import type { Missing } from "./marking-of";
import type { MarkId } from "./marks";

export const cornerNames = [
  "Left end, upper edge",
  "Right end, upper edge",
  "Right end, lower edge",
  "Left end, lower edge",
] as const;
export const edgeNames: Readonly<Record<BoardEdge, string>> = {
  top: "upper edge",
  right: "right end",
  bottom: "lower edge",
  left: "left end",
};

export function markName({ of, index }: MarkId): string {
  if (of === "board") return `Board, corner ${index + 1}: ${cornerNames[index]?.toLowerCase()}`;
  if (of === "sheet") return `Sheet, corner ${index + 1}`;
  if (of === "extra") return `Further point ${index + 1}`;
  if (of === "edge") return `Edge point ${index + 1}`;
  return index === 0 ? "Distance, from" : "Distance, to";
}

export const positionWords = (p: PhotoPoint): string => `${p.x.toFixed(1)} px from the left, ${p.y.toFixed(1)} px from the top`;

export function missingWords(missing: Missing): string {
  switch (missing.what) {
    case "board-size":
      return "Enter the true length and width of the board.";
    case "sheet-size":
      return "Enter the true length and width of the sheet.";
    case "sheet-corners":
      return `Put the corners of the sheet in their place: ${missing.count} of 4 to go.`;
    case "board-corners":
      return `Put the corners of the board in their place: ${missing.count} of 4 to go.`;
  }
}

/** Whether the points along the edges took out the lens' bending. */
export function lensWords(lens: LensOutcome, style: LengthStyle): string {
  const print = (mm: number) => (Number.isFinite(mm) ? printFine(mm, style) : "far");
  switch (lens.kind) {
    case "not-asked":
      return "No points along the edges yet.";
    case "too-few":
      return `${lens.points} of at least ${lens.needed} points. Add more to tell the lens' bending from a shaky hand.`;
    case "implausible":
      return `The points lie ${print(lens.beforeMm)} off a straight line, more than a lens bends. The edge is not straight, or the points are not on it: nothing was taken out.`;
    case "no-help":
      return `The points lie within ${print(lens.beforeMm)} of straight as they are: there is no bending worth taking out.`;
    case "taken-out":
      return `Bending taken out. The points lay ${print(lens.beforeMm)} off straight before, ${print(lens.afterMm)} after.`;
  }
}

/** Residuals are finer than a length on a drawing: hundredths of a millimetre, or the shop's fraction when it works in inches. */
export function printFine(mm: number, style: LengthStyle): string {
  if (style.unit === "mm") return `${mm.toFixed(2)} mm`;
  return Math.abs(mm) < 25.4 / style.denominator / 2 ? `${(mm / 25.4).toFixed(3)}″` : printLength(umFromMm(mm), style);
}
