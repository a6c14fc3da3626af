/** Movement of the wood through the year: what is known of the boards, the place, the surround, the gaps, and what the shop enters itself. */
import type { Locator, Page } from "@playwright/test";
import { LayoutTablePage } from "./support/layout-table";
import { makeBoard, makeFace } from "./support/stock";
import { accessibilityFaults, expect, signIn, test } from "./support/test";

const stack = { columnsMm: [600], rowsMm: [150, 150, 150] };

async function openMovement(page: Page): Promise<Locator> {
  const section = page.locator("details").filter({ has: page.getByRole("heading", { name: "Movement through the year" }) });
  if ((await section.getAttribute("open")) === null) await section.locator("summary").first().click();
  await expect(section.getByText("Where it will live:")).toBeVisible();
  return section;
}

const gapRow = (section: Locator, name: string) => section.getByRole("row").filter({ hasText: name }).getByRole("cell");
const warnings = (section: Locator) => section.getByRole("list", { name: "Warnings of movement" });

test("a stack of fronts: its wood told, its place changed, its gaps made as recommended and undone", async ({
  makerPage: page,
  shop,
}) => {
  const { tag } = await makeBoard(page.request, { lengthMm: 1400, widthMm: 500 });
  const table = new LayoutTablePage(page);
  const address = await makeFace(page.request, shop.sawId, stack);
  await table.open(address);
  await table.addBoard(tag);
  await table.saved();
  const section = await openMovement(page);

  // "Ash" names several: asked, not guessed.
  await expect(warnings(section)).toContainText(`Say which species board ${tag} is`);
  await expect(warnings(section)).toContainText(`The moisture of board ${tag} was never read.`);
  await expect(gapRow(section, "between 1 and 2")).toHaveText([/^between 1 and 2and 1 alike$/, "3.0", "not known"]);
  await section.getByLabel(`Species of ${tag}`).selectOption({ label: "Ash, white" });
  await section.getByLabel("Read today, %").fill("8");
  await section.getByRole("button", { name: "Add reading" }).click();
  // 150 mm · 0.00274 = 0.411 mm a percent; the rooms of the shop keep wood between 6.17 and 10.97 %.
  await expect(gapRow(section, "between 1 and 2")).toHaveText([/between 1 and 2/, "3.0", "3.8", "1.8", "2.8"]);
  await expect(warnings(section)).toBeHidden();
  await expect(section.getByRole("img", { name: /^Gap between 1 and 2: 3\.8 mm at the driest/ })).toBeVisible();

  await section.getByRole("link", { name: "As for the shop" }).click();
  await page.getByRole("button", { name: "Change where it will live" }).click();
  const place = page.getByRole("dialog", { name: "Where it will live" });
  await place.getByLabel("Moisture of wood that stands there").check();
  await place.getByLabel("Driest: moisture of the wood, %").fill("6");
  await place.getByLabel("Dampest: moisture of the wood, %").fill("14");
  expect(await accessibilityFaults(page)).toEqual([]);
  await place.getByRole("button", { name: "Use for this job" }).click();
  await expect(page.getByText("wood at 6.0 to 14.0 %")).toBeVisible();

  await table.open(address);
  const again = await openMovement(page);
  await expect(warnings(again)).toContainText(
    "2 gaps, the first between 1 and 2, come down to 0.5 mm, below the shop's least of 1.5 mm, at the dampest",
  );
  expect(await accessibilityFaults(page)).toEqual([]);
  await again.getByRole("button", { name: "Make gaps up and down 4.0 mm" }).click();
  await expect(table.said("Gaps are 4.0 mm now. Fronts give up 0.7 mm at most; the face keeps its size.")).toBeVisible();
  await expect(warnings(again)).toBeHidden();
  await expect(gapRow(again, "between 1 and 2")).toHaveText([/between 1 and 2/, "4.0", "4.8", "1.5", "4.0"]);
  await table.saved();
  await page.getByRole("button", { name: "Undo" }).click();
  await expect(gapRow(again, "between 1 and 2").nth(1)).toHaveText("3.0");
});

