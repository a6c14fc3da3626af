/** Tags on boards: "B-041" for number 41. */

/** At least three digits, so that tags of a small shop line up. */
export function printTag(tagNumber: number): string {
  return `B-${String(tagNumber).padStart(3, "0")}`;
}

/** The number of a tag as people type it: "B-041", "b41", "41"; null for anything else. */
export function readTag(text: string): number | null {
  const digits = /^(?:b-?\s*)?(\d{1,9})$/i.exec(text.trim())?.[1];
  return digits === undefined ? null : Number(digits);
}
