/**
 * Taking in a photograph: read, inspect and turn upright off this thread, store, and only then write its row. Whatever goes wrong
 * on the way leaves neither row nor file. The same upload key always answers with the same photograph.
 */
import "server-only";
import { createHash } from "node:crypto";
import { v7 as newId } from "uuid";
import { isDuplicateKey } from "@/db/duplicate-key";
import { recordHistory } from "@/db/queries/history";
import { findPhotoByUploadKey, insertPhoto, type PhotoRow } from "@/db/queries/photo";
import type { QueryOf } from "@/lib/schemas/endpoint";
import type { Photo, uploadPhoto } from "@/lib/schemas/photo";
import type { ShopAccess } from "../access";
import { database } from "../database";
import { FaultError } from "../faults";
import { log } from "../log";
import { makeUpright } from "../pictures/pixel-pool";
import { putPhotoFiles, removePhotoFiles } from "./photo-files";
import { photoOf } from "./photo-of";
import { readUpload } from "./read-upload";
import { refusalFault } from "./refusal-words";

type Upload = QueryOf<typeof uploadPhoto>;
type Upright = Extract<Awaited<ReturnType<typeof makeUpright>>, { ok: true }>;

export async function takeInPhoto(
  access: ShopAccess,
  upload: Upload,
  request: Pick<Request, "body" | "headers" | "signal">,
): Promise<Photo> {
  const bytes = await readUpload(request);
  const first = await findPhotoByUploadKey(database(), access.shopId, upload.uploadKey);
  if (first) return photoOf(first);
  const upright = await uprightOf(bytes, request.signal);
  const photoId = newId();
  try {
    const files = await putPhotoFiles(access.shopId, photoId, bytes, upright.levels);
    if (request.signal.aborted) throw cancelled();
    return photoOf(await writeRow(access, upload, { photoId, bytes, upright, files }));
  } catch (error) {
    await removePhotoFiles(access.shopId, photoId);
    // Two tries of one upload at the same time: the other one was written first.
    const other = isDuplicateKey(error) && (await findPhotoByUploadKey(database(), access.shopId, upload.uploadKey));
    if (other) return photoOf(other);
    throw error;
  }
}

async function uprightOf(bytes: Uint8Array, signal: AbortSignal): Promise<Upright> {
  const outcome = await makeUpright(bytes, signal).catch((error: unknown) => {
    throw signal.aborted ? cancelled() : error;
  });
  if (outcome.ok) return outcome;
  if ("detail" in outcome.refusal) log().info(outcome.refusal, "a file was not taken in");
  throw refusalFault(outcome.refusal);
}

const cancelled = () => new FaultError("bad-request", "The upload was cancelled.");

interface Stored {
  readonly photoId: string;
  readonly bytes: Uint8Array;
  readonly upright: Upright;
  readonly files: Pick<PhotoRow, "originalKey" | "levels">;
}

async function writeRow(access: ShopAccess, upload: Upload, { photoId, bytes, upright, files }: Stored): Promise<PhotoRow> {
  const { kind, width, height, takenAt, camera, focalLengthMm } = upright;
  const at = new Date();
  const row = {
    id: photoId,
    shopId: access.shopId,
    ...upload,
    sha256: createHash("sha256").update(bytes).digest("hex"),
    kind,
    bytes: bytes.length,
    widthPx: width,
    heightPx: height,
    takenAt: takenAt === null ? null : new Date(takenAt),
    camera,
    focalLengthHundredths: focalLengthMm === null ? null : Math.round(focalLengthMm * 100),
    ...files,
    uploadedBy: access.userId,
    createdAt: at,
  };
  await database().transaction(async (tx) => {
    await insertPhoto(tx, access.shopId, row);
    await recordHistory(
      tx,
      access.shopId,
      { userId: access.userId, noun: "photo", nounId: photoId, verb: "taken in", detail: { fileName: upload.fileName } },
      at,
    );
  });
  return row;
}
