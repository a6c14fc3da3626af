/** The colours and letters of the page, read from its own style sheet so that they are written down once. */

const colours = ["sheet", "graphite", "pencil", "line", "rule", "chalk", "crayon", "tape", "white"] as const;

export interface Palette extends Readonly<Record<(typeof colours)[number], string>> {
  /** Family of measures and labels. */
  readonly measure: string;
  /** What shows through the gaps of a face: the dark of a case. */
  readonly gap: string;
}

/** Throws when the style sheet lacks a colour. */
export function readPalette(): Palette {
  const style = getComputedStyle(document.documentElement);
  const token = (name: string) => {
    const value = style.getPropertyValue(name).trim();
    if (value === "") throw new Error(`the style sheet has no ${name}`);
    return value;
  };
  const of = (colour: (typeof colours)[number]) => token(`--color-${colour}`);
  return {
    sheet: of("sheet"),
    graphite: of("graphite"),
    pencil: of("pencil"),
    line: of("line"),
    rule: of("rule"),
    chalk: of("chalk"),
    crayon: of("crayon"),
    tape: of("tape"),
    white: of("white"),
    measure: token("--font-measure"),
    gap: "#14181a",
  };
}
