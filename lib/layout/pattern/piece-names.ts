/** Names by place in reading order, counted from 0: "p1", "p2", … and the labels "1", "2", … that are written on the wood. */
import type { PieceId } from "../piece";

export function pieceIdAt(readingIndex: number): PieceId {
  return `p${readingIndex + 1}`;
}

/** Digits only, so there is no I or O to mistake for a 1 or a 0. */
export function labelAt(readingIndex: number): string {
  return String(readingIndex + 1);
}
