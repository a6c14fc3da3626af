/** How much every front of a face, and what stands round them, grows from today to another moisture, along a line on the face. */
import { layOut } from "../pattern/lay-out";
import type { Piece, PieceId, StockId } from "../piece";
import type { FaceGap } from "./face-gaps";
import type { Strains } from "./gap-through-year";
import type { BoardWood, MovementRequest } from "./movement";
import { FIBRE_SATURATION, strainAcross } from "./size-change";
import { surroundShare } from "./surround";

/** The layout as its pieces lie on their boards, made once for all gaps. */
export interface MovingFace {
  readonly request: MovementRequest;
  readonly pieces: readonly Piece[];
  readonly byId: ReadonlyMap<PieceId, Piece>;
}

export function movingFace(request: MovementRequest): MovingFace {
  const pieces = layOut(request.layout);
  return { request, pieces, byId: new Map(pieces.map((piece) => [piece.id, piece])) };
}

/** The board whose wood a solid surround's is like: the set's, else that of the first piece that lies on wood. */
export function mainBoard({ layout }: Pick<MovementRequest, "layout">): StockId | null {
  return layout.groups.find(({ placement }) => placement !== null)?.placement?.stockId ?? null;
}

/**
 * How much of a line on the face runs across a piece's grain: the square of its part across the grain of the wood, 1 across, 0 along.
 * Before the piece lies on wood, by the grain of the layout.
 */
export function acrossShare({ byId, request }: MovingFace, id: PieceId, runs: FaceGap["runs"]): number {
  const sideways = runs === "sideways";
  const map = byId.get(id)?.stockFromFace;
  if (map === undefined) return (request.layout.face.grain === "horizontal") === sideways ? 0 : 1;
  return sideways ? map.b * map.b : map.d * map.d;
}

/** Null where something is not known that it takes. Along the grain nothing need be known: wood is still there. */
export function strainsAt(face: MovingFace, gap: FaceGap, moisture: number): Strains | null {
  const a = strainOfPiece(face, gap.a, gap.runs, moisture);
  const b = "piece" in gap.b ? strainOfPiece(face, gap.b.piece, gap.runs, moisture) : 0;
  const surround = strainOfSurround(face, gap, moisture);
  return a === null || b === null || surround === null ? null : { a, b, surround };
}

function strainOfPiece(face: MovingFace, id: PieceId, runs: FaceGap["runs"], moisture: number): number | null {
  const share = acrossShare(face, id, runs);
  const stockId = face.byId.get(id)?.stockId;
  return strainOf(stockId === undefined ? undefined : face.request.woods.get(stockId), share, moisture);
}

/** A rail cut from the layout's own wood moves as that; whatever else stands round the fronts as the face says. */
function strainOfSurround(face: MovingFace, gap: FaceGap, moisture: number): number | null {
  if (gap.rail !== null) return strainOfPiece(face, gap.rail, gap.runs, moisture);
  const { surround, woods } = face.request;
  const share = surroundShare(surround, acrossShare(face, gap.a, gap.runs));
  const board = mainBoard(face.request);
  const wood = board === null ? undefined : woods.get(board);
  const own = surround.kind === "sameWood" ? surround.moisture : null;
  return strainOf(wood && { ...wood, moisture: own ?? wood.moisture }, share, moisture);
}

function strainOf(wood: BoardWood | undefined, share: number, to: number): number | null {
  if (share === 0) return 0;
  if (!wood || wood.movement === null || wood.moisture === null || wood.moisture > FIBRE_SATURATION) return null;
  const strain = strainAcross(wood.movement, wood.ringAngle, wood.moisture, to);
  return strain === null ? null : strain * share;
}
