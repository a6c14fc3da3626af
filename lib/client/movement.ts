/** Movement of a face's wood and the shop's settings of it, from the browser. */
import { keepPreviousData, queryOptions } from "@tanstack/react-query";
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/movement";
import { call } from "./call";

export const movementKeys = {
  settings: ["shop", "movement"] as const,
  face: (faceId: string) => ["faces", faceId, "movement"] as const,
};

export const movementSettingsQuery = () =>
  queryOptions({ queryKey: movementKeys.settings, queryFn: ({ signal }) => call(endpoint.getMovementSettings, {}, signal) });

export const updateMovementSettings = (body: BodySent<typeof endpoint.updateMovementSettings>) =>
  call(endpoint.updateMovementSettings, { body });

/** `boardIds`: those on the table; with others on it the wood is asked for anew. */
export const faceMovementQuery = (faceId: string, boardIds: readonly string[]) =>
  queryOptions({
    queryKey: [...movementKeys.face(faceId), boardIds],
    queryFn: ({ signal }) => call(endpoint.getFaceMovement, { params: { faceId } }, signal),
    placeholderData: keepPreviousData,
    // Readings, climates and species change on other pages.
    staleTime: 0,
  });

export const saveFaceMovement = (faceId: string, body: BodySent<typeof endpoint.saveFaceMovement>) =>
  call(endpoint.saveFaceMovement, { params: { faceId }, body });
