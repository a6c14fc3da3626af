/** Why a file is not taken in. The screen puts the reason into words; `detail` is the decoder's own text, for the log alone. */

export type UploadRefusal =
  | { readonly reason: "empty" }
  | { readonly reason: "too-large"; readonly bytes: number; readonly limitBytes: number }
  /** Not a JPEG, PNG, WebP, AVIF or HEIC picture; `found` is the media type of the content where it is known. */
  | { readonly reason: "wrong-type"; readonly found: string | null }
  | { readonly reason: "animated" }
  /** Also the answer to decompression bombs: seen in the header, before anything is decoded. */
  | { readonly reason: "too-many-pixels"; readonly width: number; readonly height: number; readonly limitPixels: number }
  /** The end of the file is missing. */
  | { readonly reason: "truncated"; readonly detail: string }
  | { readonly reason: "corrupt"; readonly detail: string };
