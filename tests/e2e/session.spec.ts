/** Getting in, getting out, and where wrong turns lead. */
import { accessibilityFaults, expect, signIn, test } from "./support/test";

test("signing in leads to the page that was asked for", async ({ page, shop }) => {
  await page.goto("/jobs?state=open");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByLabel("E-mail").fill(shop.maker.email);
  await page.getByLabel("Password").fill("not it");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "do not go together" })).toBeVisible();
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

test("what is not there, and what is not for the role, have a page each that leads back", async ({ context, page, shop }) => {
  await signIn(context, shop.assistant);
  const missing = await page.goto("/jobs/01a2308e-5a61-738a-9730-8eb00ca41ccf");
  expect(missing?.status()).toBe(404);
  await expect(page.getByRole("heading", { name: "There is nothing here" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
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
