/** What other faces are laid out to take of the boards on a table. Only faces of open jobs count, as in the rack. Whose a board is, is in `taken-by.ts`. */
import "server-only";
import type { Connection } from "@/db/client";
import { listHolds } from "@/db/queries/layout";
import { listIssuedFaces } from "@/db/queries/order";
import type { ShopId } from "@/db/shop-id";
import { woodTaken } from "@/lib/layout";
import type { SpokenForPiece } from "@/lib/schemas/spoken-for";

type Hold = Awaited<ReturnType<typeof listHolds>>[number];

export interface Holder extends Hold {
  /** A cut order that still holds was issued; every change of the layout ends it, so it is as it was issued. */
  readonly issued: boolean;
}

/** What other layouts have of each of these boards, in the order of their jobs and faces. */
export async function holdersOf(
  db: Connection,
  shopId: ShopId,
  boardIds: readonly string[],
  exceptLayoutId: string,
): Promise<Holder[]> {
  const holds = await listHolds(db, shopId, boardIds, exceptLayoutId);
  const faceIds = [...new Set(holds.map(({ faceId }) => faceId))];
  const issued = await listIssuedFaces(db, shopId, faceIds);
  return holds.map((hold) => ({ ...hold, issued: issued.has(hold.faceId) }));
}

/** Their pieces on one board. Layouts on another version of its picture lie in another frame and cannot be compared. */
export function spokenForOn(holders: readonly Holder[], boardId: string, straighteningId: string): SpokenForPiece[] {
  return holders
    .filter((holder) => holder.boardId === boardId && holder.straighteningId === straighteningId)
    .flatMap(({ document, faceId, faceTitle, jobTitle, issued }) =>
      woodTaken(document, boardId).map(({ piece, label, rect, kerfs }) => ({
        id: `${faceId} ${piece}`,
        rect,
        kerfs,
        label,
        faceId,
        faceTitle,
        jobTitle,
        issued,
      })),
    );
}
