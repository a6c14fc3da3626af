/** Saving a layout: from a base revision, checked by the core, in one transaction with its history and the order it makes out of date. */
import "server-only";
import type { z } from "zod";
import { recordHistory } from "@/db/queries/history";
import { findFace, touchJob } from "@/db/queries/job";
import { findLayout, listLayoutBoards, lockLayout, updateLayout } from "@/db/queries/layout";
import { layoutFaults } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import { faceLayoutSchema as documentSchema, type saveLayout as endpoint, type faceLayoutSchema } from "@/lib/schemas/layout";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, FaultError, notFound, refused } from "../faults";
import { requireSaws } from "../jobs/faces";
import { markSuperseded } from "../orders/supersede";

type Document = z.output<typeof faceLayoutSchema>;

export async function saveLayout(access: ShopAccess, faceId: string, body: BodyOf<typeof endpoint>) {
  const { baseRevision, document, crosscutSawId, ripSawId } = body;
  refuseFaults(document);
  const at = new Date();
  return database().transaction(async (tx) => {
    const found = await findFace(tx, access.shopId, faceId);
    const layout = await lockLayout(tx, access.shopId, faceId);
    if (!found || !layout) throw notFound("face");
    if (layout.revision !== baseRevision) {
      const present = await findLayout(tx, access.shopId, faceId);
      throw conflict("This layout was changed in another window meanwhile.", {
        revision: layout.revision,
        updatedBy: present?.updatedByName ?? "",
        document: documentSchema.parse(layout.document),
      });
    }
    await requireSaws(tx, access, [crosscutSawId, ripSawId]);
    await requireOnTable(tx, access, layout.id, document);
    const revision = baseRevision + 1;
    await updateLayout(tx, access.shopId, layout.id, { document, crosscutSawId, ripSawId, revision }, access.userId, at);
    await markSuperseded(tx, access.shopId, faceId, { userId: access.userId, reason: "layout changed" }, at);
    await touchJob(tx, access.shopId, found.face.jobId, at);
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "layout", nounId: layout.id, verb: "saved", detail: { revision, faceId } },
      at,
    );
    return { revision, updatedAt: at.toISOString() };
  });
}

/** A document whose shape means nothing is a mistake of the program that sent it. */
function refuseFaults(document: Document): void {
  const [fault] = layoutFaults(document);
  if (fault) throw new FaultError("bad-request", `The layout does not hold together (${fault.fault}).`, { detail: { ...fault } });
}

async function requireOnTable(
  tx: Parameters<typeof listLayoutBoards>[0],
  access: ShopAccess,
  layoutId: string,
  document: Document,
) {
  const onTable = new Set((await listLayoutBoards(tx, access.shopId, layoutId)).map(({ board }) => board.id));
  for (const { placement } of document.groups) {
    if (placement && !onTable.has(placement.stockId))
      throw refused("A piece lies on a board that is not on the table. Put the board there first.");
  }
}
