/** Seams read from drawn wood, whose every step follows from the piece maps alone. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type FacePoint,
  type Isometry,
  type Piece,
  quarterTurn,
  readSeams,
  type Seam,
  type SeamReading,
  type StockPicture,
  um,
  umFromMm,
} from "@/lib/layout";
import { drawnWood, randomFigure } from "./drawn-wood";

/** Just long enough for a seam's wood: piece A ends at 13 mm, B begins at 16. */
const BOARD = { lengthMm: 29, widthMm: 150 } as const;
const WINDOW_MM = 100;

/** A seam of the face 100 mm long from (60, 0) down, with a gap of 3 mm. */
const upright: Seam = seamAt({ x: umFromMm(60), y: um(0) }, WINDOW_MM);

function seamAt(from: FacePoint, lengthMm: number): Seam {
  const to = { x: from.x, y: um(from.y + umFromMm(lengthMm)) };
  const facing = { x: um(from.x + 3_000), y: from.y };
  return { a: "p1", b: "p2", from, to, facing, gap: um(3_000), normal: "right", jump: null };
}

function piece(id: string, stockId: string, stockFromFace: Isometry): Piece {
  return { id, label: id.slice(1), role: "front", outline: [], stockId, stockFromFace };
}

/** A shift by millimetres. */
const shift = (xMm: number, yMm: number): Isometry => quarterTurn(0, umFromMm(xMm), umFromMm(yMm));

interface Read {
  readonly seam?: Seam;
  readonly a: Isometry;
  readonly b: Isometry;
  readonly pictureA: StockPicture | null;
  readonly pictureB?: StockPicture | null;
}

function read({ seam = upright, a, b, pictureA, pictureB = pictureA }: Read): SeamReading {
  const pieces = [piece("p1", "A", a), piece("p2", "B", b)];
  const [reading, ...more] = readSeams([seam], pieces, (id) => (id === "A" ? pictureA : pictureB));
  expect(more).toEqual([]);
  if (reading === undefined) throw new Error("no reading");
  return reading;
}

function stepMm({ figure }: SeamReading): number {
  if (figure.kind !== "read") throw new Error(`not read: ${figure.why}`);
  return figure.step / 1000;
}

const whyOf = ({ figure }: SeamReading) => (figure.kind === "read" ? "read" : figure.why);

/** The pieces' windows begin so many millimetres down the board. */
const windows = (downA: number, downB: number) => ({ a: shift(-47, downA), b: shift(-47, downB) });

describe("step", () => {
  test("a front cut 3 mm further down the board shows its figure 3 mm further up: step −3", () => {
    const pictureA = drawnWood({ ...BOARD, pxPerMm: 4, figure: randomFigure(1) });
    const reading = read({ ...windows(20, 23), pictureA });
    expect(stepMm(reading)).toBeCloseTo(-3, 1);
    expect(reading.figure).toMatchObject({ kind: "read", peak: expect.closeTo(1, 1) });
    expect([reading.a, reading.b]).toEqual(["p1", "p2"]);
  });

  test("windows in an uncut board have step nil and match 1; match falls as they part", () => {
    const pictureA = drawnWood({ ...BOARD, pxPerMm: 4, figure: randomFigure(1) });
    const matches = [20, 20.5, 21.5].map((down) => {
      const { figure } = read({ ...windows(20, down), pictureA });
      return figure.kind === "read" ? figure.match : Number.NaN;
    });
    expect(stepMm(read({ ...windows(20, 20), pictureA }))).toBeCloseTo(0, 1);
    expect(matches[0]).toBeGreaterThan(0.97);
    expect(matches[1]).toBeLessThan(matches[0] as number);
    expect(matches[2]).toBeLessThan(matches[1] as number);
  });

  test("follows from the maps: any step, slope, scale, turn and reflection, on one board or two of one figure", () => {
    const cases = fc.record({
      figure: fc.integer({ min: 1, max: 1e6 }),
      slope: fc.double({ min: -0.4, max: 0.4, noNaN: true }),
      down: fc.double({ min: -6, max: 6, noNaN: true }),
      scales: fc.tuple(fc.double({ min: 1.5, max: 4, noNaN: true }), fc.double({ min: 1.5, max: 4, noNaN: true })),
      turned: fc.boolean(),
      mirrored: fc.boolean(),
    });
    fc.assert(
      fc.property(cases, ({ figure, slope, down, scales, turned, mirrored }) => {
        const [pictureA, pictureB] = scales.map((pxPerMm, i) =>
          drawnWood({ ...BOARD, pxPerMm, figure: randomFigure(figure), slope, seed: figure + i }),
        ) as [StockPicture, StockPicture];
        // The board as it lies, or end for end, or upside down, or both: A's edge at 13 or 16 mm, B's facing it.
        const lay = (downMm: number): Isometry => ({
          ...{ a: turned ? -1 : 1, b: 0, c: 0, d: mirrored ? -1 : 1 },
          tx: umFromMm(turned ? 76 : -47),
          ty: umFromMm(mirrored ? WINDOW_MM + downMm : downMm),
        });
        const reading = read({ a: lay(25), b: lay(25 + down), pictureA, pictureB });
        // Lines sink by the slope over the 3 mm of the gap; both turn round with the way the face looks at the board.
        const across = mirrored ? -1 : 1;
        const along = turned ? -1 : 1;
        expect(Math.abs(stepMm(reading) - across * (along * slope * 3 - down))).toBeLessThan(0.15);
      }),
      { numRuns: 25 },
    );
  });

  test("strangers are told as such in at least nineteen of twenty, and no step is ever claimed beyond the reach", () => {
    const readings = Array.from({ length: 40 }, (_, i) => {
      const [one, other] = [2 * i + 1, 2 * i + 2].map((seed) =>
        drawnWood({ lengthMm: 20, widthMm: 110, pxPerMm: 2, figure: randomFigure(seed), seed }),
      ) as [StockPicture, StockPicture];
      return read({ a: shift(-40, 5), b: shift(-63, 5), pictureA: one, pictureB: other });
    });
    expect(readings).toHaveLength(40);
    expect(readings.filter(({ figure }) => figure.kind === "read").length).toBeLessThanOrEqual(2);
    for (const { figure } of readings) if (figure.kind === "read") expect(Math.abs(figure.step)).toBeLessThan(8_250);
  });
});

