"use client";
/** Everything wrong with the layout as it stands, for the list and for whether it can be issued. */
import { useEffect, useState } from "react";
import { blockedBoards } from "@/lib/editor/selectors/blocked";
import { problemsOf } from "@/lib/editor/selectors/facts";
import type { BoardFace, FaceLayout, Problem } from "@/lib/layout";
import { useEditorState, useTableContext } from "./table-context";

export interface Problems {
  readonly found: readonly Problem[];
  /** Whether straight cuts can part the pieces is still being worked out. */
  readonly working: boolean;
}

/** After a change, so that a step is on the screen before the longer question is asked. */
const AFTER_MS = 60;

export function useProblems(): Problems {
  const { shop } = useTableContext();
  const layout = useEditorState((state) => state.document.layout);
  const boards = useEditorState((state) => state.boardFaces);
  const [blocked, setBlocked] = useState<{ layout: FaceLayout; boards: readonly BoardFace[]; found: readonly Problem[] } | null>(
    null,
  );
  const fit = problemsOf(layout, boards);
  const known = blocked?.layout === layout && blocked.boards === boards ? blocked.found : null;
  const { shortestCrosscut, narrowestRip, shortestMachined, offcutLength, offcutWidth } = shop;

  useEffect(() => {
    const limits = { shortestCrosscut, narrowestRip, shortestMachined, offcutLength, offcutWidth };
    const timer = setTimeout(() => setBlocked({ layout, boards, found: blockedBoards(layout, boards, limits) }), AFTER_MS);
    return () => clearTimeout(timer);
  }, [layout, boards, shortestCrosscut, narrowestRip, shortestMachined, offcutLength, offcutWidth]);

  return { found: known ? [...fit, ...known] : fit, working: known === null };
}
