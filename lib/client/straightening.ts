/** Versions of a board's straightened picture, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/straightening";
import { call } from "./call";

export const straighteningKeys = {
  one: (straighteningId: string) => ["straightenings", straighteningId] as const,
};

export const straighteningQuery = (straighteningId: string) =>
  queryOptions({
    queryKey: straighteningKeys.one(straighteningId),
    queryFn: ({ signal }) => call(endpoint.getStraightening, { params: { straighteningId } }, signal),
  });

export const startStraightening = (boardId: string, body: BodySent<typeof endpoint.startStraightening>) =>
  call(endpoint.startStraightening, { params: { boardId }, body });

/** A conflict carries `{ revision }`, the present one, as its detail. */
export const saveZones = (straighteningId: string, body: BodySent<typeof endpoint.saveZones>) =>
  call(endpoint.saveZones, { params: { straighteningId }, body });
