/** Opens the demo's jobs as its people would: faces, boards on the table, layouts, cut orders and their ticks. */

import { type BoardFace, SET_ID } from "@/lib/layout";
import { faceLayoutSchema, gridFaceSchema, type Layout } from "@/lib/schemas/layout";
import type { OrderRow } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import { changeBoard } from "@/lib/server/boards/change-board";
import { readBoard } from "@/lib/server/boards/read-board";
import { addFace } from "@/lib/server/jobs/faces";
import { changeJob, openJob, readJob } from "@/lib/server/jobs/jobs";
import { putBoardOnTable } from "@/lib/server/layouts/boards-on-table";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { saveLayout } from "@/lib/server/layouts/save-layout";
import { issueOrder } from "@/lib/server/orders/issue";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep } from "@/lib/server/orders/ticks";
import { dateFrom } from "./days";
import type { DemoShop } from "./found-shop";
import { type DemoFace, type DemoJob, demoJobs, revisedBy } from "./jobs";
import { layFace, slide } from "./lay-face";

export interface Opening {
  readonly shop: DemoShop;
  readonly now: Date;
  /** By the scenario's keys. */
  readonly boardIds: ReadonlyMap<string, string>;
}

export async function openJobs(opening: Opening): Promise<void> {
  for (const demo of demoJobs) await openOne(opening, demo);
}

async function openOne(opening: Opening, { title, client, note, dueInDays, closed, faces }: DemoJob): Promise<void> {
  const { maker } = opening.shop.people;
  const dueOn = dueInDays === null ? null : dateFrom(opening.now, dueInDays);
  const job = await openJob(maker, { title, client, note, dueOn });
  for (const face of faces) {
    const faceId = await layOnBoard(opening, job.id, face);
    if (face.order) await order(opening, faceId, face);
  }
  if (!closed) return;
  const { revision } = await readJob(maker, job.id);
  await changeJob(maker, job.id, { baseRevision: revision, state: "closed" });
}

async function layOnBoard({ shop, boardIds }: Opening, jobId: string, demo: DemoFace): Promise<string> {
  const { maker } = shop.people;
  const { crosscut, rip } = shop.saws;
  const { id: faceId } = await addFace(maker, jobId, {
    title: demo.title,
    face: gridFaceSchema.parse(demo.face),
    crosscut: crosscut.loss,
    rip: rip.loss,
    crosscutSawId: crosscut.id,
    ripSawId: rip.id,
    spacing: "followGap",
  });
  await putBoardOnTable(maker, faceId, idOf(boardIds, demo.place.board));
  const layout = await readLayout(maker, faceId);
  await save(shop, layout, layFace(layout.document, demo, boardFaceOf(layout)));
  return faceId;
}

async function order(opening: Opening, faceId: string, { order: kind, place }: DemoFace): Promise<void> {
  const { shop } = opening;
  const { maker } = shop.people;
  const first = await issueNow(shop, faceId);
  switch (kind) {
    case "part":
      return tick(shop, first, 0.4);
    case "cut":
      await tick(shop, first, 1);
      return markCut(shop, idOf(opening.boardIds, place.board));
    case "revised": {
      await tick(shop, first, 0.1);
      const layout = await readLayout(maker, faceId);
      await save(shop, layout, slide(layout.document, SET_ID, revisedBy));
      await issueNow(shop, faceId);
    }
  }
}

async function issueNow({ people: { maker } }: DemoShop, faceId: string): Promise<OrderRow> {
  const { revision } = await readLayout(maker, faceId);
  return issueOrder(maker, faceId, revision);
}

/** The assistant ticks the first steps: this share of them, and at least one. */
async function tick({ people: { assistant } }: DemoShop, { id }: OrderRow, share: number): Promise<void> {
  const { revisionId, snapshot } = await readOrder(assistant.shopId, id);
  const steps = orderSteps(snapshot);
  for (const { id: stepId } of steps.slice(0, Math.max(1, Math.round(steps.length * share)))) {
    await tickStep(assistant, { orderId: id, revisionId, stepId });
  }
}

async function markCut({ people: { maker } }: DemoShop, boardId: string): Promise<void> {
  const { revision } = await readBoard(maker, boardId);
  await changeBoard(maker, boardId, { baseRevision: revision, state: "cut" });
}

async function save({ people: { maker } }: DemoShop, layout: Layout, document: unknown): Promise<void> {
  const { faceId, revision, crosscutSawId, ripSawId } = layout;
  await saveLayout(maker, faceId, {
    baseRevision: revision,
    document: faceLayoutSchema.parse(document),
    crosscutSawId,
    ripSawId,
  });
}

/** The one board on the table of a layout of the demo, as the core sees it. */
function boardFaceOf({ boards }: Layout): BoardFace {
  const [board] = boards;
  if (!board) throw new Error("a layout of the demo has no board on its table");
  const { length, width, zones } = board.straightening;
  const { outline, keepClear, glueLines } = zones;
  const { spokenFor } = board;
  return {
    id: board.boardId,
    length,
    width,
    thickness: board.thickness,
    outline,
    keepClear,
    spokenFor,
    glueLines: glueLines.map(({ across }) => across),
  };
}

function idOf(boardIds: ReadonlyMap<string, string>, key: string): string {
  const id = boardIds.get(key);
  if (id === undefined) throw new Error(`the demo's rack has no board called ${key}`);
  return id;
}
