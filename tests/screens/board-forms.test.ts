import { describe, expect, test } from "vitest";
import { checkDraft, emptyDraft } from "@/components/board/board-draft";
import { boardEventWords } from "@/components/board/board-event-words";
import { minorFromText, minorText, moneyText } from "@/components/board/money";
import { readPercent } from "@/components/board/read-percent";
import { newUpload, uploadsAfter } from "@/components/photo/upload-list-state";
import { umFromMm } from "@/lib/layout";

describe("money", () => {
  test.each([
    ["84", "EUR", 8400],
    ["84,5", "EUR", 8450],
    ["0.07", "USD", 7],
    ["1200", "JPY", 1200],
    ["12.5", "JPY", undefined],
    ["84.505", "EUR", undefined],
    ["-3", "EUR", undefined],
    ["about 80", "EUR", undefined],
  ])("%s in %s", (text, currency, minor) => {
    expect(minorFromText(text, currency)).toBe(minor);
    if (minor !== undefined) expect(minorFromText(minorText(minor, currency), currency)).toBe(minor);
  });

  test("prints with the sign of its currency", () => {
    expect(moneyText(18650, "EUR")).toBe("€186.50");
    expect(moneyText(1200, "JPY")).toBe("JP¥1,200");
  });
});

test.each([
  ["", null],
  ["8,2", 8.2],
  ["12.0 %", 12],
  ["100", 100],
  ["101", undefined],
  ["wet", undefined],
])("a moisture of %j reads as %j", (text, percent) => {
  expect(readPercent(text)).toBe(percent);
});

describe("a draft of a board", () => {
  test("says below each field what is missing", () => {
    const checked = checkDraft({ ...emptyDraft, cost: "much" }, "EUR");
    expect(checked).toMatchObject({
      ok: false,
      errors: { species: expect.any(String), thickness: expect.any(String), cost: expect.any(String) },
    });
  });

  test("that is sound becomes the fields that are sent", () => {
    const checked = checkDraft({ ...emptyDraft, species: " Ash ", thickness: umFromMm(27), cost: "" }, "EUR");
    expect(checked).toMatchObject({ ok: true, fields: { species: "Ash", thickness: 27_000, costMinor: null } });
  });
});

describe("a board's story", () => {
  test("tells what was carried over to a new version, and what was not", () => {
    const detail = { version: 2, areasFrom: 1, outline: "cut", areasKept: 3, areasDropped: 1 };
    expect(boardEventWords({ verb: "straightened", detail })).toBe(
      "Version 2 done, from version 1: its outline cut to the new size; 3 keep-clear areas kept; 1 keep-clear area dropped because off the board now",
    );
    expect(boardEventWords({ verb: "straightened", detail: { version: 1 } })).toBe("Version 1 done");
  });

  test("names the fields that were changed", () => {
    expect(boardEventWords({ verb: "changed", detail: { before: {}, after: { place: "loft", costMinor: 1 } } })).toBe(
      "Changed place, cost",
    );
  });
});

describe("the list of uploads", () => {
  test("turns a file of more than 40 MB away before it is sent", () => {
    const file = new File([new Uint8Array(41 * 1024 * 1024)], "huge.jpg");
    expect(newUpload(file, "k").progress).toMatchObject({
      is: "failed",
      mayRetry: false,
      message: expect.stringContaining("41.0 MB"),
    });
  });

  test("keeps the key of a file through a retry", () => {
    const upload = newUpload(new File(["x"], "a.jpg"), "the-key");
    const failed = uploadsAfter([upload], { event: "moved", key: "the-key", progress: { is: "cancelled" } });
    const again = uploadsAfter(failed, { event: "moved", key: "the-key", progress: { is: "waiting" } });
    expect(again).toEqual([upload]);
    expect(uploadsAfter(again, { event: "removed", key: "the-key" })).toEqual([]);
  });
});
