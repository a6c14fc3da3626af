import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { fitMarking, type MarkingFit } from "@/lib/layout/picture/fit-marking";
import {
  applyHomography,
  composeHomographies,
  type Homography,
  type MmPoint,
  type PhotoPoint,
} from "@/lib/layout/picture/homography";
import { lensOf, photoFromFlat } from "@/lib/layout/picture/lens";
import type { BoardEdge, EdgePoint, FourCorners, Marking } from "@/lib/layout/picture/marking";
import { paperSizes } from "@/lib/layout/picture/paper-sizes";
import { measureMm, stockMmFromPhoto } from "@/lib/layout/picture/photo-geometry";
import { um, umFromMm } from "@/lib/layout/units/um";

const photo = { width: 4000, height: 3000 };
/** A 1200 × 240 mm board seen from its left end, somewhat from below. */
const flatFromMm: Homography = [3.1, -0.25, 220, 0.05, 2.7, 1150, 7e-5, -1.6e-4, 1];
const LENGTH = 1200;
const WIDTH = 240;

function camera(k1: number): (p: MmPoint) => PhotoPoint {
  const lens = lensOf(photo, k1);
  return (p) => photoFromFlat(lens, applyHomography(flatFromMm, p));
}

const corners = (see: (p: MmPoint) => PhotoPoint, x: number, y: number, length: number, width: number): FourCorners => [
  see({ x, y }),
  see({ x: x + length, y }),
  see({ x: x + length, y: y + width }),
  see({ x, y: y + width }),
];

function edgePoints(see: (p: MmPoint) => PhotoPoint): EdgePoint[] {
  const along = [0.1, 0.3, 0.5, 0.7, 0.9];
  const on = (edge: BoardEdge, at: (t: number) => MmPoint): EdgePoint[] => along.map((t) => ({ edge, photo: see(at(t)) }));
  return [...on("top", (t) => ({ x: t * LENGTH, y: 0 })), ...on("bottom", (t) => ({ x: t * LENGTH, y: WIDTH }))];
}

function boardMarking(see: (p: MmPoint) => PhotoPoint, more: Partial<Marking> = {}): Marking {
  return {
    reference: { kind: "board", length: umFromMm(LENGTH), width: umFromMm(WIDTH) },
    corners: corners(see, 0, 0, LENGTH, WIDTH),
    extraPoints: [],
    edgePoints: [],
    ...more,
  };
}

function fitted(marking: Marking): Extract<MarkingFit, { ok: true }> {
  const fit = fitMarking(marking, photo);
  if (!fit.ok) throw new Error(JSON.stringify(fit.refusal));
  return fit;
}

/** Worst distance between where points of the wood are and where the fit says they are, mm. */
function worstMm(fit: Extract<MarkingFit, { ok: true }>, see: (p: MmPoint) => PhotoPoint): number {
  let worst = 0;
  for (let x = 0; x <= LENGTH; x += 100) {
    for (let y = 0; y <= WIDTH; y += 40) {
      const found = stockMmFromPhoto(fit.geometry, see({ x, y }));
      worst = Math.max(worst, Math.hypot(found.x - x, found.y - y));
    }
  }
  return worst;
}

describe("the board as its own measure", () => {
  test("four true corners bring every point of a straight photo to its place", () => {
    const fit = fitted(boardMarking(camera(0)));
    expect(worstMm(fit, camera(0))).toBeLessThan(1e-6);
    expect(fit.rmsMm).toBeLessThan(1e-9);
    expect(fit.lens).toEqual({ kind: "not-asked" });
  });

  test("the size in the result is the size asked for, to the micrometre", () => {
    const fit = fitted(boardMarking(camera(0)));
    expect([fit.length, fit.width]).toEqual([1_200_000, 240_000]);
    expect(measureMm(fit.geometry, camera(0)({ x: 0, y: 100 }), camera(0)({ x: 300, y: 500 }))).toBeCloseTo(500, 6);
  });

  test("extra points that agree leave no residual, a slip of five pixels shows in mm", () => {
    const see = camera(0);
    const extra = [{ photo: see({ x: 600, y: 120 }), at: { x: umFromMm(600), y: umFromMm(120) } }];
    expect(fitted(boardMarking(see, { extraPoints: extra })).rmsMm).toBeLessThan(1e-6);
    const slipped = extra.map((point) => ({ ...point, photo: { x: point.photo.x + 5, y: point.photo.y } }));
    const fit = fitted(boardMarking(see, { extraPoints: slipped }));
    expect(fit.rmsMm).toBeGreaterThan(0.2);
    expect(fit.residuals.find(({ mark }) => mark === "extra")?.mm).toBeGreaterThan(0.2);
  });

  test("a slip of sixty pixels is refused with the distance", () => {
    const see = camera(0);
    const at = see({ x: 600, y: 120 });
    const fit = fitMarking(
      boardMarking(see, { extraPoints: [{ photo: { x: at.x + 60, y: at.y }, at: { x: umFromMm(600), y: umFromMm(120) } }] }),
      photo,
    );
    expect(fit).toMatchObject({ ok: false, refusal: { reason: "residual" } });
    if (!fit.ok && fit.refusal.reason === "residual") expect(fit.refusal.mm).toBeGreaterThan(fit.refusal.limitMm);
  });
});

