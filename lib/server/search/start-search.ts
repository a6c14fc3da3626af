/** Starts a search for wood: from the layout as it is saved, in the place of any earlier search of the face. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBoard } from "@/db/queries/board";
import { findLayout, listLayoutBoards } from "@/db/queries/layout";
import { insertTask, requestCancel } from "@/db/queries/task";
import { deleteSearches, insertSearch, listSearchesOfFace, setSearchTask } from "@/db/queries/wood-search";
import type { ShopId } from "@/db/shop-id";
import { groupById } from "@/lib/layout";
import type { BodyOf } from "@/lib/schemas/endpoint";
import type { startSearch as endpoint } from "@/lib/schemas/wood-search";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound, refused } from "../faults";
import { insertOneBoard } from "./one-board";

export async function startSearch(
  access: ShopAccess,
  faceId: string,
  body: BodyOf<typeof endpoint>,
): Promise<{ searchId: string }> {
  const at = new Date();
  const { shopId, userId } = access;
  return database().transaction(async (tx) => {
    const found = await findLayout(tx, shopId, faceId);
    if (!found) throw notFound("face");
    const { document, revision } = found.layout;
    const group = groupById(document, body.groupId);
    if (!group || group.pieceIds.length === 0)
      throw refused("These pieces are no longer one group. Look at the layout and ask again.");
    await endEarlier(tx, shopId, faceId, at);

    const searchId = await insertSearch(tx, shopId, {
      faceId,
      scope: body.boardId === null ? "rack" : "board",
      groupId: body.groupId,
      layoutRevision: revision,
      document,
      weights: body.weights,
      species: body.species,
      leastThickness: body.leastThickness,
      mostThickness: body.mostThickness,
      taskId: null,
      startedBy: userId,
      startedAt: at,
    });
    if (body.boardId !== null) {
      const onTable = (await listLayoutBoards(tx, shopId, found.layout.id)).find(({ board }) => board.id === body.boardId);
      const row = onTable && (await findBoard(tx, shopId, body.boardId));
      if (!onTable || !row) throw notFound("board on this table");
      await insertOneBoard(tx, shopId, searchId, row.board, onTable.straightening.id);
    }
    const taskId = await insertTask(tx, shopId, { kind: "search", payload: { searchId }, createdBy: userId, createdAt: at });
    await setSearchTask(tx, shopId, searchId, taskId);
    return { searchId };
  });
}

/** Those that still run are told to stop and stay until they have; the others go. */
async function endEarlier(tx: Connection, shopId: ShopId, faceId: string, at: Date): Promise<void> {
  const earlier = await listSearchesOfFace(tx, shopId, faceId);
  const running = earlier.filter(({ state }) => state === "queued" || state === "running");
  for (const { taskId } of running) if (taskId !== null) await requestCancel(tx, shopId, taskId, at);
  const gone = earlier.filter((search) => !running.includes(search)).map(({ id }) => id);
  await deleteSearches(tx, shopId, gone);
}
