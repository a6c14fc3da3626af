/** A board's wood as its movement is worked out: what is written about the board, and what a maker chose for the face. */
import { matchSpecies, type SpeciesMatch } from "./match-species";
import type { BoardWood } from "./movement";
import { ringAngleOfCut } from "./size-change";
import type { Species } from "./species";

export interface BoardFacts {
  /** As it was written. */
  readonly species: string;
  readonly cut: keyof typeof ringAngleOfCut;
  /** The latest reading, percent. */
  readonly moisture: number | null;
}

export interface WoodChoice {
  /** The key of a species; null: the one that the board's own text names. */
  readonly species: string | null;
  /** Degrees; null: as the board was sawn. */
  readonly ringAngle: number | null;
}

export const noWoodChoice: WoodChoice = { species: null, ringAngle: null };

export interface WoodOfBoard {
  readonly wood: BoardWood;
  /** null: to be chosen among the match's candidates or all. */
  readonly species: Species | null;
  readonly match: SpeciesMatch;
}

/** A species that was chosen and has been removed since counts as not chosen. */
export function woodOfBoard(facts: BoardFacts, choice: WoodChoice, known: readonly Species[]): WoodOfBoard {
  const match = matchSpecies(facts.species, known);
  const chosen = choice.species === null ? undefined : known.find(({ key }) => key === choice.species);
  const species = chosen ?? (match.kind === "found" ? match.species : null);
  const ringAngle = choice.ringAngle ?? ringAngleOfCut[facts.cut];
  return { wood: { movement: species?.movement ?? null, ringAngle, moisture: facts.moisture }, species, match };
}
