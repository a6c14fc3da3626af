import { describe, expect, test } from "vitest";
import { revisionLetter } from "@/lib/words/revision-letter";

describe("letters of revisions", () => {
  test("count A, B, C … without I and O", () => {
    const first = Array.from({ length: 24 }, (_, i) => revisionLetter(i + 1));
    expect(first.join("")).toBe("ABCDEFGHJKLMNPQRSTUVWXYZ");
  });

  test("go on with two letters after Z, none twice", () => {
    expect([24, 25, 26, 48, 49].map(revisionLetter)).toEqual(["Z", "AA", "AB", "AZ", "BA"]);
    const many = Array.from({ length: 2000 }, (_, i) => revisionLetter(i + 1));
    expect(new Set(many).size).toBe(2000);
    expect(many.join("")).not.toMatch(/[IO]/);
  });

  test.each([0, -1, 1.5, Number.NaN])("%d is no revision", (revision) => {
    expect(() => revisionLetter(revision)).toThrow(RangeError);
  });
});
