/** Taking in photographs: whole or not at all, once a file, private tags left behind. */
import "../support/cookie-jar";
import fs from "node:fs";
import path from "node:path";
import { eq } from "drizzle-orm";
import sharp from "sharp";
import { v7 as newId } from "uuid";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import * as levelRoute from "@/app/api/photos/[photoId]/levels/[level]/route";
import * as photoRoute from "@/app/api/photos/[photoId]/route";
import * as photosRoute from "@/app/api/photos/route";
import { history, photo } from "@/db/schema";
import { addressOf } from "@/lib/client/call";
import type { Role } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/photo";
import type { ShopAccess } from "@/lib/server/access";
import { database } from "@/lib/server/database";
import { env } from "@/lib/server/env";
import { readLoosePhotos } from "@/lib/server/photos/photos";
import { takeInPhoto } from "@/lib/server/photos/take-in-photo";
import { closePixelPool } from "@/lib/server/pictures/pixel-pool";
import { startStraightening } from "@/lib/server/straightenings/start-straightening";
import { cancelTask } from "@/lib/server/tasks/tasks";
import { actAs } from "../support/act-as";
import { ask } from "../support/ask";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";
import { makeShop } from "../support/make-shop";
import { enter, filesOf, photographBytes, photoSize, soundMarking, takeIn, uploadRequest, wire } from "../support/rack";

type Shop = Awaited<ReturnType<typeof makeShop>>;
let shop: Shop;
let other: Shop;
let bytes: Uint8Array;
beforeAll(async () => {
  await bundlePixelWorker();
  shop = await makeShop();
  other = await makeShop();
  bytes = await photographBytes();
}, 60_000);
afterAll(closePixelPool);

const rowsOf = ({ shopId }: ShopAccess) => database().select().from(photo).where(eq(photo.shopId, shopId));

/** Through the handler, as the browser sends it. */
async function upload(body: Uint8Array | ReadableStream<Uint8Array>, key = newId(), headers: Record<string, string> = {}) {
  const sent = uploadRequest(body, { headers });
  const query = { uploadKey: key, fileName: "IMG_0041.JPG" };
  const url = new URL(addressOf(endpoint.uploadPhoto, { query }), env().APP_URL);
  const response = await photosRoute.POST(new Request(url, sent), { params: Promise.resolve({}) });
  return { status: response.status, body: await response.json() };
}

describe("a sound photograph", () => {
  test("is stored as it came, served upright in levels, and told of once in the history", async () => {
    const { maker } = await makeShop();
    await actAs(maker);
    const answer = await upload(bytes);
    expect(answer.status).toBe(200);
    const taken = endpoint.photoSchema.parse(answer.body);
    expect(taken).toMatchObject({ kind: "jpeg", widthPx: photoSize.width, heightPx: photoSize.height, fileName: "IMG_0041.JPG" });
    expect(taken.levels.map(({ widthPx }) => widthPx)).toEqual([1300, 650, 325]);
    expect(filesOf(maker)).toHaveLength(4);

    const [row] = await rowsOf(maker);
    expect(new Uint8Array(fs.readFileSync(path.join(env().UPLOADS_DIR, row?.originalKey ?? "")))).toEqual(bytes);
    const told = await database().select().from(history).where(eq(history.nounId, taken.id));
    expect(told).toMatchObject([{ verb: "taken in", userId: maker.userId, detail: { fileName: "IMG_0041.JPG" } }]);
  });

  test("comes upright and without its private tags, whatever the camera wrote", async () => {
    const { maker } = await makeShop();
    const tagged = await sharp(bytes)
      .withExif({
        IFD0: { Make: "Halden", Model: "Halden F2", Artist: "private name" },
        IFD3: { GPSLatitudeRef: "N", GPSLatitude: "52/1 31/1 12/1", GPSLongitudeRef: "E", GPSLongitude: "13/1 24/1 0/1" },
      })
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toBuffer();
    const taken = await takeIn(maker, new Uint8Array(tagged));
    expect(taken).toMatchObject({ widthPx: photoSize.height, heightPx: photoSize.width, camera: "Halden F2" });
    await actAs(maker);
    const served = await levelRoute.GET(new Request(new URL(taken.levels[0]?.url ?? "", env().APP_URL)), {
      params: Promise.resolve({ photoId: taken.id, level: "0" }),
    });
    const picture = new Uint8Array(await served.arrayBuffer());
    expect(served.headers.get("content-type")).toBe("image/jpeg");
    const metadata = await sharp(picture).metadata();
    expect(metadata).toMatchObject({ width: photoSize.height, height: photoSize.width });
    expect(metadata.exif).toBeUndefined();
    expect(Buffer.from(picture).includes("private name")).toBe(false);
  });
});