describe("the lens", () => {
  test.each([0.02, 0.012, -0.05, 0.15])("points along two edges give back k1 = %f and straighten the whole board", (k1) => {
    const see = camera(k1);
    const bent = fitted(boardMarking(see));
    const fit = fitted(boardMarking(see, { edgePoints: edgePoints(see) }));
    expect(fit.lens).toMatchObject({ kind: "taken-out" });
    expect(fit.geometry.lens.k1).toBeCloseTo(k1, 5);
    expect(worstMm(fit, see)).toBeLessThan(0.01);
    expect(worstMm(bent, see)).toBeGreaterThan(10 * worstMm(fit, see));
    if (fit.lens.kind === "taken-out") expect(fit.lens.afterMm).toBeLessThan(fit.lens.beforeMm / 100);
  });

  test("without bending it says that no term helps, and uses none", () => {
    const see = camera(0);
    // A hand's half pixel up and down.
    const shaky = edgePoints(see).map(({ edge, photo: p }, i) => ({
      edge,
      photo: { x: p.x, y: p.y + 0.5 * Math.sin(40 * i + 1) },
    }));
    const fit = fitted(boardMarking(see, { edgePoints: shaky }));
    expect(fit.lens.kind).toBe("no-help");
    expect(fit.geometry.lens.k1).toBe(0);
    expect(worstMm(fit, see)).toBeLessThan(0.3);
  });

  test("two edge points are too few to tell", () => {
    const see = camera(0.02);
    expect(fitted(boardMarking(see, { edgePoints: edgePoints(see).slice(0, 2) })).lens).toEqual({
      kind: "too-few",
      points: 2,
      needed: 3,
    });
  });

  test("edge points said to lie on the wrong edge are refused by number", () => {
    const see = camera(0);
    const wrong = edgePoints(see).map((point, i) => (i === 2 ? { ...point, edge: "bottom" as const } : point));
    expect(fitMarking(boardMarking(see, { edgePoints: wrong }), photo)).toMatchObject({
      ok: false,
      refusal: { reason: "edge-point-off", index: 2 },
    });
  });
});

