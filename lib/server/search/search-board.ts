/** Searches one board of a search: what lies on it and what it looks like, to the thread and back. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBoard } from "@/db/queries/board";
import { listGlueLines } from "@/db/queries/glue-line";
import { findLayout } from "@/db/queries/layout";
import { readShop } from "@/db/queries/shop";
import { findStraightening, listKeepClear } from "@/db/queries/straightening";
import type { SearchBoardRow, WoodSearchRow } from "@/db/queries/wood-search";
import type { ShopId } from "@/db/shop-id";
import { type BoardFace, defaultApart, type FoundPlace, type PlaceSearch, stockResult } from "@/lib/layout";
import type { BoardFinding, FoundPlaceOnWire } from "@/lib/schemas/wood-search";
import { figureLevel } from "../figure/figure-level";
import { holdersOf, spokenForOn } from "../layouts/spoken-for";
import { leftOut, onWire } from "./choose-boards";
import { searchInThread } from "./search-pool";

/** Places that are offered on one board, and the one that stands for a board of the rack. */
const COUNT = { board: 5, rack: 1 } as const;

interface Watch {
  readonly signal: AbortSignal;
  readonly onProgress: (share: number) => void;
}

export async function searchBoard(
  db: Connection,
  shopId: ShopId,
  search: WoodSearchRow,
  { boardId, straighteningId, stock }: SearchBoardRow,
  watch: Watch,
): Promise<{ total: number; finding: BoardFinding }> {
  const straightening = straighteningId === null ? undefined : await findStraightening(db, shopId, straighteningId);
  const picture = straightening && figureLevel(straightening);
  if (!straightening || !picture) return { total: -1, finding: leftOut([{ reason: "no-picture" }]) };
  const found = await findLayout(db, shopId, search.faceId);
  const holders = await holdersOf(db, shopId, [boardId], found?.layout.id ?? "");
  const shop = await readShop(db, shopId);
  const row = await findBoard(db, shopId, boardId);
  if (!shop || !row) throw new Error("a search among nothing");
  const board: BoardFace = {
    id: boardId,
    length: straightening.length,
    width: straightening.width,
    thickness: row.board.thickness,
    outline: straightening.outline,
    keepClear: await listKeepClear(db, shopId, straightening.id),
    spokenFor: spokenForOn(holders, boardId, straightening.id),
    glueLines: (await listGlueLines(db, shopId, straightening.id)).map(({ across }) => across),
  };
  const { document, groupId, weights, scope } = search;
  const answer = await searchInThread(
    {
      request: {
        layout: document,
        groupId,
        layoutSide: straightening.side,
        weights,
        stock,
        leastOffcut: { along: shop.offcutLength, across: shop.offcutWidth },
        count: COUNT[scope],
        apart: defaultApart,
      },
      sides: [{ side: straightening.side, board, picture }],
      neighbours: [],
    },
    watch,
  );
  return findingOf(boardId, answer);
}

function findingOf(boardId: string, answer: PlaceSearch): { total: number; finding: BoardFinding } {
  const { places, present, positions, allowed } = answer;
  const best = stockResult(boardId, answer);
  return {
    total: places[0]?.value.total ?? -1,
    finding: {
      places: places.map(placeOnWire),
      present: present && { total: present.value.total, parts: { ...present.value.parts }, allowed: present.allowed },
      leftOut: (best.leftOut ?? []).map(onWire),
      positions,
      allowed,
    },
  };
}

function placeOnWire({ place, value, against, likePresent }: FoundPlace): FoundPlaceOnWire {
  return {
    side: place.side,
    corner: place.corner,
    turns: place.turns,
    total: value.total,
    parts: { ...value.parts },
    leaves: value.leaves,
    against: against && { better: [...against.better], worse: [...against.worse] },
    likePresent,
  };
}
