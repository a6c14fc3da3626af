/** The layout table as a person uses it. */
import { expect, type Locator, type Page } from "@playwright/test";

export class LayoutTablePage {
  readonly page: Page;
  readonly stock: Locator;
  readonly show: Locator;

  constructor(page: Page) {
    this.page = page;
    this.stock = page.locator("[data-side=stock]");
    this.show = page.locator("[data-side=show]");
  }

  async open(address: string): Promise<void> {
    await this.page.goto(address);
    await expect(this.page.getByRole("button", { name: "Undo" })).toBeVisible();
  }

  /** Adds the board by its tag; the first one gets the fronts at once. */
  async addBoard(tag: string): Promise<void> {
    await this.page.getByRole("button", { name: "Add a board…" }).click();
    await this.page.getByLabel("Search").fill(tag);
    await this.page.getByRole("button", { name: `Put ${tag} on the table` }).click();
    await expect(this.page.getByRole("dialog")).toBeHidden();
  }

  front(label: string): Locator {
    return this.page.getByRole("button", { name: new RegExp(`^Front ${label},`) });
  }

  /** What the table said last. */
  said(text: string | RegExp): Locator {
    return this.page.getByRole("status").filter({ hasText: text });
  }

  /** A save may wait for a retry, on a busy machine also for its answer. */
  async saved(): Promise<void> {
    await expect(this.page.getByText("Saved", { exact: true })).toBeVisible({ timeout: 20_000 });
  }

  /** The distance of a front from the left end of its board as the list of fronts tells it, mm. */
  async leftOf(label: string): Promise<number> {
    const text = (await this.front(label).textContent()) ?? "";
    return Number(/([\d.]+) mm from the left end/.exec(text)?.[1]);
  }

  /** What the cuts do to a seam, as its row in the panel shows it: between, gap, along, across. */
  async seam(between: string): Promise<string[]> {
    return this.page.getByRole("row").filter({ hasText: between }).locator("td:not([data-read])").allInnerTexts();
  }

  /** Where a front lies on the screen, px of the page: the middle of its rectangle on the first board. */
  async middleOf(label: string, boardLengthMm: number): Promise<{ x: number; y: number; pxPerMm: number }> {
    await this.stock.scrollIntoViewIfNeeded();
    const box = await this.stock.boundingBox();
    const text = (await this.front(label).textContent()) ?? "";
    const [, width, , left] = /, ([\d.]+) mm × ([\d.]+) mm, .*?, ([\d.]+) mm from the left end/.exec(text)?.map(Number) ?? [];
    if (!box || width === undefined || left === undefined) throw new Error(`front ${label} lies nowhere: ${text}`);
    // The whole view: a margin of 20 px on either side of the longest board.
    const pxPerMm = (box.width - 40) / boardLengthMm;
    return { x: box.x + 20 + (left + width / 2) * pxPerMm, y: box.y + box.height / 2, pxPerMm };
  }
}