describe("cannot tell", () => {
  const figure = randomFigure(4);
  const pictureA = drawnWood({ ...BOARD, pxPerMm: 3, figure });
  const same = windows(20, 20);

  test("a piece that is not laid, a board without a picture", () => {
    const [lone] = readSeams([upright], [piece("p1", "A", same.a)], () => pictureA);
    expect(lone).toMatchObject({ meanB: null, figure: { kind: "cannotTell", why: "notLaid" } });
    expect(lone?.meanA).not.toBeNull();
    expect(read({ ...same, pictureA, pictureB: null })).toMatchObject({ meanB: null, figure: { why: "noPicture" } });
  });

  test("a seam of 30 mm, a seam that lies off the picture, and one that has only 30 mm on it", () => {
    const short = seamAt({ x: umFromMm(60), y: um(0) }, 30);
    expect(whyOf(read({ ...same, seam: short, pictureA }))).toBe("tooShort");
    const off = read({ a: same.a, b: shift(0, 20), pictureA });
    expect(off).toMatchObject({ meanB: null, figure: { why: "outsidePicture" } });
    expect(whyOf(read({ a: same.a, b: shift(-47, 120), pictureA }))).toBe("outsidePicture");
  });

  test("half a seam on the picture is enough if it is long enough", () => {
    expect(stepMm(read({ a: shift(-47, 70), b: shift(-47, 72), pictureA }))).toBeCloseTo(-2, 1);
  });

  test("fronts above each other: the board lies along the seam, whatever its picture shows", () => {
    const wood = drawnWood({ lengthMm: 150, widthMm: 150, pxPerMm: 2, figure });
    const lying = (down: number) => quarterTurn(1, umFromMm(100), umFromMm(down));
    for (let down = 5; down < 60; down += 5) {
      const seam = seamAt({ x: umFromMm(40), y: um(0) }, 60);
      expect(whyOf(read({ seam, a: lying(down), b: lying(down + 5), pictureA: wood }))).toBe("grainAlongSeam");
    }
  });

  test("grain that the picture shows along the seam, though the board lies across it", () => {
    const over = (x: number) => 130 + 40 * figure(x);
    const turned = drawnWood({ ...BOARD, pxPerMm: 3, figure, over });
    expect(whyOf(read({ ...same, pictureA: turned }))).toBe("grainAlongSeam");
  });

  test("a board that shows nothing but noise, and one that shows no one direction", () => {
    expect(whyOf(read({ ...same, pictureA: drawnWood({ ...BOARD, pxPerMm: 3, figure: () => 0, noise: 6 }) }))).toBe("noGrain");
    const burr = (x: number, y: number) => 130 + 25 * figure(y) + 25 * figure(x + 500);
    const burrWood = drawnWood({ ...BOARD, pxPerMm: 3, figure, over: burr });
    expect(["noGrain", "noLikeness"]).toContain(
      whyOf(read({ ...same, pictureA: burrWood, pictureB: drawnWood({ ...BOARD, pxPerMm: 3, figure: randomFigure(8) }) })),
    );
  });

  test("a likeness that is greatest at the end of the reach, and two that are as good as each other", () => {
    expect(whyOf(read({ ...windows(15, 23.4), pictureA }))).toBe("beyondReach");
    const rings = (mm: number) => Math.sin((2 * Math.PI * mm) / 5);
    const nearlyEven = drawnWood({ ...BOARD, pxPerMm: 3, figure: (mm) => 0.6 * rings(mm) + 0.25 * figure(mm) });
    expect(whyOf(read({ ...windows(20, 22.5), pictureA: nearlyEven }))).toBe("twoAnswers");
    // Rings without a fault are like any other such rings: no likeness that says anything.
    expect(whyOf(read({ ...windows(20, 22.5), pictureA: drawnWood({ ...BOARD, pxPerMm: 3, figure: rings }) }))).toBe(
      "noLikeness",
    );
  });
});

describe("mean colours", () => {
  test("are those of the wood beside the seam, taken in light and not in display values", () => {
    const { pixels } = drawnWood({ ...BOARD, pxPerMm: 2, figure: () => 0 });
    const data = new Uint8Array(pixels.data.length);
    // A's side: lines of 60 and 200 in turn; B's side red.
    for (let i = 0; i < data.length; i += 3) {
      const [x, y] = [(i / 3) % pixels.width, Math.floor(i / 3 / pixels.width)];
      if (x < 2 * 14.5) data.fill(y % 2 === 0 ? 60 : 200, i, i + 3);
      else data.set([180, 20, 10], i);
    }
    const reading = read({ ...windows(20, 20), pictureA: { pixels: { ...pixels, data }, pxPerMm: 2 } });
    const light = (byte: number) => ((byte / 255 + 0.055) / 1.055) ** 2.4;
    const mean = 255 * (1.055 * ((light(60) + light(200)) / 2) ** (1 / 2.4) - 0.055);
    for (const channel of reading.meanA ?? []) expect(channel).toBeCloseTo(mean, 6);
    expect(reading.meanB?.map((channel) => Math.round(channel))).toEqual([180, 20, 10]);
  });
});
