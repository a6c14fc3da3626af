import { describe, expect, test } from "vitest";
import { jobListAddress, readJobListState } from "@/components/job/use-job-list-state";

const read = (query: string) => readJobListState(new URLSearchParams(query));

describe("the address of the list of jobs", () => {
  test("leaves out what stands at its start", () => {
    expect(jobListAddress(read(""))).toBe("/jobs");
  });

  test.each(["?state=closed", "?search=map+chest", "?state=closed&search=%E2%80%9Cq%E2%80%9D&page=3"])(
    "%s comes back as it was",
    (query) => {
      expect(jobListAddress(read(query))).toBe(`/jobs${query}`);
    },
  );

  test.each(["?page=0", "?page=-1", "?page=two", "?state=lost"])("%s falls back to the start", (query) => {
    expect(read(query)).toEqual({ state: "open", search: "", page: 1 });
  });
});
