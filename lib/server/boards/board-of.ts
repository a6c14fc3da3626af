/** A board as the browser sees it, from its row. */
import "server-only";
import type { BoardWithPicture, listBoardHolds } from "@/db/queries/board";
import { boardFeet, boardFeetByRule, type Um, um } from "@/lib/layout";
import type { BoardRow } from "@/lib/schemas/board";
import { printTag } from "@/lib/schemas/tag";
import { servedLevel } from "../straightenings/straightening-of";

type Hold = Awaited<ReturnType<typeof listBoardHolds>>[number];

/** Wide enough for a board that fills the rack's page, px. */
const rackPicturePx = 1000;
const umPerQuarter = 6350;

export function boardRowOf(
  { board, straighteningId, backStraighteningId, levels, inBlankId, inBlankTagNumber }: BoardWithPicture,
  holds: readonly Hold[],
): BoardRow {
  const inBlank = inBlankId !== null && inBlankTagNumber !== null;
  const { id, kind, state, species, cut, nominalQuarters, thickness, length, width, place, source, costMinor, note, revision } =
    board;
  return {
    id,
    tag: printTag(board.tagNumber),
    kind,
    state,
    species,
    cut,
    nominalQuarters,
    thickness,
    length,
    width,
    place,
    source,
    costMinor,
    note,
    trueEdges: board.trueEdges,
    toBeFlattened: board.toBeFlattened,
    moisturePercent: board.moistureTenths === null ? null : board.moistureTenths / 10,
    boardFeet: boardFeetByRule(width, length, tradeThickness(nominalQuarters, thickness), halfGoesOf(board.tagNumber)),
    volumeBoardFeet: boardFeet(width, length, thickness),
    straighteningId,
    backStraighteningId,
    picture: straighteningId === null ? null : rackPicture(straighteningId, levels ?? []),
    held: holds
      .filter(({ boardId }) => boardId === id)
      .map(({ faceId, faceTitle, jobId, jobTitle }) => ({ faceId, faceTitle, jobId, jobTitle })),
    inBlank: inBlank ? { boardId: inBlankId, tag: printTag(inBlankTagNumber) } : null,
    revision,
    createdAt: board.createdAt.toISOString(),
  };
}

/** Exact halves go up and down by turns. Tags count the shop's boards, so the turns go by tag and a board keeps its count. */
const halfGoesOf = (tagNumber: number) => (tagNumber % 2 === 1 ? "up" : "down");

/** Lumber is bought by its nominal thickness, however much planing has taken since. */
function tradeThickness(nominalQuarters: number | null, thickness: Um): Um {
  return nominalQuarters === null ? thickness : um(nominalQuarters * umPerQuarter);
}

function rackPicture(straighteningId: string, levels: NonNullable<BoardWithPicture["levels"]>): BoardRow["picture"] {
  const level = levels.findLast(({ widthPx }) => widthPx >= rackPicturePx) ?? levels[0];
  return level ? servedLevel(straighteningId, level) : null;
}
