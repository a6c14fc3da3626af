/** The picture of a blank shows every board's wood where the blank's frame says, measured with patterns drawn by formula. */
import sharp from "sharp";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { blankStrips, type PlacedMember, umFromMm } from "@/lib/layout";
import type { MemberRequest } from "@/lib/server/pictures/compose";
import { closePixelPool, compose } from "@/lib/server/pictures/pixel-pool";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";

beforeAll(bundlePixelWorker, 60_000);
afterAll(closePixelPool);

/** Soft bands both ways in the board's own millimetres, another pitch for every board. */
const toneOf = (board: number) => (x: number, y: number) =>
  128 + 50 * Math.sin(x / (4 + board)) + 50 * Math.sin(y / (3 + 0.7 * board));

interface Board extends PlacedMember {
  readonly pxPerMm: number;
  readonly tone: (x: number, y: number) => number;
}

const board = (index: number, lengthMm: number, widthMm: number, pxPerMm: number, more: Partial<PlacedMember> = {}): Board => ({
  id: `board ${index}`,
  length: umFromMm(lengthMm),
  width: umFromMm(widthMm),
  endForEnd: false,
  along: umFromMm(0),
  trim: { upper: umFromMm(0), lower: umFromMm(0) },
  ...more,
  pxPerMm,
  tone: toneOf(index),
});

/** As a straightened picture is: a whole number of pixels over the board, the scale exact from the outer corner of the first. */
async function pictureOf({ length, width, pxPerMm, tone }: Board): Promise<Uint8Array> {
  const [columns, rows] = [Math.round((length / 1000) * pxPerMm), Math.round((width / 1000) * pxPerMm)];
  const data = new Uint8Array(columns * rows * 3);
  for (let y = 0; y < rows; y++) {
    for (let x = 0; x < columns; x++) {
      const value = Math.round(tone((x + 0.5) / pxPerMm, (y + 0.5) / pxPerMm));
      data.fill(value, (y * columns + x) * 3, (y * columns + x) * 3 + 3);
    }
  }
  return sharp(data, { raw: { width: columns, height: rows, channels: 3 } })
    .png()
    .toBuffer();
}

const jointing = umFromMm(1.37);
const boards = [
  board(0, 300, 71.3, 3.6, { trim: { upper: umFromMm(2.6), lower: umFromMm(0) } }),
  board(1, 290.4, 60, 4, { endForEnd: true, along: umFromMm(17.3) }),
  board(2, 310, 55.5, 3.7, { along: umFromMm(-4.15) }),
];

function layoutOf() {
  const outcome = blankStrips({ members: boards, jointing });
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
  return outcome.layout;
}

async function requests(): Promise<MemberRequest[]> {
  const { strips } = layoutOf();
  return Promise.all(
    boards.map(async (one, index) => {
      const strip = strips[index];
      if (!strip) throw new Error("no strip");
      const { pxPerMm } = one;
      return { bytes: await pictureOf(one), pxPerMmAlong: pxPerMm, pxPerMmAcross: pxPerMm, fullPxPerMm: pxPerMm, strip };
    }),
  );
}

/** Written out by hand: where a point of the blank lies on each of the three boards, mm. Strips are as high as what is left of the boards. */
const strips = [
  { top: 0, height: 71.3 - 2.6 - 1.37, left: 4.15, length: 300 },
  { top: 67.33, height: 60 - 2 * 1.37, left: 21.45, length: 290.4 },
  { top: 67.33 + 57.26, height: 55.5 - 1.37, left: 0, length: 310 },
] as const;
const own = [
  (x: number, y: number) => [x - 4.15, y + 2.6],
  (x: number, y: number) => [290.4 - (x - 21.45), 60 - (y - 67.33 + 1.37)],
  (x: number, y: number) => [x, y - 124.59 + 1.37],
] as const;

