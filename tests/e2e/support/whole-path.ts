/**
 * The main path from a photograph to ticked steps, walked by mouse and keys in two windows: the maker's and the assistant's. Takes any
 * photograph whose board corners are known, so that the project's own wood and real photographs go the same way.
 */
import type { Browser, Page } from "@playwright/test";
import { LayoutTablePage } from "./layout-table";
import { MarkingPage, type PhotoPx } from "./marking-page";
import { readPdf } from "./read-pdf";
import { expect, type Shop, signIn } from "./test";

export interface KnownPhoto {
  readonly name: string;
  readonly mimeType: "image/jpeg";
  readonly buffer: Buffer;
  readonly species: string;
  readonly lengthMm: number;
  readonly widthMm: number;
  /** Of the board's top face in the upright photograph: (0,0), (L,0), (L,W), (0,W). */
  readonly cornersPx: readonly PhotoPx[];
}

/** Two fronts that every board of the tests has room for. */
const front = { widthMm: 180, heightMm: 90, gapMm: 3 };

export async function walkTheWholePath(browser: Browser, page: Page, shop: Shop, photo: KnownPhoto): Promise<void> {
  await signInByForm(page, shop);
  await takeIn(page, photo);
  await new MarkingPage(page).markBoard(photo.cornersPx);
  await straighten(page);
  await keepClear(page);
  await describeFace(page);
  await layOnBoard(page);
  const orderAddress = await issue(page);
  await readPaper(page, orderAddress, photo);
  await tickAtBench(browser, page, shop, orderAddress);
}

