import { cancelTask as endpoint } from "@/lib/schemas/task";
import { handle } from "@/lib/server/http/handle";
import { cancelTask } from "@/lib/server/tasks/tasks";

export const POST = handle(endpoint, async ({ access, params }) => cancelTask(access, params.taskId));
