/** Calls a route handler as the browser would, through the same description. */
import { addressOf, type Sent } from "@/lib/client/call";
import type { Endpoint } from "@/lib/schemas/endpoint";
import { env } from "@/lib/server/env";
import type { RouteHandler } from "@/lib/server/http/handle";

export interface Asked {
  readonly status: number;
  readonly body: unknown;
  readonly headers: Headers;
}

export async function ask<E extends Endpoint>(
  handler: RouteHandler,
  endpoint: E,
  sent: Sent<E>,
  headers: Record<string, string> = { origin: env().APP_URL },
): Promise<Asked> {
  const request = new Request(new URL(addressOf(endpoint, sent), env().APP_URL), {
    method: endpoint.method,
    headers: { "content-type": "application/json", ...headers },
    ...(sent.body !== undefined && { body: JSON.stringify(sent.body) }),
  });
  const params: Record<string, string> = Object.fromEntries(
    Object.entries(sent.params ?? {}).map(([name, value]) => [name, String(value)]),
  );
  const response = await handler(request, { params: Promise.resolve(params) });
  const text = await response.text();
  const json = response.headers.get("content-type")?.includes("json") ?? false;
  return { status: response.status, body: json ? JSON.parse(text) : text, headers: response.headers };
}
