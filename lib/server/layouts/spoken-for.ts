/** What other faces take of the boards on a table, so that no wood is cut twice. Only faces of open jobs count, as in the rack. */
import "server-only";
import type { Connection } from "@/db/client";
import { listHolds } from "@/db/queries/layout";
import { listCutAndSuperseded, listIssuedFaces } from "@/db/queries/order";
import type { ShopId } from "@/db/shop-id";
import { woodTaken } from "@/lib/layout";
import type { SpokenForPiece } from "@/lib/schemas/spoken-for";

type Hold = Awaited<ReturnType<typeof listHolds>>[number];

export interface Holder extends Hold {
  /** Of the face, or of the order that has cut it where it lies no more. */
  readonly id: string;
  /** `planned`: laid out. `issued`: a cut order that still holds was issued; every change of the layout ends it, so it is as it was
   *  issued. `gone`: cut, and the layout or the wood was changed afterwards; it lies there no more, but neither does the wood. */
  readonly standing: "planned" | "issued" | "gone";
}

/** What other layouts have of each of these boards, in the order of their jobs and faces, and after them what is gone. */
export async function holdersOf(
  db: Connection,
  shopId: ShopId,
  boardIds: readonly string[],
  exceptLayoutId: string,
): Promise<Holder[]> {
  const holds = await listHolds(db, shopId, boardIds, exceptLayoutId);
  const faceIds = [...new Set(holds.map(({ faceId }) => faceId))];
  const issued = await listIssuedFaces(db, shopId, faceIds);
  const lying = holds.map(
    (hold): Holder => ({ ...hold, id: hold.faceId, standing: issued.has(hold.faceId) ? "issued" : "planned" }),
  );
  return [...lying, ...(await goneFrom(db, shopId, boardIds, exceptLayoutId))];
}

/** Their pieces on one board. Layouts on another version of its picture lie in another frame and cannot be compared. */
export function spokenForOn(holders: readonly Holder[], boardId: string, straighteningId: string): SpokenForPiece[] {
  return holders
    .filter((holder) => holder.boardId === boardId && holder.straighteningId === straighteningId)
    .flatMap(({ id, document, faceId, faceTitle, jobTitle, standing }) =>
      woodTaken(document, boardId).map(({ piece, label, rect, kerfs }) => ({
        id: `${id} ${piece}`,
        rect,
        kerfs,
        label,
        faceId,
        faceTitle,
        jobTitle,
        issued: standing !== "planned",
      })),
    );
}

async function goneFrom(db: Connection, shopId: ShopId, boardIds: readonly string[], exceptLayoutId: string): Promise<Holder[]> {
  if (boardIds.length === 0) return [];
  const cut = await listCutAndSuperseded(db, shopId, exceptLayoutId);
  return cut.flatMap(({ orderId, faceId, snapshot, jobTitle }) => {
    const face = snapshot.faces.find((one) => one.faceId === faceId);
    if (!face) return [];
    return snapshot.boards
      .filter(({ boardId }) => boardIds.includes(boardId))
      .map(({ boardId, straighteningId }) => ({
        id: orderId,
        standing: "gone",
        boardId,
        straighteningId,
        document: face.layout,
        faceId,
        faceTitle: face.title,
        jobTitle,
      }));
  });
}
