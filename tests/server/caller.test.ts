/** Whose address counts, with and without proxies of our own in front. */
import { describe, expect, it } from "vitest";
import { callerAddress } from "@/lib/server/http/caller";

const from = (entries: string) => new Headers({ "x-forwarded-for": entries });

describe("the caller's address", () => {
  it("is unknown where no proxy of ours could have written it", () => {
    expect(callerAddress(from("203.0.113.9"), 0)).toBeNull();
  });

  it("is what our outermost proxy saw, whatever the caller wrote before it", () => {
    expect(callerAddress(from("made-up, 198.51.100.7"), 1)).toBe("198.51.100.7");
    expect(callerAddress(from("made-up, 198.51.100.7, 10.0.0.2"), 2)).toBe("198.51.100.7");
  });

  it("is unknown where fewer entries stand than proxies", () => {
    expect(callerAddress(from("198.51.100.7"), 2)).toBeNull();
    expect(callerAddress(new Headers(), 1)).toBeNull();
  });
});
