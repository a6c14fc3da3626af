/** What the bench enters while it cuts. Of one thing there is one entry; who corrects it says which version they saw. */
import "server-only";
import type { z } from "zod";
import type { Connection } from "@/db/client";
import { correctAsCut, deleteAsCut, findAsCut, findAsCutBySubject, insertAsCut, listAsCut } from "@/db/queries/as-cut";
import { recordHistory } from "@/db/queries/history";
import { lockOrder, lockRevision } from "@/db/queries/order";
import { listTicks } from "@/db/queries/step-tick";
import type { ShopId } from "@/db/shop-id";
import { carryOut } from "@/lib/layout";
import { type AsCut, type AsCutEntry, type asCutSchema, asCutSubject } from "@/lib/schemas/as-cut";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { orderSteps } from "@/lib/schemas/order-steps";
import { restRequestOf } from "@/lib/schemas/rest-request";
import { asCutWords, restFaultSentence } from "@/lib/words/as-cut";
import { styleOf } from "@/lib/words/order-step";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound, refused } from "../faults";
import { supersededConflict } from "./superseded-conflict";

export interface RevisionAddress {
  readonly orderId: string;
  readonly revisionId: string;
}

type Answer = { asCut: z.input<typeof asCutSchema>[] };

/** `seenVersion`: of the entry that is corrected; null: a new one. */
export async function enterAsCut(
  access: ShopAccess,
  address: RevisionAddress,
  { entry, seenVersion }: { readonly entry: AsCutEntry; readonly seenVersion: number | null },
): Promise<Answer> {
  const { shopId, userId } = access;
  return onLiveRevision(access, address, async (tx, { revision, snapshot }) => {
    const subject = asCutSubject(entry);
    const there = await findAsCutBySubject(tx, shopId, address.revisionId, subject);
    await refuseOther(tx, shopId, address, snapshot, there, seenVersion);
    await refuseImpossible(tx, shopId, address, snapshot, entry);
    const at = new Date();
    const stamp = { enteredBy: userId, enteredAt: at };
    const { revisionId, orderId } = address;
    if (there) await correctAsCut(tx, shopId, there.id, { entry, version: there.version + 1, ...stamp });
    else await insertAsCut(tx, shopId, { revisionId, kind: entry.kind, subject, entry, ...stamp });
    const verb = there ? "as-cut corrected" : "as-cut entered";
    const detail = { revision, entry, ...(there && { before: there.entry }) };
    await recordHistory(tx, shopId, { userId, noun: "order", nounId: orderId, verb, detail }, at);
  });
}

export async function removeAsCut(
  access: ShopAccess,
  { asCutId, ...address }: RevisionAddress & { readonly asCutId: string },
  seenVersion: number,
): Promise<Answer> {
  const { shopId, userId } = access;
  return onLiveRevision(access, address, async (tx, { revision, snapshot }) => {
    const there = await findAsCut(tx, shopId, address.revisionId, asCutId);
    if (!there) throw notFound("entry of this cut order");
    await refuseOther(tx, shopId, address, snapshot, there, seenVersion);
    await deleteAsCut(tx, shopId, there.id);
    const detail = { revision, entry: there.entry };
    const row = { userId, noun: "order", nounId: address.orderId, verb: "as-cut taken back", detail } as const;
    await recordHistory(tx, shopId, row, new Date());
  });
}

/** What was entered of a revision, as it goes over the wire. */
export async function asCutOf(db: Connection, shopId: ShopId, revisionId: string): Promise<AsCut[]> {
  const rows = await listAsCut(db, shopId, revisionId);
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}

/** Locked as ticking locks it, so that nothing is ticked or issued meanwhile. Answers with all entries, so that the screen also learns what others entered. */
async function onLiveRevision(
  { shopId }: ShopAccess,
  { orderId, revisionId }: RevisionAddress,
  act: (tx: Connection, revision: { readonly revision: number; readonly snapshot: OrderSnapshot }) => Promise<void>,
): Promise<Answer> {
  return database().transaction(async (tx) => {
    await lockOrder(tx, shopId, orderId);
    const revision = await lockRevision(tx, shopId, orderId, revisionId);
    if (!revision) throw notFound("revision of this cut order");
    if (revision.supersededAt !== null) throw await supersededConflict(tx, shopId, orderId, revision.revision);
    await act(tx, revision);
    return { asCut: await asCutOf(tx, shopId, revisionId) };
  });
}

/** Somebody else entered or corrected it meanwhile, or took it back. The detail carries what is there now. */
async function refuseOther(
  tx: Connection,
  shopId: ShopId,
  { revisionId }: RevisionAddress,
  snapshot: OrderSnapshot,
  there: { readonly id: string; readonly version: number } | undefined,
  seenVersion: number | null,
): Promise<void> {
  if ((there?.version ?? null) === seenVersion) return;
  const all = await asCutOf(tx, shopId, revisionId);
  const present = all.find(({ id }) => id === there?.id);
  const message = present
    ? `${present.by} entered meanwhile: ${asCutWords(present.entry, snapshot, styleOf(snapshot))}. Look at it before you correct it.`
    : "That entry was taken back meanwhile.";
  throw conflict(message, { asCut: all });
}

/** An entry that cannot be true of this order, with what is ticked and entered otherwise. */
async function refuseImpossible(
  tx: Connection,
  shopId: ShopId,
  { revisionId }: RevisionAddress,
  snapshot: OrderSnapshot,
  entry: AsCutEntry,
): Promise<void> {
  if (!concernsSomething(entry, snapshot)) throw refused("This order has nothing that this entry could be about.");
  const subject = asCutSubject(entry);
  const others = (await listAsCut(tx, shopId, revisionId)).map((row) => row.entry).filter((one) => asCutSubject(one) !== subject);
  const ticked = new Set((await listTicks(tx, shopId, revisionId)).map(({ stepId }) => stepId));
  const begun = { snapshot, ticked, entries: [...others, entry] };
  for (const board of snapshot.boards) {
    const carried = carryOut(restRequestOf(begun, board));
    if (!carried.ok) throw refused(restFaultSentence(carried, snapshot, board.tag));
  }
}

function concernsSomething(entry: AsCutEntry, snapshot: OrderSnapshot): boolean {
  if (entry.kind !== "kerf") return snapshot.boards.some(({ boardId }) => boardId === entry.boardId);
  const step = orderSteps(snapshot).find(({ id }) => id === entry.stepId);
  if (step?.kind === "test-cut") return entry.reach === "all";
  return (
    step?.kind === "cut" &&
    (step.cut.kind === "rip" || step.cut.kind === "crosscut") &&
    !step.board.asCut?.done.includes(step.cut.number)
  );
}
