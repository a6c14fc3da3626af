/** Why a file is not taken in, in words for people. The decoder's own text is left for the log. */
import "server-only";
import { FaultError } from "../faults";
import type { UploadRefusal } from "../pictures/upload-refusal";

const kindsTaken = "JPEG, PNG, WebP, AVIF or a phone's HEIC";

export function refusalWords(refusal: UploadRefusal): string {
  switch (refusal.reason) {
    case "empty":
      return "The file is empty. Choose the photograph again.";
    case "too-large":
      return `The file has ${megabytes(refusal.bytes)}; at most ${megabytes(refusal.limitBytes)} are taken in. Send it smaller.`;
    case "wrong-type":
      return `This is ${refusal.found === null ? "not a picture" : `a file of type ${refusal.found}`}. Send a ${kindsTaken} photograph.`;
    case "animated":
      return "This is a moving picture. Send a single photograph.";
    case "too-many-pixels":
      return `The picture has ${megapixels(refusal.width * refusal.height)}; at most ${megapixels(refusal.limitPixels)} are taken in. Send it smaller.`;
    case "truncated":
      return "The end of the file is missing. Copy it again from the camera, or send the original.";
    case "corrupt":
      return "The file is damaged and cannot be shown whole. Copy it again from the camera, or send the original.";
  }
}

export function refusalFault(refusal: UploadRefusal): FaultError {
  return new FaultError(refusal.reason === "too-large" ? "too-large" : "refused", refusalWords(refusal), {
    detail: { reason: refusal.reason },
  });
}

const megabytes = (bytes: number) => `${(bytes / (1024 * 1024)).toFixed(1)} MB`;
const megapixels = (pixels: number) => `${(pixels / 1e6).toFixed(1)} megapixels`;
