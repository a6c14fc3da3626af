/** Pieces of a part in hand as blocks that may slide: sizes as sawn, and the room that the part and its bad wood leave each of them. */
import { movesInto, unionOf } from "../fit/forbidden-moves";
import { movesIntoArea } from "../fit/keep-clear";
import { NOISE_UM } from "../fit/noise";
import { movesOutside } from "../fit/outline";
import { roomBetween, type Span, type StockAxis, spansOf } from "../fit/span";
import type { CutKind } from "../program/program";
import type { Axis } from "../program/region";
import type { BoardFace } from "../stock/board";
import { type Um, um } from "../units/um";
import type { PartInHand, RestPiece } from "./part-in-hand";
import { blankRect, movedBy } from "./rect-edge";
import type { Block, Bounds } from "./ways-apart";

const stockAxis = { x: "along", y: "across" } as const satisfies Readonly<Record<Axis, StockAxis>>;

export function blocksOf(held: PartInHand, pieces: readonly RestPiece[], board: BoardFace): readonly Block[] {
  return pieces.map((piece): Block => {
    const blank = blankRect(piece);
    const room = (axis: Axis, from: number, size: number, partFrom: number, partSize: number): Span => {
      const free = freeMoves(piece, held, board, stockAxis[axis]);
      return {
        from: Math.max(partFrom, Math.ceil(from + free.from - NOISE_UM)),
        to: Math.min(partFrom + partSize - size, Math.floor(from + free.to + NOISE_UM)),
      };
    };
    const { rect } = held.part;
    return {
      id: piece.pieceId,
      size: { x: blank.width, y: blank.height },
      from: { x: blank.x, y: blank.y },
      room: {
        x: room("x", blank.x, blank.width, rect.x, rect.width),
        y: room("y", blank.y, blank.height, rect.y, rect.height),
      },
    };
  });
}

export function boundsOf({ part }: PartInHand, kerf: Readonly<Record<CutKind, Um>>): Bounds {
  return { size: { x: part.rect.width, y: part.rect.height }, kerf: { x: kerf.crosscut, y: kerf.rip } };
}

/** The pieces with the edge nearer the origin of what is sawn for each at these places. */
export function placedAt(pieces: readonly RestPiece[], x: readonly number[], y: readonly number[]): readonly RestPiece[] {
  return pieces.map((piece, i) => {
    const blank = blankRect(piece);
    const by = { x: um((x[i] ?? blank.x) - blank.x), y: um((y[i] ?? blank.y) - blank.y) };
    return { ...piece, rect: movedBy(piece.rect, by) };
  });
}

/** The moves along one axis, about standing still, that meet no bad wood; empty when the piece lies in some. */
function freeMoves(piece: RestPiece, held: PartInHand, board: BoardFace, axis: StockAxis): Span {
  const forbidden = movesIntoBadWood(piece, held, board, axis);
  if (forbidden.some(({ from, to }) => from < -NOISE_UM && to > NOISE_UM)) return { from: 1, to: -1 };
  return {
    from: Math.max(...forbidden.filter(({ to }) => to <= NOISE_UM).map(({ to }) => to), Number.NEGATIVE_INFINITY),
    to: Math.min(...forbidden.filter(({ from }) => from >= -NOISE_UM).map(({ from }) => from), Number.POSITIVE_INFINITY),
  };
}

/** Moves along one axis onto a keep-clear area, over the outline or into spoiled wood, as open intervals in order. */
export function movesIntoBadWood(
  piece: RestPiece,
  { spoiled }: Pick<PartInHand, "spoiled">,
  board: BoardFace,
  axis: StockAxis,
): readonly Span[] {
  const spans = spansOf(piece.rect);
  const blank = spansOf(blankRect(piece));
  const other = axis === "along" ? "across" : "along";
  return unionOf([
    ...board.keepClear.flatMap(({ area }) => movesIntoArea(spans, area, axis)),
    ...(board.outline === null ? [] : movesOutside(spans, board.outline, axis)),
    ...spoiled
      .map((rect) => spansOf(rect))
      .filter((bad) => roomBetween(bad[other], blank[other]) < 0)
      .map((bad) => movesInto(blank[axis], bad[axis])),
  ]);
}
