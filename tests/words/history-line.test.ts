import { describe, expect, test } from "vitest";
import { historyLines, historyWords } from "@/lib/words/history-line";

describe("a line of the history", () => {
  test("begins with who did it", () => {
    const row = { noun: "board", verb: "entered", by: "Mats Lind", detail: {} };
    expect(historyWords(row)).toEqual({ by: "Mats Lind", before: "entered board", after: "" });
    expect(historyWords({ ...row, by: null }).by).toBe("The system");
  });

  test.each([
    ["layout changed", "Mats Lind changed the layout"],
    ["picture changed", "Mats Lind moved the layout to another picture"],
    ["areas drawn", "Mats Lind changed what is marked on its board"],
    ["issued again", "Mats Lind issued the layout again"],
    ["something else", "the layout was changed"],
    [undefined, "the layout was changed"],
  ])("of a superseded order begins with the order and tells why: %s", (reason, why) => {
    const words = historyWords({ noun: "order", verb: "superseded", by: "Mats Lind", detail: { reason } });
    expect(words).toEqual({ by: null, before: "", after: `was superseded: ${why}` });
  });

  test("stands for what one person did to one thing again and again", () => {
    const row = (id: string, by: string) => ({
      ...{ id, by, noun: "layout", nounId: "0", verb: "saved", detail: {}, label: "Top row", path: "/jobs" },
      at: "2026-03-14T09:30:00.000Z",
    });
    const lines = historyLines([row("1", "Mats Lind"), row("2", "Mats Lind"), row("3", "Orla Brandt"), row("4", "Mats Lind")]);
    expect(lines.map(({ row: { id }, times }) => [id, times])).toEqual([
      ["1", 2],
      ["3", 1],
      ["4", 1],
    ]);
  });
});
