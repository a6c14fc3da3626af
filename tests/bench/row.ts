/** What the bench measures: a line of its table, and what was found. */

export interface Row {
  /** For `--only`. */
  readonly name: string;
  readonly what: string;
  readonly against: string;
  /** Bounds of the ratio: of our time to the other's, or of the other's time to ours where we mean to be so many times faster. */
  readonly aim: { readonly kind: "at most" | "at least"; readonly ratio: number };
  readonly measure: (effort: Effort) => Promise<Outcome>;
}

export interface Effort {
  /** Small sizes and few repetitions: whether it runs, not how fast. */
  readonly quick: boolean;
}

export type Outcome =
  | { readonly kind: "measured"; readonly cases: readonly Case[] }
  /** What the row is about does not exist yet; nothing was measured. */
  | { readonly kind: "not built yet"; readonly why: string };

export interface Case {
  readonly name: string;
  /** Over the repetitions: the middle one, and the bounds of the middle half. */
  readonly ratio: Spread;
  /** The same of processor time, all threads together, where both sides ran in this process. */
  readonly processorRatio: number | null;
  /** Middle times, ms. They say how large the case is; only ratios are compared. */
  readonly oursMs: number;
  readonly theirsMs: number;
  readonly repetitions: number;
}

export interface Spread {
  readonly median: number;
  readonly low: number;
  readonly high: number;
}

export const meets = ({ aim }: Pick<Row, "aim">, { ratio }: Case): boolean =>
  aim.kind === "at most" ? ratio.median <= aim.ratio : ratio.median >= aim.ratio;
