/** The shop's settings and saws, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/shop";
import { call } from "./call";

export const shopKey = ["shop"] as const;

export const shopQuery = () => queryOptions({ queryKey: shopKey, queryFn: ({ signal }) => call(endpoint.getShop, {}, signal) });

export const updateShop = (body: BodySent<typeof endpoint.updateShop>) => call(endpoint.updateShop, { body });

export const createSaw = (body: BodySent<typeof endpoint.createSaw>) => call(endpoint.createSaw, { body });

export const updateSaw = (sawId: string, body: BodySent<typeof endpoint.updateSaw>) =>
  call(endpoint.updateSaw, { params: { sawId }, body });
