/** The part of heic-decode 2.1 that is used; the package has no types of its own. */
declare module "heic-decode" {
  interface HeicImage {
    readonly width: number;
    readonly height: number;
    /** RGBA, 8 bits, turned upright as the file says. */
    decode(): Promise<{ readonly width: number; readonly height: number; readonly data: Uint8ClampedArray }>;
  }
  const decode: {
    all(file: { buffer: Uint8Array }): Promise<readonly HeicImage[] & { dispose(): void }>;
  };
  export default decode;
}
