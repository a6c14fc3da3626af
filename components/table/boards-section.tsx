"use client";
import { useMutation } from "@tanstack/react-query";
import Link from "next/link";
import { useState } from "react";
import { toast } from "sonner";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { moveToVersion, takeBoardOffTable } from "@/lib/client/layout";
import { takerOf } from "@/lib/editor/selectors/taken-boards";
import { type TableBoard, tableBoard } from "@/lib/editor/table-board";
import type { TakenBy } from "@/lib/schemas/taken-by";
import { heldBySentence } from "@/lib/words/held-by";
import { inBlankSentence } from "@/lib/words/in-blank";
import { takenBySentence } from "@/lib/words/taken-by";
import { AddBoardDialog } from "./add-board-dialog";
import { PanelSection } from "./panel-section";
import { useTableActions } from "./table-actions";
import { useEditorState, useTableContext } from "./table-context";

/** `asItStands`: the face's own order holds for the layout. */
export function BoardsSection({ asItStands }: { asItStands: boolean }) {
  const { editor } = useTableContext();
  const boards = useEditorState((state) => state.boards);
  const [adding, setAdding] = useState(false);
  return (
    <PanelSection title="Boards on the table" beside={boards.length}>
      {boards.length === 0 && <p className="text-sm">No board yet. Add one from the rack, then lay the fronts on it.</p>}
      <ul className="flex flex-col gap-3">
        {boards.map((board) => (
          <BoardOnTable key={board.face.id} board={board} taker={takerOf(board, asItStands)} />
        ))}
      </ul>
      {editor.mayChange && (
        <Button size="small" onClick={() => setAdding(true)}>
          Add a board…
        </Button>
      )}
      <AddBoardDialog open={adding} onOpenChange={setAdding} />
    </PanelSection>
  );
}

function BoardOnTable({ board, taker }: { board: TableBoard; taker: TakenBy | null }) {
  const { editor, sync, faceId } = useTableContext();
  const { print } = useUnits();
  const { layOn } = useTableActions();
  const used = useEditorState(({ document }) =>
    document.layout.groups.some(({ placement }) => placement?.stockId === board.face.id),
  );
  const { id, length, width } = board.face;
  const takeOff = useMutation({
    mutationFn: async () => {
      // The server looks at what is saved: fronts that were just moved away must be saved first.
      await sync.settled();
      await takeBoardOffTable(faceId, id);
    },
    onSuccess: () => editor.setBoards(editor.get().boards.filter(({ face }) => face.id !== id)),
    onError: (error) => toast.error(messageOf(error)),
  });
  const moveOver = useMutation({
    mutationFn: (straighteningId: string) => moveToVersion(faceId, id, straighteningId),
    onSuccess: (moved) => {
      editor.setBoards(editor.get().boards.map((other) => (other.face.id === id ? tableBoard(moved) : other)));
      const picture = moved.straightening.id === newer ? "on its newest picture" : `${moved.straightening.side} up`;
      toast.success(`Board ${moved.tag} is ${picture}. Look over where the fronts lie.`);
    },
    onError: (error) => toast.error(messageOf(error)),
  });
  const newer = board.newerStraighteningId;
  const otherSide = board.otherSideStraighteningId;
  return (
    <li className="flex flex-col gap-1.5 text-sm">
      <p>
        <Link href={`/rack/${id}`} className="measure text-base text-chalk underline-offset-2 hover:underline">
          {board.tag}
        </Link>{" "}
        {board.species}
        {board.side === "back" && ", back up"}
        <span className="block text-pencil">
          <span className="measure">
            {print(length)} × {print(width)}
          </span>
          {board.place && `, ${board.place}`}
        </span>
      </p>
      {board.inBlank && <Notice kind="care">{inBlankSentence(board.tag, board.inBlank.tag)}</Notice>}
      {taker && <Notice kind="care">{takenBySentence(board.tag, taker)}</Notice>}
      {board.heldBy.map((holder) => (
        <Notice key={holder.faceId} kind="care">
          {heldBySentence(
            holder,
            board.spokenFor.flatMap((wood) => (wood.faceId === holder.faceId ? wood.label : [])),
          )}
        </Notice>
      ))}
      {newer !== null && (
        <Notice kind="care">
          <span className="mb-1 block">
            This layout lies on picture {board.version}; the board was marked again since. Fronts keep their places in mm.
          </span>
          <Button size="small" disabled={moveOver.isPending || !editor.mayChange} onClick={() => moveOver.mutate(newer)}>
            Move over to the newest picture
          </Button>
        </Notice>
      )}
      {editor.mayChange && (
        <div className="flex flex-wrap gap-2">
          <Button size="small" onClick={() => layOn(board.face)}>
            Lay fronts here
          </Button>
          {otherSide !== null && (
            <Button size="small" disabled={moveOver.isPending} onClick={() => moveOver.mutate(otherSide)}>
              {board.side === "back" ? "Lay on its face" : "Lay on its back"}
            </Button>
          )}
          <Button
            size="small"
            disabled={used || takeOff.isPending}
            title={used ? "Move its fronts to another board first" : undefined}
            onClick={() => takeOff.mutate()}
          >
            Take off the table
          </Button>
        </div>
      )}
    </li>
  );
}
