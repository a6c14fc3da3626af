/** Reads an uploaded body with a running limit, so that nobody can make the server hold more than the largest file taken in. */
import "server-only";
import { maxUploadBytes } from "@/lib/schemas/upload-limits";
import { FaultError } from "../faults";

const mb = (bytes: number) => Math.ceil(bytes / (1024 * 1024));

/**
 * The whole body. Refuses as soon as it is known to be too large, and when it ends before the length the sender announced: a
 * connection that breaks must not look like a short file.
 */
export async function readUpload(request: Pick<Request, "body" | "headers">): Promise<Uint8Array> {
  const announced = announcedBytes(request.headers);
  if (announced !== null && announced > maxUploadBytes) throw tooLarge(announced);
  const chunks: Uint8Array[] = [];
  let total = 0;
  for await (const chunk of chunksOf(request.body)) {
    total += chunk.length;
    if (total > maxUploadBytes) throw tooLarge(total);
    chunks.push(chunk);
  }
  if (announced !== null && total !== announced) throw brokenOff();
  // A buffer of its own, so that it can be handed to another thread.
  const bytes = new Uint8Array(total);
  let at = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, at);
    at += chunk.length;
  }
  return bytes;
}

async function* chunksOf(body: ReadableStream<Uint8Array> | null): AsyncGenerator<Uint8Array> {
  const reader = body?.getReader();
  if (!reader) return;
  try {
    for (let next = await reader.read(); !next.done; next = await reader.read()) yield next.value;
  } catch (error) {
    throw brokenOff(error);
  } finally {
    reader.releaseLock();
  }
}

function announcedBytes(headers: Headers): number | null {
  const text = headers.get("content-length");
  return text !== null && /^\d{1,15}$/.test(text) ? Number(text) : null;
}

function tooLarge(bytes: number): FaultError {
  return new FaultError(
    "too-large",
    `The file is ${mb(bytes)} MB or more; at most ${mb(maxUploadBytes)} MB are taken in. Send it smaller.`,
  );
}

function brokenOff(cause?: unknown): FaultError {
  const fault = new FaultError("bad-request", "The upload broke off before its end. Send it again.");
  if (cause !== undefined) fault.cause = cause;
  return fault;
}
