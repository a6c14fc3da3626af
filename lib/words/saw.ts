/** Saws in words: what kind, and what they may take. */
import type { MachineKind, MachineLimits, Um } from "@/lib/layout";

export const sawKindNames: Readonly<Record<MachineKind, string>> = {
  table: "Table saw",
  track: "Track saw",
  band: "Band saw",
  hand: "Hand saw",
};

/** "rips to 600.0 mm wide, crosscuts; parts from 150.0 × 10.0 mm" */
export function sawTakes(limits: MachineLimits, print: (length: Um) => string): string {
  const { rips, crosscuts, widestRip, longestCrosscut, shortest, narrowest } = limits;
  const cuts = [
    rips && (widestRip === null ? "rips" : `rips to ${print(widestRip)} wide`),
    crosscuts && (longestCrosscut === null ? "crosscuts" : `crosscuts to ${print(longestCrosscut)} wide`),
  ].filter((part) => part !== false);
  const parts = [
    shortest > 0 && `parts from ${print(shortest)} long`,
    narrowest > 0 && `${shortest > 0 ? "" : "parts "}from ${print(narrowest)} wide`,
  ].filter((part) => part !== false);
  const what = cuts.length === 0 ? "no cuts" : cuts.join(", ");
  return parts.length === 0 ? what : `${what}; ${parts.join(", ")}`;
}
