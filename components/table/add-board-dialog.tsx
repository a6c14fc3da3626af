"use client";
/** Looks for a board in the rack and puts it on the table. Where no front lies on wood yet, they are laid on it at once. */
import { useMutation, useQuery } from "@tanstack/react-query";
import { useDeferredValue, useState } from "react";
import { BoardStrip } from "@/components/board/board-strip";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { boardPageQuery } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import { putBoardOnTable } from "@/lib/client/layout";
import { tableBoard } from "@/lib/editor/table-board";
import type { BoardRow } from "@/lib/schemas/board";
import { useTableActions } from "./table-actions";
import { useEditorState, useTableContext } from "./table-context";

export function AddBoardDialog({ open, onOpenChange }: { open: boolean; onOpenChange: (open: boolean) => void }) {
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      title="Add a board"
      lead="Boards of the rack that have a straightened picture and are in no blank."
    >
      {open && <BoardSearch onDone={() => onOpenChange(false)} />}
    </Modal>
  );
}

function BoardSearch({ onDone }: { onDone: () => void }) {
  const { editor, sync, faceId } = useTableContext();
  const { layOn } = useTableActions();
  const [text, setText] = useState("");
  const search = useDeferredValue(text);
  const here = useEditorState((state) => state.boards);
  const page = useQuery(boardPageQuery({ search, pageSize: 25 }));
  const add = useMutation({
    mutationFn: (boardId: string) => putBoardOnTable(faceId, boardId),
    onSuccess: (added) => {
      const board = tableBoard(added);
      const { boards, document } = editor.get();
      editor.setBoards([...boards.filter(({ face }) => face.id !== board.face.id), board]);
      sync.retryNow();
      const nothingLies = document.layout.groups.every(({ placement }) => placement === null);
      if (nothingLies) {
        editor.select([]);
        layOn(board.face);
      }
      onDone();
    },
  });
  const found = (page.data?.items ?? []).filter(
    ({ id, straighteningId, inBlank }) =>
      straighteningId !== null && inBlank === null && !here.some(({ face }) => face.id === id),
  );
  return (
    <div className="flex flex-col gap-3">
      <TextField
        label="Search"
        hint="Tag, wood, place or source"
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      {add.error && <Notice kind="stop">{messageOf(add.error)}</Notice>}
      {page.error && <Notice kind="stop">{messageOf(page.error)}</Notice>}
      {page.isPending && <p className="text-sm text-pencil">Looking through the rack…</p>}
      {page.data && found.length === 0 && (
        <p className="text-sm">No board with a picture answers to that, or it is on the table already.</p>
      )}
      <ul className="flex max-h-80 flex-col divide-y divide-rule overflow-y-auto">
        {found.map((board) => (
          <FoundBoard key={board.id} board={board} pending={add.isPending} onAdd={() => add.mutate(board.id)} />
        ))}
      </ul>
    </div>
  );
}

function FoundBoard({ board, pending, onAdd }: { board: BoardRow; pending: boolean; onAdd: () => void }) {
  const { print } = useUnits();
  const { tag, species, length, width, place, held } = board;
  return (
    <li className="flex items-center justify-between gap-3 py-2">
      <div className="min-w-0 flex-1 text-sm">
        <p>
          <span className="measure text-base">{tag}</span> {species}
        </p>
        <p className="text-pencil">
          <span className="measure">
            {print(length)} × {print(width)}
          </span>
          {place && `, ${place}`}
        </p>
        {held.length > 0 && <p>Held for {held.map(({ faceTitle }) => faceTitle).join(", ")}</p>}
        <div className="mt-1 max-w-80">
          <BoardStrip board={board} />
        </div>
      </div>
      <Button size="small" disabled={pending} onClick={onAdd} aria-label={`Put ${tag} on the table`}>
        Put on the table
      </Button>
    </li>
  );
}
