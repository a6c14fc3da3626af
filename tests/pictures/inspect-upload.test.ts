import sharp from "sharp";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { closePixelPool, inspectUpload } from "@/lib/server/pictures/pixel-pool";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { grainPixels } from "../support/grain-pixels";

beforeAll(bundlePixelWorker);
afterAll(closePixelPool);

const width = 320;
const height = 200;
const photo = () => sharp(grainPixels(width, height), { raw: { width, height, channels: 3 } });

describe("a file that is taken in", () => {
  test.each([
    ["jpeg", () => photo().jpeg()],
    ["jpeg", () => photo().jpeg({ progressive: true })],
    ["jpeg", () => photo().toColourspace("cmyk").jpeg()],
    ["jpeg", () => photo().greyscale().jpeg()],
    ["png", () => photo().png()],
    ["png", () => photo().toColourspace("rgb16").png()],
    ["png", () => photo().ensureAlpha(0.5).png({ palette: true })],
    ["webp", () => photo().webp()],
    ["webp", () => photo().webp({ lossless: true })],
    ["avif", () => photo().avif({ effort: 0 })],
  ] as const)("is told to be %s with its size", async (kind, make) => {
    expect(await inspectUpload(await make().toBuffer())).toEqual({
      ok: true,
      kind,
      width,
      height,
      orientation: 1,
      takenAt: null,
      camera: null,
      focalLengthMm: null,
    });
  });

  test.each([1, 2, 3, 4, 5, 6, 7, 8])("with EXIF orientation %i has the size of the upright picture", async (orientation) => {
    const outcome = await inspectUpload(await photo().withMetadata({ orientation }).jpeg().toBuffer());
    const upright = orientation >= 5 ? { width: height, height: width } : { width, height };
    expect(outcome).toMatchObject({ ok: true, orientation, ...upright });
  });

  test("tells date, camera and focal length, and nothing else of its tags", async () => {
    const exif = {
      IFD0: { Make: "Kamerawerk", Model: "Kamerawerk <b>K1</b>\u0007", Artist: "Somebody" },
      IFD2: { DateTimeOriginal: "2024:05:06 07:08:09", OffsetTimeOriginal: "+02:00", FocalLength: "26/4" },
      IFD3: { GPSLatitudeRef: "N", GPSLatitude: "51/1 30/1 0/1" },
    };
    for (const make of [
      () => photo().withExif(exif).jpeg(),
      () => photo().withExif(exif).webp(),
      () => photo().withExif(exif).png(),
    ]) {
      expect(await inspectUpload(await make().toBuffer())).toEqual({
        ok: true,
        kind: expect.any(String),
        width,
        height,
        orientation: 1,
        takenAt: "2024-05-06T05:08:09.000Z",
        camera: "Kamerawerk b K1 /b",
        focalLengthMm: 6.5,
      });
    }
  });

  test("may carry a second picture behind the first, as phones append gain maps", async () => {
    const [main, gain] = [await photo().jpeg().toBuffer(), await photo().resize(80).greyscale().jpeg().toBuffer()];
    expect(await inspectUpload(Buffer.concat([main, gain]))).toMatchObject({ ok: true, kind: "jpeg", width, height });
  });
});

