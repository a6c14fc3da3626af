import { moveLayoutToVersion } from "@/lib/schemas/layout";
import { handle } from "@/lib/server/http/handle";
import { moveToVersion } from "@/lib/server/layouts/boards-on-table";

export const POST = handle(moveLayoutToVersion, async ({ access, params, body }) =>
  moveToVersion(access, params.faceId, params.boardId, body.straighteningId),
);
