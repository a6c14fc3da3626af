/** The colour of the wood beside an edge. */
import { type EdgeMap, SAMPLE_MM } from "./edge-patch";
import type { MeanColour } from "./seam-reading";
import type { StockPicture } from "./stock-picture";
import type { Stretch } from "./stretch-inside";

/** Light of every sRGB byte, 0…1 (IEC 61966-2-1). Light adds up, display values do not. */
const lightOfByte = Float64Array.from({ length: 256 }, (_, byte) => {
  const value = byte / 255;
  return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
});

function byteOfLight(light: number): number {
  return 255 * (light <= 0.0031308 ? 12.92 * light : 1.055 * light ** (1 / 2.4) - 0.055);
}

/** Mean of the wood along a stretch of the edge, `depthMm` into the piece; null where the stretch holds no sample. */
export function meanColour({ pixels }: StockPicture, map: EdgeMap, stretch: Stretch, depthMm: number): MeanColour | null {
  const { data, width, height, channels } = pixels;
  const sums = [0, 0, 0];
  let count = 0;
  for (let along = stretch.fromMm + SAMPLE_MM / 2; along < stretch.toMm; along += SAMPLE_MM) {
    for (let into = SAMPLE_MM / 2; into < depthMm; into += SAMPLE_MM) {
      const x = Math.min(width - 1, Math.max(0, Math.floor(map.x + map.alongX * along + map.intoX * into)));
      const y = Math.min(height - 1, Math.max(0, Math.floor(map.y + map.alongY * along + map.intoY * into)));
      const at = (y * width + x) * channels;
      for (let c = 0; c < 3; c++) sums[c] = (sums[c] as number) + (lightOfByte[data[at + c] as number] as number);
      count++;
    }
  }
  if (count === 0) return null;
  const [r = 0, g = 0, b = 0] = sums.map((sum) => byteOfLight(sum / count));
  return [r, g, b];
}
