/** What happened in the shop. */
import { z } from "zod";
import { defineEndpoint, roles } from "./endpoint";
import { idSchema } from "./ids";

export const historyRowSchema = z.object({
  id: idSchema,
  at: z.iso.datetime(),
  by: z.string().nullable(),
  noun: z.string(),
  nounId: idSchema,
  /** What the thing is called now: "B-041", "Map chest"; null when it is gone. */
  label: z.string().nullable(),
  /** Where to see it. */
  path: z.string().nullable(),
  verb: z.string(),
  detail: z.record(z.string(), z.unknown()),
});
export type HistoryRow = z.output<typeof historyRowSchema>;

export const listHistory = defineEndpoint({
  method: "GET",
  path: "/api/history",
  summary: "What was done, newest first; of the whole shop or of one thing",
  tag: "history",
  access: roles,
  query: z.object({
    noun: z.string().max(24).optional(),
    nounId: idSchema.optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  response: z.object({ items: z.array(historyRowSchema) }),
});
