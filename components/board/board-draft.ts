/** What is written in a form about a board, before it is known to be sound. */
import type { Um } from "@/lib/layout";
import type { Board, cuts, trueEdges } from "@/lib/schemas/board";
import { minorFromText, minorText } from "./money";

export interface BoardDraft {
  readonly species: string;
  readonly cut: (typeof cuts)[number];
  readonly nominalQuarters: number | null;
  readonly thickness: Um | null;
  readonly place: string;
  readonly source: string;
  readonly cost: string;
  readonly note: string;
  readonly trueEdges: (typeof trueEdges)[number];
  readonly toBeFlattened: boolean;
}

export type DraftErrors = { readonly [Name in keyof BoardDraft]?: string };

export const emptyDraft: BoardDraft = {
  species: "",
  cut: "flat",
  nominalQuarters: null,
  thickness: null,
  place: "",
  source: "",
  cost: "",
  note: "",
  trueEdges: "none",
  toBeFlattened: false,
};

export function draftOf(board: Board, currency: string): BoardDraft {
  const { species, cut, nominalQuarters, thickness, place, source, note, trueEdges, toBeFlattened } = board;
  const cost = board.costMinor === null ? "" : minorText(board.costMinor, currency);
  return { species, cut, nominalQuarters, thickness, place, source, cost, note, trueEdges, toBeFlattened };
}

type BoardFields = Omit<BoardDraft, "cost" | "thickness"> & Pick<Board, "thickness" | "costMinor">;
export type CheckedDraft =
  | { readonly ok: true; readonly fields: BoardFields }
  | { readonly ok: false; readonly errors: DraftErrors };

/** The fields as they are sent, or what to say below each that is not sound. */
export function checkDraft(draft: BoardDraft, currency: string): CheckedDraft {
  const { cost, thickness, ...words } = draft;
  const costMinor = cost.trim() === "" ? null : minorFromText(cost, currency);
  const species = draft.species.trim();
  if (species !== "" && thickness !== null && thickness > 0 && costMinor !== undefined) {
    return { ok: true, fields: { ...words, species, thickness, costMinor } };
  }
  return {
    ok: false,
    errors: {
      ...(species === "" && { species: "Say which wood it is" }),
      ...((thickness === null || thickness <= 0) && { thickness: "Measure how thick it is" }),
      ...(costMinor === undefined && { cost: "Write an amount such as 84 or 84.50" }),
    },
  };
}
