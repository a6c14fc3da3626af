/** One person at a running server, through the endpoints' own descriptions. */
import { addressOf, type Sent } from "@/lib/client/call";
import type { Endpoint, ResponseOf } from "@/lib/schemas/endpoint";
import { signIn } from "@/lib/schemas/session";

export interface WebClient {
  readonly call: <E extends Endpoint>(endpoint: E, sent: Sent<E>) => Promise<ResponseOf<E>>;
  /** An upload, whose body is the file itself. */
  readonly upload: <E extends Endpoint>(endpoint: E, sent: Sent<E>, bytes: Uint8Array) => Promise<ResponseOf<E>>;
  /** Reads a page to its end and answers how long that took, ms. */
  readonly timePage: (path: string) => Promise<number>;
}

export async function signedIn(base: string, person: { readonly email: string; readonly password: string }): Promise<WebClient> {
  let cookie = "";
  const ask = async (path: string, init: RequestInit): Promise<Response> => {
    const response = await fetch(new URL(path, base), {
      ...init,
      headers: { ...init.headers, origin: base, cookie },
      redirect: "manual",
    });
    if (response.status !== 200) throw new Error(`${init.method ?? "GET"} ${path}: ${response.status} ${await response.text()}`);
    return response;
  };
  const parsed = async <E extends Endpoint>(endpoint: E, response: Response): Promise<ResponseOf<E>> => {
    const value: unknown = endpoint.response ? endpoint.response.parse(await response.json()) : undefined;
    // The schema just parsed by is the one the type is made from.
    return value as ResponseOf<E>;
  };
  const client: WebClient = {
    call: async (endpoint, sent) => {
      const body =
        sent.body === undefined ? {} : { body: JSON.stringify(sent.body), headers: { "content-type": "application/json" } };
      return parsed(endpoint, await ask(addressOf(endpoint, sent), { method: endpoint.method, ...body }));
    },
    upload: async (endpoint, sent, bytes) =>
      parsed(endpoint, await ask(addressOf(endpoint, sent), { method: endpoint.method, body: Buffer.from(bytes) })),
    timePage: async (path) => {
      const start = performance.now();
      await (await ask(path, {})).arrayBuffer();
      return performance.now() - start;
    },
  };
  const response = await ask(addressOf(signIn, {}), {
    method: "POST",
    body: JSON.stringify(person),
    headers: { "content-type": "application/json" },
  });
  cookie = response.headers
    .getSetCookie()
    .map((line) => line.split(";")[0])
    .join("; ");
  return client;
}
