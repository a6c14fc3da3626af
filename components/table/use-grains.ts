"use client";
/** Brings the grain of the boards on the table to the canvas, once it is asked to be shown. */
import { useQueries } from "@tanstack/react-query";
import { useEffect } from "react";
import { grainQuery } from "@/lib/client/figure";
import { useEditorState, useTableContext, useViewState } from "./table-context";

export interface GrainsAsked {
  readonly reading: boolean;
  readonly failed: boolean;
}

export function useGrains(): GrainsAsked {
  const { viewState } = useTableContext();
  const shown = useViewState((state) => state.showGrain);
  const boards = useEditorState((state) => state.boards);
  const ids = boards.filter(({ levels }) => levels.length > 0).map(({ straighteningId }) => straighteningId);
  const queries = useQueries({ queries: ids.map((id) => ({ ...grainQuery(id), enabled: shown })) });
  const come = queries.filter(({ isSuccess }) => isSuccess).length;

  // The answers are followed by how many have come: each stays as it is for good.
  // biome-ignore lint/correctness/useExhaustiveDependencies: the list of queries is a new one with every rendering
  useEffect(() => {
    const grains = new Map(queries.flatMap(({ data }, index) => (data ? [[ids[index] ?? "", data] as const] : [])));
    viewState.set({ ...viewState.get(), grains });
  }, [come, ids.join(" "), viewState]);

  return {
    reading: shown && queries.some(({ isPending }) => isPending),
    failed: shown && queries.some(({ isError }) => isError),
  };
}