async function signInByForm(page: Page, { maker }: Shop): Promise<void> {
  await page.goto("/");
  await page.getByLabel("E-mail").fill(maker.email);
  await page.getByLabel("Password").fill(maker.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(/\/today$/);
}

async function takeIn(page: Page, { name, mimeType, buffer, species, lengthMm, widthMm }: KnownPhoto): Promise<void> {
  await page.getByRole("link", { name: "Take in wood" }).click();
  const free = await slowUploads(page, buffer.length / 2);
  await page.getByLabel("Choose photographs").setInputFiles({ name, mimeType, buffer });
  const sent = page.getByRole("region", { name: "Uploads" }).getByRole("progressbar", { name: `Sending ${name}` });
  await expect(sent).toBeVisible();
  await expect.poll(async () => Number(await sent.getAttribute("aria-valuenow"))).toBeGreaterThan(0);
  await free();
  await expect(page.getByRole("region", { name: "Uploads" }).getByText("taken in")).toBeVisible({ timeout: 60_000 });
  await page.getByRole("link", { name: "Make a board from it" }).click();
  await page.getByLabel("Species").fill(species);
  await page.getByLabel("Length, along the grain").fill(`${lengthMm} mm`);
  await page.getByLabel("Width", { exact: true }).fill(`${widthMm} mm`);
  await page.getByLabel("Thickness, measured").fill("27 mm");
  await page.getByRole("button", { name: "Enter board and mark it" }).click();
  await expect(page).toHaveURL(/\/mark\?photo=/);
}

/** Lets the browser send no more than so many bytes a second, as over a shop's wireless; what is given back frees it again. */
async function slowUploads(page: Page, bytesPerSecond: number): Promise<() => Promise<unknown>> {
  const session = await page.context().newCDPSession(page);
  const limit = (uploadThroughput: number) =>
    session.send("Network.emulateNetworkConditions", { offline: false, latency: 0, downloadThroughput: -1, uploadThroughput });
  await session.send("Network.enable");
  await limit(bytesPerSecond);
  return () => limit(-1);
}

async function straighten(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Straighten", exact: true }).click();
  await expect(page.getByText("Version 1 of the picture is done.")).toBeVisible({ timeout: 90_000 });
  await page.getByRole("link", { name: "Draw outline and keep-clear areas" }).click();
}

/** A knot drawn near the left end of the board, where the fronts would be laid first: they come to lie right of it. */
async function keepClear(page: Page): Promise<void> {
  const picture = page.getByLabel(/^Straightened picture of/);
  await expect(picture).toBeVisible();
  await page.getByRole("button", { name: "Add an ellipse" }).click();
  const box = await picture.boundingBox();
  if (!box) throw new Error("no picture to draw on");
  const middle = { x: box.x + box.width * 0.12, y: box.y + box.height / 2 };
  await page.mouse.move(middle.x - 12, middle.y - 8);
  await page.mouse.down();
  await page.mouse.move(middle.x + 12, middle.y + 8, { steps: 4 });
  await page.mouse.up();
  await page.getByRole("button", { name: "Save", exact: true }).click();
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
}

async function describeFace(page: Page): Promise<void> {
  await page.getByRole("link", { name: "Jobs", exact: true }).click();
  await page.getByRole("button", { name: "Open a job" }).first().click();
  await page.getByLabel("Title").fill("Letter tray");
  await page.getByRole("button", { name: "Open job" }).click();
  await page.getByRole("link", { name: "Add a face" }).first().click();
  await page.getByLabel("Title").fill("Two fronts");
  const axis = async (name: "Widths" | "Heights", count: string, field: string, sizeMm: number) => {
    const group = page.getByRole("group", { name });
    await group.getByLabel(count).fill(name === "Widths" ? "2" : "1");
    await group.getByLabel("Gap between").fill(`${front.gapMm} mm`);
    await group.getByRole("button", { name: "One by one" }).click();
    for (const input of await group.getByLabel(new RegExp(`^${field} \\d`)).all()) {
      await input.fill(`${sizeMm} mm`);
      await input.press("Tab");
    }
  };
  await axis("Widths", "Fronts side by side", "Width", front.widthMm);
  await axis("Heights", "Fronts one above the other", "Height", front.heightMm);
  await page.getByRole("button", { name: "Add face" }).click();
  await expect(page).toHaveURL(/\/faces\/[0-9a-f-]{36}$/);
}

/** Lays the fronts on the board, slides them into the knot and off it again, and sees the figure run on across the gap. */
async function layOnBoard(page: Page): Promise<void> {
  const table = new LayoutTablePage(page);
  await table.addBoard("B-001");
  await expect(table.front("2")).toContainText("from the left end");
  const sound = page.getByText("Every front lies on sound wood, and straight cuts part them.");
  await expect(sound).toBeVisible();
  // Laid on the first sound wood, which begins right of the knot: sliding left leads into it.
  const laid = await table.leftOf("1");
  const problem = page.getByRole("button", { name: /^Front 1 reaches [\d.]+ mm into the knot at [\d.]+ mm\. Slide the set/ });
  await table.front("1").focus();
  for (let presses = 0; presses < 4; presses++) await page.keyboard.press("Shift+ArrowLeft");
  await expect(problem).toBeVisible();
  await expect(page.getByRole("button", { name: "Issue cut order" })).toBeDisabled();
  expect(await table.leftOf("1")).toBeCloseTo(laid - 20, 6);

  await table.front("2").focus();
  await problem.click();
  await expect(table.front("1")).toHaveAttribute("aria-pressed", "true");
  await expect(table.front("2")).toHaveAttribute("aria-pressed", "false");
  await page.getByRole("button", { name: /^Slide [\d.]+ mm right$/ }).click();
  await expect(problem).toBeHidden();
  await expect(sound).toBeVisible();
  await table.saved();
  const [, gap, along] = await table.seam("1 and 2");
  expect(gap).toBe(front.gapMm.toFixed(1));
  expect(along).toBe("0.0");
}

async function issue(page: Page): Promise<string> {
  await page.getByRole("button", { name: "Issue cut order" }).click();
  await expect(page.getByRole("link", { name: "Cut order 1 A" })).toBeVisible({ timeout: 20_000 });
  await page.getByRole("link", { name: "Cut order 1 A" }).click();
  await expect(page.getByRole("heading", { name: "Cut order 1 A" })).toBeVisible();
  return new URL(page.url()).pathname;
}

/** Opens the PDF and reads what an assistant needs from it. */
async function readPaper(page: Page, orderAddress: string, { lengthMm, widthMm, species }: KnownPhoto): Promise<void> {
  for (const paper of ["a4", "letter"]) {
    const answer = await page.request.get(`/api${orderAddress}/pdf?paper=${paper}`);
    expect(answer.headers()["content-type"]).toBe("application/pdf");
    const { text, pages } = await readPdf(await answer.body());
    expect(pages).toBeGreaterThanOrEqual(1);
    expect(pages).toBeLessThanOrEqual(3);
    for (const said of ["Cut order 1", "Letter tray", "Two fronts", "B-001", species, "Crosscut", `page ${pages} of ${pages}`]) {
      expect(text).toContain(said);
    }
    expect(text).toContain(`${lengthMm.toFixed(1)} × ${widthMm.toFixed(1)}`);
    // The fronts come off the saw with their clean-up on: 0.2 mm on either side.
    expect(text).toContain(`${(front.widthMm + 0.4).toFixed(1)} × ${(front.heightMm + 0.4).toFixed(1)}`);
    expect(text).toContain("The machine's manual, local rules and trained practice");
  }
  const labels = await page.request.get(`/api${orderAddress}/labels?sheet=a4-24&start=3`);
  expect((await readPdf(await labels.body())).text).toContain("Order 1 A");
}

/** The assistant ticks every step on a phone; the maker's page shows it without being touched. */
async function tickAtBench(browser: Browser, page: Page, shop: Shop, orderAddress: string): Promise<void> {
  const phone = await browser.newContext({ viewport: { width: 390, height: 844 } });
  await signIn(phone, shop.assistant);
  const bench = await phone.newPage();
  await bench.goto(orderAddress.replace("/orders/", "/bench/"));
  const done = bench.getByRole("button", { name: /, (next step|all done)$/ });
  await expect(done).toBeVisible();
  await done.click();
  await expect(page.getByText(shop.assistant.name).filter({ visible: true }).first()).toBeVisible({ timeout: 15_000 });

  for (let steps = 0; steps < 40 && (await done.isVisible()); steps++) {
    const before = await bench.getByText(/^step \d+ of \d+$/).textContent();
    const last = (await done.textContent())?.endsWith("all done") ?? false;
    await done.click();
    if (last) break;
    await expect(bench.getByText(/^step \d+ of \d+$/)).not.toHaveText(before ?? "");
  }
  await phone.close();
  await page.goto("/orders");
  await page.getByRole("button", { name: "Cut", exact: true }).click();
  await expect(page.getByRole("listitem").filter({ hasText: "Letter tray" })).toBeVisible();
  const order = await page.request.get(`/api${orderAddress}`);
  const { steps, ticked, state } = await order.json();
  expect({ ticked, state }).toEqual({ ticked: steps, state: "cut" });
}
