/** Long work that runs off the request thread. */
import { z } from "zod";
import { defineEndpoint, everyone, makers } from "./endpoint";
import { idSchema } from "./ids";

export const taskKinds = ["straighten", "compose", "search"] as const;
export const taskStates = ["queued", "running", "done", "failed", "cancelled"] as const;

export const taskSchema = z.object({
  id: idSchema,
  kind: z.enum(taskKinds),
  state: z.enum(taskStates),
  /** 0 to 1. */
  progress: z.number().min(0).max(1),
  failure: z.string().nullable(),
});
export type Task = z.output<typeof taskSchema>;

export const getTask = defineEndpoint({
  method: "GET",
  path: "/api/tasks/{taskId}",
  summary: "How far a task is",
  tag: "tasks",
  access: everyone,
  params: z.object({ taskId: idSchema }),
  response: taskSchema,
});

export const cancelTask = defineEndpoint({
  method: "POST",
  path: "/api/tasks/{taskId}/cancel",
  summary: "Ask a task to stop; it leaves nothing half done",
  tag: "tasks",
  access: makers,
  params: z.object({ taskId: idSchema }),
  response: taskSchema,
});
