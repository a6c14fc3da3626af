/** The rack with one thumb. */
import { accessibilityFaults, expect, test } from "./support/test";

test("the rack and taking in fit a phone, and the camera is at hand", async ({ makerPage: page }) => {
  const origin = process.env.BASE_URL ?? "";
  const data = {
    species: "European cherry",
    cut: "flat",
    nominalQuarters: null,
    thickness: 27_000,
    length: 2_700_000,
    width: 180_000,
    place: "rack 1",
    source: "",
    costMinor: null,
    note: "",
    reading: null,
  };
  await page.context().request.post("/api/boards", { data, headers: { origin } });
  const noSidewaysScroll = async () =>
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(page.viewportSize()?.width);

  await page.goto("/rack");
  await expect(page.getByRole("link", { name: /B-001/ })).toBeVisible();
  await noSidewaysScroll();
  await page.getByRole("button", { name: "Filters and order" }).click();
  await page.getByLabel("Length, at least").fill("3000");
  await page.getByLabel("Length, at least").blur();
  await expect(page.getByText("No board fits this.")).toBeVisible();
  await noSidewaysScroll();
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.goto("/rack/take-in");
  await expect(page.getByText("Take a photograph")).toBeVisible();
  await noSidewaysScroll();
});
