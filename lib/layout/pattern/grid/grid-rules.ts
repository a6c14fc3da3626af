/**
 * Fronts in rows and columns. As hung they lie at the gaps of the face, as cut at the spacing of the cuts between them; both grids
 * start at the origin of the face.
 */
import type { FaceRect } from "../../frame/point";
import { type Um, um } from "../../units/um";
import type { GridFace } from "../face";
import type { FaceFault } from "../face-fault";
import { cutBetween, spacingOf } from "../loss";
import type { CutSettings, PatternRules, SeamPlace } from "../pattern-rules";
import { pieceIdAt } from "../piece-names";
import { lengthOf, type Run, startsOf } from "../run";
import { withEvenGaps } from "./even-gaps";

export const gridRules: PatternRules<GridFace> = {
  count: ({ rows, columns }) => rows.length * columns.length,
  pieces: (face) => rectsOf(hungGrid(face)).map((rect) => ({ role: "front", rect })),
  size: (face) => {
    const { columns, rows } = hungGrid(face);
    return { width: lengthOf(columns), height: lengthOf(rows) };
  },
  places: (layout) => rectsOf(spacedGrid(layout)).map((rect) => ({ rect, mirrored: "no", anchors: true })),
  cleanUps: cleanUpsOfGrid,
  seams: (face) => face.rows.flatMap((_, row) => face.columns.flatMap((_, column) => seamsOf(face, row, column))),
  evenGaps: withEvenGaps,
  faults: gridFaults,
};

interface Grid {
  readonly columns: Run;
  readonly rows: Run;
}

function hungGrid(face: GridFace): Grid {
  return { columns: { sizes: face.columns, between: face.columnGaps }, rows: { sizes: face.rows, between: face.rowGaps } };
}

function spacedGrid(layout: CutSettings<GridFace>): Grid {
  const { face, spacing } = layout;
  const columnCut = layout[cutBetween("columns", face.grain)];
  const rowCut = layout[cutBetween("rows", face.grain)];
  return {
    columns: { sizes: face.columns, between: face.columnGaps.map((gap) => spacingOf(columnCut, gap, spacing)) },
    rows: { sizes: face.rows, between: face.rowGaps.map((gap) => spacingOf(rowCut, gap, spacing)) },
  };
}

function rectsOf({ columns, rows }: Grid): FaceRect[] {
  const [lefts, tops] = [startsOf(columns), startsOf(rows)];
  return rows.sizes.flatMap((height, row) =>
    columns.sizes.map((width, column) => ({ x: lefts[column] ?? um(0), y: tops[row] ?? um(0), width, height })),
  );
}

/**
 * On the face the edge before a cut is a piece's right or bottom one, the edge after it the next piece's left or top one; outer
 * edges of the face are sawn and cleaned like the rest.
 */
function cleanUpsOfGrid(layout: CutSettings<GridFace>) {
  const { face } = layout;
  const columnCut = layout[cutBetween("columns", face.grain)];
  const rowCut = layout[cutBetween("rows", face.grain)];
  const edges = {
    left: columnCut.cleanUpAfter,
    right: columnCut.cleanUpBefore,
    top: rowCut.cleanUpAfter,
    bottom: rowCut.cleanUpBefore,
  };
  return Array.from({ length: gridRules.count(face) }, () => edges);
}

function seamsOf(face: GridFace, row: number, column: number): SeamPlace[] {
  const { columns, rows } = hungGrid(face);
  const [left, top] = [startsOf(columns)[column] ?? um(0), startsOf(rows)[row] ?? um(0)];
  const right = um(left + (face.columns[column] ?? 0));
  const bottom = um(top + (face.rows[row] ?? 0));
  const index = row * face.columns.length + column;
  const a = pieceIdAt(index);
  const found: SeamPlace[] = [];
  if (column + 1 < face.columns.length) {
    const gap: Um = face.columnGaps[column] ?? um(0);
    const [from, to, facing] = [
      { x: right, y: top },
      { x: right, y: bottom },
      { x: um(right + gap), y: top },
    ];
    found.push({ a, b: pieceIdAt(index + 1), from, to, facing, gap, normal: "right" });
  }
  if (row + 1 < face.rows.length) {
    const gap: Um = face.rowGaps[row] ?? um(0);
    const [from, to, facing] = [
      { x: left, y: bottom },
      { x: right, y: bottom },
      { x: left, y: um(bottom + gap) },
    ];
    found.push({ a, b: pieceIdAt(index + face.columns.length), from, to, facing, gap, normal: "down" });
  }
  return found;
}

function gridFaults(face: GridFace): FaceFault[] {
  const faults: FaceFault[] = [];
  if (face.columns.length === 0 || face.rows.length === 0) faults.push({ fault: "empty-face" });
  for (const axis of ["columns", "rows"] as const) {
    const gaps = axis === "columns" ? face.columnGaps : face.rowGaps;
    if (gaps.length !== Math.max(0, face[axis].length - 1)) faults.push({ fault: "gap-count", axis });
    face[axis].forEach((size, index) => {
      if (!(size > 0)) faults.push({ fault: "size-not-positive", axis, index });
    });
  }
  for (const where of ["columnGaps", "rowGaps"] as const) {
    if (face[where].some((length) => !(length >= 0))) faults.push({ fault: "negative-length", where });
  }
  return faults;
}
