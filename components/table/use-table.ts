"use client";
/** Sets the table up: the editor, its saving and how it is looked at, one of each for as long as the page is open. */
import { useEffect, useState } from "react";
import { documentOf } from "@/lib/editor/document";
import { createEditor, type Editor } from "@/lib/editor/editor";
import type { Store } from "@/lib/editor/store";
import { hasUnsavedWork } from "@/lib/editor/sync/status";
import { createSync, type Sync } from "@/lib/editor/sync/sync";
import { tableBoard } from "@/lib/editor/table-board";
import { createViewState, type ViewState } from "@/lib/editor/view/view-state";
import type { Layout } from "@/lib/schemas/layout";
import { saveOutcome } from "./save-outcome";

export interface Table {
  readonly editor: Editor;
  readonly sync: Sync;
  readonly viewState: Store<ViewState>;
}

export function useTable(initial: Layout, mayChange: boolean): Table {
  const [table] = useState(() => createTable(initial, mayChange));
  const { editor, sync } = table;

  useEffect(() => {
    const online = () => sync.retryNow();
    const leaving = (event: BeforeUnloadEvent) => {
      if (hasUnsavedWork(editor.get().sync)) event.preventDefault();
    };
    window.addEventListener("online", online);
    window.addEventListener("beforeunload", leaving);
    return () => {
      window.removeEventListener("online", online);
      window.removeEventListener("beforeunload", leaving);
      // Off to another page of the product: what is not saved yet goes out at once.
      void sync.settled();
    };
  }, [editor, sync]);

  return table;
}

function createTable(initial: Layout, mayChange: boolean): Table {
  const document = documentOf(initial);
  const editor = createEditor({
    document,
    boards: initial.boards.map(tableBoard),
    mayChange,
    onChange: (changed) => sync.changed(changed),
    now: () => performance.now(),
  });
  const sync = createSync(
    {
      save: (request) => saveOutcome(initial.faceId, request, (present) => editor.setBoards(present.boards.map(tableBoard))),
      after(ms, then) {
        const timer = setTimeout(then, ms);
        return () => clearTimeout(timer);
      },
      onStatus: editor.setSync,
      onMerged: editor.adopt,
    },
    document,
    initial.revision,
  );
  return { editor, sync, viewState: createViewState() };
}
