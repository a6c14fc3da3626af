/** The layout table on a phone: both sides in view, fronts slid by buttons. */
import { LayoutTablePage } from "./support/layout-table";
import { makeBoard, makeFace } from "./support/stock";
import { accessibilityFaults, expect, test } from "./support/test";

test("fronts are chosen by tapping and slid by buttons", async ({ makerPage: page, shop }) => {
  const board = { lengthMm: 1200, widthMm: 200 };
  const { tag } = await makeBoard(page.request, board);
  const table = new LayoutTablePage(page);
  await table.open(await makeFace(page.request, shop.sawId, { columnsMm: [200, 200], rowsMm: [120] }));
  await table.addBoard(tag);
  await expect(table.show).toBeVisible();
  await expect(table.stock).toBeVisible();

  const second = await table.middleOf("2", board.lengthMm);
  await page.touchscreen.tap(second.x, second.y);
  await expect(table.front("2")).toHaveAttribute("aria-pressed", "true");
  await page.getByRole("button", { name: "Let loose" }).tap();
  await page.getByRole("button", { name: /^Step 0\.5 mm/ }).tap();
  const before = await table.leftOf("2");
  await page.getByRole("button", { name: "Slide right by 5.0 mm" }).tap();
  expect(await table.leftOf("2")).toBeCloseTo(before + 5, 6);
  await table.saved();
  expect(await accessibilityFaults(page)).toEqual([]);
  const scrolls = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);
  expect(scrolls).toBe(false);
});
