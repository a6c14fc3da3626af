/**
 * The two grids of a face: as it hangs (sizes and gaps) and as it is cut ("spaced": the same sizes at the spacing of the cuts).
 * Both start at the origin of the face; the spaced grid has the face's axes and is turned on to the stock only by a placement.
 */
import type { FacePoint, FaceRect } from "../frame/point";
import type { PieceId } from "../piece";
import { type Um, um } from "../units/um";
import type { FaceLayout, GridFace } from "./face-layout";
import { cutBetween, spacingOf } from "./loss";
import { type GridPlace, gridPlaceOf } from "./piece-ids";

/** Sizes along one axis and the distances between them. */
export interface Run {
  readonly sizes: readonly Um[];
  readonly between: readonly Um[];
}

/** Where each size of a run starts. */
export function startsOf(run: Run): Um[] {
  let next = 0;
  return run.sizes.map((size, index) => {
    const start = um(next);
    next += size + (run.between[index] ?? 0);
    return start;
  });
}

/** Where every piece of a grid lies. */
export interface Grid {
  readonly columns: Run;
  readonly rows: Run;
  readonly columnStarts: readonly Um[];
  readonly rowStarts: readonly Um[];
}

/** The face as it hangs. */
export function faceGrid(face: GridFace): Grid {
  return gridFrom({ sizes: face.columns, between: face.columnGaps }, { sizes: face.rows, between: face.rowGaps });
}

/** The face as it is cut from one board. */
export function spacedGrid(layout: FaceLayout): Grid {
  const { face, spacing } = layout;
  const columnCut = layout[cutBetween("columns", face.grain)];
  const rowCut = layout[cutBetween("rows", face.grain)];
  return gridFrom(
    { sizes: face.columns, between: face.columnGaps.map((gap) => spacingOf(columnCut, gap, spacing)) },
    { sizes: face.rows, between: face.rowGaps.map((gap) => spacingOf(rowCut, gap, spacing)) },
  );
}

function gridFrom(columns: Run, rows: Run): Grid {
  return { columns, rows, columnStarts: startsOf(columns), rowStarts: startsOf(rows) };
}

/** The rectangle of a place of the grid. Throws when the grid has no such place. */
export function rectAt(grid: Grid, { row, column }: GridPlace): FaceRect {
  return {
    x: present(grid.columnStarts[column]),
    y: present(grid.rowStarts[row]),
    width: present(grid.columns.sizes[column]),
    height: present(grid.rows.sizes[row]),
  };
}

/** The place of a piece in the grid. Throws on an id that the face does not have: `layoutFaults` finds those beforehand. */
export function placeOf(face: GridFace, id: PieceId): GridPlace {
  const place = gridPlaceOf(face, id);
  if (place === null) throw new RangeError(`no piece ${id} on this face`);
  return place;
}

/** Width and height of the whole face, outer edge to outer edge. */
export function faceSize(face: GridFace): { readonly width: Um; readonly height: Um } {
  const total = (sizes: readonly Um[], gaps: readonly Um[]) => um([...sizes, ...gaps].reduce((sum, part) => sum + part, 0));
  return { width: total(face.columns, face.columnGaps), height: total(face.rows, face.rowGaps) };
}

/** The finished outline of a rectangle, clockwise as seen from its top left corner. */
export function outlineOf(rect: FaceRect): FacePoint[] {
  const right = um(rect.x + rect.width);
  const bottom = um(rect.y + rect.height);
  return [
    { x: rect.x, y: rect.y },
    { x: right, y: rect.y },
    { x: right, y: bottom },
    { x: rect.x, y: bottom },
  ];
}

function present(value: Um | undefined): Um {
  if (value === undefined) throw new RangeError("no such place in the grid");
  return value;
}
