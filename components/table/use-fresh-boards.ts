"use client";
/** Asks anew what there is to say of the boards on the table: other faces are laid on them, and issued, in other windows meanwhile. */
import { useCallback, useEffect } from "react";
import { getLayout } from "@/lib/client/layout";
import { sameBytes } from "@/lib/editor/document";
import { tableBoard } from "@/lib/editor/table-board";
import { useTableContext } from "./table-context";

/** Asks whenever the window is come back to, and when it is called. */
export function useFreshBoards(): () => void {
  const { editor, faceId } = useTableContext();
  const refresh = useCallback(() => {
    const before = editor.get().boards;
    getLayout(faceId).then(
      (present) => {
        const boards = present.boards.map(tableBoard);
        // Boards put on the table or taken off while the answer was on its way are newer than it.
        if (editor.get().boards === before && !sameBytes(boards, before)) editor.setBoards(boards);
      },
      // The table goes on showing what it knew. Whether the server can be reached, saving tells.
      () => undefined,
    );
  }, [editor, faceId]);
  useEffect(() => {
    window.addEventListener("focus", refresh);
    return () => window.removeEventListener("focus", refresh);
  }, [refresh]);
  return refresh;
}
