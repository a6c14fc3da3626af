/**
 * What a face is made of, by pattern. Plain immutable JSON with finished sizes as hung; the tag `pattern` says which rules
 * (`rules-of.ts`) turn it into pieces. Lengths in µm.
 */
import type { Edge } from "../program/program";
import type { Um } from "../units/um";

/** A length, in µm, for each edge of a piece. */
export type EdgeAmounts = Readonly<Record<Edge, Um>>;

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

/** A part of a row of a cut-out: wood that is glued back between the strips, or a front that hangs in an opening of this width. */
export interface CutOutPart {
  readonly kind: "fixed" | "front";
  readonly width: Um;
}

/** Parts in order along the grain; a row starts and ends with a fixed one. `height` is that of its openings, across the grain. */
export interface CutOutRow {
  readonly height: Um;
  readonly parts: readonly CutOutPart[];
}

/**
 * Fronts cut out of a solid rail or panel and set back into it. The board is ripped into strips that stay whole and the rows between
 * them; each row is crosscut into fixed parts and fronts; the fixed parts are moved together by what the saw took and glued back
 * between the strips. All sizes are finished sizes of the glued-up rail.
 *
 * Strips and rows follow each other across the grain, parts along it: with horizontal grain from top to bottom and from left to
 * right, with vertical grain from left to right and from top to bottom. Reading order: strip, the parts of a row, strip, …
 */
export interface CutOutFace {
  readonly pattern: "cutOut";
  readonly grain: Grain;
  /** Across the grain; one more than rows. */
  readonly strips: readonly Um[];
  readonly rows: readonly CutOutRow[];
  /** Round each front, between it and the edges of its opening. */
  readonly gap: EdgeAmounts;
  /** Taken off each end of a front when it is fitted, beyond the saw. */
  readonly fitting: Um;
  /** Whether the edges between strips and rows are jointed before gluing (`rip`'s clean-up), or glued as they come from the saw. */
  readonly rails: "jointed" | "fromSaw";
}

/**
 * A corner that a run goes round. `turnDeg`: by how much the run turns there, more than 0 and less than 180; a square corner turns
 * by 90. Butt: the side that `covers` runs on to the corner and hides the end of the other, so that its own end is seen. Mitre: both
 * ends are bevelled by half the turn; either a square cut parts the two sides and each is bevelled up to its arris, or one bevel
 * cut serves the first and the second is cut again from its arris.
 */
export type WrapCorner =
  | { readonly kind: "gap"; readonly turnDeg: number; readonly gap: Um }
  | { readonly kind: "butt"; readonly turnDeg: number; readonly covers: "before" | "after" }
  | { readonly kind: "mitre"; readonly turnDeg: number; readonly parting: "squareThenBevels" | "oneBevel" };

/**
 * A run that goes round corners: the sides and top of a case, an apron, a box. The face is the run unfolded, left to right as seen
 * from the side that shows, which is the outside of its corners. Reading order: along the run.
 */
export interface WrapFace {
  readonly pattern: "wrap";
  readonly grain: Grain;
  /** What is seen of each side along the run. */
  readonly sides: readonly Um[];
  /** Upright to the run. */
  readonly height: Um;
  /** Of the finished stock. */
  readonly thickness: Um;
  /** One fewer than sides; as many where the run is closed, the last between the last side and the first. */
  readonly corners: readonly WrapCorner[];
  readonly closed: boolean;
}

/**
 * Thick stock sawn through its thickness and opened like a book, so that the two sawn faces show as mirror images. Both leaves come
 * from one rectangle of the board: the first shows it as photographed and comes from behind, the second shows it mirrored and
 * comes from the leaf at the photographed face. Changing places opens the book at the other edge.
 */
export interface ResawnFace {
  readonly pattern: "resawn";
  readonly grain: Grain;
  /** Each leaf as finished. */
  readonly leaf: { readonly width: Um; readonly height: Um; readonly thickness: Um };
  /** The second leaf hangs beside the first, or below it. */
  readonly opens: "side" | "over";
  /** `planing`: taken off each face of each leaf. */
  readonly resaw: { readonly kerf: Um; readonly planing: Um };
  /**
   * By how much the surfaces of the figure lean from the face's normal across the grain, degrees: positive where they lie farther
   * from the top edge of the photograph the deeper they are. null while nobody knows.
   */
  readonly leanDeg: number | null;
}

export type Face = GridFace | CutOutFace | WrapFace | ResawnFace;
export type Pattern = Face["pattern"];
