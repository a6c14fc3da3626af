/** From what the bench found while it cut, on a phone, to the rest issued by the maker and the bench going on with it. */
import type { Page } from "@playwright/test";
import { orderSchema } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import { issue, layOnBoard } from "./support/orders";
import { makeBoard } from "./support/stock";
import { accessibilityFaults, expect, signIn, test } from "./support/test";

const origin = process.env.BASE_URL ?? "";

/** Everything under the thumb is at least 44 px high, and the page is no wider than the phone. */
async function expectThumbable(page: Page): Promise<void> {
  const small = await page.evaluate(() =>
    [...document.querySelectorAll("button, input:not([type=radio]), label:has(input[type=radio])")]
      .filter((element) => element.getClientRects().length > 0 && element.getBoundingClientRect().height < 43.5)
      .map((element) => `${element.textContent} ${element.getAttribute("aria-label") ?? ""}`)
      .filter((name) => !name.includes("Close")),
  );
  expect(small).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth)).toBe(false);
}

test("two cuts, a kerf of 3.6 for 3.2 mm and a spoiled front: the maker issues the rest and the bench goes on", async ({
  makerPage,
  browser,
  shop,
  isMobile,
  viewport,
  hasTouch,
}) => {
  test.setTimeout(180_000);
  const board = await makeBoard(makerPage.request, { lengthMm: 1400, widthMm: 200 });
  const { faceId, address } = await layOnBoard(makerPage.request, shop.sawId, board, { kerfMm: 3.2, cleanUpMm: 0 });
  const { id, number } = await issue(makerPage.request, faceId);
  const order = orderSchema.parse(await (await makerPage.request.get(`/api/orders/${id}`)).json());
  const steps = orderSteps(order.snapshot);
  const at = (label: string) =>
    steps.findIndex((step) => step.kind === "cut" && step.cut.yields.some((part) => part.label === label));
  // Up to the cut before front 1 by the API; the two that follow by thumb.
  for (const { id: stepId } of steps.slice(0, at("1"))) {
    const tick = `/api/orders/${id}/revisions/${order.revisionId}/steps/${stepId}/tick`;
    expect((await makerPage.request.put(tick, { headers: { origin } })).status()).toBe(200);
  }

  const context = await browser.newContext({ isMobile, viewport, hasTouch });
  await signIn(context, shop.assistant);
  const page = await context.newPage();
  await page.goto(`/bench/${id}`);
  const stepText = (step: number) => page.getByText(`step ${step} of ${steps.length}`, { exact: true });
  await expect(stepText(at("1") + 1)).toBeVisible();
  await page.getByRole("button", { name: "Cut, next step" }).tap();
  await expect(stepText(at("1") + 2)).toBeVisible();
  await page.getByRole("button", { name: "Cut, next step" }).tap();
  await expect(stepText(at("1") + 3)).toBeVisible();
  await page.getByRole("button", { name: "Back" }).tap();

  // The true kerf, as it shows at the second cut; it was so at every one.
  await page.getByRole("button", { name: "As cut", exact: true }).tap();
  const sheet = page.getByRole("dialog", { name: `As cut: step ${at("1") + 2}` });
  await sheet.getByLabel("True kerf", { exact: true }).fill("3.6");
  await sheet.getByText("Every cut").tap();
  await expect(sheet.getByText("The rest does not fit as issued.")).toBeVisible();
  await expect(sheet.getByText(/sliding front 3 0\.8 mm to the right saves it\./)).toBeVisible();
  await expectThumbable(page);
  expect(await accessibilityFaults(page)).toEqual([]);
  await sheet.getByRole("button", { name: "Save" }).tap();
  await expect(sheet).toBeHidden();
  const entered = page.getByRole("region", { name: "As cut" });
  await expect(entered).toContainText("Kerf 3.6 mm instead of 3.2 mm, at every cut");
  await expect(entered).toContainText(shop.assistant.name);

  // The front that just came off has torn out.
  await page.getByRole("button", { name: "Spoiled front" }).tap();
  const spoiled = page.getByRole("dialog", { name: "A spoiled front" });
  await expect(spoiled.getByText("Front 2 is spoiled; front 2 can be cut from strip A.")).toBeVisible();
  await expectThumbable(page);
  expect(await accessibilityFaults(page)).toEqual([]);
  await spoiled.getByRole("button", { name: "Front 2 is spoiled" }).tap();
  await expect(spoiled).toBeHidden();

  // The next cut would be wrong now.
  await page.getByRole("button", { name: "Next step" }).tap();
  await expect(page.getByText("Do not make this cut yet: it changes with what was entered.")).toBeVisible();
  await expectThumbable(page);
  expect(await accessibilityFaults(page)).toEqual([]);

  // The maker sees what was entered and what it comes to, and issues the rest.
  await makerPage.goto(`/orders/${id}`);
  const rest = makerPage.getByRole("region", { name: "The rest" });
  await expect(rest).toContainText("Kerf 3.6 mm instead of 3.2 mm, at every cut");
  await expect(rest).toContainText("Front 2 is spoiled");
  await expect(rest).toContainText("Cut: front 1.");
  await expect(rest.getByRole("radio", { name: "Slide front 3 0.8 mm to the right" })).toBeChecked();
  await expect(rest.getByRole("radio", { name: "Cut front 2 from strip A instead" })).toBeChecked();
  expect(await accessibilityFaults(makerPage)).toEqual([]);
  await rest.getByRole("button", { name: "Issue the rest" }).click();
  await expect(makerPage.getByRole("heading", { level: 1 })).toHaveText(`Cut order ${number} B`);
  await expect(makerPage.getByRole("region", { name: "Already cut" })).toContainText("by revision A: front 1 cut.");
  expect(await accessibilityFaults(makerPage)).toEqual([]);

  // The bench stops by itself and goes on with the new revision, at the first cut that is left.
  await expect(page.getByRole("heading", { name: "Stop: revision A is superseded" })).toBeVisible();
  await page.getByRole("link", { name: "Go on with revision B" }).tap();
  await expect(page.getByText(`Order ${number} B`)).toBeVisible();
  const issued = orderSchema.parse(await (await makerPage.request.get(`/api/orders/${id}`)).json());
  const next = orderSteps(issued.snapshot);
  expect(issued.ticked).toBe(at("1") + 2);
  await expect(page.getByText(`step ${issued.ticked + 1} of ${next.length}`, { exact: true })).toBeVisible();
  await page.getByRole("button", { name: "Cut, next step" }).tap();
  await expect(page.getByText(`step ${issued.ticked + 2} of ${next.length}`, { exact: true })).toBeVisible();
  await page.getByRole("button", { name: "Back" }).tap();
  await page.getByRole("button", { name: "Back" }).tap();
  await expect(page.getByRole("status").filter({ hasText: `Done: ${shop.assistant.name}` })).toBeVisible();

  // And the layout table has the fronts where they are cut from now.
  await makerPage.goto(address);
  await expect(makerPage.getByText(`Cut order ${number} B`)).toBeVisible();
  await context.close();
});
