import { addMoistureReading } from "@/lib/schemas/board";
import { addReading } from "@/lib/server/boards/add-reading";
import { handle } from "@/lib/server/http/handle";

export const POST = handle(addMoistureReading, async ({ access, params, body }) => addReading(access, params.boardId, body));
