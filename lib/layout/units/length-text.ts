/**
 * The characters of a written length: what people type, brought to one spelling before it is parsed, and the marks that are
 * printed. Knows nothing of values.
 */

/** U+2044: fonts build a true fraction around it and leave the whole number alone. */
export const FRACTION_SLASH = "\u2044";
/** U+2033, the inch mark. */
export const DOUBLE_PRIME = "\u2033";
/** U+2212, as wide as a plus sign. */
export const MINUS = "\u2212";

const vulgarFractions: Readonly<Record<string, string>> = {
  "½": "1/2",
  "¼": "1/4",
  "¾": "3/4",
  "⅛": "1/8",
  "⅜": "3/8",
  "⅝": "5/8",
  "⅞": "7/8",
};

/** One spelling: ASCII quotes, slash and minus, single ordinary spaces, lower case, ready-made fractions taken apart. */
export function plainLengthText(input: string): string {
  return input
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (sign) => ` ${vulgarFractions[sign] ?? sign}`)
    .replace(/[\u2044\u2215]/g, "/")
    .replace(/\u2033|\u201d|\u201c|''|\u2032\u2032/g, '"')
    .replace(/[\u2032\u2019\u2018]/g, "'")
    .replace(/[\u2212\u2013\u2011\u2010]/g, "-")
    .replace(/\s+/g, " ")
    .trim()
    .toLowerCase();
}
