/** From an empty shop to a face with its sizes. */
import { makeFace } from "./support/stock";
import { accessibilityFaults, expect, signIn, test } from "./support/test";

test("a job is opened and a row of fronts described from its opening", async ({ makerPage: page }) => {
  await page.goto("/jobs");
  await expect(page.getByRole("heading", { name: "No jobs yet" })).toBeVisible();
  await page.getByRole("button", { name: "Open a job" }).first().click();
  await page.getByLabel("Title").fill("Map chest for the reading room");
  await page.getByLabel("Client").fill("Harbour library");
  await page.getByLabel("Due").fill("2027-03-14");
  await page.getByRole("button", { name: "Open job" }).click();
  await expect(page.getByRole("heading", { name: "Map chest for the reading room" })).toBeVisible();
  await expect(page.getByText("due 14 Mar 2027")).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.getByRole("link", { name: "Add a face" }).first().click();
  await page.getByLabel("Title").fill("Top row, four fronts");
  const widths = page.getByRole("group", { name: "Widths" });
  await widths.getByLabel("Opening, width").fill("990");
  await widths.getByLabel("Fronts side by side").fill("4");
  await widths.getByLabel("Gap between").fill("2.5 mm");
  await widths.getByLabel("Gap between").blur();
  // 990 − 2 × 3 − 3 × 2.5 = 976.5; a quarter is 244.125, brought down to 0.1 mm.
  await expect(widths.getByText("244.1 mm, 244.1 mm, 244.1 mm, 244.1 mm")).toBeVisible();
  await expect(widths.getByText(/0\.1 mm left over/)).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("button", { name: "Add face" }).click();
  await expect(page).toHaveURL(/\/faces\/[0-9a-f-]{36}$/);
  for (const address of ["/jobs", "/today"]) {
    await page.goto(address);
    await expect(page.getByText("due 14 Mar 2027")).toBeVisible();
  }
});

test("the shop's units change every length on the next page", async ({ context, page, shop }) => {
  await signIn(context, shop.owner);
  await page.goto("/shop");
  await expect(page.getByRole("cell", { name: "2.4 mm" })).toBeVisible();
  await page.getByLabel("Units").selectOption("inch");
  await page.getByRole("button", { name: "Save settings" }).click();
  await expect(page.getByText("Settings saved")).toBeVisible();
  await expect(page.getByRole("cell", { name: "3⁄32″" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
});

test("closing a job that somebody else changed is refused on the page, and works the second time", async ({
  makerPage: page,
  shop,
  browser,
}) => {
  await makeFace(page.request, shop.sawId, { columnsMm: [200], rowsMm: [100] });
  await page.goto("/jobs");
  await expect(page.getByRole("link", { name: /Map chest/ })).toHaveCount(1);
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("link", { name: /Map chest/ }).click();
  await expect(page.getByRole("heading", { name: "Map chest" })).toBeVisible();
  await expect(page.getByRole("link", { name: "Top row" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);

  const other = await browser.newContext();
  await signIn(other, shop.owner);
  const origin = process.env.BASE_URL ?? "";
  const jobId = new URL(page.url()).pathname.split("/").at(-1);
  const changed = await other.request.patch(`/api/jobs/${jobId}`, {
    data: { baseRevision: 1, client: "Harbour museum" },
    headers: { origin },
  });
  expect(changed.status()).toBe(200);
  await other.close();

  await page.getByRole("button", { name: "Close job" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "The job is not closed." })).toContainText(
    "Somebody else changed this job",
  );
  await expect(page.getByText("Harbour museum")).toBeVisible();
  await page.getByRole("button", { name: "Close job" }).click();
  await expect(page.getByRole("button", { name: "Open again" })).toBeVisible();
  await expect(page.getByText("The job is not closed.")).toBeHidden();
});

test("a job that cannot be closed without a connection says so", async ({ makerPage: page, context, shop }) => {
  await makeFace(page.request, shop.sawId, { columnsMm: [200], rowsMm: [100] });
  await page.goto("/jobs");
  await page.getByRole("link", { name: /Map chest/ }).click();
  await expect(page.getByRole("button", { name: "Close job" })).toBeVisible();
  await context.setOffline(true);
  await page.getByRole("button", { name: "Close job" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "The job is not closed." })).toContainText("cannot be reached");
  await context.setOffline(false);
});
