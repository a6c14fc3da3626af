/** A picture in memory. */

/** 8-bit pixels, row by row, without padding. */
export interface Pixels {
  readonly data: Uint8Array;
  readonly width: number;
  readonly height: number;
  readonly channels: 3 | 4;
}
