/** OpenCV's perspective warp on pictures that lie in its own memory, as ours lie in ours. */
import type { Pixels, WarpMap } from "@/lib/layout";
import { loadOpenCv, type OpenCvMat } from "../support/opencv";

export interface OpenCvWarp {
  /** Pixels of the picture, straight from the photo. */
  readonly run: () => void;
  /** The warp to a picture twice as large each way, made smaller by the mean over areas. */
  readonly runFiner: () => void;
  readonly pixels: () => Uint8Array;
}

/** It knows no lens. Pixel centres are whole numbers to it and halves to us. */
export async function openCvWarp(photo: Pixels, width: number, height: number, map: WarpMap): Promise<OpenCvWarp> {
  const { cv } = await loadOpenCv();
  const from = cv.matFromArray(photo.height, photo.width, cv.CV_8UC3, photo.data);
  const [to, large] = [new cv.Mat(), new cv.Mat()];
  const [once, finer] = [1, 2].map((times) => cv.matFromArray(3, 3, cv.CV_64FC1, centred(map.flatFromPicture, times)));
  const warpTo = (target: OpenCvMat, matrix: OpenCvMat | undefined, times: number) => {
    if (matrix === undefined) throw new Error("no matrix");
    const size = new cv.Size(width * times, height * times);
    // 16: the matrix leads from the result to the source.
    cv.warpPerspective(from, target, matrix, size, cv.INTER_LINEAR | 16, cv.BORDER_REPLICATE, new cv.Scalar());
  };
  return {
    run: () => warpTo(to, once, 1),
    runFiner: () => {
      warpTo(large, finer, 2);
      cv.resize(large, to, new cv.Size(width, height), 0, 0, cv.INTER_AREA);
    },
    pixels: () => to.data,
  };
}

/** The map between pixel centres, from a picture that has so many times the pixels each way. */
function centred(h: WarpMap["flatFromPicture"], times: number): number[] {
  const rows = [h.slice(0, 3), h.slice(3, 6), h.slice(6, 9)].map(([a = 0, b = 0, c = 0]) => {
    const [x, y] = [a / times, b / times];
    return [x, y, c + (x + y) / 2];
  });
  const last = rows[2] ?? [];
  return [...[0, 1].flatMap((r) => (rows[r] ?? []).map((value, n) => value - 0.5 * (last[n] ?? 0))), ...last];
}