describe("the same upload again", () => {
  test("answers with the first photograph", async () => {
    const { maker } = await makeShop();
    const key = newId();
    const first = await takeIn(maker, bytes, key);
    expect((await takeIn(maker, bytes, key)).id).toBe(first.id);
    expect(await rowsOf(maker)).toHaveLength(1);
    expect(filesOf(maker)).toHaveLength(4);
  });

  test("at the same time, three times over: one row, one set of files, three equal answers", async () => {
    const { maker } = await makeShop();
    const key = newId();
    const taken = await Promise.all([takeIn(maker, bytes, key), takeIn(maker, bytes, key), takeIn(maker, bytes, key)]);
    expect(new Set(taken.map(({ id }) => id)).size).toBe(1);
    expect(await rowsOf(maker)).toHaveLength(1);
    expect(filesOf(maker)).toHaveLength(4);
    expect(filesOf(maker).every((file) => file.includes(taken[0]?.id ?? "none"))).toBe(true);
  });

  test("under the same key in another shop is another photograph", async () => {
    const key = newId();
    const mine = await takeIn(shop.maker, bytes, key);
    expect((await takeIn(other.maker, bytes, key)).id).not.toBe(mine.id);
  });
});

describe("what is refused leaves no row and no file", () => {
  let maker: ShopAccess;
  beforeAll(async () => {
    maker = (await makeShop()).maker;
  });
  const nothingLeft = async () => {
    expect(await rowsOf(maker)).toEqual([]);
    expect(filesOf(maker)).toEqual([]);
    expect(await database().select().from(history).where(eq(history.shopId, maker.shopId))).toEqual([]);
  };

  test.each<[string, () => Uint8Array | Promise<Uint8Array>, RegExp]>([
    ["an empty file", () => new Uint8Array(), /empty/],
    ["text named as a picture", () => new TextEncoder().encode("not a picture at all, only words ".repeat(40)), /not a picture/],
    ["a cut-off file", () => bytes.subarray(0, bytes.length / 2), /end of the file is missing/],
    ["a moving picture", animated, /moving picture/],
    ["a picture of a kind that is not taken in", gif, /image\/gif/],
    ["a bomb of 90 megapixels in a small file", bomb, /90\.0 megapixels; at most 60\.0/],
  ])("%s", async (_, make, words) => {
    await actAs(maker);
    const answer = await upload(await make());
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: "refused", title: expect.stringMatching(words) });
    await nothingLeft();
  });

  test("a file announced too large, before a byte of it is read", async () => {
    await actAs(maker);
    const pull = vi.fn();
    const body = new ReadableStream<Uint8Array>({ pull }, { highWaterMark: 0 });
    const answer = await upload(body, newId(), { "content-length": String(41 * 1024 * 1024) });
    expect(answer).toMatchObject({ status: 413, body: { code: "too-large" } });
    expect(pull).not.toHaveBeenCalled();
    await nothingLeft();
  });

  test("a body that goes on past 40 MB without having said so, as soon as it does", async () => {
    await actAs(maker);
    let sent = 0;
    const body = new ReadableStream<Uint8Array>({
      pull(controller) {
        sent += 1024 * 1024;
        controller.enqueue(new Uint8Array(1024 * 1024));
      },
    });
    expect(await upload(body)).toMatchObject({ status: 413, body: { code: "too-large" } });
    expect(sent).toBeLessThanOrEqual(43 * 1024 * 1024);
    await nothingLeft();
  });

  test("a connection that breaks off midway", async () => {
    await actAs(maker);
    let first = true;
    const body = new ReadableStream<Uint8Array>({
      pull(controller) {
        if (first) controller.enqueue(bytes.subarray(0, 1000));
        else controller.error(new Error("socket hang up"));
        first = false;
      },
    });
    expect(await upload(body)).toMatchObject({ status: 400, body: { title: expect.stringContaining("broke off") } });
    await nothingLeft();
  });

  test("a body shorter than it was announced", async () => {
    await actAs(maker);
    const answer = await upload(bytes, newId(), { "content-length": String(bytes.length + 10) });
    expect(answer).toMatchObject({ status: 400, body: { title: expect.stringContaining("broke off") } });
    await nothingLeft();
  });

  test("an upload cancelled while the picture is looked at", async () => {
    const leaving = new AbortController();
    const { body, headers } = uploadRequest(bytes);
    const taking = takeInPhoto(maker, { uploadKey: newId(), fileName: "a.jpg" }, { body, headers, signal: leaving.signal });
    setTimeout(() => leaving.abort(), 1);
    await expect(taking).rejects.toMatchObject({ message: "The upload was cancelled." });
    await nothingLeft();
  });

  test("an upload whose row cannot be written", async () => {
    const insert = vi.spyOn(await import("@/db/queries/history"), "recordHistory").mockRejectedValueOnce(new Error("disk full"));
    await expect(takeIn(maker, bytes)).rejects.toThrow("disk full");
    insert.mockRestore();
    await nothingLeft();
  });
});

