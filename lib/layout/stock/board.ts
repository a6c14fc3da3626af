/** A board face as the core sees it: its rectangle, what of it is usable, and what must be kept clear. */
import type { StockPoint, StockRect } from "../frame/point";
import type { StockId } from "../piece";
import type { Um } from "../units/um";

export type KeepClearKind = "knot" | "check" | "sapwood" | "stain" | "other";

/** An area no show piece may touch. */
export type KeepClearShape =
  | {
      readonly shape: "ellipse";
      readonly centre: StockPoint;
      readonly radiusX: Um;
      readonly radiusY: Um;
      readonly turnDeg: number;
    }
  | { readonly shape: "polygon"; readonly points: readonly StockPoint[] };

export interface KeepClear {
  readonly id: string;
  readonly kind: KeepClearKind;
  readonly area: KeepClearShape;
}

/** Wood of a board that something else is to be cut from. */
export interface SpokenFor {
  readonly id: string;
  /** As it must leave the saw: finished size and clean-up. */
  readonly rect: StockRect;
  /** What its own cuts take around it. */
  readonly kerfs: { readonly along: Um; readonly across: Um };
}

export interface BoardFace {
  readonly id: StockId;
  /** Along the grain: x from 0 to length. */
  readonly length: Um;
  /** Across the grain: y from 0 to width. */
  readonly width: Um;
  readonly thickness: Um;
  /** Usable outline, a simple polygon inside the rectangle; null when the whole rectangle is usable. */
  readonly outline: readonly StockPoint[] | null;
  readonly keepClear: readonly KeepClear[];
  readonly spokenFor: readonly SpokenFor[];
  /** Where boards are glued edge to edge: distances across the grain from y = 0, rising. Empty for a board in one piece. */
  readonly glueLines: readonly Um[];
}
