/** Draws a straightened picture in slices, so that handles keep following the finger. Uses the core's own warp; needs no screen. */
import { type Pixels, type WarpMap, warpInBands } from "@/lib/layout";

/** Work at a stretch, ms: half a frame at 60 Hz. */
const SLICE_MS = 8;

export interface Wish {
  readonly photo: Pixels;
  readonly map: WarpMap;
  readonly width: number;
  readonly height: number;
}

/** Resolves to the RGBA picture; between slices the page is free. Null when `signal` was aborted meanwhile. */
export async function drawInSlices({ photo, map, width, height }: Wish, signal: AbortSignal): Promise<Pixels | null> {
  const picture: Pixels = { data: new Uint8Array(width * height * 4), width, height, channels: 4 };
  let sliceEnds = performance.now() + SLICE_MS;
  for (const _ of warpInBands(photo, picture, map)) {
    if (performance.now() < sliceEnds) continue;
    await nextTurn();
    if (signal.aborted) return null;
    sliceEnds = performance.now() + SLICE_MS;
  }
  return signal.aborted ? null : picture;
}

const nextTurn = () => new Promise<void>((resolve) => setTimeout(resolve));
