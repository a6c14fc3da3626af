/** Marking and drawing with one thumb. */
import type { CDPSession } from "@playwright/test";
import { boardCorners, boardToMark, MarkingPage } from "./support/marking";
import { makeBoard } from "./support/stock";
import { accessibilityFaults, expect, test } from "./support/test";

interface Touch {
  readonly x: number;
  readonly y: number;
}

const touch = (session: CDPSession, type: "touchStart" | "touchMove" | "touchEnd", touchPoints: readonly Touch[]) =>
  session.send("Input.dispatchTouchEvent", { type, touchPoints: [...touchPoints] });

test("corners are dragged by touch with a loupe, then straightened; nothing runs off the side", async ({ makerPage: page }) => {
  const marking = new MarkingPage(page);
  const entered = await boardToMark(page.context().request, { length: 1_200_000, width: 200_000 });
  await marking.open(entered);
  const session = await page.context().newCDPSession(page);
  for (const [index, corner] of boardCorners.entries()) {
    const handle = marking.corner(index + 1);
    await handle.scrollIntoViewIfNeeded();
    const box = await handle.boundingBox();
    if (!box) throw new Error("the handle is not in view");
    // The finger takes hold beside the corner, so that it does not cover it.
    const start = { x: box.x + box.width / 2 + 12, y: box.y + box.height / 2 + 14 };
    const to = await marking.onScreen(corner);
    await touch(session, "touchStart", [start]);
    await touch(session, "touchMove", [{ x: to.x + 6, y: to.y + 20 }]);
    await touch(session, "touchMove", [{ x: to.x + 12, y: to.y + 14 }]);
    if (index === 0) await expect(page.getByTestId("loupe")).toBeVisible();
    await touch(session, "touchEnd", []);
    const at = await marking.positionOf(handle);
    // A pixel of the screen is about 5 of the photograph here.
    expect(Math.hypot(at.x - corner.x, at.y - corner.y)).toBeLessThan(8);
  }
  await expect(page.getByTestId("loupe")).toBeHidden();
  // To the pixel by thumb: the step buttons.
  const first = await marking.positionOf(marking.corner(4));
  await page.getByRole("button", { name: "Left by 1 px" }).tap();
  expect((await marking.positionOf(marking.corner(4))).x).toBeCloseTo(first.x - 1);

  await expect(marking.straighten).toBeEnabled();
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(page.viewportSize()?.width);
  expect(await accessibilityFaults(page)).toEqual([]);
  await marking.straighten.tap();
  await expect(page.getByText("Version 1 of the picture is done.")).toBeVisible({ timeout: 40_000 });
});

test("two fingers zoom the picture, a tap draws an area, and it is saved", async ({ makerPage: page }) => {
  const board = await makeBoard(page.context().request, { lengthMm: 1200, widthMm: 200 });
  await page.goto(`/rack/${board.id}/zones`);
  const picture = page.getByAltText(`Straightened picture of ${board.tag}`);
  await expect(picture).toBeVisible();
  await page.getByRole("button", { name: "Add an ellipse" }).tap();
  const before = await picture.boundingBox();
  if (!before) throw new Error("the picture is not in view");
  const middle = { x: before.x + before.width / 2, y: before.y + before.height / 2 };
  const session = await page.context().newCDPSession(page);
  const fingers = (apart: number): Touch[] => [
    { x: middle.x - apart, y: middle.y },
    { x: middle.x + apart, y: middle.y },
  ];
  await touch(session, "touchStart", fingers(30));
  for (const apart of [45, 60, 90]) await touch(session, "touchMove", fingers(apart));
  await touch(session, "touchEnd", []);
  const zoomed = await picture.boundingBox();
  expect((zoomed?.width ?? 0) / before.width).toBeCloseTo(3, 1);

  await page.touchscreen.tap(middle.x, middle.y);
  await expect(page.getByRole("button", { name: "Remove area 1, knot" })).toBeVisible();
  await page.getByRole("button", { name: "Save" }).tap();
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(page.viewportSize()?.width);
  expect(await accessibilityFaults(page)).toEqual([]);
});
