/** Long work, watched and stopped from the browser. */
import { queryOptions } from "@tanstack/react-query";
import { cancelTask as cancelEndpoint, getTask, type Task } from "@/lib/schemas/task";
import { call } from "./call";

/** Often enough for a tape that moves, seldom enough for a phone. */
const askAgainMs = 700;

export const taskEnded = (task: Task): boolean => task.state !== "queued" && task.state !== "running";

/** Asks again until the task has ended. */
export const taskQuery = (taskId: string) =>
  queryOptions({
    queryKey: ["tasks", taskId],
    queryFn: ({ signal }) => call(getTask, { params: { taskId } }, signal),
    staleTime: 0,
    refetchInterval: ({ state }) => (state.data && taskEnded(state.data) ? false : askAgainMs),
  });

export const cancelTask = (taskId: string) => call(cancelEndpoint, { params: { taskId } });
