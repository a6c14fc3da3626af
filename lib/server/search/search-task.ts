/**
 * Searches the boards of a search one after the other, two at a time. What is found on a board is kept as soon as it is searched: a run that was
 * killed goes on with the boards that wait, and what was found before stays.
 */
import "server-only";
import { z } from "zod";
import { countSearchBoards, findSearch, keepFinding, listWaitingBoards, type WoodSearchRow } from "@/db/queries/wood-search";
import { idSchema } from "@/lib/schemas/ids";
import { database } from "../database";
import type { TaskContext, TaskKind } from "../tasks/task-kind";
import { chooseBoards } from "./choose-boards";
import { searchBoard } from "./search-board";
import { SEARCH_THREADS } from "./search-pool";

const payloadSchema = z.object({ searchId: idSchema });

export const searchTask: TaskKind = {
  async work(payload, context) {
    const { searchId } = payloadSchema.parse(payload);
    const db = database();
    const found = await findSearch(db, context.shopId, searchId);
    if (!found) throw new Error("there is no such search");
    const { boards } = await countSearchBoards(db, context.shopId, searchId);
    // A search of the rack chooses its boards itself; after a restart they are there already.
    if (boards === 0) await chooseBoards(db, context.shopId, found.search, new Date());
    await searchWaiting(found.search, context);
    return async () => {};
  },

  // What was found until then is worth keeping.
  abandon: async () => {},
};

async function searchWaiting(search: WoodSearchRow, { shopId, signal, onProgress }: TaskContext): Promise<void> {
  const db = database();
  const waiting = await listWaitingBoards(db, shopId, search.id);
  const { boards } = await countSearchBoards(db, shopId, search.id);
  const shares = new Map<string, number>();
  const before = boards - waiting.length;
  const tell = () => onProgress((before + [...shares.values()].reduce((sum, share) => sum + share, 0)) / Math.max(1, boards));
  const next = waiting.values();
  const searcher = async () => {
    for (const row of next) {
      signal.throwIfAborted();
      const report = (share: number) => {
        shares.set(row.boardId, share);
        tell();
      };
      const { total, finding } = await searchBoard(db, shopId, search, row, { signal, onProgress: report });
      await keepFinding(db, shopId, search.id, row.boardId, total, finding);
      report(1);
    }
  };
  tell();
  await Promise.all(Array.from({ length: SEARCH_THREADS }, searcher));
}
