/** New layouts in one set that is not laid on wood yet, and the faces of a row, a stack or a grid of fronts. */
import type { Um } from "../units/um";
import type { Face, Grain, GridFace } from "./face";
import type { CutLoss, FaceLayout, Spacing } from "./face-layout";
import { pieceIdsOf } from "./piece-ids";

export interface CutChoices {
  readonly crosscut: CutLoss;
  readonly rip: CutLoss;
  readonly spacing: Spacing;
}

/** The id of the first group of every fresh layout. */
export const SET_ID = "set";

/** A layout over a face, anchored in its middle: that halves the greatest drift. */
export function freshLayout(face: Face, cuts: CutChoices): FaceLayout {
  return {
    face,
    crosscut: cuts.crosscut,
    rip: cuts.rip,
    spacing: cuts.spacing,
    anchorX: "centre",
    anchorY: "centre",
    groups: [{ id: SET_ID, pieceIds: pieceIdsOf(face), placement: null, takesPlaceOf: {} }],
  };
}

/** Fronts side by side, all of one height, with the same gap between them. */
export function rowFace(widths: readonly Um[], height: Um, gap: Um, grain: Grain): GridFace {
  return gridFace(widths, [height], gap, gap, grain);
}

/** Fronts one above the other, all of one width, with the same gap between them. */
export function stackFace(heights: readonly Um[], width: Um, gap: Um, grain: Grain): GridFace {
  return gridFace([width], heights, gap, gap, grain);
}

/** Rows and columns of fronts with one gap between columns and one between rows. */
export function gridFace(columns: readonly Um[], rows: readonly Um[], columnGap: Um, rowGap: Um, grain: Grain): GridFace {
  const gaps = (count: number, gap: Um) => Array.from({ length: Math.max(0, count - 1) }, () => gap);
  const between = { columnGaps: gaps(columns.length, columnGap), rowGaps: gaps(rows.length, rowGap) };
  return { pattern: "grid", columns, rows, ...between, grain };
}
