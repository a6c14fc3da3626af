/** Cut orders on the maker's screen, at the bench and on paper, and what a later change of the layout does to all three. */
import { issue, layOnBoard, slideLayout } from "./support/orders";
import { readPdf } from "./support/read-pdf";
import { makeBoard, markKnot } from "./support/stock";
import { accessibilityFaults, expect, signIn, test } from "./support/test";

const board = { lengthMm: 1400, widthMm: 200 };

test("an order is found in the list, on Today and by its face; labels begin at the label told", async ({
  makerPage: page,
  shop,
}) => {
  const wood = await makeBoard(page.request, board);
  const { faceId, address } = await layOnBoard(page.request, shop.sawId, wood);
  const { id, number } = await issue(page.request, faceId);

  await page.goto("/orders");
  await expect(page.getByRole("listitem").filter({ hasText: "Map chest" })).toContainText(wood.tag);
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.goto("/today");
  await expect(page.getByRole("link", { name: `Cut order ${number} A` })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.goto(address.replace(/\/faces\/.*/, ""));
  await page.getByRole("link", { name: `Cut order ${number} A` }).click();

  await expect(page.getByRole("heading", { name: `Cut order ${number} A` })).toBeVisible();
  await expect(page.getByRole("cell", { name: /Crosscut front 2 from strip A/ })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  const first = page.getByLabel("First free label");
  await first.fill("25");
  await expect(page.getByText("Enter a number from 1 to 24")).toBeVisible();
  await expect(page.getByRole("link", { name: "Print labels" })).toBeHidden();
  expect(await accessibilityFaults(page)).toEqual([]);
  await first.fill("23");
  const link = await page.getByRole("link", { name: "Print labels" }).getAttribute("href");
  expect(link).toBe(`/api/orders/${id}/labels?revision=1&sheet=a4-24&start=23`);
  // More labels than the two places left: they run on to a second sheet, while from the first place one sheet holds them.
  const sheets = async (start: number) =>
    (await readPdf(await (await page.request.get(`/api/orders/${id}/labels?sheet=a4-24&start=${start}`)).body())).pages;
  expect([await sheets(1), await sheets(23)]).toEqual([1, 2]);
});

test("a layout changed later stops screen, bench and paper, each with the way forward", async ({
  makerPage: page,
  browser,
  shop,
}) => {
  const { faceId } = await layOnBoard(page.request, shop.sawId, await makeBoard(page.request, board));
  const { id, number } = await issue(page.request, faceId);
  await page.goto(`/orders/${id}`);
  const context = await browser.newContext();
  await signIn(context, shop.assistant);
  const bench = await context.newPage();
  await bench.goto(`/bench/${id}`);
  await expect(bench.getByText(/^step 1 of \d+$/)).toBeVisible();
  expect(await accessibilityFaults(bench)).toEqual([]);

  await slideLayout(page.request, faceId, 15);
  // Both pages stand open and learn of it by themselves.
  await expect(page.getByRole("alert").filter({ hasText: "Revision A is superseded" })).toContainText("Issue the layout again");
  const stop = bench.getByRole("alert").filter({ hasText: "Stop: revision A is superseded" });
  await expect(stop).toContainText("Ask the maker");
  await expect(bench.getByRole("button", { name: /next step/ })).toBeHidden();
  expect(await accessibilityFaults(bench)).toEqual([]);
  expect(await accessibilityFaults(page)).toEqual([]);
  const paper = async (revision: number) => {
    const answer = await page.request.get(`/api/orders/${id}/pdf?paper=a4&revision=${revision}`);
    return (await readPdf(await answer.body())).text;
  };
  expect(await paper(1)).toMatch(/SUPERSEDED \d+ \w+ \d{4}, \d\d:\d\d\. Do not cut from this sheet/);

  expect(await issue(page.request, faceId)).toMatchObject({ id, revision: 2 });
  expect(await paper(1)).toContain("SUPERSEDED");
  expect(await paper(2)).not.toContain("SUPERSEDED");
  await bench.getByRole("link", { name: "Go on with revision B" }).click();
  await expect(bench.getByRole("link", { name: `Order ${number} B, Map chest` })).toBeVisible();
  await expect(bench.getByRole("button", { name: /next step/ })).toBeVisible();

  // An old sheet leads to the revision that is printed on it: it stops there too.
  await bench.goto(`/bench/${id}?revision=1`);
  await expect(bench.getByRole("link", { name: "Go on with revision B" })).toBeVisible();
  await page.goto(`/orders/${id}?revision=1`);
  await page.getByRole("link", { name: "Go to revision B" }).click();
  await expect(page.getByRole("heading", { name: `Cut order ${number} B` })).toBeVisible();
  await page.goto("/today");
  await expect(page.getByText("was superseded: Test maker changed the layout")).toBeVisible();
  await context.close();
});

test("a knot drawn after issuing supersedes the order", async ({ makerPage: page, shop }) => {
  const wood = await makeBoard(page.request, board);
  const { faceId } = await layOnBoard(page.request, shop.sawId, wood);
  const { id } = await issue(page.request, faceId);
  await page.goto(`/orders/${id}`);
  await markKnot(page.request, wood.id, { x: 1200, y: 100 });
  await expect(page.getByRole("alert").filter({ hasText: "Revision A is superseded" })).toContainText(
    "what is marked on its boards",
  );
});

test("without a connection the order page says that what is seen may be old", async ({ makerPage: page, context, shop }) => {
  const { faceId } = await layOnBoard(page.request, shop.sawId, await makeBoard(page.request, board));
  const { id } = await issue(page.request, faceId);
  await page.goto(`/orders/${id}`);
  const old = page.getByText("What you see may be old");
  await expect(page.getByRole("heading", { name: /^Cut order/ })).toBeVisible();
  await expect(old).toBeHidden();
  await context.setOffline(true);
  await expect(old).toBeVisible({ timeout: 20_000 });
  await context.setOffline(false);
  await expect(old).toBeHidden({ timeout: 20_000 });
});
