/** Boards of the rack, from the browser. */
import { keepPreviousData, queryOptions } from "@tanstack/react-query";
import * as endpoint from "@/lib/schemas/board";
import type { BodySent, QuerySent } from "@/lib/schemas/endpoint";
import { call } from "./call";

export const boardKeys = {
  all: ["boards"] as const,
  page: (query: QuerySent<typeof endpoint.listBoards>) => ["boards", "page", query] as const,
};

/** One page of the rack; while the next one loads, the last one stays in view. */
export const boardPageQuery = (query: QuerySent<typeof endpoint.listBoards>) =>
  queryOptions({
    queryKey: boardKeys.page(query),
    queryFn: ({ signal }) => call(endpoint.listBoards, { query }, signal),
    placeholderData: keepPreviousData,
  });

export const createBoard = (body: BodySent<typeof endpoint.createBoard>) => call(endpoint.createBoard, { body });

export const updateBoard = (boardId: string, body: BodySent<typeof endpoint.updateBoard>) =>
  call(endpoint.updateBoard, { params: { boardId }, body });

export const addMoistureReading = (boardId: string, body: BodySent<typeof endpoint.addMoistureReading>) =>
  call(endpoint.addMoistureReading, { params: { boardId }, body });
