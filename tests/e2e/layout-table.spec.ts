/** The layout table: laying a row of fronts on a photographed board, sliding it, and everything saved. */
import type { BrowserContext } from "@playwright/test";
import { LayoutTablePage } from "./support/layout-table";
import { makeBoard, makeFace, markKnot, straighten } from "./support/stock";
import { accessibilityFaults, expect, type Person, signIn, test } from "./support/test";

const board = { lengthMm: 1400, widthMm: 200 };
const row = { columnsMm: [240, 240, 240], rowsMm: [150] };

async function secondWindow(context: BrowserContext, person: Person): Promise<LayoutTablePage> {
  await signIn(context, person);
  return new LayoutTablePage(await context.newPage());
}

test("a row is laid on a board, slid off a knot, let loose, turned, undone and issued", async ({ makerPage: page, shop }) => {
  const { id, tag } = await makeBoard(page.request, board);
  await markKnot(page.request, id, { x: 800, y: 100 });
  const table = new LayoutTablePage(page);
  await table.open(await makeFace(page.request, shop.sawId, row));
  await expect(page.getByText("Fronts 1–3 are not laid on a board yet.")).toBeVisible();
  await expect(page.getByRole("button", { name: "Issue cut order" })).toBeDisabled();

  await table.addBoard(tag);
  await expect(table.said(`Fronts 1–3 laid on board ${tag}.`)).toBeVisible();
  await expect(page.getByText("Every front lies on sound wood, and straight cuts part them.")).toBeVisible();
  expect(await table.leftOf("1")).toBe(0.2);
  await table.saved();
  expect(await accessibilityFaults(page)).toEqual([]);

  // By mouse: 40 mm to the right, into the knot. Alt keeps it from snapping to the knot's edge.
  const from = await table.middleOf("2", board.lengthMm);
  await page.keyboard.down("Alt");
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  for (const step of [10, 25, 60, 80]) await page.mouse.move(from.x + step * from.pxPerMm, from.y);
  await page.mouse.up();
  await page.keyboard.up("Alt");
  await expect(page.getByText(/Front 3 reaches [\d.]+ mm into the knot at 800\.0 mm/)).toBeVisible();
  expect(await table.leftOf("1")).toBeCloseTo(80.2, -1);
  await page.getByRole("button", { name: /^Slide [\d.]+ mm left$/ }).click();
  await expect(page.getByText("Every front lies on sound wood, and straight cuts part them.")).toBeVisible();

  // By keyboard alone.
  await table.front("3").focus();
  await page.keyboard.press("l");
  await expect(table.said("Front 3 let loose. The wood has not moved.")).toBeVisible();
  const before = await table.leftOf("3");
  await page.keyboard.press("Shift+ArrowLeft");
  await page.keyboard.press("ArrowRight");
  expect(await table.leftOf("3")).toBeCloseTo(before - 4.5, 6);
  expect(await table.seam("2 and 3")).toEqual(["2 and 3", "3.0", "−4.5", "0.0"]);
  await expect(page.getByText(/Fronts 2–3 lie [\d.]+ mm too close for the saw/)).toBeVisible();
  await page.keyboard.press("t");
  expect(await table.seam("2 and 3")).toEqual(["2 and 3", "3.0", "turned"]);
  for (let step = 0; step < 3; step++) await page.keyboard.press("Control+z");
  expect(await table.leftOf("3")).toBeCloseTo(before, 6);
  await page.keyboard.press("b");
  await expect(table.said("Front 3 back in the set.")).toBeVisible();
  await table.saved();

  const left = await table.leftOf("1");
  await page.reload();
  expect(await table.leftOf("1")).toBe(left);
  await expect(page.getByRole("link", { name: "Show side as PNG" })).toBeVisible();
  await page.getByRole("button", { name: "Issue cut order" }).click();
  await expect(page.getByRole("link", { name: /^Cut order \d+ A$/ })).toBeVisible();
});

