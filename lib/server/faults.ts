/** What a use case throws to refuse. Mapped to an answer in one place, `http/handle.ts`; the message is for people. */
import "server-only";
import type { z } from "zod";
import type { FaultCode, faultSchema } from "@/lib/schemas/fault";

const statusOf: Record<FaultCode, number> = {
  "bad-request": 400,
  "not-signed-in": 401,
  "not-allowed": 403,
  "cross-site": 403,
  "not-found": 404,
  conflict: 409,
  "too-large": 413,
  refused: 422,
  "too-many-tries": 429,
  unexpected: 500,
};

export class FaultError extends Error {
  readonly code: FaultCode;
  readonly status: number;
  readonly fields: Record<string, string[]> | undefined;
  readonly detail: z.input<typeof faultSchema>["detail"];

  constructor(
    code: FaultCode,
    message: string,
    more: { fields?: Record<string, string[]>; detail?: z.input<typeof faultSchema>["detail"] } = {},
  ) {
    super(message);
    this.name = "FaultError";
    this.code = code;
    this.status = statusOf[code];
    this.fields = more.fields;
    this.detail = more.detail;
  }
}

/** Also for another shop's things: whether they exist is nobody else's business. */
export const notFound = (what: string) => new FaultError("not-found", `There is no such ${what}.`);

/** Somebody saved in between. `detail` tells the present state so that the screen can offer both. */
export const conflict = (message: string, detail?: z.input<typeof faultSchema>["detail"]) =>
  new FaultError("conflict", message, { detail });

/** The request is well formed, yet it cannot be done; the message says why, by how much and what would mend it. */
export const refused = (message: string, fields?: Record<string, string[]>) => new FaultError("refused", message, { fields });
