/** OpenCV compiled to WebAssembly, an independent judge for the warp. Tests only; never part of the product. */
import { createRequire } from "node:module";

/** The few calls the tests make. */
export interface OpenCv {
  readonly Mat: new () => OpenCvMat;
  readonly Size: new (width: number, height: number) => object;
  readonly Scalar: new (...values: number[]) => object;
  readonly CV_8UC3: number;
  readonly CV_64FC1: number;
  readonly INTER_LINEAR: number;
  readonly INTER_AREA: number;
  readonly BORDER_REPLICATE: number;
  matFromArray(rows: number, columns: number, type: number, values: ArrayLike<number>): OpenCvMat;
  warpPerspective(
    from: OpenCvMat,
    to: OpenCvMat,
    map: OpenCvMat,
    size: object,
    flags: number,
    border: number,
    value: object,
  ): void;
  resize(from: OpenCvMat, to: OpenCvMat, size: object, scaleX: number, scaleY: number, flags: number): void;
}

export interface OpenCvMat {
  readonly data: Uint8Array;
  delete(): void;
}

/** Loads it once. The module object is itself thenable, so it must never be awaited: it is handed over wrapped. */
export function loadOpenCv(): Promise<{ cv: OpenCv }> {
  const cv: OpenCv & { onRuntimeInitialized?: () => void } = createRequire(import.meta.url)("@techstark/opencv-js");
  return new Promise((resolve) => {
    if (typeof cv.Mat === "function") resolve({ cv });
    else cv.onRuntimeInitialized = () => resolve({ cv });
  });
}
