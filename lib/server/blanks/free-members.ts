/** The boards of a plan, locked and free to be glued; or a refusal in words that says what each is bound by. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBlank, listInBlanks } from "@/db/queries/blank";
import { listBoardHolds, lockBoard } from "@/db/queries/board";
import { listGlueLines } from "@/db/queries/glue-line";
import { findBoardPicture, findStraightening, listKeepClear, lockZones } from "@/db/queries/straightening";
import type { ShopId } from "@/db/shop-id";
import type { BlankMember } from "@/lib/layout";
import type { PlanBlank } from "@/lib/schemas/blank";
import { printTag } from "@/lib/schemas/tag";
import type { TakenBy } from "@/lib/schemas/taken-by";
import { inBlankSentence } from "@/lib/words/in-blank";
import { takenByReason } from "@/lib/words/taken-by";
import { conflict, notFound, refused } from "../faults";
import { takersOfPictures } from "../layouts/taken-by";
import { drawnMember } from "./blank-plan";

type Asked = PlanBlank["members"][number];
type BoardRow = NonNullable<Awaited<ReturnType<typeof lockBoard>>>;

export interface FreeMember {
  readonly board: BoardRow;
  readonly tag: string;
  readonly keepClear: Awaited<ReturnType<typeof listKeepClear>>;
  /** As the core takes it. */
  readonly drawn: BlankMember;
}

/** In the order asked for. Boards are locked in the order of their ids, then what is drawn on their pictures. */
export async function lockFreeMembers(tx: Connection, shopId: ShopId, asked: readonly Asked[]): Promise<FreeMember[]> {
  const boards = new Map<string, BoardRow>();
  for (const boardId of [...new Set(asked.map((one) => one.boardId))].sort()) {
    const board = await lockBoard(tx, shopId, boardId);
    if (!board) throw notFound("board");
    boards.set(boardId, board);
  }
  const straighteningIds = asked.map(({ straighteningId }) => straighteningId);
  await lockZones(tx, shopId, straighteningIds);
  await refuseBound(tx, shopId, [...boards.values()]);
  const members = await Promise.all(asked.map((one) => memberOf(tx, shopId, boards.get(one.boardId), one)));
  const takers = await takersOfPictures(tx, shopId, straighteningIds);
  for (const { tag, board } of members) {
    const taker = takers.get(board.id);
    if (taker) throw refused(takenSentence(tag, taker));
  }
  return members;
}

async function memberOf(tx: Connection, shopId: ShopId, board: BoardRow | undefined, asked: Asked): Promise<FreeMember> {
  const { boardId, straighteningId, endForEnd, along, trim } = asked;
  const straightening = await findStraightening(tx, shopId, straighteningId);
  if (!board || straightening?.boardId !== boardId || straightening.state !== "done") {
    throw notFound("picture of this board");
  }
  const tag = printTag(board.tagNumber);
  const present = await findBoardPicture(tx, shopId, boardId, straightening.side);
  if (present?.id !== straighteningId) {
    throw conflict(`${tag} was marked anew meanwhile. Look at the plan with its present picture.`);
  }
  const keepClear = await listKeepClear(tx, shopId, straighteningId);
  const glueLines = await listGlueLines(tx, shopId, straighteningId);
  const member = {
    blankId: "",
    position: 0,
    shopId,
    boardId,
    straighteningId,
    endForEnd,
    along,
    trimUpper: trim.upper,
    trimLower: trim.lower,
  };
  return { board, tag, keepClear, drawn: drawnMember({ board, straightening, member }, { keepClear, glueLines }) };
}

/** In another blank, a planned blank itself, out of the rack, or on the table of a face. */
async function refuseBound(tx: Connection, shopId: ShopId, boards: readonly BoardRow[]): Promise<void> {
  const ids = boards.map(({ id }) => id);
  const inBlanks = await listInBlanks(tx, shopId, ids);
  const holds = await listBoardHolds(tx, shopId, ids);
  for (const { id, tagNumber, state, kind } of boards) {
    const tag = printTag(tagNumber);
    if (state !== "rack") throw refused(`${tag} is no longer in the rack. Choose another board.`);
    const inBlank = inBlanks.find(({ boardId }) => boardId === id);
    if (inBlank) throw refused(inBlankSentence(tag, printTag(inBlank.blankTagNumber)));
    if (kind === "blank" && (await findBlank(tx, shopId, id))) {
      throw refused(`${tag} is a blank that is planned itself. Plan one blank of all its boards instead.`);
    }
    const hold = holds.find(({ boardId }) => boardId === id);
    if (hold) {
      throw refused(`${tag} is on the table of ${hold.faceTitle} (${hold.jobTitle}). Take it off that table first.`);
    }
  }
}

function takenSentence(tag: string, taker: TakenBy): string {
  const wayOut = taker.unfinished ? "Cut that order first, then photograph" : "Photograph";
  return `${takenByReason(tag, taker)}. ${wayOut} what is left of the board and mark it anew.`;
}