test("what stands round the fronts is chosen, with its own moisture and the gap to it, and kept", async ({
  makerPage: page,
  shop,
}) => {
  const { id, tag } = await makeBoard(page.request, { lengthMm: 1400, widthMm: 500 });
  const headers = { origin: process.env.BASE_URL ?? "" };
  await page.request.post(`/api/boards/${id}/readings`, { data: { percent: 8, takenOn: "2031-03-02" }, headers });
  const table = new LayoutTablePage(page);
  const address = await makeFace(page.request, shop.sawId, stack);
  const woods = { [id]: { species: "ash-white", ringAngle: null } };
  const choices = { baseRevision: 0, surround: { kind: "none" }, around: null, woods };
  await page.request.put(`/api/faces/${address.split("/").at(-1)}/movement`, { data: choices, headers });
  await table.open(address);
  await table.addBoard(tag);
  await table.saved();
  const section = await openMovement(page);
  // Of the same wood and direction nothing but the gap itself moves; at another moisture the two part.
  await section.getByLabel("What stands round the fronts").selectOption({ label: "Same wood, grain like the fronts’" });
  await expect(gapRow(section, "between 1 and 2")).toHaveText([/between 1 and 2/, "3.0", "3.0", "3.0", "1.6"]);
  await section.getByLabel("Its moisture, %").fill("11");
  await section.getByLabel("Its moisture, %").press("Enter");
  await expect(warnings(section)).toContainText(`Board ${tag} is at 8.0 % and what stands round the fronts at 11.0 %`);
  await section.getByLabel("Gap round the fronts").fill("2");
  // What is chosen shows before it is saved.
  const saved = page.waitForResponse(
    (answer) => answer.url().endsWith("/movement") && answer.request().postDataJSON()?.around === 2000,
  );
  await section.getByLabel("Gap round the fronts").press("Enter");
  await expect(gapRow(section, "above 1")).toHaveCount(5);
  expect((await saved).status()).toBe(200);

  await page.reload();
  const kept = await openMovement(page);
  await expect(kept.getByLabel("What stands round the fronts")).toHaveValue("with");
  await expect(kept.getByLabel("Its moisture, %")).toHaveValue("11");
  await expect(gapRow(kept, "above 1")).toHaveCount(5);
});

test("an assistant sees how the gaps will move and chooses nothing", async ({ makerPage: page, browser, shop }) => {
  const { tag } = await makeBoard(page.request, { lengthMm: 1400, widthMm: 500 });
  const table = new LayoutTablePage(page);
  const address = await makeFace(page.request, shop.sawId, stack);
  await table.open(address);
  await table.addBoard(tag);
  await table.saved();
  const context = await browser.newContext();
  await signIn(context, shop.assistant);
  const looking = await context.newPage();
  await looking.goto(address);
  const section = await openMovement(looking);
  await expect(section.getByLabel("What stands round the fronts")).toBeDisabled();
  await expect(section.getByLabel(`Species of ${tag}`)).toBeDisabled();
  await expect(section.getByRole("button", { name: /^Make gaps/ })).toBeHidden();
  await context.close();
});

test("the owner says where the furniture lives and enters a species with its source", async ({ context, page, shop }) => {
  await signIn(context, shop.owner);
  await page.goto("/shop");
  await page.getByLabel("Dampest: humidity, %").fill("70");
  await page.getByLabel("Dampest: humidity, %").press("Tab");
  await expect(page.getByText("Wood there comes to 6.2 to 13.1 %.")).toBeVisible();
  await page.getByLabel("Least gap through the year").fill("2");
  await page.getByRole("button", { name: "Save movement settings" }).click();
  await expect(page.getByText("Movement settings saved")).toBeVisible();

  await page.getByRole("button", { name: "Add a species" }).click();
  const form = page.getByRole("dialog", { name: "Add a species" });
  await form.getByLabel("Name").fill("European beech");
  await form.getByLabel("Radial").fill("5.8");
  await form.getByLabel("Tangential").fill("11.8");
  await form.getByRole("button", { name: "Save species" }).click();
  await expect(form.getByLabel("Source")).toBeFocused();
  expect(await accessibilityFaults(page)).toEqual([]);
  await form.getByLabel("Source").fill("Own test of eight boards, winter 2031");
  await form.getByRole("button", { name: "Save species" }).click();
  await expect(page.getByRole("row").filter({ hasText: "European beech" })).toContainText("Own test of eight boards");
  await page.getByText(/^Published and usual figures, \d+ species$/).click();
  await expect(page.getByRole("row").filter({ hasText: "Walnut, black" })).toContainText("Table 13-5");
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.reload();
  await expect(page.getByLabel("Dampest: humidity, %")).toHaveValue("70");
  await page.getByRole("button", { name: "Remove European beech" }).click();
  await page.getByRole("button", { name: "Remove species" }).click();
  await expect(page.getByRole("row").filter({ hasText: "European beech" })).toBeHidden();
});
