"use client";
/** Hands the table to its parts. */
import { createContext, type ReactNode, useContext, useSyncExternalStore } from "react";
import type { EditorState } from "@/lib/editor/editor";
import type { ViewState } from "@/lib/editor/view/view-state";
import type { Saw, Shop } from "@/lib/schemas/shop";
import type { Table } from "./use-table";

export interface TableContextValue extends Table {
  readonly faceId: string;
  readonly jobId: string;
  readonly shop: Shop;
  readonly saws: readonly Saw[];
}

const TableContext = createContext<TableContextValue | null>(null);

export function TableProvider({ value, children }: { value: TableContextValue; children: ReactNode }) {
  return <TableContext.Provider value={value}>{children}</TableContext.Provider>;
}

export function useTableContext(): TableContextValue {
  const table = useContext(TableContext);
  if (!table) throw new Error("a part of the table stands outside of it");
  return table;
}

/** A part of the editor's state; `select` has to answer with the same value while nothing changed. */
export function useEditorState<Part>(select: (state: EditorState) => Part): Part {
  const { editor } = useTableContext();
  const read = () => select(editor.get());
  return useSyncExternalStore(editor.subscribe, read, read);
}

export function useViewState<Part>(select: (state: ViewState) => Part): Part {
  const { viewState } = useTableContext();
  const read = () => select(viewState.get());
  return useSyncExternalStore(viewState.subscribe, read, read);
}
