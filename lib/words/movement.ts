/** Movement of wood through the year, in plain words: what to be warned of, where the furniture lives, what stands round the fronts. */
import {
  type Climate,
  COEFFICIENT_RANGE,
  FIBRE_SATURATION,
  type GapThroughYear,
  type LengthStyle,
  type MovementRequest,
  type MovementWarning,
  type PieceId,
  printLength,
  type Surround,
  type Um,
  um,
  yearlyMoisture,
} from "@/lib/layout";
import type { TagOf } from "./layout-problem";
import { labelRanges } from "./part-name";

/** A moisture as meters show it: `8.2 %`, never parted at the end of a line. */
export const percentText = (percent: number): string => `${percent.toFixed(1)}\u00a0%`;

/** What the sentences take that the warnings do not hold. */
export type MovementGround = Pick<MovementRequest, "year" | "leastGap" | "moistureLimit">;

export function movementWarningSentence(
  warning: MovementWarning,
  ground: MovementGround,
  style: LengthStyle,
  tagOf: TagOf,
): string {
  const { driest, dampest } = ground.year;
  switch (warning.kind) {
    case "not-on-wood":
      return `${fronts(warning.pieces)} not laid on wood yet: nothing to work their movement out from.`;
    case "no-species":
      return `Say which species board ${tagOf(warning.stockId)} is: its name is not in the table.`;
    case "no-reading":
      return `The moisture of board ${tagOf(warning.stockId)} was never read. Read it before you cut.`;
    case "too-damp":
      return `Board ${tagOf(warning.stockId)} was read at ${percentText(warning.moisture)}, above fibre saturation (${FIBRE_SATURATION} %): it is green. Dry it first.`;
    case "outside-place":
      return `Board ${tagOf(warning.stockId)} is at ${percentText(warning.moisture)}, ${
        warning.moisture < driest ? "drier" : "damper"
      } than it will ever be there (${percentText(driest)} to ${percentText(dampest)}). Let it settle before you cut.`;
    case "surround-differs":
      return `Board ${tagOf(warning.stockId)} is at ${percentText(warning.moisture)} and what stands round the fronts at ${percentText(
        warning.surround,
      )}: more than ${percentText(ground.moistureLimit)} apart. Let them settle side by side.`;
    case "range-left":
      return `The figures for board ${tagOf(warning.stockId)} hold from ${COEFFICIENT_RANGE.from} to ${COEFFICIENT_RANGE.to} % moisture; here it is ${warning.moistures
        .map(percentText)
        .join(" and ")}. Leave more room.`;
    case "closes":
      return `${gapsName(warning.gaps)} ${warning.gaps.length === 1 ? "closes" : "close"} when the wood is at its ${warning.season}${
        warning.least < 0 ? `, ${printLength(um(-warning.least), style)} short` : ""
      }.`;
    case "too-narrow":
      return `${gapsName(warning.gaps)} ${warning.gaps.length === 1 ? "comes" : "come"} down to ${leastText(
        warning.least,
        ground.leastGap,
        style,
      )}, at the ${warning.season}.`;
  }
}

/** Two lengths that print alike are told apart in words. */
function leastText(least: Um, shops: Um, style: LengthStyle): string {
  const [printed, wanted] = [printLength(least, style), printLength(shops, style)];
  return printed === wanted ? `just under ${wanted}, the shop's least` : `${printed}, below the shop's least of ${wanted}`;
}

/** "The gap between 1 and 2", "6 gaps, between 1 and 2 the first". */
function gapsName(gaps: readonly GapThroughYear[]): string {
  const [first] = gaps;
  if (first === undefined) return "No gap";
  return gaps.length === 1 ? `The gap ${betweenText(first)}` : `${gaps.length} gaps, the first ${betweenText(first)},`;
}

const sides = { left: "on the left of", right: "on the right of", top: "above", bottom: "below" } as const;

/** "between 1 and 2", "above 1". */
export function betweenText({ a, b }: Pick<GapThroughYear, "a" | "b">): string {
  return "piece" in b ? `between ${labelOf(a)} and ${labelOf(b.piece)}` : `${sides[b.side]} ${labelOf(a)}`;
}

const labelOf = (id: PieceId) => id.replace(/^p/, "");

function fronts(pieces: readonly PieceId[]): string {
  const labels = labelRanges(pieces.map(labelOf));
  return pieces.length === 1 ? `Front ${labels} is` : `Fronts ${labels} are`;
}

/** Shops that measure in inches have their thermometers in °F. */
export const fahrenheitOf = (celsius: number): number => (celsius * 9) / 5 + 32;

function temperatureText(celsius: number, { unit }: LengthStyle): string {
  const degrees = unit === "mm" ? celsius : fahrenheitOf(celsius);
  return `${Math.round(degrees * 10) / 10} ${unit === "mm" ? "°C" : "°F"}`;
}

/** "30 to 60 % humidity at 21 °C: wood at 6.2 to 11.0 %". */
export function climateText(climate: Climate, style: LengthStyle): string {
  const { driest, dampest } = yearlyMoisture(climate);
  const wood = `wood at ${driest.toFixed(1)} to ${percentText(dampest)}`;
  if (climate.kind === "moisture") return wood;
  const { driest: dry, dampest: damp } = climate;
  const air =
    dry.celsius === damp.celsius
      ? `${dry.humidity} to ${damp.humidity} % humidity at ${temperatureText(dry.celsius, style)}`
      : `${dry.humidity} % humidity at ${temperatureText(dry.celsius, style)} to ${damp.humidity} % at ${temperatureText(damp.celsius, style)}`;
  return `${air}: ${wood}`;
}

/** Choices of what stands round the fronts, in the order in which they are offered. */
export const surroundChoices = [
  { value: "none", label: "Nothing: the fronts stand free" },
  { value: "sheet", label: "Plywood or MDF" },
  { value: "lengthwise", label: "Same wood, a frame or case" },
  { value: "with", label: "Same wood, grain like the fronts’" },
  { value: "across", label: "Same wood, grain across the fronts’" },
] as const;
export type SurroundChoice = (typeof surroundChoices)[number]["value"];

export const surroundChoiceOf = (surround: Surround): SurroundChoice =>
  surround.kind === "sameWood" ? surround.grain : surround.kind;

/** What each choice is taken to do. */
export const surroundHints: Readonly<Record<SurroundChoice, string>> = {
  none: "The places where the fronts are held stay where they are.",
  sheet: "Taken as still.",
  lengthwise: "Its parts run along each side of the opening, and along the grain wood is still.",
  with: "A rail or panel that moves as the fronts do.",
  across: "A panel whose grain crosses the fronts’: it moves along them.",
};
