/** What stands round the fronts and sets the size of their opening. */
import { type Um, um } from "../units/um";

export type Surround =
  /**
   * Solid wood like the fronts'. `with`: its grain runs like theirs, as in a rail they are cut from. `across`: a panel whose grain
   * crosses theirs. `lengthwise`: a case or frame whose parts run along each side of the opening, so that their length sets it,
   * and length stays. `moisture`: its own reading, percent; null where it is as the fronts' board.
   */
  | { readonly kind: "sameWood"; readonly grain: "with" | "across" | "lengthwise"; readonly moisture: number | null }
  /** Plywood or MDF: taken as still, see `sheetAtMost`. */
  | { readonly kind: "sheet" }
  /** Nothing; the places where the fronts are held stay where they are. */
  | { readonly kind: "none" };

/** The share of the wood's movement across the grain that the surround makes along a line; `across` is that of the fronts' own. */
export function surroundShare(surround: Surround, across: number): number {
  if (surround.kind !== "sameWood" || surround.grain === "lengthwise") return 0;
  return surround.grain === "with" ? across : 1 - across;
}

/**
 * MDF may grow by as much as 0.33 % from 50 to 90 % relative humidity. Source: ANSI A208.2 as given in an industry buyers' guide; the
 * span of humidity from a 2015 study of the test. Plywood grows less (common practice, no source).
 */
const SHEET_AT_MOST = 0.0033;

/** By how much a gap in plywood or MDF may differ from what is worked out with a still sheet, over this much of it. */
export function sheetAtMost(length: Um): Um {
  return um(Math.ceil(length * SHEET_AT_MOST));
}
