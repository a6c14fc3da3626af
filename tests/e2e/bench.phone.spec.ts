/** The bench on an assistant's phone: ticks and their taking back, with who and when, seen by the maker too. */
import { issue, layOnBoard } from "./support/orders";
import { makeBoard } from "./support/stock";
import { accessibilityFaults, expect, signIn, test } from "./support/test";

test("steps are ticked and unticked with who and when", async ({ makerPage, browser, shop, isMobile, viewport, hasTouch }) => {
  const { faceId } = await layOnBoard(
    makerPage.request,
    shop.sawId,
    await makeBoard(makerPage.request, { lengthMm: 1400, widthMm: 200 }),
  );
  const { id } = await issue(makerPage.request, faceId);
  await makerPage.goto(`/orders/${id}`);

  const context = await browser.newContext({ isMobile, viewport, hasTouch });
  await signIn(context, shop.assistant);
  const page = await context.newPage();
  await page.goto(`/bench/${id}`);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(/^Fetch board B-\d+ from rack 1$/);
  expect(await accessibilityFaults(page)).toEqual([]);
  const before = Date.now();
  await page.getByRole("button", { name: "Fetched, next step" }).tap();
  await expect(page.getByText(/^step 2 of \d+$/)).toBeVisible();
  await page.getByRole("button", { name: "Back" }).tap();

  const done = page.getByRole("status").filter({ hasText: `Done: ${shop.assistant.name}` });
  await expect(done).toHaveText(/Done: Test assistant, \d+ \w+, \d\d:\d\d$/);
  const at = Date.parse((await done.locator("time").getAttribute("datetime")) ?? "");
  // The clock of the server and the one of the browser are the same here; the database keeps milliseconds.
  expect(at).toBeGreaterThanOrEqual(before - 1000);
  expect(at).toBeLessThanOrEqual(Date.now());
  await expect(makerPage.getByText(shop.assistant.name).filter({ visible: true })).toHaveCount(1, { timeout: 15_000 });

  await page.getByRole("button", { name: "All steps" }).tap();
  const list = page.getByRole("dialog", { name: "All steps" });
  await expect(list.getByRole("listitem").first()).toContainText(`Done: ${shop.assistant.name}`);
  expect(await accessibilityFaults(page)).toEqual([]);
  await list.getByRole("button", { name: "Untick step 1" }).tap();
  await expect(list.getByText(/Done:/)).toHaveCount(0);
  await page.keyboard.press("Escape");
  await expect(done).toBeHidden();
  const answer = await page.request.get(`/api/orders/${id}`);
  expect((await answer.json()).ticks).toEqual([]);
  await expect(makerPage.getByText(shop.assistant.name).filter({ visible: true })).toHaveCount(0, { timeout: 15_000 });

  // Once more, taken back by the button under the step.
  await page.getByRole("button", { name: "Fetched, next step" }).tap();
  await page.getByRole("button", { name: "Back" }).tap();
  await page.getByRole("button", { name: "Untick", exact: true }).tap();
  await expect(page.getByRole("button", { name: "Fetched, next step" })).toBeVisible();
  const story = await makerPage.request.get(`/api/history?noun=order&nounId=${id}`);
  const { items } = (await story.json()) as { items: { verb: string; by: string }[] };
  expect(items.map(({ verb, by }) => `${verb} by ${by}`)).toEqual([
    ...["unticked", "ticked", "unticked", "ticked"].map((verb) => `${verb} by ${shop.assistant.name}`),
    `issued by ${shop.maker.name}`,
  ]);
  const scrolls = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);
  expect(scrolls).toBe(false);
  await context.close();
});

test("a tick without a connection is refused in words and counts once the connection is back", async ({
  makerPage: page,
  context,
  shop,
}) => {
  const { faceId } = await layOnBoard(page.request, shop.sawId, await makeBoard(page.request, { lengthMm: 1400, widthMm: 200 }));
  const { id } = await issue(page.request, faceId);
  await page.goto(`/bench/${id}`);
  const fetched = page.getByRole("button", { name: "Fetched, next step" });
  await expect(fetched).toBeVisible();
  await context.setOffline(true);
  await fetched.tap();
  await expect(page.getByRole("alert").filter({ hasText: "cannot be reached" })).toBeVisible();
  await expect(page.getByText(/^step 1 of \d+$/)).toBeVisible();
  await context.setOffline(false);
  await fetched.tap();
  await expect(page.getByText(/^step 2 of \d+$/)).toBeVisible();
});
