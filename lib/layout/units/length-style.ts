/** How a shop writes its lengths. The choice is about paper and screens only; the core itself counts in micrometres. */

/** Finest fraction of an inch that is printed. Rules read to 1/32, machine settings to 1/64 (common practice, no source). */
export type InchDenominator = 32 | 64;

export type LengthStyle = { readonly unit: "mm" } | { readonly unit: "inch"; readonly denominator: InchDenominator };

/** The international inch is exactly 25.4 mm. */
export const UM_PER_INCH = 25_400;
export const INCHES_PER_FOOT = 12;
