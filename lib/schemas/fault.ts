/** Every refusal of the API has this shape (RFC 9457 problem details with a code and the request's id). */
import { z } from "zod";

export const faultCodes = [
  "bad-request",
  "not-signed-in",
  "not-allowed",
  "not-found",
  "conflict",
  "too-many-tries",
  "refused",
  "too-large",
  "cross-site",
  "unexpected",
] as const;
export type FaultCode = (typeof faultCodes)[number];

export const faultSchema = z.object({
  type: z.literal("about:blank"),
  status: z.int(),
  code: z.enum(faultCodes),
  /** A sentence for people: what is wrong, by how much, what would mend it. */
  title: z.string(),
  requestId: z.string(),
  /** Messages by field name, for forms. */
  fields: z.record(z.string(), z.array(z.string())).optional(),
  /** Machine-readable particulars, such as the present revision in a conflict. */
  detail: z.unknown().optional(),
});
export type Fault = z.output<typeof faultSchema>;
