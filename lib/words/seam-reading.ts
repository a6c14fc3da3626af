/** Puts into words what photographs say about a seam. */
import type { CannotTell } from "@/lib/layout";

export const cannotTellWords: Readonly<Record<CannotTell, string>> = {
  notLaid: "One of the two does not lie on wood yet.",
  noPicture: "One of the two boards has no straightened picture.",
  outsidePicture: "Too little of this seam lies on both pictures.",
  tooShort: "The seam is too short to compare: it takes 40 mm.",
  grainAlongSeam:
    "The grain runs along this seam. A gap is most of a growth ring there, so likeness says nothing: go by jump and tone.",
  noGrain: "One side shows no one direction of grain: a knot, a burr, or hardly any figure.",
  noLikeness: "Nowhere within 8 mm are the two sides more alike than two strange boards may be.",
  beyondReach: "They are most alike at 8 mm, where the search ends: the true step may be larger.",
  twoAnswers: "Two steps fit about equally well, as evenly spaced lines do.",
};

/** What every figure of the seam list means. */
export const seamFigures = [
  { name: "Gap", means: "As the face will hang." },
  {
    name: "Along, across",
    means: "The jump: wood that is missing at the seam, along and across the grain. Worked out from the cuts.",
  },
  {
    name: "Step",
    means:
      "How far grain lines miss each other along the seam. Measured on the photographs, or “cannot tell” where they do not say.",
  },
  { name: "Match", means: "How alike the two edges look as they will hang: 100 is the same line for line, 0 no likeness." },
  { name: "Tone", means: "How far apart the two sides are in colour (CIEDE2000): 1 can just be told side by side, 5 is plain." },
] as const;

/** Common practice, no source: what people make of a colour difference when the two lie side by side. */
export function toneWords(tone: number): string {
  if (tone < 1) return "not to be told apart";
  if (tone < 2.5) return "told apart by a close look";
  if (tone < 5) return "seen side by side";
  return "plainly different";
}

/** As a whole number of hundredths; a likeness below nothing is none. */
export function matchFigure(match: number): string {
  return String(Math.max(0, Math.round(match * 100)));
}
