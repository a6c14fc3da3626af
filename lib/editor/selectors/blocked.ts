/**
 * Whether straight cuts can part the pieces on each board. Takes longer than a frame on a crowded board, so it is asked after a change and not while
 * something is dragged. The cuts themselves are worked out on the server when an order is issued.
 */
import {
  type BoardFace,
  boardEdges,
  cutRefusal,
  cutRequestFor,
  type FaceLayout,
  type Problem,
  type ShopLimits,
  um,
} from "@/lib/layout";

/** One problem a board whose pieces block one another. What else stands in the way of cutting is in `problemsOf`. */
export function blockedBoards(layout: FaceLayout, boards: readonly BoardFace[], limits: ShopLimits): Problem[] {
  const used = new Set(layout.groups.flatMap(({ placement }) => placement?.stockId ?? []));
  return boards.flatMap((board): Problem[] => {
    if (!used.has(board.id)) return [];
    const request = cutRequestFor(layout, board, {
      // Neither edges nor their truing decide whether pieces block one another; the board counts as straight.
      boardEdges: boardEdges(true, true),
      truingTakes: { longEdge: um(0), end: um(0) },
      limits,
      budget: 0,
    });
    const refusal = cutRefusal(request);
    return refusal?.reason === "blocked" ? [{ kind: "blocked", stockId: board.id, pieces: refusal.pieces }] : [];
  });
}
