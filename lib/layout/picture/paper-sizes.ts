/** Sheets whose true size is known, for lying on a board as the measure of the photograph. */
import { type Um, um } from "../units/um";

export interface PaperSize {
  readonly lengthUm: Um;
  readonly widthUm: Um;
}

export type PaperName = "a4" | "letter";

/** A4: 297 × 210 mm, ISO 216. Letter: 11 × 8½ in = 279.4 × 215.9 mm, ANSI/ASME Y14.1 size A. Length is the longer side. */
export const paperSizes: Readonly<Record<PaperName, PaperSize>> = {
  a4: { lengthUm: um(297_000), widthUm: um(210_000) },
  letter: { lengthUm: um(279_400), widthUm: um(215_900) },
};
