/** Endpoints about the service itself. */
import { z } from "zod";
import { defineEndpoint } from "./endpoint";

export const getHealth = defineEndpoint({
  method: "GET",
  path: "/api/health",
  summary: "Answers once the database can be reached",
  tag: "service",
  access: "public",
  response: z.object({ ok: z.literal(true) }),
});

export const getOpenApi = defineEndpoint({
  method: "GET",
  path: "/api/openapi.json",
  summary: "This description",
  tag: "service",
  access: "public",
  response: z.record(z.string(), z.unknown()),
});
