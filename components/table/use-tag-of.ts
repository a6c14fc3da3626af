"use client";
import { useCallback } from "react";
import type { TagOf } from "@/lib/words/layout-problem";
import { useEditorState } from "./table-context";

/** The tag of a board on the table; of one that is not, what can be said. */
export function useTagOf(): TagOf {
  const boards = useEditorState((state) => state.boards);
  return useCallback((stockId) => boards.find(({ face }) => face.id === stockId)?.tag ?? "that is not on the table", [boards]);
}
