/** The OpenAPI document, made from the same endpoints that the handlers parse by. */
import "server-only";
import { extendZodWithOpenApi, OpenAPIRegistry, OpenApiGeneratorV31, type RouteConfig } from "@asteasolutions/zod-to-openapi";
import { z } from "zod";
import type { Endpoint } from "@/lib/schemas/endpoint";
import { endpoints } from "@/lib/schemas/endpoints";
import { faultSchema } from "@/lib/schemas/fault";

extendZodWithOpenApi(z);

const binary = z.string().meta({ format: "binary" });

function requestOf(endpoint: Endpoint): RouteConfig["request"] {
  return {
    ...(endpoint.params && { params: endpoint.params }),
    ...(endpoint.query && { query: endpoint.query }),
    ...(endpoint.body && { body: { required: true, content: { "application/json": { schema: endpoint.body } } } }),
    ...(endpoint.bodyKind && { body: { required: true, content: { "application/octet-stream": { schema: binary } } } }),
  };
}

function responsesOf(endpoint: Endpoint): RouteConfig["responses"] {
  const fault = { description: "Refused", content: { "application/problem+json": { schema: faultSchema } } };
  if (endpoint.responseKind) {
    return { 200: { description: "The file", content: { [endpoint.responseKind]: { schema: binary } } }, default: fault };
  }
  if (!endpoint.response) return { 204: { description: "Done" }, default: fault };
  return { 200: { description: "Done", content: { "application/json": { schema: endpoint.response } } }, default: fault };
}

const lowerCase = { GET: "get", POST: "post", PUT: "put", PATCH: "patch", DELETE: "delete" } as const;

export function openApiDocument() {
  const registry = new OpenAPIRegistry();
  const cookie = registry.registerComponent("securitySchemes", "session", { type: "apiKey", in: "cookie", name: "grainwright" });
  for (const endpoint of endpoints) {
    registry.registerPath({
      method: lowerCase[endpoint.method],
      path: endpoint.path,
      summary: endpoint.summary,
      description: endpoint.access === "public" ? "For everybody." : `For ${endpoint.access.join(", ")}.`,
      tags: [endpoint.tag],
      request: requestOf(endpoint),
      responses: responsesOf(endpoint),
      ...(endpoint.access !== "public" && { security: [{ [cookie.name]: [] }] }),
    });
  }
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: "3.1.0",
    info: {
      title: "Grainwright",
      version: "1",
      description: "Lengths are whole micrometres, times are UTC, money is in minor units.",
    },
  });
  return z.record(z.string(), z.unknown()).parse(JSON.parse(JSON.stringify(document)));
}