describe("a sheet lying on the board", () => {
  const turned = (deg: number, x: number, y: number): Homography => {
    const cos = Math.cos((deg * Math.PI) / 180);
    const sin = Math.sin((deg * Math.PI) / 180);
    return [cos, -sin, x, sin, cos, y, 0, 0, 1];
  };

  function sheetMarking(k1: number, deg: number, size: { length: number; width: number }): Marking {
    const see = camera(k1);
    const place = turned(deg, 500, 20);
    const onSheet = (p: MmPoint): PhotoPoint => see(applyHomography(place, p));
    return {
      reference: {
        kind: "sheet",
        length: um(size.length * 1000),
        width: um(size.width * 1000),
        corners: corners(onSheet, 0, 0, size.length, size.width),
      },
      corners: corners(see, 0, 0, LENGTH, WIDTH),
      extraPoints: [],
      edgePoints: k1 === 0 ? [] : edgePoints(see),
    };
  }

  test.each([0, 3, -12, 93])("turned by %f degrees it measures the board and puts the origin at its corner", (deg) => {
    const fit = fitted(sheetMarking(0, deg, { length: 210, width: 148 }));
    expect(Math.abs(fit.length - 1_200_000)).toBeLessThanOrEqual(1);
    expect(Math.abs(fit.width - 240_000)).toBeLessThanOrEqual(1);
    expect(worstMm(fit, camera(0))).toBeLessThan(1e-5);
  });

  test("edge points straighten the lens here too", () => {
    const fit = fitted(sheetMarking(0.03, 3, { length: 210, width: 148 }));
    expect(fit.geometry.lens.k1).toBeCloseTo(0.03, 4);
    expect(worstMm(fit, camera(0.03))).toBeLessThan(0.05);
  });

  test("the smaller the sheet, the more a pixel's slip is said to cost", () => {
    const large = fitted(sheetMarking(0, 0, { length: 297, width: 210 })).mmPerPixelOfMark;
    const small = fitted(sheetMarking(0, 0, { length: 85, width: 54 })).mmPerPixelOfMark;
    const own = fitted(boardMarking(camera(0))).mmPerPixelOfMark;
    expect(small).toBeGreaterThan(2 * large);
    expect(large).toBeGreaterThan(2 * own);
  });

  test("a board wider at one end is covered whole, laid along its longer edge", () => {
    const see = camera(0);
    const marking = sheetMarking(0, 0, { length: 210, width: 148 });
    const tapered: FourCorners = [see({ x: 0, y: 0 }), see({ x: 1200, y: 0 }), see({ x: 1195, y: 200 }), see({ x: 0, y: 240 })];
    const fit = fitted({ ...marking, corners: tapered });
    // Bottom edge: hypot(1195, 40) = 1195.67, so the top at 1200 is the longer.
    expect(fit.length).toBeCloseTo(1_200_000, -1);
    expect(fit.width).toBeCloseTo(240_000, -1);
    expect(fit.cornersMm[2]?.x).toBeCloseTo(1195, 3);
    expect(fit.cornersMm[2]?.y).toBeCloseTo(200, 3);
  });

  test("a sheet whose length and width have changed places is told, a rightly marked one is not", () => {
    const right = sheetMarking(0, 3, { length: 297, width: 210 });
    expect(fitted(right).sheetLooksTurned).toBe(false);
    expect(
      fitted({ ...right, reference: { ...right.reference, length: um(210_000), width: um(297_000) } }).sheetLooksTurned,
    ).toBe(true);
    expect(fitted(boardMarking(camera(0))).sheetLooksTurned).toBe(false);
  });

  test("paper sizes are those of the standards", () => {
    expect(paperSizes).toEqual({ a4: { lengthUm: 297_000, widthUm: 210_000 }, letter: { lengthUm: 279_400, widthUm: 215_900 } });
  });
});

