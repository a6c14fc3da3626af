/** The layout of a face, the boards on its table, and issuing it, from the browser. */
import type { BodySent, QuerySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/layout";
import { issueOrder as issueOrderEndpoint } from "@/lib/schemas/order";
import { addressOf, call } from "./call";

export const getLayout = (faceId: string) => call(endpoint.getLayout, { params: { faceId } });

export const saveLayout = (faceId: string, body: BodySent<typeof endpoint.saveLayout>) =>
  call(endpoint.saveLayout, { params: { faceId }, body });

export const putBoardOnTable = (faceId: string, boardId: string) =>
  call(endpoint.addLayoutBoard, { params: { faceId }, body: { boardId } });

export const takeBoardOffTable = (faceId: string, boardId: string) =>
  call(endpoint.removeLayoutBoard, { params: { faceId, boardId } });

export const moveToVersion = (faceId: string, boardId: string, straighteningId: string) =>
  call(endpoint.moveLayoutToVersion, { params: { faceId, boardId }, body: { straighteningId } });

/** Freezes the layout as it is saved under that revision. */
export const issueOrder = (faceId: string, layoutRevision: number) =>
  call(issueOrderEndpoint, { params: { faceId }, body: { layoutRevision } });

/** Where the show side is to be had as a picture. */
export const showSideAddress = (faceId: string, query: QuerySent<typeof endpoint.getShowSidePng>) =>
  addressOf(endpoint.getShowSidePng, { params: { faceId }, query });
