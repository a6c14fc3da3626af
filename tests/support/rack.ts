/** Wood and photographs for tests of the rack: generated, small, and different for every seed. */
import fs from "node:fs";
import path from "node:path";
import sharp from "sharp";
import { v7 as newId } from "uuid";
import type { z } from "zod";
import { type Marking, um, umFromMm } from "@/lib/layout";
import type { Board, createBoardSchema } from "@/lib/schemas/board";
import { markingSchema } from "@/lib/schemas/marking";
import type { Photo } from "@/lib/schemas/photo";
import type { ShopAccess } from "@/lib/server/access";
import { enterBoard } from "@/lib/server/boards/enter-board";
import { env } from "@/lib/server/env";
import { takeInPhoto } from "@/lib/server/photos/take-in-photo";

export const photoSize = { width: 1300, height: 500 };

/** A JPEG with stripes along the grain that change with the seed. */
export async function photographBytes(seed = 1): Promise<Uint8Array> {
  const { width, height } = photoSize;
  const pixels = new Uint8Array(width * height * 3);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const tone = 120 + 60 * Math.sin(y / (5 + seed) + x / 300);
      pixels.set([tone, tone * 0.7, tone * 0.5], (y * width + x) * 3);
    }
  }
  return new Uint8Array(
    await sharp(pixels, { raw: { width, height, channels: 3 } })
      .jpeg()
      .toBuffer(),
  );
}

type Body = Uint8Array | ReadableStream<Uint8Array>;

/** As the browser sends it. */
export function uploadRequest(body: Body, { headers }: { headers?: Record<string, string> } = {}): Request {
  const streamed = body instanceof ReadableStream;
  const init: RequestInit & { duplex?: "half" } = {
    method: "POST",
    headers: { origin: env().APP_URL, ...headers },
    body: streamed ? body : new Blob([new Uint8Array(body)]),
    ...(streamed && { duplex: "half" }),
  };
  return new Request(new URL("/api/photos", env().APP_URL), init);
}

export async function takeIn(access: ShopAccess, bytes?: Uint8Array, uploadKey: string = newId()): Promise<Photo> {
  return takeInPhoto(access, { uploadKey, fileName: "board.jpg" }, uploadRequest(bytes ?? (await photographBytes())));
}

type NewBoard = z.output<typeof createBoardSchema>;

export const newBoard: NewBoard = {
  species: "Black walnut",
  cut: "flat",
  nominalQuarters: 4,
  thickness: umFromMm(27),
  length: umFromMm(1200),
  width: umFromMm(200),
  place: "rack 2 left",
  source: "Hollin Timber",
  costMinor: 8400,
  note: "",
  trueEdges: "none",
  toBeFlattened: false,
};

export async function enter(access: ShopAccess, fields: Partial<NewBoard> = {}): Promise<Board> {
  return enterBoard(access, { ...newBoard, ...fields, reading: null });
}

/** The board of 1200 × 200 mm, seen a little askew in a photograph of `photoSize`. */
export const soundMarking: Marking = {
  reference: { kind: "board", length: umFromMm(1200), width: umFromMm(200) },
  corners: [
    { x: 42, y: 120 },
    { x: 1251, y: 134 },
    { x: 1246, y: 338 },
    { x: 38, y: 330 },
  ],
  extraPoints: [],
  edgePoints: [],
};

export const point = (xMm: number, yMm: number) => ({ x: um(Math.round(xMm * 1000)), y: um(Math.round(yMm * 1000)) });

/** Marks as they are sent and stored: the same, but in lists that may be changed. */
export const wire = (marking: Marking): z.output<typeof markingSchema> => markingSchema.parse(marking);

/** Every file stored for a shop, by key. */
export function filesOf({ shopId }: ShopAccess): string[] {
  const root = path.join(env().UPLOADS_DIR, "shops", shopId);
  if (!fs.existsSync(root)) return [];
  return fs
    .readdirSync(root, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)))
    .sort();
}
