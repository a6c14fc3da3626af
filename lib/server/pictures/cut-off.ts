/** Whether the end of a picture file is missing, from its structure; to call a failed decoding by its right name. */
import "server-only";
import type { PictureKind } from "./picture-kind";

/** True where the file says of itself that it should go on. */
export function isCutOff(kind: PictureKind, bytes: Uint8Array): boolean {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  switch (kind) {
    case "jpeg":
      return !Buffer.from(view.buffer, view.byteOffset, view.byteLength).includes(Buffer.from([0xff, 0xd9]));
    case "png":
      return chunksRunOut(view);
    case "webp":
      return view.byteLength < 12 || view.getUint32(4, true) + 8 > view.byteLength;
    case "avif":
    case "heic":
      return boxesRunOut(view);
  }
}

/** PNG: length, type, data and checksum follow one another up to "IEND". */
function chunksRunOut(view: DataView): boolean {
  let at = 8;
  while (at + 12 <= view.byteLength) {
    const type = String.fromCharCode(...[4, 5, 6, 7].map((byte) => view.getUint8(at + byte)));
    // A type that is no four letters means that the chain is broken, not that it ends early.
    if (type === "IEND" || !/^[A-Za-z]{4}$/.test(type)) return false;
    at += view.getUint32(at) + 12;
  }
  return true;
}

/** ISO base media file: every box gives its own size; 1 means a 64-bit size follows, 0 "up to the end". */
function boxesRunOut(view: DataView): boolean {
  let at = 0;
  while (at < view.byteLength) {
    if (at + 16 > view.byteLength) return true;
    const short = view.getUint32(at);
    if (short === 0) return false;
    const size = short === 1 ? Number(view.getBigUint64(at + 8)) : short;
    if (size < 8) return false;
    at += size;
  }
  return at > view.byteLength;
}
