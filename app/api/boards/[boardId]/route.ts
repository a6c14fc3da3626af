import { getBoard, updateBoard } from "@/lib/schemas/board";
import { changeBoard } from "@/lib/server/boards/change-board";
import { readBoard } from "@/lib/server/boards/read-board";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(getBoard, async ({ access, params }) => readBoard(access, params.boardId));
export const PATCH = handle(updateBoard, async ({ access, params, body }) => changeBoard(access, params.boardId, body));
