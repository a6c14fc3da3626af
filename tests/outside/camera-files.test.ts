/** Files of real cameras and of other projects' test suites, where the folder ../shared lies beside the project. */
import fs from "node:fs";
import path from "node:path";
import sharp from "sharp";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { closePixelPool, inspectUpload, makeUpright } from "@/lib/server/pictures/pixel-pool";
import type { UprightOutcome } from "@/lib/server/pictures/upright";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";

const folder = path.resolve(process.cwd(), "../shared/photos/camera");
const present = fs.existsSync(folder);
const read = (name: string): Uint8Array => fs.readFileSync(path.join(folder, name));

async function accepted(name: string): Promise<Extract<UprightOutcome, { ok: true }>> {
  const outcome = await makeUpright(read(name));
  if (!outcome.ok) throw new Error(`${name}: ${JSON.stringify(outcome.refusal)}`);
  return outcome;
}

describe.skipIf(!present)(present ? "camera files" : "camera files (skipped: ../shared/photos/camera is not there)", () => {
  beforeAll(bundlePixelWorker);
  afterAll(closePixelPool);

  describe("EXIF orientation", () => {
    const thumbnail = async (name: string): Promise<{ width: number; height: number; grey: Uint8Array }> => {
      const { levels, width, height } = await accepted(name);
      const grey = await sharp(levels[0]?.bytes).greyscale().resize(48, 48, { fit: "fill" }).raw().toBuffer();
      return { width, height, grey };
    };
    const meanDifference = (a: Uint8Array, b: Uint8Array): number =>
      a.reduce((sum, value, i) => sum + Math.abs(value - (b[i] as number)), 0) / a.length;

    test.each([0, 2, 3, 5, 6, 8])("Landscape_%i shows the same picture as Landscape_1", async (orientation) => {
      const [plain, turned] = [
        await thumbnail("orientation/Landscape_1.jpg"),
        await thumbnail(`orientation/Landscape_${orientation}.jpg`),
      ];
      expect([turned.width, turned.height]).toEqual([1800, 1200]);
      // Recoded JPEGs of one scene differ by about a level; a wrong turn by tens.
      expect(meanDifference(plain.grey, turned.grey)).toBeLessThan(3);
    });

    test.each([6, 8])("Portrait_%i shows the same picture as Portrait_3", async (orientation) => {
      const [plain, turned] = [
        await thumbnail("orientation/Portrait_3.jpg"),
        await thumbnail(`orientation/Portrait_${orientation}.jpg`),
      ];
      expect([turned.width, turned.height]).toEqual([1200, 1800]);
      expect(meanDifference(plain.grey, turned.grey)).toBeLessThan(3);
    });
  });

  test.each([
    "gps/pillow_exif_gps.jpg",
    "gps/pillow_empty_gps_ifd.jpg",
    "variants/pillow_sugarshack.mpo",
    "avif/pillow_exif.avif",
  ])("nothing of %s' tags is in what is served", async (name) => {
    for (const { bytes } of (await accepted(name)).levels) {
      const { exif, xmp, iptc, icc } = await sharp(bytes).metadata();
      expect({ exif, xmp, iptc, icc }).toEqual({ exif: undefined, xmp: undefined, iptc: undefined, icc: undefined });
      for (const mark of ["Exif", "GPS", "http://ns.adobe.com", "MPF", "Photoshop"]) {
        expect(Buffer.from(bytes).includes(mark), mark).toBe(false);
      }
    }
  });

  test.each([
    ["heic/libheif_example.heic", "heic", 1280, 854],
    ["heic/libheif_rainbow-451x461.heic", "heic", 451, 461],
    ["avif/pillow_exif.avif", "avif", 512, 512],
    ["variants/image-rs_progressive_test.jpg", "jpeg", 32, 23],
    ["variants/pillow_pil_sample_cmyk.jpg", "jpeg", 100, 100],
    ["variants/pillow_icc_profile_big.jpg", "jpeg", 425, 250],
    ["variants/pillow_sugarshack.mpo", "jpeg", 640, 480],
    ["variants/sharp_testimgl.jpg", "jpeg", 227, 149],
    ["png/image-rs_basn2c16.png", "png", 32, 32],
    ["png/sharp_swiss.png", "png", 68, 68],
    ["png/pillow_unknown_compression_method.png", "png", 57, 57],
    ["corrupt/pillow_invalid-exif.jpg", "jpeg", 200, 200],
  ] as const)("%s is taken in as %s", async (name, kind, width, height) => {
    const outcome = await accepted(name);
    expect(outcome).toMatchObject({ kind, width, height });
    // More than one colour: a decoder that gives an empty sheet has not decoded.
    const { channels } = await sharp(outcome.levels[0]?.bytes).stats();
    expect(Math.max(...channels.map(({ stdev }) => stdev))).toBeGreaterThan(0.5);
  });

  test("Display P3 red becomes sRGB red", async () => {
    const { data } = await sharp((await accepted("png/sharp_p3.png")).levels[0]?.bytes)
      .raw()
      .toBuffer({ resolveWithObject: true });
    // Stored as (241, 0, 0) in P3. JPEG keeps plain colours to a level or two.
    expect(data[0]).toBeGreaterThanOrEqual(252);
  });

  test("a HEIC cut short is refused as truncated", async () => {
    const whole = read("heic/libheif_example.heic");
    for (const share of [0.3, 0.7, 0.95]) {
      const outcome = await inspectUpload(whole.subarray(0, Math.floor(whole.length * share)));
      expect(outcome).toMatchObject({ ok: false, refusal: { reason: "truncated" } });
    }
  });

  test.each([
    ["bombs/sharp_giant-image.jpg", "too-many-pixels"],
    ["bombs/sharp_65536-uint32-limit.png", "too-many-pixels"],
    ["bombs/pillow_decompression_bomb.gif", "wrong-type"],
    ["corrupt/sharp_truncated.jpg", "truncated"],
    ["corrupt/pillow_truncated_jpeg.jpg", "truncated"],
    ["corrupt/sharp_corrupt-header.jpg", "truncated"],
    // An Ultra HDR header whose picture data ends after 14 bytes.
    ["variants/pillow_ultrahdr.jpg", "truncated"],
    ["corrupt/pillow_broken_data_stream.png", "corrupt"],
    ["corrupt/pillow_hopper_bad_exif.jpg", "corrupt"],
    ["corrupt/pillow_broken.png", "wrong-type"],
  ] as const)("%s is refused as %s", async (name, reason) => {
    const started = performance.now();
    expect(await inspectUpload(read(name))).toMatchObject({ ok: false, refusal: { reason } });
    expect(performance.now() - started).toBeLessThan(5_000);
  });
});
