/** A blank on paper: what is fetched, how it is glued up, and where its joints are. */
import { describe, expect, test } from "vitest";
import { umFromMm } from "@/lib/layout";
import type { Gluing } from "@/lib/schemas/gluing";
import { orderPdf } from "@/lib/server/print/order-pdf";
import { makeOrder } from "../support/make-order";
import { pdfPages, pdfText } from "../support/read-pdf";

const strip = (tag: string, topMm: number, heightMm: number, endForEnd = false): Gluing["members"][number] => ({
  boardId: "0190a0a0-0000-7000-8000-00000000000a",
  tag,
  species: "black walnut",
  place: "rack 2 left",
  thickness: umFromMm(26),
  length: umFromMm(2350),
  width: umFromMm(heightMm + 1.5),
  straighteningId: "0190a0a0-0000-7000-8000-00000000000b",
  side: "face",
  endForEnd,
  rect: { x: umFromMm(0), y: umFromMm(topMm), width: umFromMm(2350), height: umFromMm(heightMm) },
  takes: { upper: umFromMm(topMm > 0 ? 1.5 : 0), lower: umFromMm(topMm > 0 ? 0 : 1.5) },
});
const gluing: Gluing = { jointing: umFromMm(1.5), members: [strip("B-007", 0, 100), strip("B-012", 100, 110, true)] };

async function printed(change: Parameters<typeof makeOrder>[0]) {
  const order = await makeOrder(change);
  const print = { order, timeZone: "Europe/Oslo", benchUrl: "https://shop.example/bench/1", pictures: new Map() };
  return orderPdf(print, "a4");
}

describe("a cut order from a planned blank", () => {
  test("names the boards to fetch, with size and place, instead of the blank", async () => {
    const [first = ""] = pdfText(await printed({ gluing, glueLines: [umFromMm(100)] }));
    expect(first).toMatch(/Fetch\s+Board B-007, black walnut, 2350\.0 × 101\.5 × 26\.0/);
    expect(first).toMatch(/Board B-012, black walnut, 2350\.0 × 111\.5 × 26\.0/);
    expect(first.replace(/\s+/g, " ")).toContain("for blank B-041");
    expect(first).not.toMatch(/Board B-041, black walnut/);
  });

  test("has a row for every step of gluing up, with its cautions, before the cuts", async () => {
    const text = pdfText(await printed({ gluing, glueLines: [umFromMm(100)] })).join("\n");
    const order = ["Lay out the boards", "Joint the lower", "Glue up blank", "Mark board", "Crosscut front"].map((words) =>
      text.indexOf(words),
    );
    expect(order.every((at, i) => at > 0 && (i === 0 || at > (order[i - 1] ?? 0)))).toBe(true);
    const said = text.replace(/\s+/g, " ");
    for (const words of [
      "B-012 (turned",
      "bridge guard",
      "Glue by its maker",
      "Clamps are heavy",
      "B-007 2350.0 × 100.0",
      "B-041 2350.0 × 210.0",
    ])
      expect(said).toContain(words);
  });

  test("labels every strip on the drawing", async () => {
    const [first] = pdfPages(await printed({ gluing, glueLines: [umFromMm(100)] }));
    const table = first?.words.find(({ text }) => text === "setting,")?.top ?? 0;
    const tags = first?.words.filter(({ text, left, top }) => /^B-0(07|12)$/.test(text) && left > first.width / 2 && top < table);
    expect(tags?.map(({ text }) => text)).toEqual(["B-007", "B-012"]);
    expect((tags?.[1]?.top ?? 0) - (tags?.[0]?.top ?? 0)).toBeGreaterThan(8);
  });

  test("that is glued already fetches the blank itself", async () => {
    const [first = ""] = pdfText(await printed({ glueLines: [umFromMm(100)] }));
    expect(first).toMatch(/Fetch\s+Board B-041, black walnut/);
    expect(first).not.toContain("Glue up");
  });
});

test("fronts on the back of a board: the paper says to turn it over, before all steps", async () => {
  const [first = ""] = pdfText(await printed({ side: "back" }));
  const said = first.replace(/\s+/g, " ");
  expect(said.indexOf("Back up as in the picture: turn the board over")).toBeGreaterThan(0);
  expect(said.indexOf("Back up as in the picture: turn the board over")).toBeLessThan(said.indexOf("do this"));
  expect(said.match(/Back up as in the picture/g)).toHaveLength(2);
});
