/** The homography of a marked photo for one given lens term, and what it leaves over. Searching for the term is `fit-lens.ts`. */
import { fitHomography, type LineMark, lineResidualMm, type Mark, markResidualMm, type StockLine } from "./fit-homography";
import type { ResidualsMm } from "./fit-lens";
import { applyHomography, type Homography, type PhotoPoint } from "./homography";
import { flatFromPhoto, type Lens, lensOf, type PhotoSize } from "./lens";
import type { BoardEdge, Marking } from "./marking";
import { distancesFromOwnLine } from "./straightness";

export interface ReferenceFit {
  readonly lens: Lens;
  /** mm in the frame of the reference rectangle (board or sheet) from flat photo px. */
  readonly referenceMmFromFlat: Homography;
  /** Per mark, mm, unsigned. */
  readonly residuals: readonly { readonly mark: "corner" | "extra" | "edge"; readonly index: number; readonly mm: number }[];
  readonly leftOver: ResidualsMm;
}

/**
 * Where the board is the reference its edges are known lines and their points help to fit the map. Where a sheet is, the board's
 * edges are only known to be straight: their points say nothing about the map, but much about the lens. Null where nothing fits.
 */
export function fitAtK1(marking: Marking, photo: PhotoSize, k1: number): ReferenceFit | null {
  const lens = lensOf(photo, k1);
  const flat = (p: PhotoPoint): PhotoPoint => flatFromPhoto(lens, p);
  const marks = referenceMarks(marking).map((mark) => ({ ...mark, photo: flat(mark.photo) }));
  const lines = boardLines(marking);
  const lineMarks =
    lines === null ? [] : marking.edgePoints.map(({ photo: p, edge }): LineMark => ({ photo: flat(p), line: lines[edge] }));
  const map = fitHomography(marks, lineMarks);
  if (map === null) return null;

  const edges =
    lines === null ? bends(marking, (p) => applyHomography(map, flat(p))) : lineMarks.map((mark) => lineResidualMm(map, mark));
  const marksMm = marks.map((mark) => markResidualMm(map, mark));
  return {
    lens,
    referenceMmFromFlat: map,
    residuals: [
      ...marksMm.map((mm, i) =>
        i < 4 ? { mark: "corner" as const, index: i, mm } : { mark: "extra" as const, index: i - 4, mm },
      ),
      ...edges.map((mm, index) => ({ mark: "edge" as const, index, mm: Math.abs(mm) })),
    ],
    leftOver: { edges, marks: marksMm },
  };
}

/** The four corners of the reference rectangle, then the extra points, each with its place in the rectangle's frame. */
function referenceMarks({ reference, corners, extraPoints }: Marking): Mark[] {
  const length = reference.length / 1000;
  const width = reference.width / 1000;
  const [a, b, c, d] = reference.kind === "sheet" ? reference.corners : corners;
  return [
    { photo: a, stockMm: { x: 0, y: 0 } },
    { photo: b, stockMm: { x: length, y: 0 } },
    { photo: c, stockMm: { x: length, y: width } },
    { photo: d, stockMm: { x: 0, y: width } },
    ...extraPoints.map(({ photo, at }) => ({ photo, stockMm: { x: at.x / 1000, y: at.y / 1000 } })),
  ];
}

function boardLines({ reference }: Marking): Readonly<Record<BoardEdge, StockLine>> | null {
  if (reference.kind === "sheet") return null;
  return {
    top: { a: 0, b: 1, c: 0 },
    right: { a: 1, b: 0, c: reference.length / 1000 },
    bottom: { a: 0, b: 1, c: reference.width / 1000 },
    left: { a: 1, b: 0, c: 0 },
  };
}

/** Corners at the ends of each edge, as indices into `corners`. */
const edgeEnds = { top: [0, 1], right: [1, 2], bottom: [3, 2], left: [0, 3] } as const;

/** Distance of each edge point from the straight line through its edge's points and corners, in the order of `edgePoints`. */
function bends(marking: Marking, mmFromPhoto: (p: PhotoPoint) => { x: number; y: number }): number[] {
  const distances = new Array<number>(marking.edgePoints.length).fill(0);
  for (const [edge, ends] of Object.entries(edgeEnds)) {
    const indices = marking.edgePoints.flatMap((point, i) => (point.edge === edge ? [i] : []));
    if (indices.length === 0) continue;
    const photo = [...ends.map((end) => marking.corners[end]), ...indices.map((i) => marking.edgePoints[i]?.photo as PhotoPoint)];
    const off = distancesFromOwnLine(photo.map(mmFromPhoto));
    for (const [n, i] of indices.entries()) distances[i] = off[n + ends.length] as number;
  }
  return distances;
}