describe("a file that is refused", () => {
  const reasonOf = async (bytes: Uint8Array): Promise<unknown> => {
    const outcome = await inspectUpload(bytes);
    return outcome.ok ? "accepted" : outcome.refusal;
  };

  test("empty", async () => {
    expect(await reasonOf(new Uint8Array())).toEqual({ reason: "empty" });
  });

  test("over 40 MB, whatever is in it", async () => {
    const bytes = 40 * 1024 * 1024 + 1;
    expect(await reasonOf(new Uint8Array(bytes))).toEqual({ reason: "too-large", bytes, limitBytes: 41_943_040 });
  });

  test.each([
    ["jpeg", () => photo().jpeg()],
    ["png", () => photo().png()],
    ["webp", () => photo().webp()],
    ["avif", () => photo().avif({ effort: 0 })],
  ] as const)("a %s cut short anywhere", async (_, make) => {
    const whole = await make().toBuffer();
    for (const share of [0.5, 0.9, 0.99]) {
      expect(await reasonOf(whole.subarray(0, Math.floor(whole.length * share)))).toMatchObject({ reason: "truncated" });
    }
  });

  test("a PNG whose data is spoilt in the middle", async () => {
    const bytes = await photo().png().toBuffer();
    const middle = Math.floor(bytes.length / 2);
    bytes.fill(0x55, middle, middle + 64);
    expect(await reasonOf(bytes)).toMatchObject({ reason: "corrupt" });
  });

  test.each(["gif", "tiff"] as const)("a %s", async (format) => {
    expect(await reasonOf(await photo().toFormat(format).toBuffer())).toEqual({ reason: "wrong-type", found: `image/${format}` });
  });

  test.each([
    ["text", "wood"],
    ["SVG", '<svg xmlns="http://www.w3.org/2000/svg" width="10" height="10"><rect width="10" height="10"/></svg>'],
    ["SVG with a declaration", '<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" width="10" height="10"/>'],
    ["PDF", "%PDF-1.7\n1 0 obj\n<<>>\nendobj\n"],
    ["HTML", "<!doctype html><script>alert(1)</script>"],
  ])("%s", async (_, content) => {
    expect(await reasonOf(new TextEncoder().encode(content))).toMatchObject({ reason: "wrong-type" });
  });

  test("an animated WebP", async () => {
    const frames = await sharp([await photo().png().toBuffer(), await photo().negate().png().toBuffer()], {
      join: { animated: true },
    })
      .webp()
      .toBuffer();
    expect(await reasonOf(frames)).toEqual({ reason: "animated" });
  });

  test("an animated PNG, told by its control chunk", async () => {
    const png = await photo().png().toBuffer();
    // acTL (two frames, endless) right behind the header; its checksum is not looked at before the type is known.
    const control = Buffer.from("0000000861" + "63544c" + "0000000200000000" + "f38d9370", "hex");
    expect(await reasonOf(Buffer.concat([png.subarray(0, 33), control, png.subarray(33)]))).toEqual({ reason: "animated" });
  });

  test("over 60 megapixels, from the header alone", async () => {
    const bomb = await sharp({ create: { width: 12_000, height: 5_001, channels: 3, background: "#000" } })
      .png()
      .toBuffer();
    expect(bomb.length).toBeLessThan(1_000_000);
    expect(await reasonOf(bomb)).toEqual({ reason: "too-many-pixels", width: 12_000, height: 5_001, limitPixels: 60_000_000 });
  });
});

describe("the pool", () => {
  test("leaves the thread of requests free meanwhile", async () => {
    const large = await sharp(grainPixels(3000, 2000), { raw: { width: 3000, height: 2000, channels: 3 } })
      .png()
      .toBuffer();
    const work = inspectUpload(large);
    let longest = 0;
    let last = performance.now();
    const timer = setInterval(() => {
      const now = performance.now();
      longest = Math.max(longest, now - last);
      last = now;
    }, 5);
    expect(await work).toMatchObject({ ok: true, width: 3000 });
    clearInterval(timer);
    expect(longest).toBeLessThan(150);
  });

  test("a signal that has fired, before or meanwhile, rejects with its reason", async () => {
    const bytes = await photo().png().toBuffer();
    await expect(inspectUpload(bytes, AbortSignal.abort(new Error("gone")))).rejects.toThrow("gone");
    const controller = new AbortController();
    const work = inspectUpload(bytes, controller.signal);
    controller.abort(new Error("left"));
    await expect(work).rejects.toThrow("left");
    expect(await inspectUpload(bytes)).toMatchObject({ ok: true });
  });
});
