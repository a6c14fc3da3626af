/** Only the part of the photograph that the board fills is decoded, and no finer than the picture: the picture lies where it would lie. */
import sharp, { type Sharp } from "sharp";
import { beforeAll, expect, test } from "vitest";
import { type FourCorners, type Marking, umFromMm } from "@/lib/layout";
import { straightenInThread } from "@/lib/server/pictures/straighten";

/** mm → px, a little oblique; `fine` px per mm. */
const seen = (fine: number, x: number, y: number) => {
  const depth = 1 + 4e-4 * x - 5e-4 * y;
  return { x: (500 + fine * (x - 0.06 * y)) / depth, y: (400 + fine * (0.05 * x + y)) / depth };
};

function placed(fine: number, px: number, py: number) {
  const [a, b, c, d] = [fine - 4e-4 * px, -0.06 * fine + 5e-4 * px, 0.05 * fine - 4e-4 * py, fine + 5e-4 * py];
  const determinant = a * d - b * c;
  return { x: ((px - 500) * d - (py - 400) * b) / determinant, y: (a * (py - 400) - c * (px - 500)) / determinant };
}

const tone = (x: number, y: number): number => 128 + 50 * Math.sin(x / 1.7) + 50 * Math.sin(y / 1.3);

function drawn(width: number, height: number, mm: (px: number, py: number) => { x: number; y: number }): Buffer {
  const data = Buffer.alloc(width * height * 3);
  for (let y = 0, i = 0; y < height; y++) {
    for (let x = 0; x < width; x++, i += 3) {
      const at = mm(x + 0.5, y + 0.5);
      data.fill(Math.round(tone(at.x, at.y)), i, i + 3);
    }
  }
  return data;
}

const size = { width: 2400, height: 1500 };
const board = { length: 140, width: 70 };

const photoOf = (fine: number): Sharp =>
  sharp(
    drawn(size.width, size.height, (x, y) => placed(fine, x, y)),
    { raw: { ...size, channels: 3 } },
  );

function markingOf(fine: number): Marking {
  const corners: FourCorners = [
    seen(fine, 0, 0),
    seen(fine, board.length, 0),
    seen(fine, board.length, board.width),
    seen(fine, 0, board.width),
  ];
  const reference = { kind: "board", length: umFromMm(board.length), width: umFromMm(board.width) } as const;
  return { reference, corners, extraPoints: [], edgePoints: [] };
}

/** How far the picture lies from where it belongs, px, along and across: the least squares of its differences over its slopes. */
async function shiftOf(bytes: Uint8Array | undefined, width: number, height: number, pxPerMm: number) {
  const found = await sharp(bytes).extractChannel(1).raw().toBuffer();
  const wanted = (x: number, y: number) => tone((x + 0.5) / pxPerMm, (y + 0.5) / pxPerMm);
  const sums = { x: 0, xx: 0, y: 0, yy: 0 };
  for (let y = 2; y < height - 2; y++) {
    for (let x = 2; x < width - 2; x++) {
      const off = (found[y * width + x] as number) - wanted(x, y);
      const slopeX = (wanted(x + 1, y) - wanted(x - 1, y)) / 2;
      const slopeY = (wanted(x, y + 1) - wanted(x, y - 1)) / 2;
      sums.x += off * slopeX;
      sums.xx += slopeX * slopeX;
      sums.y += off * slopeY;
      sums.yy += slopeY * slopeY;
    }
  }
  return { x: -sums.x / sums.xx, y: -sums.y / sums.yy };
}

test.each([
  ["as fine as the picture", 4.1],
  ["half as fine again", 6.2],
  ["three times as fine", 12.3],
])("a photograph %s gives a picture that is off by less than a fiftieth of a pixel", async (_, fine) => {
  const outcome = await straightenInThread(
    await photoOf(fine).png({ compressionLevel: 0 }).toBuffer(),
    markingOf(fine),
    () => {},
  );
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
  const { widthPx, heightPx, pxPerMm, levels } = outcome;
  expect(pxPerMm).toBe(4);
  const shift = await shiftOf(levels[0]?.bytes, widthPx, heightPx, pxPerMm);
  expect(Math.hypot(shift.x, shift.y)).toBeLessThan(0.02);
});

/** The upright picture as it is stored under an orientation (EXIF 2.3, tag 274), one step after the other. */
async function turnedBack(upright: Buffer, orientation: number): Promise<Buffer> {
  const steps: Readonly<Record<number, readonly ((image: Sharp) => Sharp)[]>> = {
    2: [(image) => image.flop()],
    3: [(image) => image.rotate(180)],
    4: [(image) => image.flip()],
    5: [(image) => image.rotate(90), (image) => image.flop()],
    6: [(image) => image.rotate(270)],
    7: [(image) => image.rotate(270), (image) => image.flop()],
    8: [(image) => image.rotate(90)],
  };
  let stored = upright;
  for (const step of steps[orientation] ?? []) stored = await step(sharp(stored)).png({ compressionLevel: 0 }).toBuffer();
  return stored;
}

const half = 6.2;
let upright: Buffer;
let wanted: Buffer;
beforeAll(async () => {
  upright = await photoOf(half).png({ compressionLevel: 0 }).toBuffer();
  wanted = await fullLevel(upright);
});

test.each([2, 3, 4, 5, 6, 7, 8])(
  "a photograph stored in orientation %i gives the bytes of the upright one",
  async (orientation) => {
    const stored = await turnedBack(upright, orientation);
    const turned = await sharp(stored).withMetadata({ orientation }).png({ compressionLevel: 0 }).toBuffer();
    expect(Buffer.compare(await fullLevel(turned), wanted)).toBe(0);
  },
);

async function fullLevel(file: Buffer): Promise<Buffer> {
  const outcome = await straightenInThread(file, markingOf(half), () => {});
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
  return Buffer.from(outcome.levels[0]?.bytes as Uint8Array);
}
