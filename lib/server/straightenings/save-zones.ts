/** Saving outline and keep-clear areas of a version, as one, from a base revision. */
import "server-only";
import { isDuplicateKey } from "@/db/duplicate-key";
import { recordHistory } from "@/db/queries/history";
import { findStraightening, replaceKeepClear, type StraighteningRow, updateOutline } from "@/db/queries/straightening";
import { type LengthStyle, liesOnBoard, outsideFault, polygonFault } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { saveZones as endpoint } from "@/lib/schemas/straightening";
import type { Zones } from "@/lib/schemas/zones";
import { polygonFaultWords } from "@/lib/words/polygon-fault";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound, refused } from "../faults";
import { lengthStyleOf } from "../shops";

export async function saveZones(access: ShopAccess, straighteningId: string, zones: BodyOf<typeof endpoint>): Promise<Zones> {
  const style = await lengthStyleOf(access.shopId);
  const at = new Date();
  return database().transaction(async (tx) => {
    const row = await findStraightening(tx, access.shopId, straighteningId);
    if (!row) throw notFound("version of a board's picture");
    if (row.state !== "done")
      throw refused("This version has no picture to draw on. Wait until it is done, or mark the board again.");
    refuseFaults(zones, row, style);
    if (!(await updateOutline(tx, access.shopId, straighteningId, zones.revision, zones.outline))) {
      throw conflict("Somebody else changed these areas meanwhile. Load them again and repeat your change.", {
        revision: row.zonesRevision,
      });
    }
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
