/** The upright picture in levels for marking and showing, from an uploaded file. Inspects it on the way: one decoding serves both. */
import "server-only";
import { decodeUpright } from "./decode-upright";
import { type EncodedLevel, encodeLevels } from "./encode-levels";
import { factsOf, type UploadFacts } from "./inspect-upload";
import type { UploadRefusal } from "./upload-refusal";

export type UprightOutcome =
  | ({ readonly ok: true; readonly levels: readonly EncodedLevel[] } & UploadFacts)
  | { readonly ok: false; readonly refusal: UploadRefusal };

/** `stopIfCancelled` throws to end the work between its steps. */
export async function makeUprightInThread(bytes: Uint8Array, stopIfCancelled: () => void): Promise<UprightOutcome> {
  const decoded = await decodeUpright(bytes);
  if (!decoded.ok) return decoded;
  stopIfCancelled();
  const levels = await encodeLevels(decoded.pixels, stopIfCancelled);
  return { ok: true, ...(await factsOf(decoded.header, decoded.pixels)), levels };
}
