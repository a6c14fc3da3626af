/** The marking screen as a person uses it: rough by mouse, fine by keys. */
import { expect, type Locator, type Page } from "@playwright/test";

export interface PhotoPx {
  readonly x: number;
  readonly y: number;
}

const corners = ["left end, upper edge", "right end, upper edge", "right end, lower edge", "left end, lower edge"] as const;

export class MarkingPage {
  readonly page: Page;

  constructor(page: Page) {
    this.page = page;
  }

  /** The four corners of the board, to a tenth of a pixel of the photograph. */
  async markBoard(at: readonly PhotoPx[]): Promise<void> {
    for (const [index, name] of corners.entries()) {
      const target = at[index];
      if (!target) throw new Error(`no place for the corner ${name}`);
      await this.moveTo(this.page.getByRole("button", { name: new RegExp(`^Board, corner ${index + 1}: ${name},`) }), target);
    }
  }

  /** Alt is a tenth of a pixel of the photograph, with Shift a whole one; without Alt a pixel of the screen, with Shift ten. */
  async moveTo(handle: Locator, target: PhotoPx): Promise<void> {
    await this.dragNear(handle, target);
    await handle.focus();
    for (const modifiers of ["Alt+Shift+", "Alt+"]) {
      const step = modifiers === "Alt+" ? 0.1 : 1;
      const now = await positionOf(handle);
      const presses = async (count: number, forwards: string, backwards: string) => {
        for (let done = 0; done < Math.abs(count); done++) await handle.press(modifiers + (count > 0 ? forwards : backwards));
      };
      await presses(Math.trunc((target.x - now.x) / step + Math.sign(target.x - now.x) * 0.01), "ArrowRight", "ArrowLeft");
      await presses(Math.trunc((target.y - now.y) / step + Math.sign(target.y - now.y) * 0.01), "ArrowDown", "ArrowUp");
    }
    const end = await positionOf(handle);
    expect(Math.abs(end.x - target.x)).toBeLessThan(0.15);
    expect(Math.abs(end.y - target.y)).toBeLessThan(0.15);
  }

  /** By mouse, to within a few pixels of the screen; the scale is learned from a first short move. */
  private async dragNear(handle: Locator, target: PhotoPx): Promise<void> {
    const { mouse } = this.page;
    // A mark that was never moved has no place yet.
    await handle.press("ArrowRight");
    const from = await positionOf(handle);
    const box = await handle.boundingBox();
    if (!box) throw new Error("the handle is not on the screen");
    const start = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    await mouse.move(start.x, start.y);
    await mouse.down();
    await mouse.move(start.x + 40, start.y);
    const photoPerScreen = ((await positionOf(handle)).x - from.x) / 40;
    await mouse.move(start.x + (target.x - from.x) / photoPerScreen, start.y + (target.y - from.y) / photoPerScreen, {
      steps: 5,
    });
    await mouse.up();
  }
}

/** Told by the handle's name: "…, 246.5 px from the left, 1333.1 px from the top". */
async function positionOf(handle: Locator): Promise<PhotoPx> {
  const name = (await handle.getAttribute("aria-label")) ?? "";
  const [, x, y] = /(-?[\d.]+) px from the left, (-?[\d.]+) px from the top/.exec(name)?.map(Number) ?? [];
  if (x === undefined || y === undefined) throw new Error(`no position in “${name}”`);
  return { x, y };
}
