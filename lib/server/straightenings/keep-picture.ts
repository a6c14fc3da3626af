/** Writes a finished picture into its version, shows it in the rack, and takes over what was drawn on the version before. */
import "server-only";
import { v7 as newId } from "uuid";
import type { Connection } from "@/db/client";
import { lockBoard } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import {
  endWaitingStraightening,
  findBoardPicture,
  listKeepClear,
  replaceKeepClear,
  type StraighteningRow,
  setBoardPicture,
} from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import { carryOutline, liesOnBoard } from "@/lib/layout";

export type MadePicture = Pick<StraighteningRow, "length" | "width" | "pxPerMm" | "residual" | "levels">;

/** Call it with the transaction that ends the task. */
export async function keepPicture(
  tx: Connection,
  shopId: ShopId,
  version: Pick<StraighteningRow, "id" | "boardId" | "version">,
  made: MadePicture,
  at: Date,
): Promise<void> {
  const board = await lockBoard(tx, shopId, version.boardId);
  if (!board) throw new Error("the board of a version is gone");
  const shown = await findBoardPicture(tx, shopId, version.boardId);
  const carried = shown ? await carryZones(tx, shopId, shown, version.id, made) : null;
  const outline = carried?.outline ?? null;
  if (!(await endWaitingStraightening(tx, shopId, version.id, { ...made, outline, state: "done" }))) {
    throw new Error("the version waits for no picture any more");
  }
  // Two versions may be in the making at once; the later marking wins, whichever picture is done first.
  if (!shown || shown.version < version.version) {
    const size = { length: made.length, width: made.width, revision: board.revision + 1 };
    await setBoardPicture(tx, shopId, { boardId: version.boardId, straighteningId: version.id, size }, at);
  }
  const detail = {
    version: version.version,
    straighteningId: version.id,
    length: made.length,
    width: made.width,
    ...(carried && { areasFrom: carried.from, outline: carried.fate, areasKept: carried.kept, areasDropped: carried.dropped }),
  };
  await recordHistory(tx, shopId, { userId: null, noun: "board", nounId: version.boardId, verb: "straightened", detail }, at);
}

async function carryZones(
  tx: Connection,
  shopId: ShopId,
  from: StraighteningRow,
  toId: string,
  size: Pick<StraighteningRow, "length" | "width">,
) {
  const { fate, outline } = carryOutline(from.outline, size);
  const areas = await listKeepClear(tx, shopId, from.id);
  const kept = areas.filter(({ area }) => liesOnBoard(area, size));
  await replaceKeepClear(
    tx,
    shopId,
    toId,
    kept.map((area) => ({ ...area, id: newId() })),
  );
  return { from: from.version, fate, outline: outline && [...outline], kept: kept.length, dropped: areas.length - kept.length };
}
