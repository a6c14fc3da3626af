/** Saving outline and keep-clear areas of a version, as one, from a base revision, and superseding the orders made from them. */
import "server-only";
import { isDeepStrictEqual } from "node:util";
import type { Connection } from "@/db/client";
import { isDuplicateKey } from "@/db/duplicate-key";
import { recordHistory } from "@/db/queries/history";
import { listLayoutsOnVersion } from "@/db/queries/layout";
import {
  listKeepClear,
  lockStraightening,
  replaceKeepClear,
  type StraighteningRow,
  updateOutline,
} from "@/db/queries/straightening";
import { type LengthStyle, liesOnBoard, outsideFault, polygonFault } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { saveZones as endpoint } from "@/lib/schemas/straightening";
import type { Zones } from "@/lib/schemas/zones";
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
    // Locked before anything else is read: an order is issued from the areas as they were or as they will be, never in between.
    const row = await lockStraightening(tx, access.shopId, straighteningId);
    if (!row) throw notFound("version of a board's picture");
    if (row.state !== "done")
      throw refused("This version has no picture to draw on. Wait until it is done, or mark the board again.");
    refuseFaults(zones, row, style);
    const before = { outline: row.outline, keepClear: await listKeepClear(tx, access.shopId, straighteningId) };
    if (!(await updateOutline(tx, access.shopId, straighteningId, zones.revision, zones.outline))) {
      throw conflict("Somebody else changed these areas meanwhile. Load them again and repeat your change.", {
        revision: row.zonesRevision,
      });
    }
    if (matters(before, zones)) await supersedeOrdersOn(tx, access, row, at);
    await replaceKeepClear(tx, access.shopId, straighteningId, zones.keepClear).catch(refuseTakenId);
    const detail = { version: row.version, straighteningId, keepClear: zones.keepClear.length, outline: zones.outline !== null };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "board", nounId: row.boardId, verb: "areas drawn", detail },
      at,
    );
    return { ...zones, revision: zones.revision + 1 };
  });
}

type Drawn = Pick<Zones, "outline" | "keepClear">;

/** Whether an order made from the one would have to be looked at again under the other. What is noted beside an area cuts nothing. */
function matters(before: Drawn, after: Drawn): boolean {
  const drawn = ({ outline, keepClear }: Drawn) => ({
    outline,
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
function refuseFaults({ outline, keepClear }: Zones, size: Pick<StraighteningRow, "length" | "width">, style: LengthStyle): void {
  const fault = outline && (polygonFault(outline) ?? outsideFault(outline, size));
  if (fault) throw refused(polygonFaultWords("The outline", fault, style), { outline: [fault.fault] });
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
