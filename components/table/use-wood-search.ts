"use client";
/** A search from the table: started, watched while it goes on, stopped. */
import { useMutation, useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { cancelTask } from "@/lib/client/task";
import { searchEnded, searchQuery, startSearch } from "@/lib/client/wood-search";
import { defaultWeights, type Weights } from "@/lib/layout";
import type { WoodSearch } from "@/lib/schemas/wood-search";
import { useEditorState, useTableContext } from "./table-context";

type Asked = Omit<Parameters<typeof startSearch>[1], "weights">;

export interface WoodSearchState {
  readonly weights: Weights;
  readonly setWeights: (weights: Weights) => void;
  readonly start: (asked: Asked) => void;
  readonly stop: () => void;
  readonly search: WoodSearch | null;
  readonly running: boolean;
  readonly error: unknown;
  /** False while a change of the layout is not saved yet: a search begins from what is saved. */
  readonly ready: boolean;
}

export function useWoodSearch(): WoodSearchState {
  const { faceId } = useTableContext();
  const ready = useEditorState(({ sync }) => sync.kind === "saved");
  const [weights, setWeights] = useState<Weights>(defaultWeights);
  const [searchId, setSearchId] = useState<string | null>(null);
  const begin = useMutation({
    mutationFn: (asked: Asked) => startSearch(faceId, { ...asked, weights: { ...weights } }),
    onSuccess: (answer) => setSearchId(answer.searchId),
  });
  const query = useQuery({ ...searchQuery(searchId ?? ""), enabled: searchId !== null });
  const cancel = useMutation({ mutationFn: cancelTask });
  const search = query.data ?? null;
  const running = begin.isPending || (searchId !== null && (search === null ? !query.isError : !searchEnded(search)));
  return {
    weights,
    setWeights,
    start: (asked) => begin.mutate(asked),
    stop: () => search && cancel.mutate(search.taskId),
    search,
    running,
    error: begin.error ?? query.error ?? cancel.error,
    ready,
  };
}
