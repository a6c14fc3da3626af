import { addLayoutBoard } from "@/lib/schemas/layout";
import { handle } from "@/lib/server/http/handle";
import { putBoardOnTable } from "@/lib/server/layouts/boards-on-table";

export const POST = handle(addLayoutBoard, async ({ access, params, body }) =>
  putBoardOnTable(access, params.faceId, body.boardId),
);
