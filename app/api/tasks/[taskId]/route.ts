import { getTask } from "@/lib/schemas/task";
import { handle } from "@/lib/server/http/handle";
import { readTask } from "@/lib/server/tasks/tasks";

export const GET = handle(getTask, async ({ access, params }) => readTask(access, params.taskId));
