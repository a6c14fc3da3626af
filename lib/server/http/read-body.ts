/** Reads a request's body with a running limit, so that nobody can make the server hold more than a handler wants. */
import "server-only";

export type ReadBody =
  | { readonly ok: true; readonly bytes: Uint8Array }
  /** At least so many bytes, announced or already sent. */
  | { readonly ok: false; readonly tooLarge: number };

/** The whole body in a buffer of its own, or a refusal as soon as it is known to be too large. Rejects when the connection breaks. */
export async function readBody(request: Pick<Request, "body" | "headers">, maxBytes: number): Promise<ReadBody> {
  const announced = announcedBytes(request.headers);
  if (announced !== null && announced > maxBytes) return { ok: false, tooLarge: announced };
  const chunks: Uint8Array[] = [];
  let total = 0;
  const reader = request.body?.getReader();
  try {
    for (let next = await reader?.read(); next && !next.done; next = await reader?.read()) {
      total += next.value.length;
      if (total > maxBytes) return { ok: false, tooLarge: total };
      chunks.push(next.value);
    }
  } finally {
    reader?.releaseLock();
  }
  const bytes = new Uint8Array(total);
  let at = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, at);
    at += chunk.length;
  }
  return { ok: true, bytes };
}

/** What the sender announced, or null where it did not say, or said nonsense. */
export function announcedBytes(headers: Headers): number | null {
  const text = headers.get("content-length");
  return text !== null && /^\d{1,15}$/.test(text) ? Number(text) : null;
}
