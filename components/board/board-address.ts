/** Where a side of a board is marked and drawn on. Pure. */
import type { BoardSide } from "@/lib/schemas/straightening";

export const zonesAddress = (boardId: string, side: BoardSide): string =>
  side === "back" ? `/rack/${boardId}/zones?side=back` : `/rack/${boardId}/zones`;

export const markAddress = (boardId: string, photoId: string, side: BoardSide): string =>
  `/rack/${boardId}/mark?photo=${photoId}${side === "back" ? "&side=back" : ""}`;

/** Planning a blank, with a board in it already. */
export const blankAddress = (boardId?: string): string => (boardId ? `/rack/glue-up?with=${boardId}` : "/rack/glue-up");
