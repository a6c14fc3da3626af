/** Letters for new strips and numbers for new offcuts that nothing of the revision bears, so that no two parts are ever called alike. */
import { stripLabel } from "../program/name-parts";
import type { Part } from "../program/program";

export interface FreeLabels {
  readonly strip: () => string;
  readonly offcut: () => string;
}

export function freeLabels(parts: readonly Part[]): FreeLabels {
  const taken = new Set(parts.map(({ label }) => label));
  const next = (labelAt: (index: number) => string) => {
    let index = 0;
    return () => {
      while (taken.has(labelAt(index))) index += 1;
      const label = labelAt(index);
      taken.add(label);
      return label;
    };
  };
  return { strip: next(stripLabel), offcut: next((index) => `C${index + 1}`) };
}
