/** What is suggested to be kept clear on drawn wood. Rates on grown wood: `sawn-knots.test.ts`. */
import { describe, expect, test } from "vitest";
import { type StockPicture, suggestKeepClear } from "@/lib/layout";
import { drawnWood, randomFigure } from "./drawn-wood";

const BOARD = { lengthMm: 300, widthMm: 90, pxPerMm: 2, figure: randomFigure(3) } as const;

/** A disc of rings on end, darker than the wood, with a black rim. */
function knotAt(x0: number, y0: number, radius: number) {
  return (x: number, y: number, grey: number) => {
    const off = Math.hypot(x - x0, y - y0);
    if (off > radius) return grey;
    return off > radius - 1.5 ? 40 : 90 + 15 * Math.sin(2.5 * off);
  };
}

/** The picture turned end for end. */
function turned({ pixels, pxPerMm }: StockPicture): StockPicture {
  const { width, height, channels, data } = pixels;
  const pixel = (i: number) => data.subarray(i * channels, (i + 1) * channels);
  const back = new Uint8Array(data.length);
  for (let i = 0; i < width * height; i++) back.set(pixel(width * height - 1 - i), i * channels);
  return { pixels: { ...pixels, data: back }, pxPerMm };
}

describe("suggested keep-clear areas", () => {
  test("a drawn knot is found where and about as large as it is", () => {
    for (const [x, y, radius] of [
      [80, 40, 10],
      [200, 60, 15],
      [150, 30, 6],
    ] as const) {
      const found = suggestKeepClear(drawnWood({ ...BOARD, over: knotAt(x, y, radius) }));
      expect(found).toHaveLength(1);
      const { kind, area, score } = found[0] as (typeof found)[number];
      expect(kind).toBe("knot");
      expect(Math.hypot(area.centre.x / 1000 - x, area.centre.y / 1000 - y)).toBeLessThan(2);
      const meanRadius = Math.sqrt(area.radiusX * area.radiusY) / 1000;
      expect(meanRadius / radius).toBeGreaterThan(0.7);
      expect(meanRadius / radius).toBeLessThan(1.6);
      expect(score).toBeGreaterThan(0.8);
      expect(score).toBeLessThanOrEqual(1);
    }
  });

  test("nothing is suggested on clear wood, on a dark band along the grain, or where there is only noise", () => {
    const band = (_: number, y: number, grey: number) => (Math.abs(y - 45) < 8 ? grey - 60 : grey);
    for (const wood of [{}, { slope: 0.1 }, { over: band }, { figure: () => 0 }, { figure: () => 0, noise: 10 }]) {
      expect(suggestKeepClear(drawnWood({ ...BOARD, ...wood }))).toEqual([]);
    }
  });

  test("marks of a saw across the whole board are no knots, and a knot among them is found", () => {
    const marks = (x: number, grey: number) => (x % 5 < 0.5 ? grey + 20 : grey);
    expect(suggestKeepClear(drawnWood({ ...BOARD, over: (x, _, grey) => marks(x, grey) }))).toEqual([]);
    const knot = knotAt(120, 45, 12);
    const found = suggestKeepClear(drawnWood({ ...BOARD, over: (x, y, grey) => marks(x, knot(x, y, grey)) }));
    expect(found).toHaveLength(1);
    expect(Math.abs((found[0]?.area.centre.x ?? 0) / 1000 - 120)).toBeLessThan(3);
  });

  test("a knot that a long edge cuts is found, its area held by nothing but its own shape", () => {
    const found = suggestKeepClear(drawnWood({ ...BOARD, over: knotAt(120, 86, 12) }));
    expect(found).toHaveLength(1);
    expect(Math.abs((found[0]?.area.centre.x ?? 0) / 1000 - 120)).toBeLessThan(3);
    expect((found[0]?.area.centre.y ?? 0) / 1000).toBeGreaterThan(74);
  });

  test("a board turned end for end has the turned suggestions", () => {
    const over = (x: number, y: number, grey: number) => knotAt(70, 30, 9)(x, y, knotAt(210, 55, 13)(x, y, grey));
    const wood = drawnWood({ ...BOARD, over });
    const [straight, back] = [suggestKeepClear(wood), suggestKeepClear(turned(wood))];
    expect(straight).toHaveLength(2);
    expect(back).toHaveLength(2);
    const byX = back
      .map(({ area }) => ({ x: 300_000 - area.centre.x, y: 90_000 - area.centre.y, rx: area.radiusX }))
      .sort((a, b) => a.x - b.x);
    [...straight]
      .sort((a, b) => a.area.centre.x - b.area.centre.x)
      .forEach(({ area }, i) => {
        const other = byX[i] as (typeof byX)[number];
        expect(Math.hypot(area.centre.x - other.x, area.centre.y - other.y)).toBeLessThan(500);
        expect(Math.abs(area.radiusX / other.rx - 1)).toBeLessThan(0.05);
      });
  });

  test("the same picture gives the same suggestions, surest first", () => {
    const over = (x: number, y: number, grey: number) => knotAt(70, 30, 9)(x, y, knotAt(210, 55, 13)(x, y, grey));
    const [one, two] = [suggestKeepClear(drawnWood({ ...BOARD, over })), suggestKeepClear(drawnWood({ ...BOARD, over }))];
    expect(two).toEqual(one);
    expect(one.map(({ score }) => score)).toEqual([...one.map(({ score }) => score)].sort((a, b) => b - a));
  });
});
