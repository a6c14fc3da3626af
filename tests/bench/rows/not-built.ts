/** Rows whose subject does not exist yet. They stand in the table so that nobody takes their silence for a number. */
import type { Row } from "../row";

export const rackRow: Row = {
  name: "rack",
  what: "search over a rack of 200 boards, in the pool's threads on two cores",
  against: "the search of one board, 200 times",
  aim: { kind: "at most", ratio: 0.6 },
  measure: async () => ({ kind: "not built yet", why: "there is no search over the rack" }),
};

export const guillotineRow: Row = {
  name: "guillotine",
  what: "cutting sheets: optimum on published instances, and how soon",
  against: "a general solver of mixed integer programs",
  aim: { kind: "at most", ratio: 1 },
  measure: async () => ({ kind: "not built yet", why: "there are no sheets of core yet" }),
};
