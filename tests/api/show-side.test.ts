/** The show side as a picture, pixel by pixel, from a board whose colours tell the place they were taken from. */
import { eq } from "drizzle-orm";
import sharp from "sharp";
import { v7 as newId } from "uuid";
import { beforeAll, describe, expect, test } from "vitest";
import { layout, layoutBoard } from "@/db/schema";
import { type FaceLayout, gridFace, letLoose, placeGroup, type QuarterTurns, rowFace, SET_ID, umFromMm } from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { showSidePng } from "@/lib/server/layouts/show-side";
import { storage } from "@/lib/server/storage";
import { type MadeLayout, makeLayout } from "../support/make-layout";
import { makeShop } from "../support/make-shop";

const boardMm = { length: 400, width: 160 };
const dark = [21, 23, 24];
type Rgb = readonly number[];

let maker: ShopAccess;
beforeAll(async () => {
  maker = (await makeShop()).maker;
});

/** Red tells how far along the board, green how far across, blue which board. */
const colourAt = (xMm: number, yMm: number, blue: number): Rgb => [
  40 + (200 * xMm) / boardMm.length,
  40 + (200 * yMm) / boardMm.width,
  blue,
];

async function pictureLevel(level: number, pxPerMm: number, blue: number) {
  const [widthPx, heightPx] = [boardMm.length * pxPerMm, boardMm.width * pxPerMm];
  const data = Buffer.alloc(widthPx * heightPx * 3);
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      data.set(colourAt((x + 0.5) / pxPerMm, (y + 0.5) / pxPerMm, blue), (y * widthPx + x) * 3);
    }
  }
  const key = `tests/show-side/${newId()}.png`;
  const bytes = await sharp(data, { raw: { width: widthPx, height: heightPx, channels: 3 } })
    .png()
    .toBuffer();
  await storage().put(key, new Uint8Array(bytes));
  return { level, key, widthPx, heightPx };
}

/** Two levels; the blue of the coarse one is 40 more, so that a test sees which was read. */
const levelsOf = async (blue: number) => [await pictureLevel(0, 4, blue), await pictureLevel(1, 2, blue + 40)];

/** Two fronts of different widths with 10 mm between them. */
const fronts = { left: 60, right: 40, height: 50, gap: 10 };
const twoFronts = rowFace(
  [umFromMm(fronts.left), umFromMm(fronts.right)],
  umFromMm(fronts.height),
  umFromMm(fronts.gap),
  "horizontal",
);

async function madeOn(blue: number): Promise<MadeLayout> {
  return makeLayout(maker, { face: twoFronts, boardMm, kerfMm: 2.4, at: null, levels: await levelsOf(blue) });
}

function laid(document: FaceLayout, groupId: string, boardId: string, xMm: number, yMm: number, turns: QuarterTurns): FaceLayout {
  const placed = placeGroup(document, groupId, boardId, { x: umFromMm(xMm), y: umFromMm(yMm) }, turns);
  if (!placed.ok) throw new Error(`the group ${groupId} cannot be placed`);
  return placed.layout;
}

async function save(made: MadeLayout, document: FaceLayout): Promise<void> {
  await database()
    .update(layout)
    .set({ document: faceLayoutSchema.parse(document) })
    .where(eq(layout.id, made.layoutId));
}

async function drawn(made: MadeLayout, pxPerMm: number) {
  const { data, info } = await sharp(await showSidePng(maker, made.faceId, pxPerMm))
    .raw()
    .toBuffer({ resolveWithObject: true });
  const at = (xMm: number, yMm: number): Rgb => {
    const from = (Math.floor(yMm * pxPerMm) * info.width + Math.floor(xMm * pxPerMm)) * info.channels;
    return [...data.subarray(from, from + 3)];
  };
  return { at, width: info.width, height: info.height };
}

function expectColour(found: Rgb, wanted: Rgb): void {
  // A pixel of a quarter millimetre changes red by 0.1 and green by 0.3; rounding an edge moves the piece by half a pixel.
  for (const [channel, value] of wanted.entries()) expect(Math.abs((found[channel] ?? Number.NaN) - value)).toBeLessThan(2);
}

/** Where the wood of the set's rectangle (`wide` × `high` on the face) lies in its rectangle on the board, worked out by hand. */
const onBoard: Readonly<Record<QuarterTurns, (x: number, y: number, wide: number, high: number) => readonly [number, number]>> = {
  0: (x, y) => [x, y],
  1: (x, y, _wide, high) => [high - y, x],
  2: (x, y, wide, high) => [wide - x, high - y],
  3: (x, y, wide) => [y, wide - x],
};

const wide = fronts.left + fronts.gap + fronts.right;
const spots = [
  [2, 2],
  [58, 3],
  [30, 25],
  [3, 48],
  [72, 2],
  [107, 47],
] as const;

