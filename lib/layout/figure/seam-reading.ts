/** What a photograph says about a seam. */
import type { PieceId } from "../piece";
import type { Um } from "../units/um";

/** sRGB, 0…255 each, not rounded: the mean in linear light. */
export type MeanColour = readonly [number, number, number];

/**
 * Why no step is claimed.
 * - `notLaid`: one of the two pieces does not lie on wood.
 * - `noPicture`: one of the boards has no straightened picture.
 * - `outsidePicture`: too little of the seam lies on both pictures.
 * - `tooShort`: the seam itself is too short to compare.
 * - `grainAlongSeam`: the grain runs along the seam on one side or both; a gap is most of a growth ring there, and likeness says nothing.
 * - `noGrain`: one side shows no one direction of grain: a knot, a burr, or next to no figure.
 * - `noLikeness`: nowhere within reach are the two sides more alike than two edges of strangers may be.
 * - `beyondReach`: they are most alike at the very end of the reach, so the best step may lie beyond it.
 * - `twoAnswers`: two steps fit about equally well, as with even rings.
 */
export type CannotTell =
  | "notLaid"
  | "noPicture"
  | "outsidePicture"
  | "tooShort"
  | "grainAlongSeam"
  | "noGrain"
  | "noLikeness"
  | "beyondReach"
  | "twoAnswers";

export type SeamFigure =
  | {
      readonly kind: "read";
      /** Positive when B's figure sits further along the seam's from→to direction than A's. µm, to a fraction of a pixel. */
      readonly step: Um;
      /** How alike the two sides are as they hang, −1…1: the correlation of their figure where the step is nil. */
      readonly match: number;
      /** The same once B is moved back by the step. */
      readonly peak: number;
    }
  | { readonly kind: "cannotTell"; readonly why: CannotTell };

export interface SeamReading {
  readonly a: PieceId;
  readonly b: PieceId;
  /** Of the wood beside the seam; null where it lies on no picture. */
  readonly meanA: MeanColour | null;
  readonly meanB: MeanColour | null;
  readonly figure: SeamFigure;
}
