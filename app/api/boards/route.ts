import { createBoard, listBoards } from "@/lib/schemas/board";
import { enterBoard } from "@/lib/server/boards/enter-board";
import { readBoardPage } from "@/lib/server/boards/list-boards";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(listBoards, async ({ access, query }) => readBoardPage(access, query));
export const POST = handle(createBoard, async ({ access, body }) => enterBoard(access, body));