describe.each([0, 1, 2, 3] as const)("with %i quarter turns", (turns) => {
  test.each([1, 2, 4])("every spot shows the wood it is cut from, and gaps are dark, at %i px/mm", async (pxPerMm) => {
    const made = await madeOn(90);
    await save(made, laid(made.document, SET_ID, made.boardId, 120, 20, turns));
    const picture = await drawn(made, pxPerMm);
    expect([picture.width, picture.height]).toEqual([wide * pxPerMm, fronts.height * pxPerMm]);
    const half = 0.5 / pxPerMm;
    for (const [x, y] of spots) {
      const [along, across] = onBoard[turns](x + half, y + half, wide, fronts.height);
      expectColour(picture.at(x, y), colourAt(120 + along, 20 + across, pxPerMm > 2 ? 90 : 130));
    }
    for (const x of [60.5, 65, 69]) expect(picture.at(x, 25)).toEqual(dark);
  });
});

test("where a piece hangs over the picture it is dark, and the rest stays in its place", async () => {
  const made = await madeOn(90);
  // 30 mm beyond the left end and 10 mm above the upper edge.
  await save(made, laid(made.document, SET_ID, made.boardId, -30, -10, 0));
  const picture = await drawn(made, 2);
  expect(picture.at(29, 30)).toEqual(dark);
  expect(picture.at(45, 9)).toEqual(dark);
  expectColour(picture.at(31, 11), colourAt(1.25, 1.25, 130));
  expectColour(picture.at(55, 45), colourAt(25.25, 35.25, 130));
});

test("a piece wholly off the picture is dark, and one not laid yet too", async () => {
  const made = await madeOn(90);
  await save(made, laid(made.document, SET_ID, made.boardId, 355, 300, 0));
  const off = await drawn(made, 1);
  for (const [x, y] of spots) expect(off.at(x, y)).toEqual(dark);
  await save(made, made.document);
  const unplaced = await drawn(made, 1);
  for (const [x, y] of spots) expect(unplaced.at(x, y)).toEqual(dark);
});

test("fronts on two boards show each its own, and each may be turned its own way", async () => {
  const made = await madeOn(90);
  const other = await madeOn(180);
  const { boardId, straighteningId } = other;
  await database().insert(layoutBoard).values({ layoutId: made.layoutId, shopId: maker.shopId, boardId, straighteningId });
  const loose = letLoose(laid(made.document, SET_ID, made.boardId, 100, 20, 0), "p2");
  if (!loose.ok) throw new Error("front 2 cannot be let loose");
  const single = loose.layout.groups.find(({ pieceIds }) => pieceIds.includes("p2"));
  await save(made, laid(loose.layout, single?.id ?? "", boardId, 200, 80, 2));
  const picture = await drawn(made, 4);
  expectColour(picture.at(10, 10), colourAt(110.125, 30.125, 90));
  // Front 2 begins 70 mm from the left of the face and is turned end for end.
  expectColour(picture.at(75, 10), colourAt(200 + fronts.right - 5.125, 80 + fronts.height - 10.125, 180));
});

test("rows come one above the other with their gap dark", async () => {
  const face = gridFace([umFromMm(60)], [umFromMm(30), umFromMm(20)], umFromMm(4), umFromMm(4), "horizontal");
  const made = await makeLayout(maker, { face, boardMm, at: { x: umFromMm(10), y: umFromMm(50) }, levels: await levelsOf(90) });
  const picture = await drawn(made, 2);
  expect(picture.height).toBe(108);
  expectColour(picture.at(30, 15), colourAt(40.25, 65.25, 130));
  expect(picture.at(30, 32)).toEqual(dark);
  expectColour(picture.at(30, 40), colourAt(40.25, 90.25, 130));
});

test("pictures asked for at the same time come out as when asked for alone", async () => {
  const [one, two] = [await madeOn(90), await madeOn(180)];
  await save(one, laid(one.document, SET_ID, one.boardId, 100, 20, 0));
  await save(two, laid(two.document, SET_ID, two.boardId, 100, 20, 2));
  const alone = [await showSidePng(maker, one.faceId, 2), await showSidePng(maker, two.faceId, 2)];
  const together = await Promise.all([one, two, one, two].map(({ faceId }) => showSidePng(maker, faceId, 2)));
  expect(together).toEqual([alone[0], alone[1], alone[0], alone[1]]);
});

test("a picture that would be too large is refused with its size; a missing file fails without stopping the next", async () => {
  const huge = rowFace([umFromMm(2400), umFromMm(2400)], umFromMm(1800), umFromMm(3), "horizontal");
  const made = await makeLayout(maker, { face: huge, at: null });
  await expect(showSidePng(maker, made.faceId, 4)).rejects.toMatchObject({
    code: "refused",
    message: "At 4 pixels a millimetre the picture would have 19212 × 7200 pixels. Ask for fewer.",
  });
  await expect(showSidePng(maker, made.faceId, 3)).rejects.toMatchObject({ code: "refused" });

  const gone = await makeLayout(maker, { levels: [{ level: 0, key: "tests/show-side/gone.png", widthPx: 9400, heightPx: 840 }] });
  await expect(showSidePng(maker, gone.faceId, 1)).rejects.toThrow("is gone from the storage");
  expect((await drawn(await madeOn(90), 1)).width).toBe(wide);
});

test("another shop finds no face", async () => {
  const made = await madeOn(90);
  const stranger = (await makeShop({ name: "Otherwhere" })).owner;
  await expect(showSidePng(stranger, made.faceId, 1)).rejects.toMatchObject({ code: "not-found" });
});
