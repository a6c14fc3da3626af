/** Which part in hand each piece still lies in, and whether it is cut to size there already. */
import type { PieceId } from "../piece";
import type { PartInHand, RestPiece } from "./part-in-hand";
import { blankRect, everyEdge, sameRect } from "./rect-edge";

export interface Holding {
  readonly held: PartInHand;
  /** In the order asked. */
  readonly pieces: readonly RestPiece[];
}

export interface Holdings {
  readonly parts: readonly Holding[];
  /** Pieces whose wood is in no part in hand any more. */
  readonly without: readonly RestPiece[];
}

export function holdPieces(bench: readonly PartInHand[], pieces: readonly RestPiece[], spoiled: ReadonlySet<PieceId>): Holdings {
  const partOf = new Map<PieceId, PartInHand>();
  for (const piece of pieces) {
    if (spoiled.has(piece.pieceId)) continue;
    const own = bench.find(({ part }) => part.pieceId === piece.pieceId);
    const held = own ?? bench.find((one) => mayHold(one) && hasMiddleOf(one, piece));
    if (held) partOf.set(piece.pieceId, held);
  }
  return {
    parts: bench.map((held) => ({ held, pieces: pieces.filter(({ pieceId }) => partOf.get(pieceId) === held) })),
    without: pieces.filter(({ pieceId }) => !partOf.has(pieceId)),
  };
}

/** Not waste, and not parted from the rest as some other piece. */
export function mayHold({ part }: PartInHand): boolean {
  return part.kind !== "waste" && part.pieceId === null;
}

/** The one piece of a part that needs no more sawing; what its edges lose to clean-up may be rough. */
export function finishedPiece({ held, pieces }: Holding): RestPiece | null {
  const [piece, second] = pieces;
  if (!piece || second || !sameRect(held.part.rect, blankRect(piece))) return null;
  return everyEdge.every((edge) => held.edges[edge] !== "rough" || piece.cleanUp[edge] > 0) ? piece : null;
}

function hasMiddleOf({ part: { rect } }: PartInHand, piece: RestPiece): boolean {
  const blank = blankRect(piece);
  const [x, y] = [blank.x + blank.width / 2, blank.y + blank.height / 2];
  return x >= rect.x && x < rect.x + rect.width && y >= rect.y && y < rect.y + rect.height;
}
