/** What a face's movement is worked out from, and what comes of it. */
import type { FaceLayout } from "../pattern/face-layout";
import type { PieceId, StockId } from "../piece";
import type { Um } from "../units/um";
import type { YearlyMoisture } from "./climate";
import type { FaceGap } from "./face-gaps";
import type { WoodMovement } from "./size-change";
import type { Surround } from "./surround";

/** What is known of the wood of one board. Moisture in percent of dry weight. A board's reading may be any; the year's and the surround's are at most
 * fibre saturation. */
export interface BoardWood {
  /** null: no species is chosen. */
  readonly movement: WoodMovement | null;
  /** Between the growth rings and the board's face, degrees; 0 flat sawn, 90 quarter sawn. */
  readonly ringAngle: number;
  /** As read today; null: not read. */
  readonly moisture: number | null;
}

export interface MovementRequest {
  readonly layout: FaceLayout;
  readonly woods: ReadonlyMap<StockId, BoardWood>;
  readonly surround: Surround;
  /** The gap round the fronts; null: there is none, or it does not matter. */
  readonly around: Um | null;
  readonly year: YearlyMoisture;
  /** No gap of the year is to be narrower. */
  readonly leastGap: Um;
  /** Board and surround may differ in moisture by as much as this, percent. */
  readonly moistureLimit: number;
}

export type Season = "driest" | "dampest";

export interface GapFigures {
  readonly driest: Um;
  readonly dampest: Um;
  /** Cut today, it is at least the shop's least gap at both; never below nothing. */
  readonly toCut: Um;
}

export interface GapThroughYear extends FaceGap {
  /** How much of the line across the gap runs across the first front's grain: 1 across, 0 along it. */
  readonly across: number;
  /** null: something is not known, see the warnings. */
  readonly figures: GapFigures | null;
}

export type MovementWarning =
  | { readonly kind: "not-on-wood"; readonly pieces: readonly PieceId[] }
  | { readonly kind: "no-species" | "no-reading"; readonly stockId: StockId }
  /** Above fibre saturation: it has all of its shrinking before it. */
  | { readonly kind: "too-damp"; readonly stockId: StockId; readonly moisture: number }
  /** The equation is not said to hold for these moistures. */
  | { readonly kind: "range-left"; readonly stockId: StockId; readonly moistures: readonly number[] }
  /** Drier or damper than the place will ever make it. */
  | { readonly kind: "outside-place"; readonly stockId: StockId; readonly moisture: number }
  | {
      readonly kind: "surround-differs";
      readonly stockId: StockId;
      readonly moisture: number;
      readonly surround: number;
    }
  /** `closes`: comes to nothing. `too-narrow`: to less than the shop's least gap. The gaps in their order, `least` of them all. */
  | {
      readonly kind: "closes" | "too-narrow";
      readonly season: Season;
      readonly gaps: readonly GapThroughYear[];
      readonly least: Um;
    };

export interface FaceMovement {
  readonly gaps: readonly GapThroughYear[];
  readonly warnings: readonly MovementWarning[];
}
