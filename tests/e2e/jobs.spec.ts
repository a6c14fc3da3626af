/** From an empty shop to a face with its sizes. */
import { accessibilityFaults, expect, signIn, test } from "./support/test";

test("a job is opened and a row of fronts described from its opening", async ({ makerPage: page }) => {
  await page.goto("/jobs");
  await expect(page.getByRole("heading", { name: "No jobs yet" })).toBeVisible();
  await page.getByRole("button", { name: "Open a job" }).first().click();
  await page.getByLabel("Title").fill("Map chest for the reading room");
  await page.getByLabel("Client").fill("Harbour library");
  await page.getByRole("button", { name: "Open job" }).click();
  await expect(page.getByRole("heading", { name: "Map chest for the reading room" })).toBeVisible();
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
