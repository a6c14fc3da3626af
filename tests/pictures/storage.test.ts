import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { createFolderStorage, type Storage } from "@/lib/server/storage";

let root: string;
let storage: Storage;
beforeEach(() => {
  root = path.join(fs.mkdtempSync(path.join(os.tmpdir(), "storage-")), "files");
  storage = createFolderStorage(root);
});
afterEach(() => fs.rmSync(path.dirname(root), { recursive: true, force: true }));

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const streamOf = (...parts: string[]): ReadableStream<Uint8Array> =>
  new ReadableStream({
    start(controller) {
      for (const part of parts) controller.enqueue(bytes(part));
      controller.close();
    },
  });
const filesIn = (folder: string): string[] =>
  fs.readdirSync(folder, { recursive: true, encoding: "utf8" }).filter((name) => fs.statSync(path.join(folder, name)).isFile());

describe("folder storage", () => {
  test("gives back what was put, as bytes and as a stream, and leaves no drafts", async () => {
    await storage.put("shops/1/photos/7/original", bytes("oak"));
    await storage.put("shops/1/photos/7/level-0.jpg", streamOf("wal", "nut"));
    expect(Buffer.from((await storage.get("shops/1/photos/7/original")) ?? []).toString()).toBe("oak");
    const stored = await storage.stream("shops/1/photos/7/level-0.jpg");
    expect(stored?.bytes).toBe(6);
    expect(await new Response(stored?.stream).text()).toBe("walnut");
    expect(filesIn(root)).toHaveLength(2);
  });

  test("put again replaces the whole file", async () => {
    await storage.put("a", bytes("a long first text"));
    await storage.put("a", bytes("short"));
    expect(Buffer.from((await storage.get("a")) ?? []).toString()).toBe("short");
  });

  test("a stream that breaks off leaves the old file and nothing half written", async () => {
    await storage.put("a", bytes("old"));
    const breaking = new ReadableStream<Uint8Array>({
      pull(controller) {
        controller.enqueue(bytes("new"));
        controller.error(new Error("connection lost"));
      },
    });
    await expect(storage.put("a", breaking)).rejects.toThrow("connection lost");
    expect(Buffer.from((await storage.get("a")) ?? []).toString()).toBe("old");
    expect(filesIn(root)).toEqual(["a"]);
  });

  test("what is not there is null, not an error", async () => {
    expect(await storage.get("shops/none")).toBeNull();
    expect(await storage.stream("shops/none")).toBeNull();
    expect(await storage.exists("shops/none")).toBe(false);
    await storage.put("file", bytes("x"));
    expect(await storage.get("file/below")).toBeNull();
    await storage.remove("shops/none");
    await storage.removePrefix("shops");
  });

  test("removes one file, or all below a prefix but not its neighbours", async () => {
    for (const key of ["s/1/a", "s/1/b/c", "s/12/a"]) await storage.put(key, bytes(key));
    await storage.remove("s/1/a");
    expect(await storage.exists("s/1/a")).toBe(false);
    expect(await storage.exists("s/1/b/c")).toBe(true);
    await storage.removePrefix("s/1");
    expect(await storage.exists("s/1/b/c")).toBe(false);
    expect(await storage.exists("s/12/a")).toBe(true);
  });

  test.each([
    "",
    "/",
    "/etc/passwd",
    "a//b",
    "../a",
    "a/../../b",
    "a/.",
    ".drafts/x",
    "a\\b",
    "a\0",
    "a b",
    "ä",
    "x".repeat(301),
  ])("%j is no key", async (key) => {
    await expect((async () => storage.put(key, bytes("x")))()).rejects.toThrow("not a storage key");
    await expect((async () => storage.get(key))()).rejects.toThrow("not a storage key");
    await expect((async () => storage.removePrefix(key))()).rejects.toThrow("not a storage key");
    expect(fs.existsSync(path.join(root, ".."))).toBe(true);
  });
});
