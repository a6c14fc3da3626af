import { describe, expect, test } from "vitest";
import { dayText } from "@/lib/words/day";

describe("a day", () => {
  test("is written with the month as a word", () => {
    expect(["2027-03-14", "2027-12-01", "2028-02-29"].map(dayText)).toEqual(["14 Mar 2027", "1 Dec 2027", "29 Feb 2028"]);
  });

  test.each(["", "14 Mar 2027", "2027-03-14T10:00:00Z", "2027-13-01"])("%j is none", (text) => {
    expect(() => dayText(text)).toThrow(RangeError);
  });
});
