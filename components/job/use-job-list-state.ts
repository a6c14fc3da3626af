"use client";
/** Which jobs the list shows, kept in its address: loading again and coming back find it as it was left. */
import { useSearchParams } from "next/navigation";
import { useEffect, useState } from "react";

export interface JobListState {
  readonly state: "open" | "closed";
  readonly search: string;
  readonly page: number;
}

type Params = Pick<URLSearchParams, "get">;

/** What cannot be read falls back to its start. */
export const readJobListState = (params: Params): JobListState => ({
  state: params.get("state") === "closed" ? "closed" : "open",
  search: params.get("search") ?? "",
  page: /^[1-9]\d{0,5}$/.test(params.get("page") ?? "") ? Number(params.get("page")) : 1,
});

/** What stands at its start is left out. */
export function jobListAddress({ state, search, page }: JobListState): string {
  const query = new URLSearchParams();
  if (state === "closed") query.set("state", state);
  if (search !== "") query.set("search", search);
  if (page > 1) query.set("page", String(page));
  return query.size > 0 ? `/jobs?${query}` : "/jobs";
}

export function useJobListState() {
  const params = useSearchParams();
  const [list, setList] = useState(() => readJobListState(params));
  // "Jobs" in the top bar leads to the plain address. The window is asked: `params` may still be behind what is being typed.
  useEffect(() => {
    if (params.size === 0 && window.location.search === "") setList(readJobListState(params));
  }, [params]);
  /** A new search or state begins at the first page. */
  const change = (part: Partial<JobListState>) => {
    const wanted = { ...list, page: 1, ...part };
    setList(wanted);
    window.history.replaceState(null, "", jobListAddress(wanted));
  };
  return [list, change] as const;
}
