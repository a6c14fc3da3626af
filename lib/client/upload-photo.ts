/** Sends a photograph with progress. Goes by XMLHttpRequest because `fetch` does not tell how much of a body has been sent. */
import { uploadPhoto as endpoint, type Photo, photoSchema } from "@/lib/schemas/photo";
import { addressOf, readFault } from "./call";

interface Upload {
  readonly file: Blob;
  readonly fileName: string;
  /** The same for every try of one file, so that a retry never doubles it. */
  readonly uploadKey: string;
  /** Share of the bytes that have left, 0 to 1. After 1 the server still looks at the picture. */
  readonly onProgress: (share: number) => void;
  readonly signal: AbortSignal;
}

/** Rejects with `FaultFromServer` on a refusal, a `TypeError` when the connection breaks, and the signal's reason when cancelled. */
export function uploadPhoto({ file, fileName, uploadKey, onProgress, signal }: Upload): Promise<Photo> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    const abort = () => request.abort();
    request.open(endpoint.method, addressOf(endpoint, { query: { uploadKey, fileName: fileName.slice(-255) } }));
    request.upload.onprogress = (event) => {
      if (event.lengthComputable && event.total > 0) onProgress(event.loaded / event.total);
    };
    request.onload = () => answerOf(request).then(resolve, reject);
    request.onerror = () => reject(new TypeError("the connection broke off"));
    request.onabort = () => reject(signal.reason);
    request.onloadend = () => signal.removeEventListener("abort", abort);
    if (signal.aborted) return reject(signal.reason);
    signal.addEventListener("abort", abort, { once: true });
    request.send(file);
  });
}

async function answerOf(request: XMLHttpRequest): Promise<Photo> {
  if (request.status === 200) return photoSchema.parse(JSON.parse(request.responseText));
  throw await readFault(new Response(request.responseText || null, { status: request.status }));
}
