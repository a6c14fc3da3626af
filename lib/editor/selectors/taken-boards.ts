/** Boards on the table that the layout cannot be issued from, because their picture belongs to a cut order. */
import type { TakenBy } from "@/lib/schemas/taken-by";
import type { TableDocument } from "../document";
import type { TableBoard } from "../table-board";

export interface TakenBoard {
  readonly id: string;
  readonly tag: string;
  readonly takenBy: TakenBy;
}

type Board = Pick<TableBoard, "face" | "tag" | "takenBy">;

/** The order in the way. `asItStands`: the face's own order holds for the layout, so that what it has cut is as it should be. */
export function takerOf({ takenBy }: Pick<Board, "takenBy">, asItStands: boolean): TakenBy | null {
  return asItStands && takenBy?.by !== "another-face" ? null : takenBy;
}

/** Of those that a front lies on. */
export function takenBoards(
  { layout }: Pick<TableDocument, "layout">,
  boards: readonly Board[],
  asItStands: boolean,
): readonly TakenBoard[] {
  const used = new Set(layout.groups.flatMap(({ placement }) => placement?.stockId ?? []));
  return boards.flatMap((board) => {
    const { face, tag } = board;
    const takenBy = takerOf(board, asItStands);
    return takenBy && used.has(face.id) ? { id: face.id, tag, takenBy } : [];
  });
}
