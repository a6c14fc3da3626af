/** What an order needs labels for, board by board: strips as they come to hand, fronts, and what goes back to the rack. */
import "server-only";
import { carpentersTriangle, type FaceLayout, type FaceRect, facePieces, type Part, type TriangleSegment } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";

export interface OrderLabel {
  readonly label: string;
  readonly kind: "front" | "strip" | "offcut";
  readonly board: SnapshotBoard;
  /** Finished for fronts, as sawn for the rest. */
  readonly size: Pick<Part["rect"], "width" | "height">;
  /** A front as seen from the show side with its part of the triangle; null for what is no front. */
  readonly front: { readonly rect: FaceRect; readonly segments: readonly TriangleSegment[] } | null;
}

export function orderLabels(snapshot: OrderSnapshot): readonly OrderLabel[] {
  return snapshot.boards.flatMap((board) => [
    ...strips(board).map((part) => labelOf(board, part, "strip", null)),
    ...inReadingOrder(board).map((part) => labelOf(board, part, "front", frontOf(snapshot, part.pieceId))),
    ...board.program.offcuts.map((part) => labelOf(board, part, "offcut", null)),
  ]);
}

function labelOf(board: SnapshotBoard, part: Part, kind: OrderLabel["kind"], front: OrderLabel["front"]): OrderLabel {
  return { label: part.label ?? "", kind, board, size: part.rect, front };
}

/** A strip keeps its letter while pieces come off it: one label, with the size at which it was first cut. */
function strips({ program }: SnapshotBoard): Part[] {
  const byLabel = new Map<string, Part>();
  for (const part of program.steps.flatMap(({ yields }) => yields)) {
    if (part.kind === "strip" && part.label !== null && !byLabel.has(part.label)) byLabel.set(part.label, part);
  }
  return [...byLabel.values()];
}

function inReadingOrder({ program }: SnapshotBoard): Part[] {
  return [...program.pieces].sort((a, b) => Number(a.label) - Number(b.label));
}

function frontOf({ faces }: OrderSnapshot, pieceId: string | null): OrderLabel["front"] {
  for (const { layout } of faces) {
    const front = pieceId === null ? null : frontIn(layout, pieceId);
    if (front) return front;
  }
  return null;
}

function frontIn(layout: FaceLayout, pieceId: string): OrderLabel["front"] {
  const rect = facePieces(layout).find(({ id }) => id === pieceId)?.rect;
  const segments = carpentersTriangle(layout).find(({ piece }) => piece === pieceId)?.segments;
  return rect && segments ? { rect, segments } : null;
}