describe("marks that are refused", () => {
  const good = corners(camera(0), 0, 0, LENGTH, WIDTH);
  const [a, b, c, d] = good;
  const refused = (marks: FourCorners, more: Partial<Marking> = {}): unknown => {
    const fit = fitMarking(boardMarking(camera(0), { corners: marks, ...more }), photo);
    return fit.ok ? "accepted" : fit.refusal;
  };

  test("corners that have changed places fold the board", () => {
    expect(refused([a, c, b, d])).toMatchObject({ reason: "folded" });
    expect(refused([a, b, d, c])).toMatchObject({ reason: "folded" });
  });

  test("the other way round would mirror the wood", () => {
    expect(refused([d, c, b, a])).toMatchObject({ reason: "mirrored" });
  });

  test("a corner that points inwards is named", () => {
    expect(refused([a, b, { x: (a.x + b.x + d.x) / 3, y: (a.y + b.y + d.y) / 3 }, d])).toMatchObject({
      reason: "not-convex",
      corner: 2,
    });
  });

  test("three marks in line", () => {
    expect(refused([a, { x: (a.x + c.x) / 2, y: (a.y + c.y) / 2 }, c, d])).toMatchObject({ reason: "in-line", corner: 1 });
  });

  test("marks on one spot are too small, by how much is said", () => {
    expect(refused([a, a, c, d])).toEqual({ reason: "tiny", of: "board", sidePx: 0, neededPx: 12 });
  });

  test("outside the photo, or not a number", () => {
    expect(refused([a, b, c, { x: -400, y: 2000 }])).toMatchObject({
      reason: "outside-photo",
      mark: "corner",
      index: 3,
      byPx: 400,
    });
    expect(refused([a, b, { x: Number.NaN, y: 0 }, d])).toMatchObject({ reason: "outside-photo", index: 2 });
  });

  test("length and width that have changed places", () => {
    const swapped = { kind: "board", length: umFromMm(WIDTH), width: umFromMm(LENGTH) } as const;
    expect(refused(good, { reference: swapped })).toMatchObject({ reason: "too-flat" });
  });

  test("one end impossibly nearer than the other", () => {
    expect(
      refused([
        { x: 100, y: 100 },
        { x: 3900, y: 1480 },
        { x: 3900, y: 1520 },
        { x: 100, y: 2900 },
      ]),
    ).toMatchObject({ reason: "scale-varies" });
  });

  test("a size of nothing", () => {
    expect(refused(good, { reference: { kind: "board", length: um(0), width: um(240_000) } })).toEqual({
      reason: "size",
      of: "board",
    });
  });

  const point = fc.record({
    x: fc.double({ min: -50, max: 4050, noNaN: true }),
    y: fc.double({ min: -50, max: 3050, noNaN: true }),
  });
  const anyFour = fc.tuple(point, point, point, point);
  const finite = (fit: MarkingFit): boolean =>
    !fit.ok ||
    [...fit.geometry.stockMmFromFlat, fit.rmsMm, fit.mmPerPixelOfMark, fit.scale.widthPx, fit.scale.heightPx].every(
      Number.isFinite,
    );

  test("whatever four points are marked, the answer is a fit of finite numbers or a reason", () => {
    fc.assert(
      fc.property(anyFour, (marks) => finite(fitMarking(boardMarking(camera(0), { corners: marks }), photo))),
      { numRuns: 500 },
    );
  });

  test("the same with any sheet on any board, and with edge points anywhere", () => {
    const edges = fc.array(fc.record({ photo: point, edge: fc.constantFrom<BoardEdge>("top", "right", "bottom", "left") }), {
      maxLength: 6,
    });
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    // Rectangles with every corner moved by up to a third of a side; wholly free points would nearly all be refused.
    const quadrilateral = fc
      .tuple(point, share, share, fc.array(share, { minLength: 8, maxLength: 8 }))
      .map(([from, w, h, moves]): FourCorners => {
        const width = 100 + 2500 * w;
        const height = 100 + 1500 * h;
        const at = (i: number, right: number, down: number): PhotoPoint => ({
          x: from.x / 3 + width * (right + ((moves[i] ?? 0) - 0.5) / 1.5),
          y: from.y / 3 + height * (down + ((moves[i + 1] ?? 0) - 0.5) / 1.5),
        });
        return [at(0, 0, 0), at(2, 1, 0), at(4, 1, 1), at(6, 0, 1)];
      });
    let accepted = 0;
    fc.assert(
      fc.property(quadrilateral, quadrilateral, edges, (sheet, board, edgePoints) => {
        const reference = { kind: "sheet", length: um(297_000), width: um(210_000), corners: sheet } as const;
        const fit = fitMarking({ reference, corners: board, extraPoints: [], edgePoints }, photo);
        if (fit.ok) accepted++;
        return finite(fit);
      }),
      { numRuns: 500 },
    );
    expect(accepted).toBeGreaterThan(5);
  });
});

describe("the scale of the picture", () => {
  const seenAt = (pxPerMm: number, length: number, width: number, size: { width: number; height: number }): MarkingFit => {
    const map = composeHomographies([pxPerMm, 0, 20, 0, pxPerMm, 20, 0, 0, 1], [1, 0, 0, 0, 1, 0, 0, 0, 1]);
    const see = (p: MmPoint): PhotoPoint => applyHomography(map, p);
    const reference = { kind: "board", length: umFromMm(length), width: umFromMm(width) } as const;
    return fitMarking({ reference, corners: corners(see, 0, 0, length, width), extraPoints: [], edgePoints: [] }, size);
  };

  test("is 4 px/mm where the photo holds that", () => {
    expect(seenAt(6, 600, 200, photo)).toMatchObject({
      scale: { pxPerMm: 4, widthPx: 2400, heightPx: 800, limitedBy: "wanted" },
    });
  });

  test("never enlarges the photo more than 1.5 times", () => {
    expect(seenAt(1.5, 2400, 240, photo)).toMatchObject({
      scale: { pxPerMm: 2.25, widthPx: 5400, heightPx: 540, limitedBy: "photo" },
    });
  });

  test("keeps within what a worker's memory and a browser's canvas hold", () => {
    const fit = seenAt(3.4, 3500, 1000, { width: 12_000, height: 5_000 });
    expect(fit).toMatchObject({ ok: true, scale: { limitedBy: "memory" } });
    if (fit.ok) expect(fit.scale.widthPx * fit.scale.heightPx).toBeLessThanOrEqual(40_100_000);
  });
});
