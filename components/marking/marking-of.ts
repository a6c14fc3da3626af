/** A draft made into what the core takes, or what is still missing. Pure. */
import type { Marking, Um } from "@/lib/layout";
import { type Draft, sheetSize } from "./draft";

/** In the order in which they are asked for. */
export type Missing =
  | { readonly what: "board-size" }
  | { readonly what: "sheet-size" }
  | { readonly what: "sheet-corners"; readonly count: number }
  | { readonly what: "board-corners"; readonly count: number };

export type DraftOutcome =
  | { readonly complete: true; readonly marking: Marking; readonly extraIndexes: readonly number[] }
  | { readonly complete: false; readonly missing: Missing };

/**
 * Further points whose true place is not entered yet are left out; `extraIndexes` says which of the draft's points the marking holds, in its order, so that residuals find
 * back to them.
 */
export function markingOf(draft: Draft): DraftOutcome {
  const reference = referenceOf(draft);
  if (reference === null)
    return { complete: false, missing: { what: draft.reference === "board" ? "board-size" : "sheet-size" } };
  const sheet = draft.unplaced.sheet.filter(Boolean).length;
  if (draft.reference === "sheet" && sheet > 0) return { complete: false, missing: { what: "sheet-corners", count: sheet } };
  const board = draft.unplaced.board.filter(Boolean).length;
  if (board > 0) return { complete: false, missing: { what: "board-corners", count: board } };
  const known = draft.extraPoints.flatMap(({ photo, x, y }, index) =>
    x === null || y === null ? [] : [{ photo, at: { x, y }, index }],
  );
  return {
    complete: true,
    marking: {
      reference,
      corners: draft.corners,
      extraPoints: known.map(({ photo, at }) => ({ photo, at })),
      edgePoints: draft.edgePoints,
    },
    extraIndexes: known.map(({ index }) => index),
  };
}

function referenceOf(draft: Draft): Marking["reference"] | null {
  if (draft.reference === "board") {
    const { length, width } = draft;
    return length !== null && width !== null ? { kind: "board", length, width } : null;
  }
  const size = sheetSize(draft.sheet);
  return size && { kind: "sheet", ...size, corners: draft.sheetCorners };
}

/** Measured against true: how far off, µm and per cent; signed, above 0 where the picture measures too much. */
export function differenceFrom(trueLength: Um, measuredMm: number): { mm: number; percent: number } {
  const mm = measuredMm - trueLength / 1000;
  return { mm, percent: (mm / (trueLength / 1000)) * 100 };
}
