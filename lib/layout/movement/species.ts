/** A species as the movement of its wood is known, and where that is known from. */
import type { WoodMovement } from "./size-change";

export interface SpeciesSource {
  /**
   * `published`: read in the source named. `secondary`: read in somebody's account of it. `shrinkage`: worked out from published
   * shrinkage. `common-practice`: no source. `shop`: entered by the shop.
   */
  readonly kind: "published" | "secondary" | "shrinkage" | "common-practice" | "shop";
  readonly text: string;
}

export interface Species {
  /** Stable: stored with a face. */
  readonly key: string;
  /** As a table lists it: "Walnut, black". */
  readonly name: string;
  readonly alsoCalled: readonly string[];
  readonly movement: WoodMovement;
  readonly source: SpeciesSource;
}
