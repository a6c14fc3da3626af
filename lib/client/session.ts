/** Signing in and out, and the shop's settings, from the browser. */
import { queryOptions } from "@tanstack/react-query";
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/session";
import { call } from "./call";

export const sessionQuery = () =>
  queryOptions({ queryKey: ["session"], queryFn: ({ signal }) => call(endpoint.getSession, {}, signal) });

export const signIn = (body: BodySent<typeof endpoint.signIn>) => call(endpoint.signIn, { body });
export const signOut = () => call(endpoint.signOut, {});
export const signOutEverywhere = () => call(endpoint.signOutEverywhere, {});
