/** The profile of a face across the grain, from its straightened picture: the mean luminance of a stretch, from edge to edge. */
import type { Pixels } from "../../picture/pixels";
import type { Um } from "../../units/um";
import type { AcrossProfile } from "./lean-from-faces";

/** Weights of the primaries by Rec. ITU-R BT.709, taken on the display values as they are. */
const LUMINANCE = [0.2126, 0.7152, 0.0722] as const;

/**
 * `along`: the stretch of the board that is averaged, µm from its left end. Where the grain wanders a short one shows the lines
 * sharper. Throws on a stretch beside the picture.
 */
export function acrossProfile(pixels: Pixels, pxPerMm: number, along: { readonly from: Um; readonly to: Um }): AcrossProfile {
  const { data, width, height, channels } = pixels;
  const from = Math.max(0, Math.floor((along.from / 1000) * pxPerMm));
  const to = Math.min(width, Math.ceil((along.to / 1000) * pxPerMm));
  if (!(from < to)) throw new RangeError(`no pixels from ${along.from} to ${along.to} µm`);
  const values = Array.from({ length: height }, (_, row) => {
    let sum = 0;
    for (let column = from; column < to; column++) {
      const at = (row * width + column) * channels;
      for (const [channel, weight] of LUMINANCE.entries()) sum += weight * (data[at + channel] ?? 0);
    }
    return sum / (to - from);
  });
  return { values, stepUm: 1000 / pxPerMm };
}
