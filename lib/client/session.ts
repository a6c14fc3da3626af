/** Signing in and out, from the browser. */
import type { BodySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/session";
import { call } from "./call";

export const signIn = (body: BodySent<typeof endpoint.signIn>) => call(endpoint.signIn, { body });
export const signOut = () => call(endpoint.signOut, {});
export const signOutEverywhere = () => call(endpoint.signOutEverywhere, {});
