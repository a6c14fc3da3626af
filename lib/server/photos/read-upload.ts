/** Reads an uploaded photograph: not larger than what is taken in, and not shorter than its sender announced. */
import "server-only";
import { maxUploadBytes } from "@/lib/schemas/upload-limits";
import { FaultError } from "../faults";
import { announcedBytes, readBody } from "../http/read-body";

const mb = (bytes: number) => Math.ceil(bytes / (1024 * 1024));

/** The whole body. A connection that breaks must not look like a short file, so its length is held against what was announced. */
export async function readUpload(request: Pick<Request, "body" | "headers">): Promise<Uint8Array> {
  const read = await readBody(request, maxUploadBytes).catch((error: unknown) => {
    throw brokenOff(error);
  });
  if (!read.ok) {
    const [size, most] = [mb(read.tooLarge), mb(maxUploadBytes)];
    throw new FaultError("too-large", `The file is ${size} MB or more; at most ${most} MB are taken in. Send it smaller.`);
  }
  const announced = announcedBytes(request.headers);
  if (announced !== null && read.bytes.length !== announced) throw brokenOff();
  return read.bytes;
}

function brokenOff(cause?: unknown): FaultError {
  const fault = new FaultError("bad-request", "The upload broke off before its end. Send it again.");
  if (cause !== undefined) fault.cause = cause;
  return fault;
}
