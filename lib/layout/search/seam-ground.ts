/** The seams of a layout as `planSeams` asks about them. */
import { lyingPieces } from "../fit/lying-piece";
import type { FaceLayout } from "../pattern/face-layout";
import { layOut } from "../pattern/lay-out";
import type { PieceId, StockId } from "../piece";
import { seams } from "../seam/seams";
import { profileWindow } from "./profile-window";
import type { SeamGround } from "./seam-plan";
import type { SearchPicture } from "./search-picture";

export function seamGround(
  layout: FaceLayout,
  moves: (id: PieceId) => boolean,
  pictureOf: (stockId: StockId) => SearchPicture | null,
): SeamGround {
  const pieces = layOut(layout);
  const pieceById = new Map(pieces.map((piece) => [piece.id, piece]));
  const lyingById = new Map(lyingPieces(layout, pieces).map((piece) => [piece.id, piece]));
  return {
    seams: seams(layout, pieces),
    moves,
    windowOf: (seam, side) => {
      const [piece, lying] = [pieceById.get(seam[side]), lyingById.get(seam[side])];
      return piece === undefined || lying === undefined ? null : profileWindow(seam, side, piece, lying);
    },
    stockOf: (id) => pieceById.get(id)?.stockId ?? null,
    pictureOf,
  };
}
