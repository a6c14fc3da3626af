/** Getting in, getting out, and where wrong turns lead. */
import { accessibilityFaults, expect, makeShop, signIn, test } from "./support/test";

test("signing in leads to the page that was asked for", async ({ page, shop }) => {
  await page.goto("/jobs?state=open");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByLabel("E-mail").fill(shop.maker.email);
  await page.getByLabel("Password").fill("not it");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "do not go together" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByLabel("Password").fill(shop.maker.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(/\/jobs\?state=open$/);
  await expect(page.getByRole("heading", { name: "Jobs", exact: true })).toBeVisible();
});

test("no address leads a person off to another site after signing in", async ({ page, shop }) => {
  await page.goto("/sign-in?next=//elsewhere.example/");
  await page.getByLabel("E-mail").fill(shop.maker.email);
  await page.getByLabel("Password").fill(shop.maker.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(/\/today$/);
});

test("signing out everywhere ends the other window at its next step", async ({ browser, makerPage, shop }) => {
  const other = await browser.newContext();
  await signIn(other, shop.maker);
  const otherPage = await other.newPage();
  await otherPage.goto("/today");
  await makerPage.goto("/today");
  await makerPage.getByRole("button", { name: /Account of/ }).click();
  await makerPage.getByRole("menuitem", { name: "Sign out on every device" }).click();
  await expect(makerPage).toHaveURL(/\/sign-in/);
  await otherPage.getByRole("link", { name: "Rack", exact: true }).click();
  await expect(otherPage).toHaveURL(/\/sign-in/);
  await other.close();
});

test("what is not there has a page that leads back", async ({ makerPage: page }) => {
  const missing = await page.goto("/jobs/01a2308e-5a61-738a-9730-8eb00ca41ccf");
  expect(missing?.status()).toBe(404);
  await expect(page.getByRole("heading", { name: "There is nothing here" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("link", { name: "Go to Today" }).click();
  await expect(page).toHaveURL(/\/today$/);
});

test("what is not for the role has a page that says who decides", async ({ browser, makerPage, shop }) => {
  const origin = process.env.BASE_URL ?? "";
  const data = { title: "Linen press", client: "", note: "", dueOn: null };
  const job = await (await makerPage.request.post("/api/jobs", { data, headers: { origin } })).json();

  const context = await browser.newContext();
  await signIn(context, shop.assistant);
  const page = await context.newPage();
  const refused = await page.goto(`/jobs/${job.id}/faces/new`);
  expect(refused?.status()).toBe(403);
  await expect(page.getByRole("heading", { name: "Not for your role" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await context.close();
});

test("another shop's job is not there, whoever asks", async ({ browser, makerPage }) => {
  const origin = process.env.BASE_URL ?? "";
  const data = { title: "Linen press", client: "", note: "", dueOn: null };
  const job = await (await makerPage.request.post("/api/jobs", { data, headers: { origin } })).json();

  const context = await browser.newContext();
  await signIn(context, (await makeShop("Another shop")).owner);
  const page = await context.newPage();
  expect((await page.goto(`/jobs/${job.id}`))?.status()).toBe(404);
  expect((await context.request.get(`/api/jobs/${job.id}`)).status()).toBe(404);
  await context.close();
});

test("every page carries the security headers, and its scripts run under them", async ({ makerPage }) => {
  const complaints: string[] = [];
  makerPage.on("console", (message) => message.type() === "error" && complaints.push(message.text()));
  const response = await makerPage.goto("/today");
  const headers = response?.headers() ?? {};
  expect(headers["content-security-policy"]).toMatch(/script-src 'self' 'nonce-[^']+' 'strict-dynamic';/);
  expect(headers["x-content-type-options"]).toBe("nosniff");
  expect(headers["x-frame-options"]).toBe("DENY");
  expect(headers["x-powered-by"]).toBeUndefined();
  await makerPage.getByRole("button", { name: /Account of/ }).click();
  await expect(makerPage.getByRole("menuitem", { name: "Sign out", exact: true })).toBeVisible();
  expect(complaints).toEqual([]);
});
