/**
 * One description of an endpoint, used three times: the server parses and answers by it, the browser calls by it, and the OpenAPI
 * document is made from it. Path parameters stand in braces, as OpenAPI writes them.
 */
import type { z } from "zod";

export const roles = ["owner", "maker", "assistant"] as const;
export type Role = (typeof roles)[number];

/** Who may read the shop's things. */
export const everyone = roles;
/** Who may change stock, jobs, layouts and orders. */
export const makers = ["owner", "maker"] as const;

/** Who may call: anybody, or members of the shop with one of these roles. */
export type EndpointAccess = "public" | readonly Role[];
export type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
export type BinaryKind = "image/jpeg" | "image/png" | "application/pdf";

export interface Endpoint {
  readonly method: Method;
  readonly path: `/api/${string}`;
  readonly summary: string;
  readonly tag: string;
  readonly access: EndpointAccess;
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly body?: z.ZodType;
  /** "bytes": the body is a file, read as a stream and not parsed. */
  readonly bodyKind?: "bytes";
  /** null: answers 204 with nothing. */
  readonly response?: z.ZodType | null;
  /** Answers with a file of this type instead of JSON. */
  readonly responseKind?: BinaryKind;
}

export function defineEndpoint<const E extends Endpoint>(endpoint: E): E {
  return endpoint;
}

type Out<T> = T extends z.ZodType ? z.output<T> : undefined;
type In<T> = T extends z.ZodType ? z.input<T> : undefined;

export type ParamsOf<E extends Endpoint> = Out<E["params"]>;
export type QueryOf<E extends Endpoint> = Out<E["query"]>;
export type BodyOf<E extends Endpoint> = Out<E["body"]>;
export type ParamsSent<E extends Endpoint> = In<E["params"]>;
export type QuerySent<E extends Endpoint> = In<E["query"]>;
/** Read-only all the way down: what is sent is often a document of the core, which nobody may write to. */
export type BodySent<E extends Endpoint> = ReadonlyDeep<In<E["body"]>>;

type ReadonlyDeep<T> = T extends readonly (infer Item)[]
  ? readonly ReadonlyDeep<Item>[]
  : T extends object
    ? { readonly [Key in keyof T]: ReadonlyDeep<T[Key]> }
    : T;
/** What the browser gets, parsed. */
export type ResponseOf<E extends Endpoint> = Out<E["response"]>;
/** What the server answers with, before it is parsed and written. */
export type Answer<E extends Endpoint> = In<E["response"]>;
