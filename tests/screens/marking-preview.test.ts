import { expect, test } from "vitest";
import { drawInSlices } from "@/components/marking/draw-in-slices";
import { mapOnLevel } from "@/components/marking/level-map";
import { fitMarking, type Pixels, um, warpMapAt } from "@/lib/layout";

/** A picture that is red by x and green by y, as shares of its size. */
function shaded(width: number, height: number): Pixels {
  const data = new Uint8Array(width * height * 4);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++)
      data.set([((x + 0.5) / width) * 255, ((y + 0.5) / height) * 255, 0, 255], (y * width + x) * 4);
  }
  return { data, width, height, channels: 4 };
}

const photo = { width: 800, height: 600 };
const corner = (x: number, y: number) => ({ x, y });

test("drawn from a small level, the preview shows the same places as from the full photograph, lens included", async () => {
  const fit = fitMarking(
    {
      reference: { kind: "board", length: um(500_000), width: um(200_000) },
      corners: [corner(80, 150), corner(720, 120), corner(760, 470), corner(60, 430)],
      extraPoints: [],
      edgePoints: [],
    },
    photo,
  );
  if (!fit.ok) throw new Error(fit.refusal.reason);
  const bent = { ...fit.geometry, lens: { ...fit.geometry.lens, k1: 0.05 } };
  const map = warpMapAt(bent, 0.4);
  const { signal } = new AbortController();
  const size = { width: 200, height: 80 };
  const full = await drawInSlices({ photo: shaded(800, 600), map, ...size }, signal);
  const level = await drawInSlices({ photo: shaded(200, 150), map: mapOnLevel(map, 0.25), ...size }, signal);
  if (!full || !level) throw new Error("stopped");
  const worst = Math.max(...full.data.map((value, at) => Math.abs(value - (level.data[at] ?? Number.NaN))));
  expect(worst).toBeLessThanOrEqual(2);
  // The picture is no plain colour: the places it shows really differ.
  expect((full.data[size.width * 4 - 4] ?? 0) - (full.data[0] ?? 0)).toBeGreaterThan(150);
});

test("stopped meanwhile, it gives nothing", async () => {
  const stop = new AbortController();
  stop.abort();
  const identity = { flatFromPicture: [1, 0, 0, 0, 1, 0, 0, 0, 1], lens: { k1: 0, centre: corner(0, 0), norm: 1 } } as const;
  expect(await drawInSlices({ photo: shaded(4, 4), map: identity, width: 4, height: 4 }, stop.signal)).toBeNull();
});
