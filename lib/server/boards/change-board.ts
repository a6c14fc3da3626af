/** Changing what is written about a board. */
import "server-only";
import type { Connection } from "@/db/client";
import { findBlank, listInBlanks } from "@/db/queries/blank";
import { findBoard, lockBoard, updateBoard } from "@/db/queries/board";
import { recordHistory } from "@/db/queries/history";
import type { Board, updateBoard as endpoint } from "@/lib/schemas/board";
import type { BodyOf } from "@/lib/schemas/endpoint";
import { printTag } from "@/lib/schemas/tag";
import { inBlankSentence } from "@/lib/words/in-blank";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { conflict, notFound, refused } from "../faults";
import { readBoard } from "./read-board";

type Given = Omit<BodyOf<typeof endpoint>, "baseRevision">;

const fieldNames = [
  "state",
  "species",
  "cut",
  "nominalQuarters",
  "thickness",
  "length",
  "width",
  "place",
  "source",
  "costMinor",
  "note",
  "trueEdges",
  "toBeFlattened",
] as const satisfies readonly (keyof Given)[];
type FieldName = (typeof fieldNames)[number];

export async function changeBoard(access: ShopAccess, boardId: string, body: BodyOf<typeof endpoint>): Promise<Board> {
  const { baseRevision, ...given } = body;
  const at = new Date();
  return database().transaction(async (tx) => {
    await lockBoard(tx, access.shopId, boardId);
    const found = await findBoard(tx, access.shopId, boardId);
    if (!found) throw notFound("board");
    if (given.state !== undefined && given.state !== found.board.state)
      await refuseBound(tx, access, boardId, found.board.tagNumber);
    if (await findBlank(tx, access.shopId, boardId)) refuseSize(given);
    if (found.straighteningId !== null && (given.length !== undefined || given.width !== undefined)) {
      throw refused("The size comes from the straightened picture. Mark the board again to correct it.");
    }
    if (!(await updateBoard(tx, access.shopId, boardId, baseRevision, given, at))) {
      throw conflict("Somebody else changed this board meanwhile. Load it again and repeat your change.", {
        revision: found.board.revision,
      });
    }
    // Only what differs: the history tells what was changed, not what was sent.
    const changed = fieldNames.filter((name) => given[name] !== undefined && given[name] !== found.board[name]);
    const detail = { before: valuesOf(found.board, changed), after: valuesOf(given, changed) };
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "board", nounId: boardId, verb: "changed", detail },
      at,
    );
    return readBoard(access, boardId, tx);
  });
}

function valuesOf(fields: { readonly [Name in FieldName]?: string | number | boolean | null }, names: readonly FieldName[]) {
  return Object.fromEntries(names.map((name) => [name, fields[name] ?? null]));
}

/** A board that is to be glued into a blank stays in the rack. */
async function refuseBound(tx: Connection, { shopId }: ShopAccess, boardId: string, tagNumber: number): Promise<void> {
  const [inBlank] = await listInBlanks(tx, shopId, [boardId]);
  if (inBlank) throw refused(inBlankSentence(printTag(tagNumber), printTag(inBlank.blankTagNumber)));
}

function refuseSize({ length, width }: Given): void {
  if (length === undefined && width === undefined) return;
  throw refused("The size comes from the boards that the blank is glued up from.");
}
