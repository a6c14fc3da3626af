/**
 * The saws of a shop as a cut program chooses among them: what each takes from the wood, and what it may take in hand. The saws that the
 * layout was made for are the preferred ones; another makes a cut that the preferred one cannot make safely or at all.
 */
import { type Um, um } from "../units/um";

export type MachineKind = "table" | "track" | "band" | "hand";

/** What the machine may take. They are the shop's own words about its saw; the machine's manual comes first. */
export interface MachineLimits {
  readonly rips: boolean;
  readonly crosscuts: boolean;
  /** Widest part between fence and blade at a rip, µm; null: as wide as it comes. */
  readonly widestRip: Um | null;
  /** Longest crosscut: the widest part, across the grain, that it cuts through; null: as wide as it comes. */
  readonly longestCrosscut: Um | null;
  /** Shortest part it may take in hand, along the grain. */
  readonly shortest: Um;
  /** Narrowest part it may take in hand, across the grain. */
  readonly narrowest: Um;
}

export interface Machine {
  /** Unique among the machines of one request. */
  readonly id: string;
  readonly name: string;
  readonly kind: MachineKind;
  readonly kerf: Um;
  /** What has to come off each edge it leaves, at least. Of a preferred machine the layout's own clean-up counts instead. */
  readonly cleanUp: Um;
  readonly limits: MachineLimits;
}

export interface CutMachines {
  /** Those the layout was spaced for; they may be one and the same. */
  readonly rip: Machine;
  readonly crosscut: Machine;
  /** Every other saw of the shop. */
  readonly others: readonly Machine[];
}

/** Takes whatever it is given. */
export const noLimits: MachineLimits = {
  rips: true,
  crosscuts: true,
  widestRip: null,
  longestCrosscut: null,
  shortest: um(0),
  narrowest: um(0),
};
