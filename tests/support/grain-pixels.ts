/** Pixels with lines like growth rings and a fixed grit, for tests of files: neither plain nor the same in any two places. */
export function grainPixels(width: number, height: number): Uint8Array {
  const data = new Uint8Array(width * height * 3);
  let grit = 12345;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      grit = (Math.imul(grit, 1103515245) + 12345) >>> 0;
      const ring = 130 + 60 * Math.sin(y / 7 + 3 * Math.sin(x / 90)) + ((grit >>> 24) - 128) / 16;
      data.set([ring + 40, ring, ring - 50], (y * width + x) * 3);
    }
  }
  return data;
}
