/** The main path with a photograph of a board that the sawmill made. */
import sharp from "sharp";
import { photographBoard } from "../../lib/sawmill/photograph-board";
import { test } from "./support/test";
import { walkTheWholePath } from "./support/whole-path";

test("from a photograph to a cut order ticked off at the bench", async ({ browser, page, shop }) => {
  test.setTimeout(240_000);
  const [lengthMm, widthMm] = [1200, 160];
  const { rgb, width, height, truth } = photographBoard({
    species: "walnut",
    cut: "flat",
    lengthMm,
    widthMm,
    seed: 11,
    photo: { widthPx: 1800, heightPx: 1000 },
  });
  const buffer = await sharp(rgb, { raw: { width, height, channels: 3 } })
    .jpeg({ quality: 88 })
    .toBuffer();
  await walkTheWholePath(browser, page, shop, {
    name: "walnut.jpg",
    mimeType: "image/jpeg",
    buffer,
    species: "Black walnut",
    lengthMm,
    widthMm,
    cornersPx: truth.cornersPx.map(([x, y]) => ({ x, y })),
  });
});
