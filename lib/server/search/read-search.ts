/** How far a search is, what it found, and what it left out. */
import "server-only";
import type { z } from "zod";
import { countSearchBoards, findSearch, listBestBoards, listLeftOutBoards } from "@/db/queries/wood-search";
import { printTag } from "@/lib/schemas/tag";
import type { listLeftOut, WoodSearch } from "@/lib/schemas/wood-search";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { notFound } from "../faults";
import { servedLevel } from "../straightenings/straightening-of";

const MOST_FOUND = 20;
const PAGE_SIZE = 50;

export async function readSearch({ shopId }: ShopAccess, searchId: string): Promise<WoodSearch> {
  const db = database();
  const row = await findSearch(db, shopId, searchId);
  if (!row?.task) throw notFound("search");
  const { search, task } = row;
  const counts = await countSearchBoards(db, shopId, searchId);
  const best = await listBestBoards(db, shopId, searchId, MOST_FOUND);
  return {
    id: search.id,
    faceId: search.faceId,
    scope: search.scope,
    groupId: search.groupId,
    layoutRevision: search.layoutRevision,
    weights: search.weights,
    taskId: task.id,
    state: task.state,
    progress: task.state === "done" ? 1 : task.progress,
    failure: task.failure,
    ...counts,
    found: best.flatMap(({ found, board, straightening }) => {
      if (found.finding === null) return [];
      return [
        {
          boardId: board.id,
          tag: printTag(board.tagNumber),
          species: board.species,
          place: board.place,
          straighteningId: straightening.id,
          length: straightening.length,
          width: straightening.width,
          thickness: board.thickness,
          levels: straightening.levels.map((level) => servedLevel(straightening.id, level)),
          finding: found.finding,
        },
      ];
    }),
  };
}

export async function readLeftOut(
  { shopId }: ShopAccess,
  searchId: string,
  page: number,
): Promise<z.output<typeof listLeftOut.response>> {
  const db = database();
  if (!(await findSearch(db, shopId, searchId))) throw notFound("search");
  const { leftOut } = await countSearchBoards(db, shopId, searchId);
  const rows = await listLeftOutBoards(db, shopId, searchId, page, PAGE_SIZE);
  return {
    items: rows.map(({ found, species }) => ({
      boardId: found.boardId,
      tag: printTag(found.tagNumber),
      species,
      reasons: found.finding?.leftOut ?? [],
    })),
    total: leftOut,
    page,
    pageSize: PAGE_SIZE,
  };
}