describe("loose photographs", () => {
  test("are those no board uses, the newest first; a stopped try lets its photograph go again", async () => {
    const { maker } = await makeShop();
    const first = await takeIn(maker, bytes);
    const second = await takeIn(maker, bytes);
    expect((await readLoosePhotos(maker, 50)).map(({ id }) => id)).toEqual([second.id, first.id]);
    const { taskId } = await startStraightening(maker, (await enter(maker)).id, {
      photoId: first.id,
      marking: wire(soundMarking),
    });
    expect((await readLoosePhotos(maker, 50)).map(({ id }) => id)).toEqual([second.id]);
    await cancelTask(maker, taskId ?? "");
    expect(await readLoosePhotos(maker, 50)).toHaveLength(2);
  });

  test("can be removed with their files; one in use is refused and names the board", async () => {
    const { maker } = await makeShop();
    const used = await takeIn(maker, bytes);
    const { id, tag } = await enter(maker);
    const { taskId } = await startStraightening(maker, id, { photoId: used.id, marking: wire(soundMarking) });
    await actAs(maker);
    const remove = () => ask(photoRoute.DELETE, endpoint.deletePhoto, { params: { photoId: used.id } });
    expect(await remove()).toMatchObject({ status: 422, body: { title: expect.stringContaining(tag) } });
    expect(filesOf(maker)).toHaveLength(4);
    await cancelTask(maker, taskId ?? "");
    expect((await remove()).status).toBe(204);
    expect(filesOf(maker)).toEqual([]);
    expect(await rowsOf(maker)).toEqual([]);
  });
});

describe("who may", () => {
  const calls = {
    list: () => ask(photosRoute.GET, endpoint.listLoosePhotos, {}),
    read: (photoId: string) => ask(photoRoute.GET, endpoint.getPhoto, { params: { photoId } }),
    level: (photoId: string) => ask(levelRoute.GET, endpoint.getPhotoLevel, { params: { photoId, level: 0 } }),
    take: () => upload(bytes),
    remove: (photoId: string) => ask(photoRoute.DELETE, endpoint.deletePhoto, { params: { photoId } }),
  };

  test.each<[Role, Record<keyof typeof calls, number>]>([
    ["owner", { list: 200, read: 200, level: 200, take: 200, remove: 204 }],
    ["maker", { list: 200, read: 200, level: 200, take: 200, remove: 204 }],
    ["assistant", { list: 200, read: 200, level: 200, take: 200, remove: 403 }],
  ])("%s", async (role, expected) => {
    const { id } = await takeIn(shop.owner, bytes);
    await actAs(shop[role]);
    const statuses: Record<string, number> = {};
    for (const [name, make] of Object.entries(calls)) statuses[name] = (await make(id)).status;
    expect(statuses).toEqual(expected);
  });

  test("another shop's photograph is not found", async () => {
    const { id } = await takeIn(shop.owner, bytes);
    await actAs(other.owner);
    for (const make of [calls.read, calls.level, calls.remove]) expect((await make(id)).status).toBe(404);
    expect((await readLoosePhotos(other.owner, 100)).some((found) => found.id === id)).toBe(false);
    expect(await database().select().from(photo).where(eq(photo.id, id))).toHaveLength(1);
  });
});

async function animated(): Promise<Uint8Array> {
  const frame = (background: string) =>
    sharp({ create: { width: 20, height: 20, channels: 3, background } })
      .png()
      .toBuffer();
  const frames = [await frame("#804020"), await frame("#204080")];
  return new Uint8Array(
    await sharp(frames, { join: { animated: true } })
      .webp()
      .toBuffer(),
  );
}

/** The smallest GIF: one pixel. */
function gif(): Uint8Array {
  return new Uint8Array(Buffer.from("R0lGODlhAQABAIAAAAAAAP///yH5BAEAAAAALAAAAAABAAEAAAIBRAA7", "base64"));
}

async function bomb(): Promise<Uint8Array> {
  const create = { width: 9000, height: 10_000, channels: 3, background: "#888888" } as const;
  return new Uint8Array(await sharp({ create, limitInputPixels: false }).png({ compressionLevel: 9 }).toBuffer());
}
