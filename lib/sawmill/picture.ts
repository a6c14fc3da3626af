/** A picture in memory: three display (sRGB) bytes a pixel, rows from the top. Encoding is the caller's business. */
export interface RgbPicture {
  readonly rgb: Uint8Array;
  readonly width: number;
  readonly height: number;
}

/** A face of wood seen square on and to scale: pixel (0, 0) begins at the face's corner (0, 0). */
export interface FacePicture extends RgbPicture {
  readonly pxPerMm: number;
}
