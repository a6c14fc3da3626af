/** The main path with photographs that do not ship with the project. */
import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { z } from "zod";
import { test } from "../e2e/support/test";
import { walkTheWholePath } from "../e2e/support/whole-path";

const photos = path.resolve(import.meta.dirname, "../../../shared/photos");
const truthFile = path.join(photos, "truth/walnut-flat.json");
const softwoodFile = path.join(photos, "boards/softwood-a.jpg");
const truthSchema = z.object({
  size_mm: z.tuple([z.number(), z.number()]),
  corners_px: z.array(z.tuple([z.number(), z.number()])).length(4),
});

test.describe("with photographs from outside", () => {
  test.skip(!existsSync(truthFile), `skipped: ${path.relative(process.cwd(), photos)} is not there`);
  test.setTimeout(300_000);

  test("a camera's photograph with known corners goes all the way", async ({ browser, page, shop }) => {
    const truth = truthSchema.parse(JSON.parse(readFileSync(truthFile, "utf8")));
    const [lengthMm, widthMm] = truth.size_mm;
    await walkTheWholePath(browser, page, shop, {
      name: "walnut-flat.jpg",
      mimeType: "image/jpeg",
      buffer: readFileSync(path.join(photos, "truth/walnut-flat.jpg")),
      species: "Black walnut",
      lengthMm,
      widthMm,
      cornersPx: truth.corners_px.map(([x, y]) => ({ x, y })),
    });
  });

  test("a real softwood board that fills its picture goes all the way", async ({ browser, page, shop }) => {
    const buffer = readFileSync(softwoodFile);
    const { default: sharp } = await import("sharp");
    const { width = 0, height = 0 } = await sharp(buffer).metadata();
    await walkTheWholePath(browser, page, shop, {
      name: "softwood-a.jpg",
      mimeType: "image/jpeg",
      buffer,
      species: "Spruce",
      // The true scale of this picture is unknown; its notes ask to take it as 1090 × 200 mm.
      lengthMm: 1090,
      widthMm: 200,
      cornersPx: [
        { x: 0, y: 0 },
        { x: width, y: 0 },
        { x: width, y: height },
        { x: 0, y: height },
      ],
    });
  });
});
