/** The cut order on paper, read back from the file. */
import sharp from "sharp";
import { beforeAll, describe, expect, test } from "vitest";
import { umFromMm } from "@/lib/layout";
import type { Order } from "@/lib/schemas/order";
import { orderSteps } from "@/lib/schemas/order-steps";
import { orderPdf } from "@/lib/server/print/order-pdf";
import type { Paper } from "@/lib/server/print/paper";
import { firstOfAll } from "@/lib/words/caution";
import { makeOrder } from "../support/make-order";
import { makeRest } from "../support/make-rest";
import { pdfFonts, pdfPages, pdfPictures, pdfText } from "../support/read-pdf";

let jpeg: Uint8Array;
beforeAll(async () => {
  jpeg = await sharp({ create: { width: 1600, height: 143, channels: 3, background: "#7a5a3c" } })
    .jpeg()
    .toBuffer();
});

async function print(order: Order, paper: Paper, timeZone = "Europe/Berlin"): Promise<Uint8Array> {
  const pictures = new Map(order.snapshot.boards.map(({ straighteningId }) => [straighteningId, { jpeg }]));
  return orderPdf({ order, timeZone, benchUrl: `https://wood.example/bench/${order.id}`, pictures }, paper);
}

/** Words as they are read, line breaks and columns closed up. */
const plain = (pages: readonly string[]) => pages.join(" ").replace(/\s+/g, " ");

/** A printer leaves 4–5 mm bare (common practice, no source): 12 points. */
const bare = 12;

describe.each([
  ["3 fronts", { frontsPerBoard: 1, boards: 1 }],
  ["some 30 steps", { frontsPerBoard: 12, frontMm: { width: 150, height: 184 } }],
  ["some 300 steps", { boards: 6, frontsPerBoard: 22, frontMm: { width: 90, height: 184 } }],
] as const)("an order of %s", (_, change) => {
  describe.each(["a4", "letter"] as const)("on %s", (paper) => {
    test.each(["mm", "inch"] as const)("in %s has every step once, numbered pages and no word off the page", async (units) => {
      const order = await makeOrder({ ...change, units });
      const pdf = await print(order, paper);
      const pages = pdfPages(pdf);
      const [width, height] = paper === "a4" ? [595.28, 841.89] : [612, 792];
      for (const page of pages) {
        expect(page.width).toBeCloseTo(width, 1);
        expect(page.height).toBeCloseTo(height, 1);
        for (const word of page.words) {
          expect(word.left, word.text).toBeGreaterThanOrEqual(bare);
          expect(word.top, word.text).toBeGreaterThanOrEqual(bare);
          expect(word.right, word.text).toBeLessThanOrEqual(width - bare);
          expect(word.bottom, word.text).toBeLessThanOrEqual(height - bare);
        }
      }
      const texts = pdfText(pdf);
      for (const [i, text] of texts.entries()) expect(plain([text])).toContain(`page ${i + 1} of ${texts.length}`);
      // Step numbers stand in the first column, larger than those of the drawing.
      const numbers = pages.flatMap(({ words }) =>
        words
          .filter(({ left, right, top, bottom, text }) => left >= 37 && right <= 62 && bottom - top > 11 && /^\d+$/.test(text))
          .sort((a, b) => a.top - b.top),
      );
      expect(numbers.map(({ text }) => Number(text))).toEqual(orderSteps(order.snapshot).map(({ number }) => number));
      expect(plain(texts)).toContain(firstOfAll);
    });
  });
});

test("says what, from where, which setting and what it gives", async () => {
  const text = plain(pdfText(await print(await makeOrder(), "a4")));
  expect(text).toContain("Cut order 18");
  expect(text).toContain("Map chest for the reading room");
  expect(text).toContain("Revision A");
  expect(text).toContain("issued 14 Mar 2026 by Mats Lind");
  expect(text).toContain("Board B-041, black walnut, 2350.0 × 210.0 × 26.0, rack 2 left");
  expect(text).toContain("Panel saw, thin blade, kerf 2.4; true kerf:");
  expect(text).toMatch(/Rip the (lower|upper) edge off, strip A stays/);
  expect(text).toMatch(/Crosscut front 2 from strip A.* 243\.6/);
  expect(text).toContain("finished 243.2 × 184.0");
  expect(text).toContain("Label and rack what is left offcut C1");
  expect(text).toMatch(/Along the strip: fronts 972\.8 .*= board 2350\.0 mm\./);
});

test("figures of the check add up as printed", async () => {
  for (const units of ["mm", "inch"] as const) {
    const text = plain(pdfText(await print(await makeOrder({ units, boards: 2 }), "letter")));
    const checks = [...text.matchAll(/By area: (.*?) = board ([\d.]+) /g)];
    expect(checks).toHaveLength(2);
    for (const [, parts, whole] of checks) {
      const sum = [...(parts ?? "").matchAll(/[\d.]+/g)].reduce((total, [figure]) => total + Number(figure), 0);
      expect(sum).toBeCloseTo(Number(whole), 6);
    }
  }
});

