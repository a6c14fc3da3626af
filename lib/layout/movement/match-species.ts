/** Finds the species that a board's free text names. The order of words, capitals and punctuation do not count. */
import type { Species } from "./species";

export type SpeciesMatch =
  | { readonly kind: "found"; readonly species: Species }
  /** Nothing has just that name: those that may be meant, in the order of the table; empty when there are none. */
  | { readonly kind: "choose"; readonly candidates: readonly Species[] };

/** `species`: where two have one name the first counts, so put the shop's own before the table's. */
export function matchSpecies(text: string, species: readonly Species[]): SpeciesMatch {
  const wanted = wordsOf(text);
  if (wanted.length === 0) return { kind: "choose", candidates: [] };
  const names = species.map((one) => ({ one, names: [one.name, ...one.alsoCalled].map(wordsOf) }));
  const found = names.find((row) => row.names.some((words) => words.join(" ") === wanted.join(" ")));
  if (found) return { kind: "found", species: found.one };
  const meant = names.filter((row) => row.names.some((words) => wanted.every((word) => words.includes(word))));
  return { kind: "choose", candidates: meant.map(({ one }) => one) };
}

/** The words of a name in the order of the alphabet: "Walnut, black" and "black walnut" are one. */
function wordsOf(text: string): string[] {
  return text
    .toLowerCase()
    .normalize("NFD")
    .replace(/\p{M}/gu, "")
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== "")
    .sort();
}
