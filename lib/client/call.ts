/** Calls an endpoint from the browser and parses what comes back. Throws `FaultFromServer` on a refusal. */
import type { BodySent, Endpoint, ParamsSent, QuerySent, ResponseOf } from "@/lib/schemas/endpoint";
import { faultSchema } from "@/lib/schemas/fault";
import { FaultFromServer } from "./fault-from-server";

type Part<Name extends string, T> = [T] extends [undefined] ? { [K in Name]?: undefined } : { [K in Name]: T };

/** Exactly the parts that the endpoint takes. */
export type Sent<E extends Endpoint> = Part<"params", ParamsSent<E>> & Part<"body", BodySent<E>> & { query?: QuerySent<E> };

/** The address of an endpoint, for links and pictures. */
export function addressOf<E extends Endpoint>(endpoint: E, sent: { params?: ParamsSent<E>; query?: QuerySent<E> }): string {
  const params: Record<string, unknown> = sent.params ?? {};
  const path = endpoint.path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(sent.query ?? {})) {
    if (value !== undefined && value !== "") query.set(name, String(value));
  }
  return query.size > 0 ? `${path}?${query}` : path;
}

export async function call<E extends Endpoint>(endpoint: E, sent: Sent<E>, signal?: AbortSignal): Promise<ResponseOf<E>> {
  const response = await fetch(addressOf(endpoint, sent), {
    method: endpoint.method,
    ...(sent.body !== undefined && { body: JSON.stringify(sent.body), headers: { "content-type": "application/json" } }),
    ...(signal && { signal }),
  });
  if (!response.ok) throw await readFault(response);
  const parsed: unknown = endpoint.response ? endpoint.response.parse(await response.json()) : undefined;
  // The schema just parsed by is the one the type is made from.
  return parsed as ResponseOf<E>;
}

/** Also for uploads, which go by XMLHttpRequest. */
export async function readFault(response: Response): Promise<FaultFromServer> {
  const parsed = faultSchema.safeParse(await response.json().catch(() => null));
  if (parsed.success) return new FaultFromServer(parsed.data);
  const title = `The server answered with status ${response.status}. Try again in a moment.`;
  return new FaultFromServer({ type: "about:blank", status: response.status, code: "unexpected", title, requestId: "" });
}
