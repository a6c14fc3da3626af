import { removeLayoutBoard } from "@/lib/schemas/layout";
import { handle } from "@/lib/server/http/handle";
import { takeBoardOffTable } from "@/lib/server/layouts/boards-on-table";

export const DELETE = handle(removeLayoutBoard, async ({ access, params }) => {
  await takeBoardOffTable(access, params.faceId, params.boardId);
  return null;
});
