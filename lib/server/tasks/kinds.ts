/** Every kind of long work there is. */
import "server-only";
import type { taskKinds } from "@/lib/schemas/task";
import { composeTask } from "../blanks/compose-task";
import { searchTask } from "../search/search-task";
import { straightenTask } from "../straightenings/straighten-task";
import type { TaskKind } from "./task-kind";

export const kinds: Record<(typeof taskKinds)[number], TaskKind> = {
  straighten: straightenTask,
  compose: composeTask,
  search: searchTask,
};
