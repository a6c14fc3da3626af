import sharp, { type Sharp } from "sharp";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { closePixelPool, makeUpright } from "@/lib/server/pictures/pixel-pool";
import { pngWithProfile } from "@/lib/server/pictures/tag-profile";
import type { UprightOutcome } from "@/lib/server/pictures/upright";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { grainPixels } from "../support/grain-pixels";

beforeAll(bundlePixelWorker);
afterAll(closePixelPool);

async function made(bytes: Uint8Array): Promise<Extract<UprightOutcome, { ok: true }>> {
  const outcome = await makeUpright(bytes);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
  return outcome;
}

async function pixelsOf(
  outcome: Extract<UprightOutcome, { ok: true }>,
): Promise<{ data: Buffer; width: number; height: number }> {
  const { data, info } = await sharp(outcome.levels[0]?.bytes).raw().toBuffer({ resolveWithObject: true });
  return { data, width: info.width, height: info.height };
}

/** Red, green, blue and white quarters, clockwise from the top left; one quarter tells every turn and mirroring from the others. */
const quarters = (): Sharp => {
  const width = 64;
  const height = 48;
  const data = new Uint8Array(width * height * 3);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const colour =
        y < height / 2 ? (x < width / 2 ? [220, 20, 20] : [20, 200, 20]) : x < width / 2 ? [250, 250, 250] : [20, 20, 220];
      data.set(colour, (y * width + x) * 3);
    }
  }
  return sharp(data, { raw: { width, height, channels: 3 } });
};

/** How to store an upright picture so that each orientation's turn leads back to it (EXIF 2.32, tag 0x0112). */
const stored: Readonly<Record<number, (picture: Sharp) => Sharp>> = {
  1: (p) => p,
  2: (p) => p.flop(),
  3: (p) => p.rotate(180),
  4: (p) => p.flip(),
  6: (p) => p.rotate(270),
  8: (p) => p.rotate(90),
};

