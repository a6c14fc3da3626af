/**
 * Makes a route handler from an endpoint and what it does: same origin → session → role → parse → act → answer. Faults are mapped
 * here and nowhere else; the cause of anything unexpected goes to the log, never to the caller.
 */
import "server-only";
import { z } from "zod";
import type { Answer, BodyOf, Endpoint, ParamsOf, QueryOf } from "@/lib/schemas/endpoint";
import type { Fault } from "@/lib/schemas/fault";
import { requireAccess, type ShopAccess } from "../access";
import { env } from "../env";
import { FaultError } from "../faults";
import { log } from "../log";
import { readBody } from "./read-body";
import { checkSameOrigin } from "./same-origin";

export interface Call<E extends Endpoint> {
  readonly params: ParamsOf<E>;
  readonly query: QueryOf<E>;
  readonly body: BodyOf<E>;
  /** The member asking; null on public endpoints only. */
  readonly access: E["access"] extends "public" ? null : ShopAccess;
  readonly request: Request;
  readonly requestId: string;
}

type RouteContext = { params: Promise<Record<string, string | string[] | undefined>> };
export interface RouteHandler {
  (request: Request, context: RouteContext): Promise<Response>;
  /** What it was made from: a test holds it against the file's place and name. */
  readonly endpoint: Endpoint;
}

/** JSON bodies are documents of a few kilobytes; a layout of 1600 pieces stays below 1 MB. */
const maxJsonBytes = 2 * 1024 * 1024;

/** On every JSON answer: kept by nobody, taken for nothing else, run nowhere. */
const guarded = {
  "cache-control": "no-store",
  "x-content-type-options": "nosniff",
  "content-security-policy": "default-src 'none'; frame-ancestors 'none'",
};

/** What acting answers: JSON by the endpoint's schema, a file, or null where the endpoint answers with nothing. */
type Acted<E extends Endpoint> = undefined extends Answer<E> ? Promise<Response | null> : Promise<Answer<E> | Response>;

export function handle<E extends Endpoint>(endpoint: E, act: (call: Call<E>) => Acted<E>): RouteHandler {
  const answer = async (request: Request, context: RouteContext): Promise<Response> => {
    const requestId = crypto.randomUUID();
    const started = performance.now();
    const line = { requestId, method: request.method, path: new URL(request.url).pathname };
    try {
      const call = await readCall(endpoint, request, context, requestId);
      const response = write(endpoint, await act(call), requestId);
      log().info({ ...line, status: response.status, ms: Math.round(performance.now() - started) }, "answered");
      return response;
    } catch (error) {
      // Work that was dropped because nobody waits for it any more is no failure, and nobody reads the answer.
      if (request.signal.aborted && isAbort(error)) {
        log().info(line, "left by the caller");
        return new Response(null, { status: 499, headers: { "x-request-id": requestId } });
      }
      const fault =
        error instanceof FaultError ? error : new FaultError("unexpected", "Something went wrong on our side. Try again.");
      if (fault.code === "unexpected") log().error({ ...line, err: error }, "failed");
      else log().info({ ...line, status: fault.status, code: fault.code }, "refused");
      return faultResponse(fault, requestId);
    }
  };
  return Object.assign(answer, { endpoint });
}

async function readCall<E extends Endpoint>(
  endpoint: E,
  request: Request,
  context: RouteContext,
  requestId: string,
): Promise<Call<E>> {
  checkSameOrigin(request, env().APP_URL);
  const access = endpoint.access === "public" ? null : await requireAccess(endpoint.access);
  const read = {
    params: endpoint.params && parse(endpoint.params, await context.params, "address"),
    query: endpoint.query && parse(endpoint.query, Object.fromEntries(new URL(request.url).searchParams), "address"),
    body: endpoint.body && parse(endpoint.body, await readJson(request), "body"),
    access,
    request,
    requestId,
  };
  // The conditional types of Call follow the endpoint's literal type, which the checker cannot see through here.
  return read as Call<E>;
}

const isAbort = (error: unknown): boolean => error instanceof Error && error.name === "AbortError";

function parse(schema: z.ZodType, value: unknown, where: "address" | "body"): unknown {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  // An id that is not one cannot name anything.
  if (where === "address" && result.error.issues.every((issue) => issue.path.some((key) => String(key).endsWith("Id")))) {
    throw new FaultError("not-found", "There is nothing at this address.");
  }
  const { formErrors, fieldErrors } = z.flattenError(result.error) as {
    formErrors: string[];
    fieldErrors: Record<string, string[] | undefined>;
  };
  const fields = Object.fromEntries(Object.entries(fieldErrors).map(([name, messages]) => [name, messages ?? []]));
  const first = formErrors[0] ?? Object.values(fields)[0]?.[0] ?? "it does not have the form asked for";
  throw new FaultError("bad-request", `The request cannot be read: ${first}`, { fields });
}

async function readJson(request: Request): Promise<unknown> {
  const read = await readBody(request, maxJsonBytes);
  if (!read.ok) throw new FaultError("too-large", "The request is larger than 2 MB.");
  try {
    return JSON.parse(new TextDecoder().decode(read.bytes));
  } catch {
    throw new FaultError("bad-request", "The request's body is not JSON.");
  }
}

function write(endpoint: Endpoint, answer: unknown, requestId: string): Response {
  if (answer instanceof Response) {
    answer.headers.set("x-request-id", requestId);
    return answer;
  }
  const headers = { ...guarded, "x-request-id": requestId };
  if (!endpoint.response) return new Response(null, { status: 204, headers });
  return Response.json(answer, { headers });
}

function faultResponse(fault: FaultError, requestId: string): Response {
  const body: Fault = {
    type: "about:blank",
    status: fault.status,
    code: fault.code,
    title: fault.message,
    requestId,
    ...(fault.fields && { fields: fault.fields }),
    ...(fault.detail !== undefined && { detail: fault.detail }),
  };
  return Response.json(body, {
    status: fault.status,
    headers: { ...guarded, "content-type": "application/problem+json", "x-request-id": requestId },
  });
}
