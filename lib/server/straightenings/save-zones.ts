/** Saving outline, keep-clear areas and glue lines of a version, as one, from a base revision, and superseding the orders made from them. */
import "server-only";
import { isDeepStrictEqual } from "node:util";
import type { Connection } from "@/db/client";
import { isDuplicateKey } from "@/db/duplicate-key";
import { findBlank } from "@/db/queries/blank";
import { lockBoard, setBoardKind } from "@/db/queries/board";
import { listGlueLines, replaceGlueLines } from "@/db/queries/glue-line";
import { recordHistory } from "@/db/queries/history";
import { listLayoutsOnVersion } from "@/db/queries/layout";
import {
  findBoardPicture,
  findStraightening,
  listKeepClear,
  lockStraightening,
  replaceKeepClear,
  type StraighteningRow,
  updateOutline,
} from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import { type LengthStyle, liesOnBoard, liesWithin, outsideFault, polygonFault } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { saveZones as endpoint } from "@/lib/schemas/straightening";
import type { GlueLine, Zones } from "@/lib/schemas/zones";
import { polygonFaultWords } from "@/lib/words/polygon-fault";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound, refused } from "../faults";
import { markSuperseded } from "../orders/supersede";
import { lengthStyleOf } from "../shops";

export async function saveZones(access: ShopAccess, straighteningId: string, zones: BodyOf<typeof endpoint>): Promise<Zones> {
  const style = await lengthStyleOf(access.shopId);
  const at = new Date();
  return database().transaction(async (tx) => {
    if (zones.glueLines) await lockBoardOf(tx, access, straighteningId);
    // Locked before anything else is read: an order is issued from the areas as they were or as they will be, never in between.
    const row = await lockStraightening(tx, access.shopId, straighteningId);
    if (!row) throw notFound("version of a board's picture");
    if (row.state !== "done")
      throw refused("This version has no picture to draw on. Wait until it is done, or mark the board again.");
    refuseFaults(zones, row, style);
    const glueLines = await listGlueLines(tx, access.shopId, straighteningId);
    const before = { outline: row.outline, keepClear: await listKeepClear(tx, access.shopId, straighteningId), glueLines };
    const after = { ...zones, glueLines: zones.glueLines ? withBoardsOf(glueLines, zones.glueLines) : glueLines };
    if (!(await updateOutline(tx, access.shopId, straighteningId, zones.revision, zones.outline))) {
      throw conflict("Somebody else changed these areas meanwhile. Load them again and repeat your change.", {
        revision: row.zonesRevision,
      });
    }
    if (matters(before, after)) await supersedeOrdersOn(tx, access, row, at);
    await replaceKeepClear(tx, access.shopId, straighteningId, zones.keepClear).catch(refuseTakenId);
    if (zones.glueLines) {
      await replaceGlueLines(tx, access.shopId, straighteningId, after.glueLines).catch(refuseTakenId);
      await refreshKind(tx, access.shopId, row, at);
    }
    const detail = {
      version: row.version,
      straighteningId,
      keepClear: zones.keepClear.length,
      outline: zones.outline !== null,
      glueLines: after.glueLines.length,
    };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "board", nounId: row.boardId, verb: "areas drawn", detail },
      at,
    );
    return { ...after, revision: zones.revision + 1 };
  });
}

/** Boards are locked before what is drawn on them, here as where an order is issued. */
async function lockBoardOf(tx: Connection, { shopId }: ShopAccess, straighteningId: string): Promise<void> {
  const version = await findStraightening(tx, shopId, straighteningId);
  if (version) await lockBoard(tx, shopId, version.boardId);
}

/** Which boards meet at a line is known from gluing it up, and stays with the line. */
function withBoardsOf(known: readonly GlueLine[], lines: readonly GlueLine[]): GlueLine[] {
  return lines
    .map(({ id, across }) => {
      const { aboveBoardId = null, belowBoardId = null } = known.find((line) => line.id === id) ?? {};
      return { id, across, aboveBoardId, belowBoardId };
    })
    .sort((a, b) => a.across - b.across || (a.id < b.id ? -1 : 1));
}

/** A board with glue lines on the picture of its face is a blank. One that was planned as a blank stays one. */
async function refreshKind(tx: Connection, shopId: ShopId, { id, boardId }: StraighteningRow, at: Date): Promise<void> {
  const face = await findBoardPicture(tx, shopId, boardId);
  if (face?.id !== id || (await findBlank(tx, shopId, boardId))) return;
  const lines = await listGlueLines(tx, shopId, id);
  await setBoardKind(tx, shopId, boardId, lines.length > 0 ? "blank" : "board", at);
}

type Drawn = Pick<Zones, "outline" | "keepClear" | "glueLines">;

/** Whether an order made from the one would have to be looked at again under the other. What is noted beside an area cuts nothing. */
function matters(before: Drawn, after: Drawn): boolean {
  const drawn = ({ outline, keepClear, glueLines }: Drawn) => ({
    outline,
    glueLines: glueLines.map(({ across }) => across),
    areas: keepClear.map(({ id, kind, area }) => ({ id, kind, area })).sort((a, b) => (a.id < b.id ? -1 : 1)),
  });
  return !isDeepStrictEqual(drawn(before), drawn(after));
}

/** Of every face whose pieces lie on this version. A board that only stands on the table gives nothing to an order. */
async function supersedeOrdersOn(tx: Connection, access: ShopAccess, { id, boardId }: StraighteningRow, at: Date): Promise<void> {
  for (const { faceId, document } of await listLayoutsOnVersion(tx, access.shopId, id)) {
    const lies = document.groups.some(({ placement }) => placement?.stockId === boardId);
    if (lies) await markSuperseded(tx, access.shopId, faceId, { userId: access.userId, reason: "areas drawn" }, at);
  }
}

/** A polygon must enclose wood in one piece; the outline must stay on the board, while areas may hang over its edge as knots do. */
function refuseFaults(
  { outline, keepClear, glueLines = [] }: BodyOf<typeof endpoint>,
  size: Pick<StraighteningRow, "length" | "width">,
  style: LengthStyle,
): void {
  const fault = outline && (polygonFault(outline) ?? outsideFault(outline, size));
  if (fault) throw refused(polygonFaultWords("The outline", fault, style), { outline: [fault.fault] });
  const off = glueLines.findIndex((line) => !liesWithin(line, size.width));
  if (off >= 0) {
    throw refused(`Glue line ${off + 1} lies off the board. Move it between its edges or remove it.`, {
      glueLines: [String(off)],
    });
  }
  for (const [index, { area }] of keepClear.entries()) {
    const crossed = area.shape === "polygon" ? polygonFault(area.points) : null;
    if (crossed) throw refused(polygonFaultWords(`Area ${index + 1}`, crossed, style), { keepClear: [String(index)] });
    if (!liesOnBoard(area, size)) {
      throw refused(`Area ${index + 1} lies wholly off the board. Move it onto the wood or remove it.`, {
        keepClear: [String(index)],
      });
    }
  }
}

function refuseTakenId(error: unknown): never {
  if (isDuplicateKey(error)) throw refused("Two areas have the same id. Give a new area an id of its own.");
  throw error;
}
