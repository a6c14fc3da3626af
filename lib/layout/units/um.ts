/**
 * The one unit of length: integer micrometres. Nothing in the core holds a length in any other unit;
 * printing and parsing live in `parse-length.ts` and `print-length.ts`.
 */

declare const umBrand: unique symbol;

/** A length or coordinate in whole micrometres. */
export type Um = number & { readonly [umBrand]: "um" };

/** Micrometres from a number that is already a whole count of them; throws on anything else. */
export function um(value: number): Um {
  if (!Number.isSafeInteger(value)) throw new RangeError(`not a whole number of micrometres: ${value}`);
  return (value === 0 ? 0 : value) as Um;
}

/** Micrometres from millimetres, rounded to the nearest whole micrometre. */
export function umFromMm(mm: number): Um {
  return um(Math.round(mm * 1000));
}

/** Millimetres from micrometres, for arithmetic on pictures and for display only. */
export function mmFromUm(value: Um): number {
  return value / 1000;
}
