/**
 * Stored files, by key. Everything that reads or writes an uploaded or made file goes through this interface, so that an object
 * storage can stand in for the folder. Knows nothing of what the files are or whose they are.
 */
import "server-only";
import { randomUUID } from "node:crypto";
import { createReadStream } from "node:fs";
import { mkdir, open, readFile, rename, rm, stat, writeFile } from "node:fs/promises";
import path from "node:path";
import type { Readable } from "node:stream";
import { env } from "./env";

export interface StoredStream {
  readonly stream: ReadableStream<Uint8Array>;
  readonly bytes: number;
}

/** Keys are parts of letters, digits, dots, hyphens and underscores, parted by slashes: `shops/7f3a/photos/91c0/level-0.jpg`. */
export interface Storage {
  /** Whole or not at all: a reader sees the old file or the new one, also after a power cut. */
  put(key: string, content: Uint8Array | ReadableStream<Uint8Array>): Promise<void>;
  /** null where there is no such file. */
  get(key: string): Promise<Uint8Array | null>;
  /** For answering requests; null where there is no such file. */
  stream(key: string): Promise<StoredStream | null>;
  exists(key: string): Promise<boolean>;
  /** No matter whether it was there. */
  remove(key: string): Promise<void>;
  /** Everything whose key begins with these parts: `shops/7f3a` takes `shops/7f3a/…`, not `shops/7f3ab`. */
  removePrefix(prefix: string): Promise<void>;
}

/** Drafts lie inside the root, because a file can be renamed into place on one file system only. No key can begin with a dot. */
const draftsFolder = ".drafts";
const longestKey = 300;

/** Storage in a folder, made when first written to. Several processes and machines may share it. */
export function createFolderStorage(root: string): Storage {
  const place = (key: string): string => path.join(root, ...partsOf(key));
  return {
    async put(key, content) {
      const target = place(key);
      const draft = path.join(root, draftsFolder, randomUUID());
      await mkdir(path.dirname(draft), { recursive: true });
      try {
        await writeThrough(draft, content);
        await mkdir(path.dirname(target), { recursive: true });
        await rename(draft, target);
        await syncFolder(path.dirname(target));
      } finally {
        await rm(draft, { force: true });
      }
    },
    get: (key) => nullIfMissing(readFile(place(key))),
    async stream(key) {
      const file = place(key);
      const found = await nullIfMissing(stat(file));
      if (found === null || !found.isFile()) return null;
      return { stream: bytesOf(createReadStream(file)), bytes: found.size };
    },
    async exists(key) {
      return (await nullIfMissing(stat(place(key))))?.isFile() ?? false;
    },
    remove: (key) => rm(place(key), { force: true }),
    removePrefix: (prefix) => rm(place(prefix), { force: true, recursive: true }),
  };
}

let own: Storage | undefined;

/** The storage of this process, as the environment sets it. */
export function storage(): Storage {
  own ??= createFolderStorage(env().UPLOADS_DIR);
  return own;
}

/** Throws on a key that was not made by this program: keys never come from outside as they are. */
function partsOf(key: string): string[] {
  const parts = key.split("/");
  const sound = key.length <= longestKey && parts.every((part) => /^[A-Za-z0-9_-][A-Za-z0-9._-]*$/.test(part));
  if (!sound) throw new RangeError(`not a storage key: ${JSON.stringify(key.slice(0, longestKey))}`);
  return parts;
}

async function writeThrough(file: string, content: Uint8Array | ReadableStream<Uint8Array>): Promise<void> {
  const handle = await open(file, "wx", 0o600);
  try {
    await writeFile(handle, content instanceof Uint8Array ? content : chunksOf(content));
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function* chunksOf(stream: ReadableStream<Uint8Array>): AsyncGenerator<Uint8Array> {
  const reader = stream.getReader();
  try {
    for (let next = await reader.read(); !next.done; next = await reader.read()) yield next.value;
  } finally {
    await reader.cancel();
  }
}

/** The name of a file is on disk only once its folder is. */
async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, "r");
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

function bytesOf(file: Readable): ReadableStream<Uint8Array> {
  const chunks = file[Symbol.asyncIterator]();
  return new ReadableStream({
    async pull(controller) {
      const { done, value } = await chunks.next();
      if (done === true) controller.close();
      else controller.enqueue(value);
    },
    cancel() {
      file.destroy();
    },
  });
}

async function nullIfMissing<T>(wanted: Promise<T>): Promise<T | null> {
  try {
    return await wanted;
  } catch (error) {
    if (error instanceof Error && "code" in error && (error.code === "ENOENT" || error.code === "ENOTDIR")) return null;
    throw error;
  }
}
