import { describe, expect, test } from "vitest";
import { changedState, clearedState, filterCount, isUnfiltered, rackAddress, readRackState } from "@/components/rack/rack-query";

const start = readRackState({});

describe("the address of the rack", () => {
  test("is bare at the start, and holds whatever differs", () => {
    expect(rackAddress(start)).toBe("/rack");
    expect(rackAddress({ ...start, search: "white oak", sort: "length", direction: "down", view: "table" })).toBe(
      "/rack?search=white+oak&sort=length&direction=down&view=table",
    );
  });

  test("reads back to the same state", () => {
    const state = {
      ...start,
      search: "B-041 & co",
      minLengthUm: 1_200_000,
      cut: "rift",
      free: "yes",
      page: 3,
      view: "table",
    } as const;
    const params = Object.fromEntries(new URL(rackAddress(state), "http://here.example").searchParams);
    expect(readRackState(params)).toEqual(state);
  });

  test("drops what cannot be read, and keeps the rest", () => {
    const state = readRackState({
      sort: "colour",
      page: "-2",
      cut: ["rift", "flat"],
      minWidthUm: "wide",
      view: "sideways",
      species: "Ash",
    });
    expect(state).toEqual({ ...start, cut: "rift", species: "Ash" });
  });
});

describe("a change", () => {
  const third = { ...start, page: 3 };
  test("of a filter or the order begins at the first page; of the view it stays", () => {
    expect(changedState(third, { species: "Ash" }).page).toBe(1);
    expect(changedState(third, { sort: "width" }).page).toBe(1);
    expect(changedState(third, { view: "table" }).page).toBe(3);
    expect(changedState(third, { page: 4 }).page).toBe(4);
  });

  test("back to all boards keeps order and view, and counts no filter", () => {
    const state = clearedState({ ...third, species: "Ash", search: "x", sort: "width", view: "table" });
    expect(state).toEqual({ ...start, sort: "width", view: "table" });
    expect(filterCount({ ...state, free: "no", minWidthUm: 5 })).toBe(2);
    expect(isUnfiltered(state)).toBe(true);
    expect(isUnfiltered({ ...state, search: "x" })).toBe(false);
  });
});
