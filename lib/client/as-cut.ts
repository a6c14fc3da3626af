/** What the bench enters while it cuts, and the rest planned from it, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import * as asCut from "@/lib/schemas/as-cut";
import * as rest from "@/lib/schemas/rest";
import { call } from "./call";
import { orderKeys } from "./order";

interface RevisionAddress {
  orderId: string;
  revisionId: string;
}

export const enterAsCut = (params: RevisionAddress, entry: asCut.AsCutEntry, seenVersion: number | null) =>
  call(asCut.enterAsCut, { params, body: { entry, seenVersion } });

export const removeAsCut = (params: RevisionAddress, { id, version }: Pick<asCut.AsCut, "id" | "version">) =>
  call(asCut.removeAsCut, { params: { ...params, asCutId: id }, query: { seenVersion: version } });

/** `basis`: whatever it is to be asked anew for, as a ticked step or a new entry. */
export const restQuery = (orderId: string, choices: rest.RescueChoicesByBoard, basis: string) =>
  queryOptions({
    queryKey: [...orderKeys.all, orderId, "rest", choices, basis],
    queryFn: ({ signal }) => call(rest.previewRest, { params: { orderId }, body: { choices } }, signal),
    // A refusal is an answer: asking again does not change it.
    retry: false,
    staleTime: Number.POSITIVE_INFINITY,
  });

export const issueRest = (orderId: string, basis: string, choices: rest.RescueChoicesByBoard) =>
  call(rest.issueRest, { params: { orderId }, body: { basis, choices } });
