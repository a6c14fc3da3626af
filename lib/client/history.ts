/** What happened in the shop, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import type { QuerySent } from "@/lib/schemas/endpoint";
import { listHistory } from "@/lib/schemas/history";
import { call } from "./call";

export const historyQuery = (query: QuerySent<typeof listHistory>) =>
  queryOptions({ queryKey: ["history", query], queryFn: ({ signal }) => call(listHistory, { query }, signal) });
