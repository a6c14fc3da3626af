/** Writes a finished picture into its version, makes it the picture of its side, and takes over what was drawn on the version before. */
import "server-only";
import { v7 as newId } from "uuid";
import type { Connection } from "@/db/client";
import { lockBoard } from "@/db/queries/board";
import { type GlueLineRow, listGlueLines, replaceGlueLines } from "@/db/queries/glue-line";
import { recordHistory } from "@/db/queries/history";
import {
  endWaitingStraightening,
  findBoardPicture,
  listKeepClear,
  replaceKeepClear,
  type StraighteningRow,
  setBackPicture,
  setBoardPicture,
} from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import { carryGlueLines, carryOutline, liesOnBoard, um } from "@/lib/layout";

export type MadePicture = Pick<StraighteningRow, "length" | "width" | "pxPerMm" | "residual" | "levels">;
type Size = Pick<StraighteningRow, "length" | "width">;

/** Call it with the transaction that ends the task. */
export async function keepPicture(
  tx: Connection,
  shopId: ShopId,
  version: Pick<StraighteningRow, "id" | "boardId" | "version" | "side">,
  made: MadePicture,
  at: Date,
): Promise<void> {
  const { boardId, side } = version;
  const board = await lockBoard(tx, shopId, boardId);
  if (!board) throw new Error("the board of a version is gone");
  const shown = await findBoardPicture(tx, shopId, boardId, side);
  const carried = shown ? await carryZones(tx, shopId, shown, version.id, made) : null;
  if (!shown && side === "back") await carryGlueLinesThrough(tx, shopId, boardId, version.id, made);
  const outline = carried?.outline ?? null;
  if (!(await endWaitingStraightening(tx, shopId, version.id, { ...made, outline, state: "done" }))) {
    throw new Error("the version waits for no picture any more");
  }
  // Two versions may be in the making at once; the later marking wins, whichever picture is done first.
  if (!shown || shown.version < version.version) {
    const size = { length: made.length, width: made.width, revision: board.revision + 1 };
    if (side === "back") await setBackPicture(tx, shopId, boardId, version.id);
    else await setBoardPicture(tx, shopId, { boardId, straighteningId: version.id, size }, at);
  }
  const detail = {
    version: version.version,
    straighteningId: version.id,
    side,
    length: made.length,
    width: made.width,
    ...(carried && { areasFrom: carried.from, outline: carried.fate, areasKept: carried.kept, areasDropped: carried.dropped }),
  };
  await recordHistory(tx, shopId, { userId: null, noun: "board", nounId: boardId, verb: "straightened", detail }, at);
}

async function carryZones(tx: Connection, shopId: ShopId, from: StraighteningRow, toId: string, size: Size) {
  const { fate, outline } = carryOutline(from.outline, size);
  const areas = await listKeepClear(tx, shopId, from.id);
  const kept = areas.filter(({ area }) => liesOnBoard(area, size));
  await replaceKeepClear(
    tx,
    shopId,
    toId,
    kept.map((area) => ({ ...area, id: newId() })),
  );
  await putGlueLines(tx, shopId, toId, carryGlueLines(await listGlueLines(tx, shopId, from.id), size.width));
  return { from: from.version, fate, outline: outline && [...outline], kept: kept.length, dropped: areas.length - kept.length };
}

/** A glue line goes through the wood: the first picture of the back has those of the face, turned over. Areas are never taken over by themselves. */
async function carryGlueLinesThrough(tx: Connection, shopId: ShopId, boardId: string, toId: string, { width }: Size) {
  const face = await findBoardPicture(tx, shopId, boardId);
  const lines = face ? await listGlueLines(tx, shopId, face.id) : [];
  const turned = lines.map((line) => ({
    ...line,
    across: um(width - line.across),
    aboveBoardId: line.belowBoardId,
    belowBoardId: line.aboveBoardId,
  }));
  await putGlueLines(tx, shopId, toId, carryGlueLines(turned, width));
}

const putGlueLines = (tx: Connection, shopId: ShopId, toId: string, lines: readonly GlueLineRow[]) =>
  replaceGlueLines(
    tx,
    shopId,
    toId,
    lines.map((line) => ({ ...line, id: newId() })),
  );
