/** Blanks, from the browser. */
import * as endpoint from "@/lib/schemas/blank";
import type { BodySent } from "@/lib/schemas/endpoint";
import { call } from "./call";

export const planBlank = (body: BodySent<typeof endpoint.planBlank>) => call(endpoint.planBlank, { body });

export const takeApartBlank = (boardId: string) => call(endpoint.takeApartBlank, { params: { boardId } });