test("the help lists the keys, and closing it gives the focus back", async ({ makerPage: page, shop }) => {
  const table = new LayoutTablePage(page);
  await table.open(await makeFace(page.request, shop.sawId, row));
  await table.front("2").focus();
  await page.keyboard.press("?");
  await expect(page.getByRole("dialog", { name: "At the layout table" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.keyboard.press("Escape");
  await expect(table.front("2")).toBeFocused();
});

test("without a connection the work is kept, said so, and saved when it is back", async ({ makerPage: page, context, shop }) => {
  const { tag } = await makeBoard(page.request, board);
  const table = new LayoutTablePage(page);
  await table.open(await makeFace(page.request, shop.sawId, row));
  await table.addBoard(tag);
  await table.saved();
  await context.setOffline(true);
  await page.getByRole("button", { name: "Slide right by 0.5 mm" }).click();
  await expect(page.getByText(/Not saved: no connection/)).toBeVisible();
  await context.setOffline(false);
  await table.saved();
  await page.reload();
  expect(await table.leftOf("1")).toBe(0.7);
});

test("two windows: other fronts come together, the same fronts are asked about", async ({ makerPage: page, browser, shop }) => {
  const { tag } = await makeBoard(page.request, board);
  const mine = new LayoutTablePage(page);
  const address = await makeFace(page.request, shop.sawId, row);
  await mine.open(address);
  await mine.addBoard(tag);
  await mine.front("3").focus();
  await page.keyboard.press("l");
  await page.keyboard.press("Shift+ArrowRight");
  await mine.saved();

  const context = await browser.newContext();
  const theirs = await secondWindow(context, shop.owner);
  await theirs.open(address);
  await theirs.front("1").focus();
  await theirs.page.keyboard.press("Shift+ArrowRight");
  await theirs.saved();
  const loose = await mine.leftOf("3");
  await mine.front("3").focus();
  await page.keyboard.press("Shift+ArrowRight");
  const merged = mine.said("Test owner changed this layout in another window. The table shows it.");
  await expect(merged).toBeVisible({ timeout: 20_000 });
  await mine.saved();
  expect(await mine.leftOf("1")).toBe(5.2);
  expect(await mine.leftOf("3")).toBeCloseTo(loose + 5, 6);

  // The other window still has the layout from before: it slides the same front.
  await theirs.front("3").focus();
  await theirs.page.keyboard.press("ArrowRight");
  const asked = theirs.page.getByRole("dialog", { name: "Changed in another window" });
  await expect(asked).toBeVisible({ timeout: 20_000 });
  expect(await accessibilityFaults(theirs.page)).toEqual([]);
  await asked.getByRole("button", { name: "Take theirs" }).click();
  await theirs.saved();
  expect(await theirs.leftOf("3")).toBeCloseTo(loose + 5, 6);
  await context.close();
});

test("an assistant sees the layout and changes nothing", async ({ makerPage: page, browser, shop }) => {
  const { tag } = await makeBoard(page.request, board);
  const table = new LayoutTablePage(page);
  const address = await makeFace(page.request, shop.sawId, row);
  await table.open(address);
  await table.addBoard(tag);
  await table.saved();
  const context = await browser.newContext();
  const looking = await secondWindow(context, shop.assistant);
  await looking.page.goto(address);
  await looking.front("1").focus();
  await looking.page.keyboard.press("ArrowRight");
  await expect(looking.said("You may look at this layout but not change it.")).toBeVisible();
  await expect(looking.page.getByRole("button", { name: "Issue cut order" })).toBeHidden();
  expect(await looking.leftOf("1")).toBe(0.2);
  await context.close();
});

test("fronts move to a second board, an empty one is taken off, a newer picture is moved over to", async ({
  makerPage: page,
  shop,
}) => {
  const first = await makeBoard(page.request, board);
  const second = await makeBoard(page.request, { lengthMm: 600, widthMm: 180 });
  const table = new LayoutTablePage(page);
  const address = await makeFace(page.request, shop.sawId, { columnsMm: [200, 200], rowsMm: [120] });
  await table.open(address);
  await table.addBoard(first.tag);
  await table.addBoard(second.tag);
  const onTable = (tag: string) => page.getByRole("complementary").getByRole("listitem").filter({ hasText: tag });
  await expect(onTable(first.tag).getByRole("button", { name: "Take off the table" })).toBeDisabled();

  await table.front("2").focus();
  await page.keyboard.press("l");
  await onTable(second.tag).getByRole("button", { name: "Lay fronts here" }).click();
  await expect(table.said(`Front 2 moved to board ${second.tag}.`)).toBeVisible();
  expect(await table.seam("1 and 2")).toEqual(["1 and 2", "3.0", "other wood"]);
  await table.front("1").focus();
  await onTable(second.tag).getByRole("button", { name: "Lay fronts here" }).click();
  await onTable(first.tag).getByRole("button", { name: "Take off the table" }).click();
  await expect(onTable(first.tag)).toBeHidden();
  await table.saved();

  await straighten(page.request, second.id, { lengthMm: 600, widthMm: 180 });
  await page.reload();
  await expect(page.getByText("This layout lies on picture 1; the board was marked again since.")).toBeVisible();
  await page.getByRole("button", { name: "Move over to the newest picture" }).click();
  await expect(page.getByText("This layout lies on picture 1")).toBeHidden();
});

test("sizes, saws and the anchor are changed beside the table", async ({ makerPage: page, shop }) => {
  const { tag } = await makeBoard(page.request, board);
  const table = new LayoutTablePage(page);
  await table.open(await makeFace(page.request, shop.sawId, row));
  await table.addBoard(tag);
  const left = await table.leftOf("1");
  await page.getByLabel("Anchor, sideways").selectOption("left");
  await page.getByRole("heading", { name: "Sizes" }).click();
  await page.getByLabel("Width 2").fill("200");
  await page.getByLabel("Width 2").press("Enter");
  await expect(table.said("Sizes changed.")).toBeVisible();
  expect(await table.leftOf("1")).toBe(left);
  expect(await table.leftOf("3")).toBeCloseTo(left + 240 + 3 + 200 + 3, 6);

  // A kerf wider than the gap: the figure jumps by what is missing.
  await page.getByLabel("Kerf").first().fill("4");
  await page.getByLabel("Kerf").first().press("Enter");
  expect(await table.seam("1 and 2")).toEqual(["1 and 2", "3.0", "1.4", "0.0"]);
  await page.getByLabel("Crosscuts: saw").selectOption({ label: "Saw of the tests" });
  expect(await table.seam("1 and 2")).toEqual(["1 and 2", "3.0", "0.0", "0.0"]);
  await page.getByLabel("Spacing").selectOption("tight");
  expect(await table.seam("1 and 2")).toEqual(["1 and 2", "3.0", "−0.2", "0.0"]);

  await page.getByRole("button", { name: "Work out from an opening…" }).click();
  const widths = page.getByRole("dialog").getByRole("group", { name: "Widths" });
  await widths.getByLabel("Opening, width").fill("700");
  await widths.getByLabel("Opening, width").blur();
  await page.getByRole("button", { name: "Use these sizes" }).click();
  await expect(page.getByLabel("Width 1")).toHaveValue("229.3 mm");
  await page.keyboard.press("Control+z");
  await table.saved();
});

test("by keyboard alone two fronts change places, one is turned end for end, and the grain is turned by a quarter", async ({
  makerPage: page,
  shop,
}) => {
  const { tag } = await makeBoard(page.request, board);
  const table = new LayoutTablePage(page);
  // Low enough to lie across the board as well: 150 mm of 200.
  await table.open(await makeFace(page.request, shop.sawId, { columnsMm: [150, 150, 150], rowsMm: [120] }));
  await table.addBoard(tag);
  const [one, three] = [await table.leftOf("1"), await table.leftOf("3")];

  await table.front("1").focus();
  await page.keyboard.press("s");
  await expect(table.said(/^Choose two fronts to swap/)).toBeVisible();
  await page.keyboard.press("Space");
  await table.front("3").focus();
  await page.keyboard.press("Space");
  await page.keyboard.press("s");
  await expect(table.said("Fronts 1, 3 have changed places in the wood.")).toBeVisible();
  expect([await table.leftOf("1"), await table.leftOf("3")]).toEqual([three, one]);
  const along = async () => (await table.seam("1 and 2"))[2];
  expect(await along()).toBe("−306.0");
  await page.keyboard.press("Control+z");
  expect([await table.leftOf("1"), await table.leftOf("3")]).toEqual([one, three]);
  expect(await along()).toBe("0.0");

  await page.keyboard.press("Escape");
  await page.keyboard.press("t");
  await expect(table.said(/^Fronts? .* turned end for end\.$/)).toBeVisible();
  await page.keyboard.press("Control+z");

  const quarter = page.getByRole("button", { name: "Turn the grain" });
  await quarter.focus();
  await page.keyboard.press("Enter");
  await expect(table.said("Grain turned by a quarter, and every group laid along its board again.")).toBeVisible();
  // A row with its grain upright lies across the board: 456 mm of fronts over 200 mm of wood.
  await expect(page.getByText(/reaches? [\d.]+ mm over the usable outline/).first()).toBeVisible();
  await page.keyboard.press("Control+z");
  await expect(page.getByText("Every front lies on sound wood, and straight cuts part them.")).toBeVisible();
  await table.saved();
});
