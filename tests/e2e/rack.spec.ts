/** From a photograph to a board in the rack, and finding it again. */
import type { APIRequestContext, Page } from "@playwright/test";
import sharp from "sharp";
import { type Board, boardSchema } from "../../lib/schemas/board";
import { photoSchema } from "../../lib/schemas/photo";
import { straighteningSchema } from "../../lib/schemas/straightening";
import { accessibilityFaults, expect, test } from "./support/test";

const origin = process.env.BASE_URL ?? "";
const size = { width: 1300, height: 500 };

/** A warm rectangle on grey, as a board on a bench. */
function photograph(): Promise<Buffer> {
  const plank = { create: { width: 1200, height: 200, channels: 3, background: "#a8794a" } } as const;
  return sharp({ create: { ...size, channels: 3, background: "#8a8f8c" } })
    .composite([{ input: plank, left: 50, top: 150 }])
    .jpeg()
    .toBuffer();
}

const file = async (name: string) => ({ name, mimeType: "image/jpeg", buffer: await photograph() });

async function enterBoard(request: APIRequestContext, fields: Partial<Record<string, unknown>> = {}): Promise<Board> {
  const data = {
    species: "Black walnut",
    cut: "flat",
    nominalQuarters: 4,
    thickness: 27_000,
    length: 1_200_000,
    width: 200_000,
    place: "rack 2 left",
    source: "",
    costMinor: null,
    note: "",
    reading: null,
    ...fields,
  };
  const answer = await request.post("/api/boards", { data, headers: { origin } });
  return boardSchema.parse(await answer.json());
}

async function straightenBoard(request: APIRequestContext, boardId: string): Promise<void> {
  const query = `uploadKey=${crypto.randomUUID()}&fileName=board.jpg`;
  const upload = await request.post(`/api/photos?${query}`, { data: await photograph(), headers: { origin } });
  const { id: photoId } = photoSchema.parse(await upload.json());
  const [left, right, top, bottom] = [50, 1250, 150, 350];
  const marking = {
    reference: { kind: "board", length: 1_200_000, width: 200_000 },
    corners: [
      { x: left, y: top },
      { x: right, y: top },
      { x: right, y: bottom },
      { x: left, y: bottom },
    ],
    extraPoints: [],
    edgePoints: [],
  };
  const started = await request.post(`/api/boards/${boardId}/straightenings`, {
    data: { photoId, marking },
    headers: { origin },
  });
  const { id } = straighteningSchema.parse(await started.json());
  await expect
    .poll(async () => straighteningSchema.parse(await (await request.get(`/api/straightenings/${id}`)).json()).state, {
      timeout: 30_000,
    })
    .toBe("done");
}

const choose = (page: Page) => page.getByLabel("Choose photographs");