/** The mean difference in tone between the picture and the boards' own patterns shifted by so many pixels. */
function difference(grey: Uint8Array, width: number, pxPerMm: number, index: number, shiftX: number, shiftY: number): number {
  const [strip, place, tone] = [strips[index], own[index], boards[index]?.tone];
  if (!strip || !place || !tone) throw new Error("no board");
  let [sum, count] = [0, 0];
  // A few pixels off every edge, where bilinear samples stay on the board.
  const [fromY, toY] = [Math.ceil((strip.top + 1.5) * pxPerMm), Math.floor((strip.top + strip.height - 1.5) * pxPerMm)];
  const [fromX, toX] = [Math.ceil((strip.left + 1.5) * pxPerMm), Math.floor((strip.left + strip.length - 1.5) * pxPerMm)];
  for (let y = fromY; y < toY; y += 3) {
    for (let x = fromX; x < toX; x += 3) {
      const [u = 0, v = 0] = place((x + 0.5 + shiftX) / pxPerMm, (y + 0.5 + shiftY) / pxPerMm);
      sum += Math.abs((grey[y * width + x] ?? 0) - tone(u, v));
      count += 1;
    }
  }
  return sum / count;
}

describe("composing", () => {
  test("shows each board's wood at its place to within half a pixel, turned and shifted as planned, at the coarsest board's scale", async () => {
    const { length, width } = layoutOf();
    const { pxPerMm, widthPx, heightPx, levels } = await compose({ length, width, members: await requests() }, {});
    expect(pxPerMm).toBe(3.6);
    expect([widthPx, heightPx]).toEqual([Math.round((length / 1000) * 3.6), Math.round((width / 1000) * 3.6)]);
    const grey = await sharp(levels[0]?.bytes).greyscale().raw().toBuffer();
    for (const index of [0, 1, 2]) {
      const here = difference(grey, widthPx, pxPerMm, index, 0, 0);
      const shifts = [
        [0.5, 0],
        [-0.5, 0],
        [0, 0.5],
        [0, -0.5],
      ] as const;
      const off = shifts.map(([x, y]) => difference(grey, widthPx, pxPerMm, index, x, y));
      // Half a pixel one way or the other is plainly worse, so the place is nearer than that to where it should be: by a good deal.
      expect(Math.min(...off) / here).toBeGreaterThan(1.8);
      expect(here).toBeLessThan(2);
    }
  });

  test("shows no wood where no board lies, and the last of its own beside it", async () => {
    const { length, width } = layoutOf();
    const { pxPerMm, widthPx, heightPx, levels } = await compose({ length, width, members: await requests() }, {});
    const { data } = await sharp(levels[0]?.bytes).raw().toBuffer({ resolveWithObject: true });
    const at = (xMm: number, yMm: number) => data[(Math.floor(yMm * pxPerMm) * widthPx + Math.floor(xMm * pxPerMm)) * 3] ?? 0;
    for (const y of [80, 95, 110]) {
      expect(Math.abs(at(10, y) - 128)).toBeLessThan(6);
      expect(Math.abs(at(21.45 - 1.5, y) - 128)).toBeLessThan(12);
    }
    expect(heightPx).toBe(Math.round((width / 1000) * pxPerMm));
  });

  test("reports rising progress, and stops when cancelled, with the pool going on", async () => {
    const { length, width } = layoutOf();
    const members = await requests();
    const shares: number[] = [];
    await compose({ length, width, members }, { onProgress: (share) => shares.push(share) });
    expect(shares.length).toBeGreaterThan(5);
    expect(shares.every((share, i) => i === 0 || share >= (shares[i - 1] ?? 0))).toBe(true);
    expect(shares.at(-1)).toBe(1);
    const controller = new AbortController();
    const stopped = compose(
      { length, width, members },
      { signal: controller.signal, onProgress: () => controller.abort(new Error("not wanted any more")) },
    );
    await expect(stopped).rejects.toThrow("not wanted any more");
    expect((await compose({ length, width, members }, {})).levels.length).toBeGreaterThan(0);
  });
});
