/** Face and back of one board: a picture each, zones each, and one order at a time for both. */
import "../support/cookie-jar";
import { and, eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import * as versionsRoute from "@/app/api/boards/[boardId]/straightenings/route";
import { findTask } from "@/db/queries/task";
import { task } from "@/db/schema";
import { um, umFromMm } from "@/lib/layout";
import { boardQuerySchema } from "@/lib/schemas/board";
import { orderSteps } from "@/lib/schemas/order-steps";
import * as endpoint from "@/lib/schemas/straightening";
import type { ShopAccess } from "@/lib/server/access";
import { readBoardPage } from "@/lib/server/boards/list-boards";
import { readBoard } from "@/lib/server/boards/read-board";
import { database } from "@/lib/server/database";
import { moveToVersion } from "@/lib/server/layouts/boards-on-table";
import { readLayout } from "@/lib/server/layouts/read-layout";
import { issueOrder } from "@/lib/server/orders/issue";
import { type Planner, planAndVerify } from "@/lib/server/orders/plan-cuts";
import { readOrder } from "@/lib/server/orders/read-orders";
import { tickStep } from "@/lib/server/orders/ticks";
import { closePixelPool } from "@/lib/server/pictures/pixel-pool";
import { saveZones } from "@/lib/server/straightenings/save-zones";
import { startStraightening } from "@/lib/server/straightenings/start-straightening";
import { readStraightening, readStraightenings } from "@/lib/server/straightenings/straightenings";
import { kinds } from "@/lib/server/tasks/kinds";
import { runTask } from "@/lib/server/tasks/run-task";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";
import { addPicture } from "../support/pictured-board";
import { enter, point, soundMarking, takeIn, wire } from "../support/rack";

vi.mock("@/lib/server/orders/plan-pool", () => ({ planInThread: (async (request) => planAndVerify(request)) satisfies Planner }));

let maker: ShopAccess;
let assistant: ShopAccess;
beforeAll(async () => {
  await bundlePixelWorker();
  ({ maker, assistant } = await makeShop());
}, 60_000);
afterAll(async () => {
  vi.restoreAllMocks();
  await closePixelPool();
});

/** Claims this very task, as the queue would, and works it off here. */
async function workOff(taskId: string | null): Promise<void> {
  const claim = { state: "running", claimId: newId(), attempts: 1, leaseUntil: new Date(Date.now() + 30_000) } as const;
  await database()
    .update(task)
    .set(claim)
    .where(and(eq(task.id, taskId ?? ""), eq(task.state, "queued")));
  const row = await findTask(database(), maker.shopId, taskId ?? "");
  if (!row) throw new Error("no such task");
  await runTask(database(), kinds[row.kind], row, new AbortController().signal);
}

async function straightened(boardId: string, side?: "face" | "back", widthMm = 200) {
  const photo = await takeIn(maker);
  const reference = { kind: "board", length: umFromMm(1200), width: umFromMm(widthMm) } as const;
  const marking = wire({ ...soundMarking, reference });
  const { id, taskId } = await startStraightening(maker, boardId, { photoId: photo.id, marking, ...(side && { side }) });
  await workOff(taskId);
  return readStraightening(maker, id);
}

describe("a board photographed on both faces", () => {
  test("has a picture of each; what asks for the board's picture gets the face, and its size is the face's", async () => {
    const { id: boardId } = await enter(maker, { species: "Olive ash" });
    const face = await straightened(boardId);
    const back = await straightened(boardId, "back", 203);
    expect([face.side, back.side]).toEqual(["face", "back"]);
    expect([face.version, back.version]).toEqual([1, 2]);
    const board = await readBoard(maker, boardId);
    expect(board).toMatchObject({ straighteningId: face.id, backStraighteningId: back.id, width: 200_000, length: 1_200_000 });
    expect(board.picture?.url).toContain(face.id);
    const page = await readBoardPage(maker, boardQuerySchema.parse({ species: "Olive ash" }));
    expect(page.items.map(({ id, straighteningId }) => [id, straighteningId])).toEqual([[boardId, face.id]]);
    expect(page.total).toBe(1);
    expect((await readStraightenings(maker, boardId)).map(({ side }) => side)).toEqual(["back", "face"]);
  });

  test("keeps the picture of one side when the other is marked again", async () => {
    const { id: boardId } = await enter(maker);
    const face = await straightened(boardId);
    const back = await straightened(boardId, "back");
    const again = await straightened(boardId);
    expect(await readBoard(maker, boardId)).toMatchObject({ straighteningId: again.id, backStraighteningId: back.id });
    const backAgain = await straightened(boardId, "back");
    expect(await readBoard(maker, boardId)).toMatchObject({ straighteningId: again.id, backStraighteningId: backAgain.id });
    expect(face.id).not.toBe(again.id);
  });

  test("is photographed on its face first: the back is the face turned over", async () => {
    const { id: boardId } = await enter(maker);
    const photo = await takeIn(maker);
    await actAs(maker);
    const body = { photoId: photo.id, marking: wire(soundMarking), side: "back" as const };
    const answer = await ask(versionsRoute.POST, endpoint.startStraightening, { params: { boardId }, body });
    expect(answer).toMatchObject({
      status: 422,
      body: { title: expect.stringContaining("Mark a photograph of the face first") },
    });
    await actAs(assistant);
    expect((await ask(versionsRoute.POST, endpoint.startStraightening, { params: { boardId }, body })).status).toBe(403);
  });

  test("has outline and areas of its own on each side; only glue lines, which go through the wood, are there at once, turned over", async () => {
    const { id: boardId } = await enter(maker);
    const face = await straightened(boardId);
    const knot = {
      id: newId(),
      kind: "knot" as const,
      area: { shape: "ellipse" as const, centre: point(400, 60), radiusX: um(20_000), radiusY: um(10_000), turnDeg: 12 },
      note: "",
    };
    const line = { id: newId(), across: um(70_000), aboveBoardId: null, belowBoardId: null };
    await saveZones(maker, face.id, { outline: null, keepClear: [knot], glueLines: [line], revision: 0 });
    const back = await straightened(boardId, "back");
    expect(back.zones).toMatchObject({ outline: null, keepClear: [] });
    expect(back.zones.glueLines.map(({ across }) => across)).toEqual([130_000]);
    // From one picture of a side to the next one of that side everything goes along.
    const outline = [point(0, 0), point(1200, 0), point(1200, 190), point(0, 190)];
    await saveZones(maker, back.id, { outline, keepClear: [], revision: 0 });
    expect((await straightened(boardId, "back")).zones).toMatchObject({
      outline,
      keepClear: [],
      glueLines: [{ across: 130_000 }],
    });
    expect((await straightened(boardId)).zones).toMatchObject({ outline: null, keepClear: [{ kind: "knot" }] });
  });
});

const moveOver = ({ faceId, boardId }: MadeLayout, straighteningId: string) =>
  moveToVersion(maker, faceId, boardId, straighteningId);
const issue = async ({ faceId }: MadeLayout) => issueOrder(maker, faceId, (await readLayout(maker, faceId)).revision);
const takenBy = async ({ faceId, boardId }: MadeLayout) =>
  (await readLayout(maker, faceId)).boards.find((board) => board.boardId === boardId)?.takenBy ?? null;
const besides = (one: MadeLayout) => makeLayout(maker, { at: { x: umFromMm(1300), y: umFromMm(13) }, stock: one });

async function cutAll(orderId: string): Promise<void> {
  const { revisionId, snapshot } = await readOrder(maker.shopId, orderId);
  for (const { id: stepId } of orderSteps(snapshot)) await tickStep(maker, { orderId, revisionId, stepId });
}

const yesterday = () => new Date(Date.now() - 86_400_000);

describe("a layout on the back", () => {
  test("lies on the back's picture, is offered the face, and a newer picture only of its own side", async () => {
    const one = await makeLayout(maker);
    const back = await addPicture(maker, one.boardId, { side: "back" });
    const [before] = (await readLayout(maker, one.faceId)).boards;
    expect(before).toMatchObject({ newerStraighteningId: null, otherSideStraighteningId: back, straightening: { side: "face" } });
    const moved = await moveOver(one, back);
    expect(moved).toMatchObject({
      straightening: { id: back, side: "back" },
      newerStraighteningId: null,
      otherSideStraighteningId: one.straighteningId,
    });
    const newer = await addPicture(maker, one.boardId, { side: "back" });
    expect((await readLayout(maker, one.faceId)).boards[0]).toMatchObject({ newerStraighteningId: newer });
  });

  test("is issued as one, and says to turn the board over", async () => {
    const one = await makeLayout(maker);
    await moveOver(one, await addPicture(maker, one.boardId, { side: "back" }));
    const { snapshot } = await readOrder(maker.shopId, (await issue(one)).id);
    expect(snapshot.boards[0]).toMatchObject({ side: "back" });
    const onFace = await makeLayout(maker);
    expect((await readOrder(maker.shopId, (await issue(onFace)).id)).snapshot.boards[0]).not.toHaveProperty("side");
  });
});

describe("one board, one order at a time, whichever side is up:", () => {
  test("an order from the face has the picture of the back that was taken before it", async () => {
    const one = await makeLayout(maker);
    const two = await besides(one);
    await moveOver(two, await addPicture(maker, one.boardId, { side: "back", photographedAt: yesterday() }));
    expect(await takenBy(two)).toBeNull();
    const { number } = await issue(one);
    expect(await takenBy(two)).toMatchObject({ orderNumber: number, by: "another-face", unfinished: true });
    await expect(issue(two)).rejects.toMatchObject({ code: "refused", message: expect.stringContaining("issued for cutting") });
  });

  test("an order from the back has the picture of the face, also when it was marked after that of the back", async () => {
    const one = await makeLayout(maker);
    const two = await besides(one);
    await moveOver(one, await addPicture(maker, one.boardId, { side: "back", photographedAt: yesterday() }));
    await moveOver(two, await addPicture(maker, one.boardId, { side: "face", photographedAt: yesterday() }));
    await issue(one);
    await expect(issue(two)).rejects.toMatchObject({ code: "refused" });
  });

  test("once it was cut from the face, the back is free only on a photograph that came in since", async () => {
    const one = await makeLayout(maker);
    const two = await besides(one);
    const old = await addPicture(maker, one.boardId, { side: "back", photographedAt: yesterday() });
    const { id, number } = await issue(one);
    await cutAll(id);
    await moveOver(two, old);
    expect(await takenBy(two)).toMatchObject({ orderNumber: number, cutInto: true });
    await expect(issue(two)).rejects.toMatchObject({ code: "refused", message: expect.stringContaining("already cut into") });
    await moveOver(two, await addPicture(maker, one.boardId, { side: "back" }));
    expect(await takenBy(two)).toBeNull();
    await expect(issue(two)).resolves.toMatchObject({ revision: 1 });
  });

  test("issued at once from both sides, one gets it, every time", async () => {
    for (let round = 0; round < 4; round += 1) {
      const one = await makeLayout(maker);
      const two = await besides(one);
      await moveOver(two, await addPicture(maker, one.boardId, { side: "back", photographedAt: yesterday() }));
      const outcomes = await Promise.allSettled([issue(one), issue(two)]);
      expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    }
  });
});
