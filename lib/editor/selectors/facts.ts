/** Everything that follows from a layout and its boards and is shown beside them. Worked out once a layout, however often it is asked for. */
import {
  type BoardFace,
  carpentersTriangle,
  type Drift,
  drifts,
  type FaceLayout,
  type FacePiece,
  facePieces,
  layOut,
  type Piece,
  type PieceId,
  type Problem,
  problems,
  type Seam,
  seams,
  type TriangleMark,
} from "@/lib/layout";

export interface LayoutFacts {
  readonly facePieces: readonly FacePiece[];
  /** Those on wood. */
  readonly pieces: readonly Piece[];
  readonly pieceById: ReadonlyMap<PieceId, Piece>;
  readonly seams: readonly Seam[];
  readonly drifts: ReadonlyMap<PieceId, Drift["drift"]>;
  readonly triangle: ReadonlyMap<PieceId, TriangleMark>;
}

const factsByLayout = new WeakMap<FaceLayout, LayoutFacts>();

export function factsOf(layout: FaceLayout): LayoutFacts {
  const known = factsByLayout.get(layout);
  if (known) return known;
  const pieces = layOut(layout);
  const facts: LayoutFacts = {
    facePieces: facePieces(layout),
    pieces,
    pieceById: new Map(pieces.map((piece) => [piece.id, piece])),
    seams: seams(layout, pieces),
    drifts: new Map(drifts(layout, pieces).map(({ piece, drift }) => [piece, drift])),
    triangle: new Map(carpentersTriangle(layout, "bottom", pieces).map((mark) => [mark.piece, mark])),
  };
  factsByLayout.set(layout, facts);
  return facts;
}

const problemsByLayout = new WeakMap<FaceLayout, { boards: readonly BoardFace[]; found: readonly Problem[] }>();

/** Everything wrong with the layout on its boards but whether straight cuts can part it (`blocked.ts`). */
export function problemsOf(layout: FaceLayout, boards: readonly BoardFace[]): readonly Problem[] {
  const known = problemsByLayout.get(layout);
  if (known?.boards === boards) return known.found;
  const found = problems(layout, boards);
  problemsByLayout.set(layout, { boards, found });
  return found;
}

/** The pieces a problem is about. */
export function piecesOfProblem(problem: Problem): readonly PieceId[] {
  return "pieces" in problem ? problem.pieces : [problem.piece];
}