describe("the upright picture", () => {
  test.each(Object.keys(stored).map(Number))("of EXIF orientation %i is the same as of orientation 1", async (orientation) => {
    const turn = stored[orientation];
    if (turn === undefined) throw new Error("no such orientation");
    const turned = await turn(quarters()).png().toBuffer();
    const { data, width, height } = await pixelsOf(
      await made(await sharp(turned).withMetadata({ orientation }).png().toBuffer()),
    );
    expect([width, height]).toEqual([64, 48]);
    const at = (x: number, y: number): number[] => [...data.subarray((y * width + x) * 3, (y * width + x) * 3 + 3)];
    const near = (colour: number[], wanted: number[]): void => {
      for (const [i, value] of colour.entries()) expect(Math.abs(value - (wanted[i] as number))).toBeLessThan(12);
    };
    near(at(16, 12), [220, 20, 20]);
    near(at(48, 12), [20, 200, 20]);
    near(at(48, 36), [20, 20, 220]);
    near(at(16, 36), [250, 250, 250]);
  });

  test.each([5, 7])("of EXIF orientation %i is turned over its diagonal", async (orientation) => {
    // 5 is stored as the transpose, 7 as the transverse.
    const onItsSide = await quarters().rotate(90).png().toBuffer();
    const turned = orientation === 5 ? sharp(onItsSide).flop() : sharp(onItsSide).flip();
    const { data, width } = await pixelsOf(await made(await turned.withMetadata({ orientation }).png().toBuffer()));
    expect(width).toBe(64);
    expect(data[(12 * width + 16) * 3]).toBeGreaterThan(200);
    expect(data[(12 * width + 48) * 3 + 1]).toBeGreaterThan(180);
    expect(data[(36 * width + 48) * 3 + 2]).toBeGreaterThan(200);
  });

  test("comes in halves down to about 600 px, each a JPEG of its size", async () => {
    const photo = sharp(grainPixels(3000, 1800), { raw: { width: 3000, height: 1800, channels: 3 } });
    const { levels } = await made(await photo.jpeg().toBuffer());
    expect(levels.map(({ level, widthPx, heightPx }) => [level, widthPx, heightPx])).toEqual([
      [0, 3000, 1800],
      [1, 1500, 900],
      [2, 750, 450],
      [3, 375, 225],
    ]);
    for (const { bytes, widthPx, heightPx } of levels) {
      expect(await sharp(bytes).metadata()).toMatchObject({ format: "jpeg", width: widthPx, height: heightPx, space: "srgb" });
    }
  });

  test("holds no tag of the original: no place, no name, no profile", async () => {
    const tagged = await sharp(grainPixels(200, 100), { raw: { width: 200, height: 100, channels: 3 } })
      .withExif({
        IFD0: { Artist: "Somebody Private", ImageDescription: "kitchen of Somebody Private" },
        IFD3: { GPSLatitudeRef: "N", GPSLatitude: "51/1 30/1 0/1", GPSLongitudeRef: "W", GPSLongitude: "0/1 7/1 0/1" },
      })
      .withXmp('<x:xmpmeta xmlns:x="adobe:ns:meta/"><note>Somebody Private</note></x:xmpmeta>')
      .withIccProfile("p3")
      .jpeg()
      .toBuffer();
    expect(tagged.includes("Somebody Private")).toBe(true);
    for (const { bytes } of (await made(tagged)).levels) {
      const { exif, xmp, icc, iptc } = await sharp(bytes).metadata();
      expect([exif, xmp, icc, iptc]).toEqual([undefined, undefined, undefined, undefined]);
      for (const trace of ["Somebody", "Exif", "GPS", "adobe", "ICC_PROFILE"])
        expect(Buffer.from(bytes).includes(trace)).toBe(false);
    }
  });

  test("shows the colours a wide-gamut profile means", async () => {
    const wanted = { r: 170, g: 120, b: 70 };
    const wide = await sharp({ create: { width: 32, height: 32, channels: 3, background: wanted } })
      .withIccProfile("p3")
      .png()
      .toBuffer();
    const bare = await sharp(wide).keepIccProfile().raw().toBuffer();
    const { data } = await pixelsOf(await made(wide));
    for (const [i, value] of [wanted.r, wanted.g, wanted.b].entries())
      expect(Math.abs((data[i] as number) - value)).toBeLessThanOrEqual(2);
    // The same numbers taken without their profile would be visibly duller.
    expect(Math.abs((bare[0] as number) - wanted.r)).toBeGreaterThan(4);
  });

  test("of a profile put on bare pixels, as phone pictures need it, is the same", async () => {
    const wanted = [170, 120, 70, 255];
    const wide = sharp({
      create: { width: 8, height: 8, channels: 4, background: { r: 170, g: 120, b: 70, alpha: 1 } },
    }).withIccProfile("p3");
    const file = await wide.png().toBuffer();
    const { icc } = await sharp(file).metadata();
    if (icc === undefined) throw new Error("no profile");
    const bare = await sharp(file).keepIccProfile().ensureAlpha().raw().toBuffer();
    const { data } = await pixelsOf(await made(await pngWithProfile(bare, 8, 8, icc)));
    for (const [i, value] of wanted.slice(0, 3).entries()) expect(Math.abs((data[i] as number) - value)).toBeLessThanOrEqual(2);
  });

  test("of a picture with holes has white behind it", async () => {
    const clear = await sharp({ create: { width: 16, height: 16, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } })
      .png()
      .toBuffer();
    expect([...(await pixelsOf(await made(clear))).data.subarray(0, 3)]).toEqual([255, 255, 255]);
  });

  test("of 16 bits keeps its tones in 8", async () => {
    const deep = await sharp(grainPixels(64, 64), { raw: { width: 64, height: 64, channels: 3 } })
      .toColourspace("rgb16")
      .png()
      .toBuffer();
    expect((await sharp(deep).metadata()).depth).toBe("ushort");
    const { data } = await pixelsOf(await made(deep));
    const off = grainPixels(64, 64).map((value, i) => Math.abs(value - (data[i] as number)));
    expect(off.reduce((sum, value) => sum + value, 0) / off.length).toBeLessThan(8);
  });

  test("is not made of what is no picture", async () => {
    expect(await makeUpright(new TextEncoder().encode("oak"))).toEqual({
      ok: false,
      refusal: { reason: "wrong-type", found: null },
    });
  });
});
