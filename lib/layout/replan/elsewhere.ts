/** Finds other wood of the same board in hand for a piece: as near as can be to where it lay, so that figure and colour change least. */
import { movesIntoBadWood } from "./blocks";
import { finishedPiece, type Holding, mayHold } from "./hold-pieces";
import type { RestPiece } from "./part-in-hand";
import { blankRect, isInside, movedBy } from "./rect-edge";
import { isOnSoundWood, type Sawing, stands } from "./stands";

/** Places weighed for one piece; nearest first, so those left out lie farthest. */
const MOST_PLACES = 3_000;

interface Move {
  readonly x: number;
  readonly y: number;
}

export interface NewPlace {
  readonly partId: string;
  readonly piece: RestPiece;
}

/** The nearest place at which the piece can be cut with all others where they are; null when there is none. */
export function placeElsewhere(piece: RestPiece, holdings: readonly Holding[], sawing: Sawing): NewPlace | null {
  const places = holdings
    .filter((holding) => mayHold(holding.held) && !finishedPiece(holding))
    .flatMap((holding, rank) =>
      cornersIn(holding, piece, sawing).map((by) => ({ holding, rank, by, far: by.x ** 2 + by.y ** 2 })),
    )
    .sort((a, b) => a.far - b.far || a.rank - b.rank || a.by.y - b.by.y || a.by.x - b.by.x);
  for (const { holding, by } of places.slice(0, MOST_PLACES)) {
    const placed = { ...piece, rect: movedBy(piece.rect, by) };
    if (!isOnSoundWood(placed, holding.held, sawing.board)) continue;
    if (stands(holding.held, [...holding.pieces, placed], sawing)) return { partId: holding.held.part.id, piece: placed };
  }
  return null;
}

/**
 * Moves that bring what is sawn for the piece into a corner: of the part, or of other such rectangles with the blade between; where bad
 * wood is in the way, on either side of it along the board.
 */
function cornersIn({ held, pieces }: Holding, piece: RestPiece, { kerf, board }: Sawing): Move[] {
  const blank = blankRect(piece);
  const { rect } = held.part;
  const others = pieces.map(blankRect);
  const beside = (axis: "x" | "y", size: "width" | "height", blade: number) =>
    others.flatMap((one) => [one[axis] - blade - blank[size], one[axis] + one[size] + blade]);
  const along = [blank.x, rect.x, rect.x + rect.width - blank.width, ...beside("x", "width", kerf.crosscut)];
  const across = [blank.y, rect.y, rect.y + rect.height - blank.height, ...beside("y", "height", kerf.rip)];
  return distinct(across).flatMap((y) => {
    const row = { ...piece, rect: movedBy(piece.rect, { x: 0, y: y - blank.y }) };
    const bad = movesIntoBadWood(row, held, board, "along").flatMap(({ from, to }) => [Math.floor(from), Math.ceil(to)]);
    const ends = bad.filter(Number.isFinite).map((move) => blank.x + move);
    return distinct([...along, ...ends])
      .map((x) => ({ x: x - blank.x, y: y - blank.y }))
      .filter((by) => isInside(movedBy(blank, by), rect));
  });
}

const distinct = (values: readonly number[]): number[] => [...new Set(values)].sort((a, b) => a - b);
