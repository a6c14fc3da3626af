/** What is said of one step, whatever kind it is of. */
import type { Um } from "@/lib/layout";
import type { Title } from "./cut-title";

/** Something a step gives: "front" in words, its label for the box, its size. */
export interface Gives {
  readonly word: string;
  readonly label: string | null;
  readonly size: string | null;
}

export interface StepWords extends Title {
  /** What to keep in mind, in the order of importance. */
  readonly notes: readonly string[];
  readonly cautions: readonly string[];
  /** Where the setting is measured from; null where nothing is set. */
  readonly from: string | null;
  /** How it is dialled in or marked; for the bench, where there is room for it. */
  readonly measure: string | null;
  /** The number to set. */
  readonly setting: Um | null;
  readonly gives: readonly Gives[];
}
