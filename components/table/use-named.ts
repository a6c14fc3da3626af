"use client";
import { useMemo } from "react";
import { woodOfBoards } from "@/lib/editor/selectors/spoken-for";
import type { Named } from "@/lib/words/layout-problem";
import { useEditorState } from "./table-context";
import { useTagOf } from "./use-tag-of";

/** Boards on the table and what other faces take of them, by the ids that problems have. */
export function useNamed(): Named {
  const tagOf = useTagOf();
  const boards = useEditorState((state) => state.boards);
  return useMemo(() => ({ tagOf, woodOf: woodOfBoards(boards) }), [tagOf, boards]);
}
