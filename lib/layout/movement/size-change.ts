/**
 * How much wood grows or shrinks across the grain between two moistures, as a share of its size at the first.
 *
 * Sources: Wood Handbook (FPL-GTR-190) ch. 13. Eq. 13-2, ΔD = D_I·C·(M_F − M_I), with C per percent of moisture, for 6 to 14 %.
 * Eq. 13-3, ΔD = D_I·(M_F − M_I)/(30·100/S − 30 + M_I), from total shrinkage S (green to ovendry, percent) with fibre saturation at
 * 30 %, where only shrinkage is known; neither moisture above 30 %. Along the grain wood is taken as still: normal wood shrinks 0.1 to 0.2 %
 * from green to ovendry.
 */

/** What is known of a species. Radial: from the pith outwards; tangential: along the growth rings. */
export type WoodMovement =
  /** Share of the size per percent of moisture. */
  | { readonly kind: "coefficients"; readonly radial: number; readonly tangential: number }
  /** Percent from green to ovendry. */
  | { readonly kind: "shrinkage"; readonly radial: number; readonly tangential: number };

/** Wood above this holds free water and does not move. */
export const FIBRE_SATURATION = 30;

/** The moistures between which Eq. 13-2 is said to hold, percent. */
export const COEFFICIENT_RANGE = { from: 6, to: 14 } as const;

/**
 * Change per percent of moisture for a size across the grain on the board's face, starting at `moisture`. `ringAngle`: between the growth
 * rings and the face, degrees; 0 flat sawn, 90 quarter sawn. Between the two C = C_T·cos²φ + C_R·sin²φ (common practice, no
 * source).
 */
export function coefficientAt(movement: WoodMovement, ringAngle: number, moisture: number): number {
  const sine = Math.sin((ringAngle * Math.PI) / 180);
  const radialShare = sine * sine;
  const [radial, tangential] =
    movement.kind === "coefficients"
      ? [movement.radial, movement.tangential]
      : [fromShrinkage(movement.radial, moisture), fromShrinkage(movement.tangential, moisture)];
  return tangential * (1 - radialShare) + radial * radialShare;
}

/** Eq. 13-3 per percent of moisture. From 10 % it gives most rows of the Handbook's table of coefficients to the last digit. */
export function fromShrinkage(shrinkage: number, moisture: number): number {
  return 1 / ((FIBRE_SATURATION * 100) / shrinkage - FIBRE_SATURATION + moisture);
}

/** Share of its size by which wood grows across the grain (negative: shrinks); null when a moisture is above fibre saturation. */
export function strainAcross(movement: WoodMovement, ringAngle: number, from: number, to: number): number | null {
  if (from > FIBRE_SATURATION || to > FIBRE_SATURATION) return null;
  return coefficientAt(movement, ringAngle, from) * (to - from);
}

/** Those of the moistures that the species' equation is not said to hold for. */
export function outsideRange(movement: WoodMovement, moistures: readonly number[]): number[] {
  const { from, to } = movement.kind === "coefficients" ? COEFFICIENT_RANGE : { from: 0, to: FIBRE_SATURATION };
  return moistures.filter((moisture) => moisture < from || moisture > to);
}

/** How a board was sawn, as its ring angle when nobody has measured it. Rift: common practice, no source. */
export const ringAngleOfCut = { flat: 0, rift: 45, quarter: 90 } as const;
