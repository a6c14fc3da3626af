/**
 * The picture of a blank from the straightened pictures of its boards: each board's strip takes whole rows of it, sampled through the
 * board's own map, so that a point of the wood lies where the blank's frame says, to a fraction of a pixel. Works in bands of rows like
 * the warp it is made with. Holds one board's pixels at a time.
 */
import { inverted } from "../frame/combine-isometries";
import type { BlankStrip } from "../stock/blank/blank-strips";
import { mmFromUm, type Um, um } from "../units/um";
import type { Homography } from "./homography";
import { lensOf } from "./lens";
import { largestScale, WANTED_PX_PER_MM } from "./output-scale";
import { type Pixels, warpInBands } from "./warp";

export interface BlankScale {
  readonly pxPerMm: number;
  readonly widthPx: number;
  readonly heightPx: number;
}

/** One scale for all: that of the coarsest picture, so that none is enlarged, and no more than memory allows. Whole thousandths. */
export function blankScale(length: Um, width: Um, pxPerMmOfMembers: readonly number[]): BlankScale {
  const [lengthMm, widthMm] = [mmFromUm(length), mmFromUm(width)];
  const most = Math.min(WANTED_PX_PER_MM, largestScale(lengthMm, widthMm), ...pxPerMmOfMembers);
  const pxPerMm = Math.max(0.001, Math.floor(most * 1000) / 1000);
  return {
    pxPerMm,
    widthPx: Math.max(1, Math.round(lengthMm * pxPerMm)),
    heightPx: Math.max(1, Math.round(widthMm * pxPerMm)),
  };
}

/** A board's straightened picture, or a smaller level of it. */
export interface MemberPicture {
  readonly pixels: Pixels;
  readonly pxPerMmAlong: number;
  readonly pxPerMmAcross: number;
}

/** Where no board lies: a tone that no wood has. */
const GROUND = 128;
const ZERO = um(0);

/** Paints the strip at `index` of all strips, and yields the share of it done (0..1] after each band. */
export function* paintStrip(
  picture: Pixels,
  pxPerMm: number,
  strips: readonly Pick<BlankStrip, "blankFromMember" | "rect">[],
  index: number,
  member: MemberPicture,
): Generator<number, void, void> {
  const strip = strips[index];
  if (!strip) throw new RangeError(`there is no strip ${index}`);
  const { from, to } = rowsOf(strips, index, picture.height, pxPerMm);
  const row = picture.width * picture.channels;
  const own: Pixels = { ...picture, data: picture.data.subarray(from * row, to * row), height: to - from };
  const lens = lensOf(member.pixels, 0);
  yield* warpInBands(member.pixels, own, { flatFromPicture: memberFromPicture(strip, from, pxPerMm, member), lens });
  blankOutside(own, strip, pxPerMm);
}

/** Rows whose middle lies on the strip; the outer strips take what rounding adds. */
function rowsOf(strips: readonly Pick<BlankStrip, "rect">[], index: number, height: number, pxPerMm: number) {
  const firstRow = (y: Um) => Math.min(height, Math.max(0, Math.ceil(mmFromUm(y) * pxPerMm - 0.5)));
  const next = strips[index + 1];
  return {
    from: index === 0 ? 0 : firstRow(strips[index]?.rect.y ?? ZERO),
    to: next ? firstRow(next.rect.y) : height,
  };
}

/** Pixels of the board's picture from pixels of the strip's rows; both count from the outer corner of their first pixel. */
function memberFromPicture(
  { blankFromMember }: Pick<BlankStrip, "blankFromMember">,
  firstRow: number,
  pxPerMm: number,
  { pxPerMmAlong, pxPerMmAcross }: MemberPicture,
): Homography {
  const { a, b, c, d, tx, ty } = inverted(blankFromMember);
  const [along, across] = [pxPerMmAlong / pxPerMm, pxPerMmAcross / pxPerMm];
  return [
    along * a,
    along * c,
    along * c * firstRow + (pxPerMmAlong * tx) / 1000,
    across * b,
    across * d,
    across * d * firstRow + (pxPerMmAcross * ty) / 1000,
    0,
    0,
    1,
  ];
}

/** The warp goes on with the rim's colour beyond the board; there is no wood. */
function blankOutside({ data, width, height, channels }: Pixels, { rect }: Pick<BlankStrip, "rect">, pxPerMm: number): void {
  const left = Math.max(0, Math.ceil(mmFromUm(rect.x) * pxPerMm - 0.5));
  const right = Math.min(width, Math.ceil((mmFromUm(rect.x) + mmFromUm(rect.width)) * pxPerMm - 0.5));
  for (let y = 0; y < height; y++) {
    const start = y * width * channels;
    data.fill(GROUND, start, start + left * channels);
    data.fill(GROUND, start + right * channels, start + width * channels);
  }
}
