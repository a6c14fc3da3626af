/** A board that belongs to the order of another face, at the layout table: told of before anybody presses Issue, and when somebody was quicker. */
import type { APIRequestContext, Page } from "@playwright/test";
import { orderSchema } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import { LayoutTablePage } from "./support/layout-table";
import { issue, layOnBoard } from "./support/orders";
import { makeBoard, straighten } from "./support/stock";
import { accessibilityFaults, expect, test } from "./support/test";

const origin = process.env.BASE_URL ?? "";
const size = { lengthMm: 1400, widthMm: 200 };

/** A part of the panel beside the table. */
const section = (page: Page, title: string) =>
  page.locator("details").filter({ has: page.getByRole("heading", { name: title }) });

async function tickFirstCut(request: APIRequestContext, orderId: string): Promise<void> {
  const { revisionId, snapshot } = orderSchema.parse(await (await request.get(`/api/orders/${orderId}`)).json());
  const step = orderSteps(snapshot).find(({ kind }) => kind === "cut");
  const address = `/api/orders/${orderId}/revisions/${revisionId}/steps/${step?.id}/tick`;
  expect((await request.put(address, { headers: { origin } })).status()).toBe(200);
}

test("the table says whose the board is and what to do, and issuing is off until it lies on a picture taken after the cutting", async ({
  makerPage: page,
  shop,
}) => {
  const board = await makeBoard(page.request, size);
  const { faceId } = await layOnBoard(page.request, shop.sawId, board);
  const { address } = await layOnBoard(page.request, shop.sawId, board);
  const { number } = await issue(page.request, faceId);
  const table = new LayoutTablePage(page);
  await table.open(address);
  const said = `${board.tag} is issued for cutting with cut order ${number}, `;
  const wayOut = "Cut that order first, then photograph what is left of the board and mark it anew.";
  for (const title of ["Problems", "Boards on the table"]) {
    await expect(section(page, title).getByText(said)).toContainText(wayOut);
  }
  const button = page.getByRole("button", { name: "Issue cut order" });
  await expect(button).toBeDisabled();
  await expect(button).toHaveAccessibleDescription(`${board.tag} is issued with cut order ${number} A`);
  expect(await accessibilityFaults(page)).toEqual([]);

  await straighten(page.request, board.id, size);
  await page.reload();
  await page.getByRole("button", { name: "Move over to the newest picture" }).click();
  await expect(page.getByText(said)).toHaveCount(0);
  await expect(button).toBeEnabled();
});

test("whoever presses Issue second is refused in words, and the table then shows why", async ({ makerPage: page, shop }) => {
  const board = await makeBoard(page.request, size);
  const { faceId } = await layOnBoard(page.request, shop.sawId, board);
  const { address } = await layOnBoard(page.request, shop.sawId, board);
  const table = new LayoutTablePage(page);
  await table.open(address);
  const button = page.getByRole("button", { name: "Issue cut order" });
  await expect(button).toBeEnabled();
  const { number } = await issue(page.request, faceId);
  await button.click();
  await expect(page.getByText(`This layout cannot be cut yet. ${board.tag} is issued for cutting`)).toBeVisible();
  await expect(section(page, "Problems")).toContainText(`cut order ${number}, `);
  await expect(button).toBeDisabled();
});

test("an order that is being cut is no problem of its own layout until that is changed", async ({ makerPage: page, shop }) => {
  const board = await makeBoard(page.request, size);
  const { faceId, address } = await layOnBoard(page.request, shop.sawId, board);
  const { id, number } = await issue(page.request, faceId);
  await tickFirstCut(page.request, id);
  const table = new LayoutTablePage(page);
  await table.open(address);
  await expect(page.getByText("Every front lies on sound wood, and straight cuts part them.")).toBeVisible();
  await table.front("2").focus();
  await page.keyboard.press("ArrowRight");
  await table.saved();
  await expect(section(page, "Problems")).toContainText(
    `${board.tag} was already cut into by cut order ${number} A of this face`,
  );
  await expect(page.getByRole("button", { name: "Issue a new revision" })).toBeDisabled();
});
