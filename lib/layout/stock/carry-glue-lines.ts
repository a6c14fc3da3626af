/** Glue lines taken over to another picture of the same board: what lies on the board stays at the same distance from its upper edge. */
import type { Um } from "../units/um";

export function carryGlueLines<Line extends { readonly across: Um }>(lines: readonly Line[], width: Um): Line[] {
  return lines.filter((line) => liesWithin(line, width));
}

/** A glue line has wood on both sides. */
export function liesWithin({ across }: { readonly across: Um }, width: Um): boolean {
  return across > 0 && across < width;
}
