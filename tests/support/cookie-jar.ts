/** Stands in for Next.js' request cookies, so that route handlers run in a test as they are. Each test file has a jar of its own. */
import { vi } from "vitest";

const held = new Map<string, string>();

/** Signs whoever was signed in out of this jar without telling the server. */
export const emptyJar = () => held.clear();
/** What a browser would keep: to sign in as one person, put the jar aside, and take it up again. */
export const jarContent = () => new Map(held);
export const fillJar = (content: ReadonlyMap<string, string>) => {
  held.clear();
  for (const [name, value] of content) held.set(name, value);
};

vi.mock("next/headers", () => ({
  cookies: async () => ({
    get: (name: string) => (held.has(name) ? { name, value: held.get(name) } : undefined),
    set: (name: string, value: string, options?: { maxAge?: number }) => {
      if (options?.maxAge === 0) held.delete(name);
      else held.set(name, value);
    },
  }),
}));

// Outside a render there is nothing to remember per request.
vi.mock("react", async (original) => ({ ...(await original<typeof import("react")>()), cache: <F>(work: F) => work }));
