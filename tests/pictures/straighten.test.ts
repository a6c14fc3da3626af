import sharp, { type Sharp } from "sharp";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { type FourCorners, type Marking, umFromMm } from "@/lib/layout";
import { closePixelPool, straighten } from "@/lib/server/pictures/pixel-pool";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";

beforeAll(bundlePixelWorker);
afterAll(closePixelPool);

const photoSize = { width: 1600, height: 1200 };
const board = { length: 500, width: 160 };

/** A camera a little to the left: mm → px, written out so that nothing of the product is needed to draw the photo. */
function seen(x: number, y: number): { x: number; y: number } {
  const depth = 1 + 2e-4 * x - 3e-4 * y;
  return { x: (180 + 2.9 * x - 0.2 * y) / depth, y: (420 + 0.1 * x + 2.6 * y) / depth };
}

/** Back again, by solving the two equations of `seen` for x and y. */
function placed(px: number, py: number): { x: number; y: number } {
  const a = 2.9 - 2e-4 * px;
  const b = -0.2 + 3e-4 * px;
  const c = 0.1 - 2e-4 * py;
  const d = 2.6 + 3e-4 * py;
  const determinant = a * d - b * c;
  return { x: ((px - 180) * d - (py - 420) * b) / determinant, y: (a * (py - 420) - c * (px - 180)) / determinant };
}

/** Soft bands both ways, so that a shift shows along and across. */
const tone = (x: number, y: number): number => 128 + 55 * Math.sin(x / 4) + 55 * Math.sin(y / 3.1);

function drawn(width: number, height: number, mm: (px: number, py: number) => { x: number; y: number }): Uint8Array {
  const data = new Uint8Array(width * height * 3);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const p = mm(x + 0.5, y + 0.5);
      const value = Math.round(tone(p.x, p.y));
      data.set([value, value, value], (y * width + x) * 3);
    }
  }
  return data;
}

const photo = (): Sharp => sharp(drawn(photoSize.width, photoSize.height, placed), { raw: { ...photoSize, channels: 3 } });

const cornersOf = (x: number, y: number, length: number, width: number): FourCorners => [
  seen(x, y),
  seen(x + length, y),
  seen(x + length, y + width),
  seen(x, y + width),
];

const marking: Marking = {
  reference: { kind: "board", length: umFromMm(board.length), width: umFromMm(board.width) },
  corners: cornersOf(0, 0, board.length, board.width),
  extraPoints: [],
  edgePoints: [],
};

async function greyOf(bytes: Uint8Array | undefined): Promise<Uint8Array> {
  return sharp(bytes).greyscale().raw().toBuffer();
}

function meanDifference(a: Uint8Array, b: Uint8Array): number {
  return a.reduce((sum, value, i) => sum + Math.abs(value - (b[i] as number)), 0) / a.length;
}

describe("straighten", () => {
  test("gives the board true to scale, pixel for pixel", async () => {
    const outcome = await straighten({ source: await photo().png().toBuffer(), marking });
    if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
    const { widthPx, heightPx, pxPerMm } = outcome;
    expect([outcome.length, outcome.width]).toEqual([500_000, 160_000]);
    expect([widthPx, heightPx]).toEqual([Math.round(500 * pxPerMm), Math.round(160 * pxPerMm)]);
    const wanted = await greyOf(
      await sharp(
        drawn(widthPx, heightPx, (x, y) => ({ x: x / pxPerMm, y: y / pxPerMm })),
        { raw: { width: widthPx, height: heightPx, channels: 3 } },
      )
        .png()
        .toBuffer(),
    );
    const shifted = await greyOf(
      await sharp(
        drawn(widthPx, heightPx, (x, y) => ({ x: x / pxPerMm + 0.3, y: y / pxPerMm })),
        { raw: { width: widthPx, height: heightPx, channels: 3 } },
      )
        .png()
        .toBuffer(),
    );
    const found = await greyOf(outcome.levels[0]?.bytes);
    expect(meanDifference(found, wanted)).toBeLessThan(1.5);
    expect(meanDifference(found, shifted)).toBeGreaterThan(2);
  });

  test("a turned file with its orientation in EXIF gives the same picture, marked upright", async () => {
    const turned = await sharp(await photo().rotate(90).png().toBuffer())
      .withMetadata({ orientation: 8 })
      .png()
      .toBuffer();
    const [a, b] = [
      await straighten({ source: await photo().png().toBuffer(), marking }),
      await straighten({ source: turned, marking }),
    ];
    if (!a.ok || !b.ok) throw new Error("refused");
    expect(b.levels[0]?.bytes).toEqual(a.levels[0]?.bytes);
  });

  test("measured by a card lying on it, the board has its true size", async () => {
    const reference = {
      kind: "sheet",
      length: umFromMm(120),
      width: umFromMm(80),
      corners: cornersOf(200, 40, 120, 80),
    } as const;
    const outcome = await straighten({ source: await photo().png().toBuffer(), marking: { ...marking, reference } });
    if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
    expect(Math.abs(outcome.length - 500_000)).toBeLessThanOrEqual(1);
    expect(Math.abs(outcome.width - 160_000)).toBeLessThanOrEqual(1);
  });

  test("reports rising progress from 0 to 1", async () => {
    const shares: number[] = [];
    await straighten({ source: await photo().jpeg().toBuffer(), marking, onProgress: (share) => shares.push(share) });
    expect(shares[0]).toBe(0);
    expect(shares.length).toBeGreaterThan(5);
    expect(shares.every((share, i) => i === 0 || share >= (shares[i - 1] as number))).toBe(true);
    expect(shares.at(-1)).toBe(1);
  });

  test("stops when cancelled on the way, and the pool goes on working", async () => {
    const source = await photo().png().toBuffer();
    const controller = new AbortController();
    const shares: number[] = [];
    const work = straighten({
      source,
      marking,
      signal: controller.signal,
      onProgress: (share) => {
        shares.push(share);
        controller.abort(new Error("not wanted any more"));
      },
    });
    await expect(work).rejects.toThrow("not wanted any more");
    expect(shares).toHaveLength(1);
    expect(await straighten({ source, marking })).toMatchObject({ ok: true });
  });

  test("says what is wrong with the marks or with the photo", async () => {
    const [a, b, c, d] = marking.corners;
    expect(await straighten({ source: await photo().png().toBuffer(), marking: { ...marking, corners: [a, c, b, d] } })).toEqual({
      ok: false,
      of: "marks",
      refusal: { reason: "folded", of: "board" },
    });
    const cut = (await photo().jpeg().toBuffer()).subarray(0, 20_000);
    expect(await straighten({ source: cut, marking })).toMatchObject({
      ok: false,
      of: "photo",
      refusal: { reason: "truncated" },
    });
  });
});
