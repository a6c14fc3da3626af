"use client";
/** Looks for boards in the rack that are free and have a picture, and puts them into the blank one after the other. */
import { useQuery } from "@tanstack/react-query";
import { useDeferredValue, useState } from "react";
import { BoardStrip } from "@/components/board/board-strip";
import { useUnits } from "@/components/shell/units";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { boardPageQuery } from "@/lib/client/board";
import { messageOf } from "@/lib/client/fault-from-server";
import type { BoardRow } from "@/lib/schemas/board";

interface Props {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** Already in the blank. */
  chosen: readonly string[];
  onChoose: (board: BoardRow) => void;
}

export function ChooseBoards({ open, onOpenChange, chosen, onChoose }: Props) {
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      title="Add boards"
      lead="Boards of the rack that have a straightened picture, lie on no table and are in no other blank."
    >
      {open && <Search chosen={chosen} onChoose={onChoose} onDone={() => onOpenChange(false)} />}
    </Modal>
  );
}

function Search({ chosen, onChoose, onDone }: Pick<Props, "chosen" | "onChoose"> & { onDone: () => void }) {
  const { print } = useUnits();
  const [text, setText] = useState("");
  const search = useDeferredValue(text);
  const page = useQuery(boardPageQuery({ search, free: "yes", pageSize: 50 }));
  const found = (page.data?.items ?? []).filter(({ id, straighteningId }) => straighteningId !== null && !chosen.includes(id));
  return (
    <div className="flex flex-col gap-3">
      <TextField
        label="Search"
        hint="Tag, wood, place or source"
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      {page.error && <Notice kind="stop">{messageOf(page.error)}</Notice>}
      {page.isPending && <p className="text-sm text-pencil">Looking through the rack…</p>}
      {page.data && found.length === 0 && <p className="text-sm">No free board with a picture answers to that.</p>}
      <ul className="flex max-h-80 flex-col divide-y divide-rule overflow-y-auto">
        {found.map((board) => (
          <li key={board.id} className="flex items-center justify-between gap-3 py-2">
            <div className="min-w-0 flex-1 text-sm">
              <p>
                <span className="measure text-base">{board.tag}</span> {board.species}
              </p>
              <p className="text-pencil">
                <span className="measure">
                  {print(board.length)} × {print(board.width)} × {print(board.thickness)}
                </span>
                {board.place && `, ${board.place}`}
              </p>
              <div className="mt-1 max-w-80">
                <BoardStrip board={board} />
              </div>
            </div>
            <Button size="small" aria-label={`Add ${board.tag}`} onClick={() => onChoose(board)}>
              Add
            </Button>
          </li>
        ))}
      </ul>
      <Button className="self-start" onClick={onDone}>
        Done
      </Button>
    </div>
  );
}
