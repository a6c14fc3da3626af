/** Cut orders, from the browser. Issuing one is in `layout.ts`: it belongs to the layout table. */
import { keepPreviousData, queryOptions } from "@tanstack/react-query";
import type { QuerySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/order";
import { addressOf, call } from "./call";

export const orderKeys = {
  all: ["orders"] as const,
  one: (orderId: string, revision: number | undefined) => ["orders", orderId, revision ?? "newest"] as const,
  progress: (orderId: string, revisionId: string) => ["orders", orderId, "progress", revisionId] as const,
};

/** Others tick too: what they did shows within this time. */
const refreshMs = 5000;

export const ordersQuery = (query: QuerySent<typeof endpoint.listOrders>) =>
  queryOptions({
    queryKey: [...orderKeys.all, "list", query],
    queryFn: ({ signal }) => call(endpoint.listOrders, { query }, signal),
    placeholderData: keepPreviousData,
    refetchInterval: refreshMs,
  });

export const orderQuery = (orderId: string, revision?: number) =>
  queryOptions({
    queryKey: orderKeys.one(orderId, revision),
    queryFn: ({ signal }) => call(endpoint.getOrder, { params: { orderId }, query: { revision } }, signal),
  });

export const progressQuery = (orderId: string, revisionId: string) =>
  queryOptions({
    queryKey: orderKeys.progress(orderId, revisionId),
    queryFn: ({ signal }) => call(endpoint.getOrderProgress, { params: { orderId, revisionId } }, signal),
    refetchInterval: refreshMs,
  });

interface StepAddress {
  orderId: string;
  revisionId: string;
  stepId: string;
}

export const tickStep = (params: StepAddress) => call(endpoint.tickStep, { params });
export const untickStep = (params: StepAddress) => call(endpoint.untickStep, { params });

export const orderPdfUrl = (orderId: string, query: QuerySent<typeof endpoint.getOrderPdf>) =>
  addressOf(endpoint.getOrderPdf, { params: { orderId }, query });

export const orderLabelsUrl = (orderId: string, query: QuerySent<typeof endpoint.getOrderLabels>) =>
  addressOf(endpoint.getOrderLabels, { params: { orderId }, query });
