/** Boards glued up into a blank, from the rack to the printed order; and both faces of one board. */

import { LayoutTablePage } from "./support/layout-table";
import { MarkingPage, photograph } from "./support/marking";
import { layOnBoard } from "./support/orders";
import { readPdf } from "./support/read-pdf";
import { makeBoard, makeFace, markKnot } from "./support/stock";
import { accessibilityFaults, expect, signIn, test } from "./support/test";

test("two boards are planned into a blank, a face is laid across their joint and issued; paper and bench begin with gluing up", async ({
  makerPage: page,
  browser,
  shop,
}) => {
  test.setTimeout(180_000);
  const upper = await makeBoard(page.request, { lengthMm: 1100, widthMm: 120 });
  const lower = await makeBoard(page.request, { lengthMm: 1060, widthMm: 110 });
  await markKnot(page.request, lower.id, { x: 950, y: 60 });

  await page.goto("/rack");
  await page.getByRole("link", { name: "Glue up a blank" }).click();
  await page.getByRole("button", { name: "Add boards…" }).click();
  for (const { tag } of [upper, lower]) await page.getByRole("button", { name: `Add ${tag}` }).click();
  await page.getByRole("button", { name: "Done" }).click();
  const second = page.getByRole("group", { name: `Board ${lower.tag}` });
  await second.getByLabel("Turned end for end").check();
  await second.getByLabel("Left end in by").fill("20");
  await second.getByLabel("Left end in by").press("Enter");
  // 120 + 110 less 1.5 mm jointed off each of the two glued edges; 20 + 1060 mm is within 1100.
  await expect(page.getByText("1100.0 mm × 227.0 mm × 27.0 mm")).toBeVisible();
  await expect(page.getByRole("img", { name: `Blank of ${upper.tag}, ${lower.tag}` })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("button", { name: "Plan this blank" }).click();

  await expect(page.getByRole("heading", { name: "Glued up from" })).toBeVisible();
  const blankTag = /B-\d+/.exec((await page.getByRole("heading", { level: 1 }).textContent()) ?? "")?.[0] ?? "";
  await expect(page.getByRole("img", { name: `${blankTag}, straightened` })).toBeVisible({ timeout: 60_000 });
  await expect(page.getByText("keep clear: 1 knot; 1 glue line")).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  // Its boards are bound to it.
  await page.goto(`/rack/${upper.id}`);
  await expect(page.getByText(`${upper.tag} is to be glued into blank ${blankTag}`)).toBeVisible();
  await expect(page.getByRole("button", { name: "Use in a job" })).toBeHidden();

  const address = await makeFace(page.request, shop.sawId, { columnsMm: [300, 300], rowsMm: [180] });
  const table = new LayoutTablePage(page);
  await table.open(address);
  await table.addBoard(blankTag);
  await expect(table.front("1")).toContainText(blankTag);
  await table.saved();
  await page.getByRole("button", { name: "Issue cut order" }).click();
  const issued = page.getByRole("link", { name: /^Cut order \d+ A/ });
  await expect(issued).toBeVisible({ timeout: 30_000 });
  const orderId = (await issued.getAttribute("href"))?.split("/").at(-1) ?? "";

  const { text } = await readPdf(await (await page.request.get(`/api/orders/${orderId}/pdf?paper=a4`)).body());
  const said = text.replace(/\s+/g, " ");
  const steps = [
    `Fetch board ${upper.tag}`,
    `Fetch board ${lower.tag}`,
    `Lay out the boards of blank ${blankTag}`,
    `Joint the lower edge of ${upper.tag} and the upper edge of`,
    `Glue up blank ${blankTag} of ${upper.tag} and ${lower.tag}`,
    `Mark board ${blankTag}`,
  ].map((words) => said.lastIndexOf(words));
  expect(steps.every((at, i) => at > 0 && (i === 0 || at > (steps[i - 1] ?? 0)))).toBe(true);
  for (const words of [`${lower.tag} (turned`, "20.0 mm in", "bridge guard", "Glue by its maker"]) {
    expect(said).toContain(words);
  }

  const context = await browser.newContext();
  await signIn(context, shop.assistant);
  const bench = await context.newPage();
  await bench.goto(`/bench/${orderId}`);
  await expect(bench.getByRole("heading", { name: `Fetch board ${upper.tag}` })).toBeVisible();
  for (const done of ["Fetched", "Fetched", "Laid out", "Jointed", "Glued up"]) {
    await bench.getByRole("button", { name: new RegExp(`^${done}`) }).click();
  }
  await expect(bench.getByRole("heading", { name: `Mark board ${blankTag}` })).toBeVisible();
  expect(await accessibilityFaults(bench)).toEqual([]);
  await context.close();
  await page.goto(`/rack/${upper.id}`);
  await page.getByRole("link", { name: blankTag }).first().click();
  await expect(page.getByText("Glued up.", { exact: false }).first()).toBeVisible();
  await expect(page.getByRole("button", { name: "Take this blank apart" })).toBeHidden();
});

test("a blank is taken apart, and its boards are free again", async ({ makerPage: page }) => {
  const boards = [
    await makeBoard(page.request, { lengthMm: 600, widthMm: 100 }),
    await makeBoard(page.request, { lengthMm: 600, widthMm: 100 }),
  ];
  await page.goto(`/rack/glue-up?with=${boards[0]?.id}`);
  await page.getByRole("button", { name: "Add boards…" }).click();
  await page.getByRole("button", { name: `Add ${boards[1]?.tag}` }).click();
  await page.getByRole("button", { name: "Done" }).click();
  await page.getByRole("button", { name: "Plan this blank" }).click();
  await expect(page.getByRole("img", { name: /^B-\d+, straightened$/ })).toBeVisible({ timeout: 60_000 });
  await page.getByRole("button", { name: "Take this blank apart" }).click();
  await page.getByRole("button", { name: "Take it apart" }).click();
  await expect(page.getByText("gone", { exact: true }).first()).toBeVisible();
  await page.goto(`/rack/${boards[0]?.id}`);
  await expect(page.getByRole("button", { name: "Use in a job" })).toBeVisible();
});

test("a board is photographed on its back, drawn on turned over, and laid on", async ({ makerPage: page, shop }) => {
  test.setTimeout(120_000);
  const board = await makeBoard(page.request, { lengthMm: 1200, widthMm: 200 });
  await markKnot(page.request, board.id, { x: 400, y: 50 });
  await page.goto(`/rack/${board.id}`);
  await page.getByRole("button", { name: "Photograph the back" }).click();
  const dialog = page.getByRole("dialog");
  await dialog
    .getByLabel("Choose photographs")
    .setInputFiles({ name: "sycamore.jpg", mimeType: "image/jpeg", buffer: await photograph() });
  await dialog.getByRole("link", { name: "sycamore.jpg" }).click();

  await expect(page.getByRole("heading", { name: `Mark the back of ${board.tag}` })).toBeVisible();
  await expect(page.getByRole("radio", { name: "the back" })).toBeChecked();
  const marking = new MarkingPage(page);
  await marking.markCorners();
  expect(await accessibilityFaults(page)).toEqual([]);
  // Said to be 1210 mm long it is 10 mm longer than the face, more than two photographs of one board may differ.
  await page.getByLabel("True length").fill("1210");
  await page.getByLabel("True length").press("Enter");
  await expect(page.getByText("The back comes out 10.0 mm longer than the face.")).toBeVisible();
  await page.getByLabel("True length").fill("1200");
  await page.getByLabel("True length").press("Enter");
  await expect(page.getByText("The back comes out")).toBeHidden();
  await marking.straighten.click();
  await expect(page.getByText("Version 2, the picture of the back, is done.")).toBeVisible({ timeout: 60_000 });

  // Nothing is carried over by itself; the knot of the face is offered where it lies once the board is turned over.
  await page.getByRole("link", { name: "Draw outline and keep-clear areas" }).click();
  await expect(page.getByRole("heading", { name: `Outline and keep-clear areas of the back of ${board.tag}` })).toBeVisible();
  await expect(page.getByText("Nothing to keep clear of yet.")).toBeVisible();
  await page.getByRole("button", { name: "Take over 1 keep-clear area" }).click();
  await expect(page.getByText("400.0 mm along, 150.0 mm across")).toBeVisible();
  await page.getByRole("button", { name: "Save" }).click();
  await expect(page.getByRole("status").filter({ hasText: /^Saved$/ })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.goto(`/rack/${board.id}`);
  const [face, back] = [page.getByLabel(`Face of ${board.tag}`), page.getByLabel(`Back of ${board.tag}`)];
  await expect(back).toBeVisible();
  // At one scale, one below the other.
  const [faceBox, backBox] = [await face.boundingBox(), await back.boundingBox()];
  expect(Math.abs((faceBox?.width ?? 0) - (backBox?.width ?? 1))).toBeLessThan(1);
  expect(backBox?.y ?? 0).toBeGreaterThan((faceBox?.y ?? 0) + (faceBox?.height ?? 0));
  expect(await accessibilityFaults(page)).toEqual([]);

  const { address } = await layOnBoard(page.request, shop.sawId, board);
  const table = new LayoutTablePage(page);
  await table.open(address);
  await page.getByRole("button", { name: "Lay on its back" }).click();
  await expect(page.getByRole("button", { name: "Lay on its face" })).toBeVisible();
  await expect(page.getByText(`Board ${board.tag} is back up.`, { exact: false }).first()).toBeVisible();
});

test("glue lines drawn on a board make it a blank", async ({ makerPage: page }) => {
  const board = await makeBoard(page.request, { lengthMm: 800, widthMm: 200 });
  await page.goto(`/rack/${board.id}/zones`);
  await page.getByRole("button", { name: "Add a glue line" }).click();
  const stage = page.getByLabel(/^Straightened picture of/);
  await stage.focus();
  await page.keyboard.press("Enter");
  const field = page.getByLabel("From the upper edge", { exact: true });
  await expect(field).toBeVisible();
  await field.fill("95");
  await field.press("Enter");
  await expect(page.getByRole("button", { name: "Glue line 1, 95.0 mm from the upper edge" })).toBeVisible();
  await page.getByRole("button", { name: "Glue line 1, 95.0 mm from the upper edge" }).press("Alt+ArrowDown");
  await expect(field).toHaveValue("95.1 mm");
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("button", { name: "Save" }).click();
  await expect(page.getByRole("status").filter({ hasText: /^Saved$/ })).toBeVisible();
  await page.goto(`/rack/${board.id}`);
  await expect(page.getByText("blank", { exact: true })).toBeVisible();
  await expect(page.getByText("1 glue line", { exact: false })).toBeVisible();
});
