/** What photographs say about seams and grain, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import * as endpoint from "@/lib/schemas/figure";
import { call } from "./call";

/** Read from the layout as it is saved; `revision` is the one that the browser knows to be saved, so that a save asks again. */
export const seamReadingsQuery = (faceId: string, revision: number) =>
  queryOptions({
    queryKey: ["seam-readings", faceId, revision] as const,
    queryFn: ({ signal }) => call(endpoint.getSeamReadings, { params: { faceId } }, signal),
    staleTime: Number.POSITIVE_INFINITY,
  });

/** A finished picture never changes, and so neither does its grain. */
export const grainQuery = (straighteningId: string) =>
  queryOptions({
    queryKey: ["grain", straighteningId] as const,
    queryFn: ({ signal }) => call(endpoint.getGrain, { params: { straighteningId } }, signal),
    staleTime: Number.POSITIVE_INFINITY,
  });

export const suggestionsQuery = (straighteningId: string) =>
  queryOptions({
    queryKey: ["suggestions", straighteningId] as const,
    queryFn: ({ signal }) => call(endpoint.getSuggestions, { params: { straighteningId } }, signal),
    staleTime: Number.POSITIVE_INFINITY,
  });
