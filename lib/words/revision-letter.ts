/** How revisions of a cut order are called. */

/** No I and no O, which are read as figures. */
const letters = "ABCDEFGHJKLMNPQRSTUVWXYZ";

/** A for 1, B for 2, … Z for 24, AA for 25. Throws on anything that is no revision. */
export function revisionLetter(revision: number): string {
  if (!Number.isSafeInteger(revision) || revision < 1) throw new RangeError(`not a revision: ${revision}`);
  const index = revision - 1;
  const last = letters.charAt(index % letters.length);
  return index < letters.length ? last : revisionLetter(Math.floor(index / letters.length)) + last;
}
