/**
 * What a face is made of, by pattern. Plain immutable JSON with finished sizes as hung; the tag `pattern` says which rules
 * (`rules-of.ts`) turn it into pieces. Lengths in µm.
 */
import type { Um } from "../units/um";

/** How the grain runs on the face. Horizontal: columns are parted by crosscuts and rows by rips; vertical: the other way. */
export type Grain = "horizontal" | "vertical";

/**
 * Fronts in rows and columns; a row of fronts has one row, a stack one column. `columnGaps.length === columns.length − 1`, likewise
 * rows. Reading order, left to right and then down, numbers the pieces.
 */
export interface GridFace {
  readonly pattern: "grid";
  readonly columns: readonly Um[];
  readonly rows: readonly Um[];
  readonly columnGaps: readonly Um[];
  readonly rowGaps: readonly Um[];
  readonly grain: Grain;
}

export type Face = GridFace;
export type Pattern = Face["pattern"];