test("inches are printed as fractions with the fraction slash", async () => {
  const text = plain(pdfText(await print(await makeOrder({ units: "inch" }), "letter")));
  expect(text).toContain("92 17⁄32 × 8 9⁄32 × 1 1⁄32");
  expect(text).toContain("In inches.");
});

test("the day is the shop's: issued late on the 14th in UTC is the 15th in Auckland", async () => {
  const order = { ...(await makeOrder()), issuedAt: "2026-03-14T20:30:00.000Z" };
  expect(plain(pdfText(await print(order, "a4", "Pacific/Auckland")))).toContain("issued 15 Mar 2026");
});

test("the photograph is embedded as the JPEG it is, the fonts are embedded, the rest is vectors", async () => {
  const pdf = await print(await makeOrder(), "a4");
  expect(pdfPictures(pdf)).toEqual([{ encoding: "jpeg", widthPx: 1600, heightPx: 143 }]);
  expect(Buffer.from(pdf).includes(Buffer.from(jpeg))).toBe(true);
  const fonts = pdfFonts(pdf);
  expect(fonts.length).toBeGreaterThanOrEqual(3);
  for (const { name, embedded } of fonts) {
    expect(name).toMatch(/\+(AtkinsonHyperlegibleNext|SofiaSansCondensed)/);
    expect(embedded).toBe(true);
  }
});

test("a board without a picture is drawn without one", async () => {
  const order = await makeOrder();
  const pdf = await orderPdf({ order, timeZone: "UTC", benchUrl: "https://wood.example/bench/x", pictures: new Map() }, "a4");
  expect(pdfPictures(pdf)).toEqual([]);
  expect(pdfPages(pdf).length).toBeGreaterThanOrEqual(1);
});

test("every page of a superseded revision says so, and none of one that holds", async () => {
  const superseded = pdfText(await print(await makeOrder({ superseded: true, boards: 3 }), "letter"));
  expect(superseded.length).toBeGreaterThan(2);
  for (const text of superseded) expect(text).toContain("SUPERSEDED 15 Mar 2026, 14:05. Do not cut from this sheet");
  for (const text of pdfText(await print(await makeOrder(), "letter"))) expect(text).not.toContain("SUPERSEDED");
});

test("words without a space wrap, and stay on the page", async () => {
  const long = "Donaudampfschifffahrtselektrizitätenhauptbetriebswerkbauunterbeamtengesellschaftsschrank".padEnd(118, "x");
  const pages = pdfPages(
    await print(await makeOrder({ jobTitle: long, sawName: long.slice(0, 80), place: long.slice(0, 80) }), "a4"),
  );
  for (const { width, words } of pages) for (const word of words) expect(word.right, word.text).toBeLessThanOrEqual(width - bare);
  expect(pages[0]?.words.map(({ text }) => text).join("")).toContain(long);
});

test("the same order gives the same bytes", async () => {
  const order = await makeOrder();
  expect(Buffer.from(await print(order, "a4")).equals(Buffer.from(await print(order, "a4")))).toBe(true);
});

describe("the rest of an order that was begun", () => {
  const found = (order: Order, stepId: string) => [
    { kind: "kerf" as const, stepId, kerf: umFromMm(3.6), reach: "all" as const },
    { kind: "spoiled" as const, boardId: order.snapshot.boards[0]?.boardId ?? "", pieceId: "p2", usable: null },
  ];

  test("says before the steps what is cut, what is in hand, what was found and what is done about it", async () => {
    const order = await makeRest({ doneTo: "2", found }, { kerfMm: 3.2, cleanUpMm: 0 });
    const text = plain(pdfText(await print(order, "a4")));
    expect(text).toContain("Revision B");
    expect(text).toContain("Already cut by revision A: do not cut it again");
    expect(text).toMatch(/B-041, by revision A: front 1 cut\. In hand: Strip A, [\d.]+ × 184\.0/);
    expect(text).toContain("Kerf 3.6 mm instead of 3.2 mm, at every cut (Asha Noor).");
    expect(text).toContain("Front 2 is spoiled; front 2 can be cut from strip A.");
    expect(text).toContain("Panel saw, thin blade, kerf 3.6; true kerf:");
    expect(text.indexOf("Already cut")).toBeLessThan(text.indexOf("do this"));
  });

  test("its wood adds up as printed, what was spoiled with it", async () => {
    const order = await makeRest({ doneTo: "2", found }, { kerfMm: 3.2, cleanUpMm: 0 });
    const [, parts = "", whole] = /By area: (.*?) = board ([\d.]+) /.exec(plain(pdfText(await print(order, "letter")))) ?? [];
    const sum = [...parts.matchAll(/[\d.]+/g)].reduce((total, [figure]) => total + Number(figure), 0);
    expect(sum).toBeCloseTo(Number(whole), 6);
  });

  test("an order that nothing was cut of says nothing of the kind", async () => {
    expect(plain(pdfText(await print(await makeOrder(), "a4")))).not.toContain("Already cut");
  });
});