test("an empty rack says what it is for and leads to the first step", async ({ makerPage: page }) => {
  await page.goto("/rack");
  await expect(page.getByRole("heading", { name: "The rack is empty" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("link", { name: "Take in wood" }).click();
  await expect(page.getByRole("heading", { name: "Take in wood" })).toBeVisible();
});

test("photographs are taken in several at once, a wrong file is refused in words, and a board is made from one", async ({
  makerPage: page,
}) => {
  await page.goto("/rack/take-in");
  const wrong = { name: "offer.jpg", mimeType: "image/jpeg", buffer: Buffer.from("thirty boards of oak, as agreed") };
  await choose(page).setInputFiles([await file("first.jpg"), await file("second.jpg"), wrong]);
  const uploads = page.getByRole("region", { name: "Uploads" });
  await expect(uploads.getByText("taken in")).toHaveCount(2, { timeout: 20_000 });
  await expect(uploads.getByText("This is not a picture")).toBeVisible({ timeout: 20_000 });
  expect(await accessibilityFaults(page)).toEqual([]);

  const card = page.getByRole("listitem").filter({ has: page.getByRole("img", { name: "Photograph first.jpg" }) });
  await card.getByRole("link", { name: "Make a board from it" }).click();
  await page.getByRole("button", { name: "Enter board and mark it" }).click();
  await expect(page.getByText("Say which wood it is")).toBeVisible();
  await expect(page.getByLabel("Length, along the grain")).toBeFocused();
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.getByLabel("Length, along the grain").fill("1200");
  await page.getByLabel("Width").fill("200");
  await page.getByLabel("Species").fill("Black walnut");
  await page.getByLabel("Nominal thickness").selectOption("4/4");
  await expect(page.getByLabel("Thickness, measured")).toHaveValue("25.4 mm");
  await page.getByLabel("Moisture, %").fill("8,2");
  await page.getByRole("button", { name: "Enter board and mark it" }).click();
  await expect(page).toHaveURL(/\/rack\/[0-9a-f-]{36}\/mark\?photo=/);

  await page.goto("/rack");
  await expect(page.getByRole("link", { name: /B-001.*Black walnut, flat.*8\.2 %/s })).toBeVisible();
});

test("an upload that broke off is tried again under the same key and taken in once", async ({ makerPage: page }) => {
  await page.goto("/rack/take-in");
  await page.route("**/api/photos?**", (route) => route.abort("connectionreset"), { times: 1 });
  await choose(page).setInputFiles([await file("walnut.jpg")]);
  await expect(page.getByText("The server cannot be reached")).toBeVisible();
  await page.getByRole("button", { name: "Try walnut.jpg again" }).click();
  await expect(page.getByRole("region", { name: "Uploads" }).getByText("taken in")).toBeVisible();
  await expect(page.getByRole("img", { name: "Photograph walnut.jpg" })).toHaveCount(1);
});

test("boards hang to one scale; search, order and view stay in the address", async ({ makerPage: page }) => {
  const { request } = page.context();
  const walnut = await enterBoard(request);
  await enterBoard(request, { species: "White oak", length: 2_400_000, place: "rack 1 top" });
  await straightenBoard(request, walnut.id);
  await page.goto("/rack");
  const picture = page.getByRole("link", { name: /B-001/ }).locator("img");
  await expect(picture).toHaveJSProperty("complete", true);
  const shorter = (await picture.boundingBox())?.width ?? 0;
  const longer =
    (await page.getByRole("link", { name: /B-002/ }).getByText("no picture yet").locator("..").boundingBox())?.width ?? 0;
  expect(shorter / longer).toBeCloseTo(1200 / 2400, 2);
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.getByLabel("Search the rack").fill("b-1");
  await expect(page).toHaveURL(/search=b-1/);
  await expect(page.getByText("1 board", { exact: true })).toBeVisible();
  await page.getByLabel("Search the rack").fill("");
  await page.getByRole("button", { name: "As a table" }).click();
  await expect(page).toHaveURL(/view=table/);
  const length = page.getByRole("columnheader", { name: "Length, mm" });
  for (const order of ["ascending", "descending"]) {
    await length.getByRole("button").click();
    await expect(length).toHaveAttribute("aria-sort", order);
  }
  await expect(page.getByRole("rowheader")).toHaveText(["B-002", "B-001"]);
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.reload();
  await expect(page.getByRole("rowheader")).toHaveText(["B-002", "B-001"]);
});

test("a board's page shows its picture under the tape; facts and readings are changed there", async ({ makerPage: page }) => {
  const { request } = page.context();
  const { id } = await enterBoard(request);
  await straightenBoard(request, id);
  await page.goto(`/rack/${id}`);
  await expect(page.getByRole("img", { name: "B-001, straightened" })).toBeVisible();
  await expect(page.getByRole("img", { name: "Tape, 0 to 1200.0 mm" })).toBeVisible();
  expect(await accessibilityFaults(page)).toEqual([]);

  await page.getByRole("button", { name: "Change" }).click();
  await page.getByLabel("Place").fill("loft");
  await page.getByRole("button", { name: "Save" }).click();
  await expect(page.getByRole("definition").filter({ hasText: "loft" })).toBeVisible();
  await expect(page.getByText("Changed place")).toBeVisible();

  await page.getByLabel("Moisture, %").fill("9.1");
  await page.getByRole("button", { name: "Add reading" }).click();
  await expect(page.getByRole("cell", { name: "9.1 %" })).toBeVisible();
});

/** A file as the browser's own drag or clipboard would hand it over. */
const handedOver = async (page: Page, name: string) => {
  const base64 = (await photograph()).toString("base64");
  return page.evaluateHandle(
    async ([text, fileName]) => {
      const bytes = Uint8Array.from(atob(text), (letter) => letter.charCodeAt(0));
      const data = new DataTransfer();
      data.items.add(new File([bytes], fileName, { type: "image/jpeg" }));
      return data;
    },
    [base64, name] as const,
  );
};

test("photographs are dropped on the page and pasted into it", async ({ makerPage: page }) => {
  await page.goto("/rack/take-in");
  const uploads = page.getByRole("region", { name: "Uploads" });
  const zone = page.getByText("drop them here");
  await expect(zone).toBeVisible();
  await zone.dispatchEvent("dragover", { dataTransfer: await handedOver(page, "dropped.jpg") });
  await zone.dispatchEvent("drop", { dataTransfer: await handedOver(page, "dropped.jpg") });
  await expect(page.getByRole("img", { name: "Photograph dropped.jpg" })).toBeVisible({ timeout: 20_000 });

  const clipboardData = await handedOver(page, "pasted.jpg");
  await page.evaluate(
    (data) => document.body.dispatchEvent(new ClipboardEvent("paste", { clipboardData: data, bubbles: true })),
    clipboardData,
  );
  await expect(uploads.getByText("taken in")).toHaveCount(2, { timeout: 20_000 });
  await expect(page.getByRole("img", { name: /^Photograph / })).toHaveCount(2);
});

test("a board without a photograph is entered by its size and hangs in the rack", async ({ makerPage: page }) => {
  await page.goto("/rack/take-in");
  await page.getByRole("link", { name: "Enter a board without a photograph" }).click();
  await page.getByLabel("Length, along the grain").fill("1300");
  await page.getByLabel("Width", { exact: true }).fill("150");
  await page.getByLabel("Species").fill("Ash");
  await page.getByLabel("Thickness, measured").fill("20");
  expect(await accessibilityFaults(page)).toEqual([]);
  await page.getByRole("button", { name: "Enter board" }).click();
  await expect(page.getByRole("heading", { name: "B-001, Ash" })).toBeVisible();
  // 150 mm tallies to 6 in, 1300 mm to 4 ft, 20 mm counts as 1 in: 6 × 4 ÷ 12.
  await expect(page.getByRole("definition").filter({ hasText: /^2$/ })).toBeVisible();
});
