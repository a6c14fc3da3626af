/** Searches for wood, started, watched and stopped from the browser. */
import { queryOptions } from "@tanstack/react-query";
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/wood-search";
import { call } from "./call";

/** Often enough that boards come in as they are found, seldom enough for a phone. */
const askAgainMs = 800;

export const searchEnded = ({ state }: Pick<endpoint.WoodSearch, "state">): boolean => state !== "queued" && state !== "running";

export const startSearch = (faceId: string, body: BodySent<typeof endpoint.startSearch>) =>
  call(endpoint.startSearch, { params: { faceId }, body });

/** Asks again until the search has ended. */
export const searchQuery = (searchId: string) =>
  queryOptions({
    queryKey: ["searches", searchId],
    queryFn: ({ signal }) => call(endpoint.getSearch, { params: { searchId } }, signal),
    staleTime: 0,
    refetchInterval: ({ state }) => (state.data && searchEnded(state.data) ? false : askAgainMs),
  });

export const leftOutQuery = (searchId: string, page: number) =>
  queryOptions({
    queryKey: ["searches", searchId, "left-out", page],
    queryFn: ({ signal }) => call(endpoint.listLeftOut, { params: { searchId }, query: { page } }, signal),
  });
