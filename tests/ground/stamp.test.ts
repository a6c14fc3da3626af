import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterEach, beforeEach, expect, test } from "vitest";
import { isStamped, stampOf } from "../../scripts/ground/stamp.mjs";

let base = "";

beforeEach(() => {
  base = fs.mkdtempSync(path.join(os.tmpdir(), "grainwright-stamp-"));
  fs.mkdirSync(path.join(base, "app", "deep"), { recursive: true });
  fs.writeFileSync(path.join(base, "app", "deep", "page.tsx"), "one");
  fs.writeFileSync(path.join(base, "next.config.ts"), "two");
});

afterEach(() => fs.rmSync(base, { recursive: true }));

const stamp = () => stampOf(base, ["app", "next.config.ts", "not-there"], ["fact"]);

test("the stamp stays the same while nothing changes, whatever the times of the files", () => {
  const before = stamp();
  fs.utimesSync(path.join(base, "next.config.ts"), 0, 0);
  expect(stamp()).toBe(before);
});

test("the stamp changes with a deep file's contents, name, appearance and disappearance, and with a fact", () => {
  const page = path.join(base, "app", "deep", "page.tsx");
  const seen = [stamp(), stampOf(base, ["app", "next.config.ts"], ["another fact"])];
  fs.writeFileSync(page, "three");
  seen.push(stamp());
  fs.renameSync(page, path.join(base, "app", "deep", "other.tsx"));
  seen.push(stamp());
  fs.writeFileSync(path.join(base, "not-there"), "");
  seen.push(stamp());
  fs.rmSync(path.join(base, "next.config.ts"));
  seen.push(stamp());
  expect(new Set(seen).size).toBe(seen.length);
});

test("text that moves from one file to the next changes the stamp", () => {
  fs.writeFileSync(path.join(base, "a"), "xy");
  fs.writeFileSync(path.join(base, "b"), "z");
  const before = stampOf(base, ["a", "b"]);
  fs.writeFileSync(path.join(base, "a"), "x");
  fs.writeFileSync(path.join(base, "b"), "yz");
  expect(stampOf(base, ["a", "b"])).not.toBe(before);
});

test("a missing stamp file never matches", () => {
  expect(isStamped(path.join(base, "no.stamp"), stamp())).toBe(false);
});
