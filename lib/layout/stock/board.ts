/** A board face as the core sees it: its rectangle, what of it is usable, and what must be kept clear. */
import type { StockPoint } from "../frame/point";
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
}
