/** An order that the bench has begun, with everything that its rest is planned from. */
import "server-only";
import { createHash } from "node:crypto";
import type { Connection } from "@/db/client";
import { findLayout } from "@/db/queries/layout";
import { findOrder, findRevision } from "@/db/queries/order";
import { listTicks } from "@/db/queries/step-tick";
import type { AsCut } from "@/lib/schemas/as-cut";
import { takesWood } from "@/lib/schemas/order-steps";
import type { RescueChoicesByBoard } from "@/lib/schemas/rest";
import type { BegunRevision } from "@/lib/schemas/rest-request";
import { revisionLetter } from "@/lib/words/revision-letter";
import type { ShopAccess } from "../access";
import { notFound, refused } from "../faults";
import { asCutOf } from "./as-cut";
import type { ToFreeze } from "./freeze";
import { toFreeze } from "./issue";

type Revision = NonNullable<Awaited<ReturnType<typeof findRevision>>>;

export interface BegunOrder extends BegunRevision {
  readonly orderId: string;
  readonly number: number;
  /** The newest, whether it holds or the layout has moved on since. */
  readonly revision: Revision;
  readonly asCut: readonly AsCut[];
  /** The layout and its boards as they are now. */
  readonly given: ToFreeze;
  readonly layoutId: string;
  /** Somebody changed the layout, or what is marked on its boards, after the revision was issued. */
  readonly layoutChanged: boolean;
}

/** Refused while nothing is cut and nothing was entered: then the layout is issued again as usual. */
export async function readBegun(db: Connection, access: ShopAccess, orderId: string): Promise<BegunOrder> {
  const { shopId } = access;
  const order = await findOrder(db, shopId, orderId);
  const revision = order && (await findRevision(db, shopId, orderId, undefined));
  if (!order || !revision) throw notFound("cut order");
  const { snapshot } = revision;
  const faceId = snapshot.faces[0]?.faceId ?? "";
  const found = await findLayout(db, shopId, faceId);
  if (!found) throw notFound("face");
  const ticked = new Set((await listTicks(db, shopId, revision.id)).map(({ stepId }) => stepId));
  const asCut = await asCutOf(db, shopId, revision.id);
  const begun = snapshot.boards.some(({ tag }) => [...ticked].some((stepId) => takesWood(stepId, tag)));
  if (!begun && asCut.length === 0) {
    const letter = revisionLetter(revision.revision);
    throw refused(`Nothing of revision ${letter} is cut yet. Issue the layout again from the layout table instead.`);
  }
  return {
    orderId,
    number: order.number,
    revision,
    snapshot,
    ticked,
    asCut,
    entries: asCut.map(({ entry }) => entry),
    given: await toFreeze(db, access, faceId, found.layout),
    layoutId: found.layout.id,
    layoutChanged: revision.supersededAt !== null,
  };
}

/** Everything the rest is planned from, in short: what was previewed is what is issued, or nothing. */
export function basisOf({ revision, ticked, asCut, given }: BegunOrder, choices: RescueChoicesByBoard): string {
  const boards = given.boards.map(({ straightening: { id, zonesRevision } }) => [id, zonesRevision]);
  const sorted = (record: Readonly<Record<string, unknown>>) => Object.entries(record).sort(([a], [b]) => (a < b ? -1 : 1));
  const chosen = sorted(choices).map(([boardId, byKey]) => [boardId, sorted(byKey as Record<string, unknown>)]);
  const entries = asCut.map(({ id, version }) => [id, version]);
  const all = [revision.id, [...ticked].sort(), entries, given.face.layoutRevision, boards, chosen];
  return createHash("sha256").update(JSON.stringify(all)).digest("hex");
}
