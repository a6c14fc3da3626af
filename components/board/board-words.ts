/** How a board's facts are written on screens. */
import type { boardSorts, boardStates, cuts, trueEdges } from "@/lib/schemas/board";

type Cut = (typeof cuts)[number];
type BoardState = (typeof boardStates)[number];

export const cutNames: Readonly<Record<Cut, string>> = { flat: "flat", rift: "rift", quarter: "quarter" };

export const stateNames: Readonly<Record<BoardState, string>> = { rack: "in the rack", cut: "cut up", gone: "gone" };

/** Upper and lower as the picture of the face lies. */
export const trueEdgeNames: Readonly<Record<(typeof trueEdges)[number], string>> = {
  none: "none",
  top: "the upper one",
  bottom: "the lower one",
  both: "both",
};

type Sort = (typeof boardSorts)[number];

/** Each order of the rack and its reverse, as they stand in a list of choices. */
export const orderNames: Readonly<Record<Sort, { readonly up: string; readonly down: string }>> = {
  tag: { up: "tag, lowest first", down: "tag, highest first" },
  species: { up: "species, A to Z", down: "species, Z to A" },
  length: { up: "shortest first", down: "longest first" },
  width: { up: "narrowest first", down: "widest first" },
  thickness: { up: "thinnest first", down: "thickest first" },
  moisture: { up: "driest first", down: "wettest first" },
  place: { up: "place, A to Z", down: "place, Z to A" },
  newest: { up: "newest first", down: "oldest first" },
};

/** "4/4" for a board sold by quarters. */
export const quartersText = (nominalQuarters: number | null): string => (nominalQuarters === null ? "" : `${nominalQuarters}/4`);

/** To two decimals at most, which a thickness sold by quarters never needs more of: `8`, `6.25`. */
export const boardFeetText = (boardFeet: number): string => (boardFeet === 0 ? "under 1" : String(Number(boardFeet.toFixed(2))));

const M3_PER_BOARD_FOOT = 0.0254 ** 3 * 144;

/** `7.81 board feet, 0.0184 m³` */
export const volumeText = (boardFeet: number): string =>
  `${boardFeet.toFixed(2)} board feet, ${(boardFeet * M3_PER_BOARD_FOOT).toFixed(4)} m³`;
