/** The browser tests' own `test`: a fresh shop for every test, people who are signed in, and an accessibility check. */
import { execFile } from "node:child_process";
import path from "node:path";
import { promisify } from "node:util";
import AxeBuilder from "@axe-core/playwright";
import { type BrowserContext, test as base, expect, type Page } from "@playwright/test";
import { z } from "zod";

const root = path.resolve(import.meta.dirname, "../../..");
const run = promisify(execFile);

const personSchema = z.object({ email: z.string(), name: z.string(), password: z.string() });
const shopSchema = z.object({ owner: personSchema, maker: personSchema, assistant: personSchema, sawId: z.string() });
export type Person = z.output<typeof personSchema>;
export type Shop = z.output<typeof shopSchema>;

/** A shop with an owner, a maker and an assistant, and nothing in it. */
export async function makeShop(name: string): Promise<Shop> {
  const { stdout } = await run(process.execPath, [path.join(root, ".data/build/make-shop.mjs"), name]);
  return shopSchema.parse(JSON.parse(stdout.trim().split("\n").at(-1) ?? ""));
}

/** Signs in by the API: the browser context keeps the cookie. */
export async function signIn(context: BrowserContext, { email, password }: Person): Promise<void> {
  const base = process.env.BASE_URL ?? "";
  const answer = await context.request.post("/api/session", { data: { email, password }, headers: { origin: base } });
  expect(answer.status()).toBe(200);
}

/** What axe finds against WCAG 2.2 A and AA, as readable lines; wait for what the page shows before asking. */
export async function accessibilityFaults(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
    .analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(" ")} ${node.failureSummary ?? ""}`),
  );
}

interface Fixtures {
  shop: Shop;
  /** A page signed in as the shop's maker. */
  makerPage: Page;
}

export const test = base.extend<Fixtures>({
  // Playwright reads which fixtures a fixture needs from its first parameter; one it asks for and does not use keeps that form.
  shop: async ({ baseURL: _ }, use, info) => use(await makeShop(info.title.slice(0, 80))),
  makerPage: async ({ context, page, shop }, use) => {
    await signIn(context, shop.maker);
    await use(page);
  },
});
export { expect };
