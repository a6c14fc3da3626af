/** The description of the API is complete: what is served is described, what is described is served, under that address. */
import { readdirSync } from "node:fs";
import path from "node:path";
import { describe, expect, it, vi } from "vitest";
import "../support/cookie-jar";
import { endpoints } from "@/lib/schemas/endpoints";
import { openApiDocument } from "@/lib/server/http/openapi";

const root = path.resolve(import.meta.dirname, "../../app/api");
const methods = ["GET", "POST", "PUT", "PATCH", "DELETE", "HEAD", "OPTIONS"] as const;

vi.setConfig({ testTimeout: 60_000 });

const routeFiles = readdirSync(root, { recursive: true, encoding: "utf8" }).filter((file) => path.basename(file) === "route.ts");
/** app/api/boards/[boardId]/route.ts serves /api/boards/{boardId}. */
const addressOfFile = (file: string) => `/api/${path.dirname(file).replaceAll(/\[(\w+)\]/g, "{$1}")}`;
const nameOf = (endpoint: { method: string; path: string }) => `${endpoint.method} ${endpoint.path}`;

describe("the OpenAPI document", () => {
  it("has every handler, and every handler serves the endpoint it was made from", async () => {
    const served: string[] = [];
    for (const file of routeFiles) {
      const module: Record<string, { endpoint?: { method: string; path: string } }> = await import(path.join(root, file));
      for (const method of methods) {
        const handler = module[method];
        if (!handler) continue;
        const name = `${method} ${addressOfFile(file)}`;
        expect(handler.endpoint && nameOf(handler.endpoint), `${file} exports ${method}`).toBe(name);
        served.push(name);
      }
    }
    expect(served.sort()).toEqual(endpoints.map(nameOf).sort());
  });

  it("describes each endpoint under its path and method", () => {
    const paths = openApiDocument().paths as Record<string, Record<string, unknown>>;
    const described = Object.entries(paths).flatMap(([address, byMethod]) =>
      Object.keys(byMethod).map((method) => `${method.toUpperCase()} ${address}`),
    );
    expect(described.sort()).toEqual(endpoints.map(nameOf).sort());
  });

  it("names every parameter that stands in a path", () => {
    for (const endpoint of endpoints) {
      const inPath = [...endpoint.path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]).sort();
      expect(Object.keys(endpoint.params?.shape ?? {}).sort(), nameOf(endpoint)).toEqual(inPath);
    }
  });
});
