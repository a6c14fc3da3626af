/** Which piece lies under a point. Small pieces get a margin, so that a fingertip finds them. */
import { boundsOf, type FaceLayout, facePieces, layOut, type PieceId, polygonToStock } from "@/lib/layout";
import type { BoardPlace, TablePoint } from "./geometry";

/** The piece of the stock side, the one on top where two overlap; null beside all of them. `reach`: how far beside still counts, µm. */
export function pieceOnStockAt(
  layout: FaceLayout,
  places: readonly BoardPlace[],
  point: TablePoint,
  reach: number,
): PieceId | null {
  const topOf = new Map(places.map(({ stockId, top }) => [stockId, top]));
  const boxes = layOut(layout).flatMap((piece) => {
    const top = topOf.get(piece.stockId);
    if (top === undefined) return [];
    const box = boundsOf(polygonToStock(piece.stockFromFace, piece.outline));
    return [{ id: piece.id, x: box.x, y: box.y + top, width: box.width, height: box.height }];
  });
  return nearestBox(boxes, point, reach);
}

/** The piece of the show side at a point of the face frame. */
export function pieceOnFaceAt(layout: Pick<FaceLayout, "face">, point: TablePoint, reach: number): PieceId | null {
  return nearestBox(
    facePieces(layout).map(({ id, rect }) => ({ id, x: rect.x, y: rect.y, width: rect.width, height: rect.height })),
    point,
    reach,
  );
}

interface Box {
  readonly id: PieceId;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

function nearestBox(boxes: readonly Box[], { x, y }: TablePoint, reach: number): PieceId | null {
  let best: { id: PieceId; distance: number } | null = null;
  for (const box of boxes) {
    const dx = Math.max(box.x - x, x - box.x - box.width, 0);
    const dy = Math.max(box.y - y, y - box.y - box.height, 0);
    const distance = Math.hypot(dx, dy);
    if (distance <= reach && (best === null || distance <= best.distance)) best = { id: box.id, distance };
  }
  return best?.id ?? null;
}
