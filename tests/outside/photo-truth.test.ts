/**
 * Accuracy on synthetic photographs whose every point is known, where the folder ../shared lies beside the project. Marked at the
 * true corners, positions are right within 0.3 mm or half a photo pixel where the lens does not bend, and within one photo pixel
 * after edge points where it does.
 */
import fs from "node:fs";
import path from "node:path";
import sharp, { type Sharp } from "sharp";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { z } from "zod";
import {
  type EdgePoint,
  type FourCorners,
  fitMarking,
  type Marking,
  type MarkingFit,
  photoFromStockMm,
  stockMmFromPhoto,
  umFromMm,
} from "@/lib/layout";
import { closePixelPool, straighten } from "@/lib/server/pictures/pixel-pool";
import { bundlePixelWorker } from "../support/bundle-pixel-worker";

const folder = path.resolve(process.cwd(), "../shared/photos/truth");
const present = fs.existsSync(folder);
const names = [
  ...["walnut-flat", "oak-quarter", "pine-knots", "cherry-oblique", "pine-phone"],
  ...Array.from({ length: 8 }, (_, leaf) => `flitch-walnut/leaf0${leaf}`),
];

const pair = z.tuple([z.number(), z.number()]);
const truthSchema = z.object({
  size_mm: pair,
  corners_px: z.tuple([pair, pair, pair, pair]),
  homography_mm_to_px: z.tuple([z.array(z.number()), z.array(z.number()), z.array(z.number())]),
  upright_px: pair,
  distortion: z.object({ k1: z.number(), center: pair, norm: z.number() }),
});
type Truth = z.output<typeof truthSchema>;

interface Point {
  readonly x: number;
  readonly y: number;
}

const truthOf = (name: string): Truth =>
  truthSchema.parse(JSON.parse(fs.readFileSync(path.join(folder, `${name}.json`), "utf8")));

/** Reckoned from the truth file alone, with none of the product's code: stock mm → photo px. */
function seen({ homography_mm_to_px: rows, distortion: { k1, center, norm } }: Truth, { x, y }: Point): Point {
  const [u, v, w] = rows.map(([a = 0, b = 0, c = 0]) => a * x + b * y + c) as [number, number, number];
  const dx = u / w - center[0];
  const dy = v / w - center[1];
  const flat = Math.hypot(dx, dy) / norm;
  let low = 0;
  let high = 2;
  for (let i = 0; i < 100; i++) {
    const r = (low + high) / 2;
    if (r * (1 + k1 * r * r) < flat) low = r;
    else high = r;
  }
  const factor = flat === 0 ? 1 : low / flat;
  return { x: center[0] + dx * factor, y: center[1] + dy * factor };
}

function markingOf(truth: Truth): Marking {
  const [length, width] = truth.size_mm;
  const [a, b, c, d] = truth.corners_px;
  const at = ([x, y]: readonly [number, number]): Point => ({ x, y });
  const corners: FourCorners = [at(a), at(b), at(c), at(d)];
  const along = [0.08, 0.25, 0.42, 0.58, 0.75, 0.92];
  const edgePoints: EdgePoint[] = along.flatMap((t) => [
    { edge: "top", photo: seen(truth, { x: t * length, y: 0 }) },
    { edge: "bottom", photo: seen(truth, { x: t * length, y: width }) },
  ]);
  return {
    reference: { kind: "board", length: umFromMm(length), width: umFromMm(width) },
    corners,
    extraPoints: [],
    edgePoints: truth.distortion.k1 === 0 ? [] : edgePoints,
  };
}

function fitOf(truth: Truth, marking: Marking): Extract<MarkingFit, { ok: true }> {
  const fit = fitMarking(marking, { width: truth.upright_px[0], height: truth.upright_px[1] });
  if (!fit.ok) throw new Error(JSON.stringify(fit.refusal));
  return fit;
}

function grid([length, width]: readonly [number, number], columns: number, rows: number, margin: number): Point[] {
  return Array.from({ length: columns * rows }, (_, i) => ({
    x: margin + ((length - 2 * margin) * (i % columns)) / (columns - 1),
    y: margin + ((width - 2 * margin) * Math.floor(i / columns)) / (rows - 1),
  }));
}

const distance = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);

describe.skipIf(!present)(
  present ? "synthetic photographs" : "synthetic photographs (skipped: ../shared/photos/truth is not there)",
  () => {
    beforeAll(bundlePixelWorker);
    afterAll(closePixelPool);

    test.each(names)("%s: every point of the board is where the truth says", (name) => {
      const truth = truthOf(name);
      const fit = fitOf(truth, markingOf(truth));
      const points = grid(truth.size_mm, 33, 9, 0);
      const worstMm = Math.max(...points.map((p) => distance(stockMmFromPhoto(fit.geometry, seen(truth, p)), p)));
      const worstPx = Math.max(...points.map((p) => distance(photoFromStockMm(fit.geometry, p), seen(truth, p))));
      if (truth.distortion.k1 === 0) {
        expect(worstMm).toBeLessThanOrEqual(Math.max(0.3, 0.5 / fit.scale.photoPxPerMm));
      } else {
        expect(fit.lens.kind).toBe("taken-out");
        expect(worstPx).toBeLessThanOrEqual(1);
      }
    });

    test.each(["cherry-oblique", "pine-phone"])("%s: without edge points the bending shows, with them it is gone", (name) => {
      const truth = truthOf(name);
      const exact = markingOf(truth);
      const points = grid(truth.size_mm, 33, 9, 0);
      const worst = (edgePoints: readonly EdgePoint[]): number => {
        const { geometry } = fitOf(truth, { ...exact, edgePoints });
        return Math.max(...points.map((p) => distance(photoFromStockMm(geometry, p), seen(truth, p))));
      };
      // Fixed sine waves stand in for a hand that is off by up to half a pixel each way.
      const shaky = exact.edgePoints.map(({ edge, photo: p }, i) => ({
        edge,
        photo: { x: p.x + 0.5 * Math.sin(12.9 * i + 1), y: p.y + 0.5 * Math.sin(78.2 * i + 2) },
      }));
      const without = worst([]);
      expect(without).toBeGreaterThan(3);
      expect(worst(exact.edgePoints)).toBeLessThan(0.001);
      expect(worst(shaky)).toBeLessThan(without / 2);
    });

    test.each(["walnut-flat", "oak-quarter", "pine-knots", "cherry-oblique", "pine-phone", "flitch-walnut/leaf03"])(
      "%s: the pixels themselves lie there, from the file to the stored level",
      async (name) => {
        const truth = truthOf(name);
        const file = fs.readFileSync(path.join(folder, `${name}.jpg`));
        const outcome = await straighten({ source: file, marking: markingOf(truth) });
        if (!outcome.ok) throw new Error(JSON.stringify(outcome.refusal));
        const level = outcome.levels[0];
        expect([outcome.length, outcome.width]).toEqual(truth.size_mm.map(umFromMm));
        expect(level).toMatchObject({ widthPx: outcome.widthPx, heightPx: outcome.heightPx });
        expect(Math.abs(outcome.widthPx - truth.size_mm[0] * outcome.pxPerMm)).toBeLessThanOrEqual(0.5);

        const picture = await grey(sharp(level?.bytes));
        const photo = await grey(sharp(file).autoOrient());
        const { photoPxPerMm } = fitOf(truth, markingOf(truth)).scale;
        const allowedMm = truth.distortion.k1 === 0 ? Math.max(0.3, 0.5 / photoPxPerMm) : 1 / photoPxPerMm;
        const shifts = grid(truth.size_mm, 7, 3, 22).map((p) => patchShiftMm(truth, photo, picture, outcome.pxPerMm, p));
        const worst = Math.max(...shifts);
        expect(worst).toBeLessThanOrEqual(allowedMm);
      },
      60_000,
    );
  },
);

interface Grey {
  readonly data: Uint8Array;
  readonly width: number;
  readonly height: number;
}

async function grey(image: Sharp): Promise<Grey> {
  const { data, info } = await image.greyscale().raw().toBuffer({ resolveWithObject: true });
  return { data, width: info.width, height: info.height };
}

/** How far the picture's patch round a stock point must be moved to look most like the photo at its true place, mm. */
function patchShiftMm(truth: Truth, photo: Grey, picture: Grey, pxPerMm: number, centre: Point): number {
  const half = 24;
  const reach = 4;
  const cx = Math.round(centre.x * pxPerMm);
  const cy = Math.round(centre.y * pxPerMm);
  const expected: number[] = [];
  for (let y = -half; y < half; y++) {
    for (let x = -half; x < half; x++) {
      expected.push(bilinear(photo, seen(truth, { x: (cx + x + 0.5) / pxPerMm, y: (cy + y + 0.5) / pxPerMm })));
    }
  }
  const misfit = (dx: number, dy: number): number => {
    let sum = 0;
    let i = 0;
    for (let y = -half; y < half; y++) {
      for (let x = -half; x < half; x++) {
        const at = (cy + y + dy) * picture.width + cx + x + dx;
        sum += ((picture.data[at] ?? Number.NaN) - (expected[i++] as number)) ** 2;
      }
    }
    return sum;
  };
  let best = { dx: 0, dy: 0, cost: Number.POSITIVE_INFINITY };
  for (let dy = -reach; dy <= reach; dy++) {
    for (let dx = -reach; dx <= reach; dx++) {
      const cost = misfit(dx, dy);
      if (cost < best.cost) best = { dx, dy, cost };
    }
  }
  const x = best.dx + vertex(misfit(best.dx - 1, best.dy), best.cost, misfit(best.dx + 1, best.dy));
  const y = best.dy + vertex(misfit(best.dx, best.dy - 1), best.cost, misfit(best.dx, best.dy + 1));
  return Math.hypot(x, y) / pxPerMm;
}

/** Where the parabola through three values a step apart is least, from the middle one. */
function vertex(before: number, at: number, after: number): number {
  const curve = before - 2 * at + after;
  return curve > 0 ? (before - after) / (2 * curve) : 0;
}

function bilinear({ data, width, height }: Grey, p: Point): number {
  const x = Math.min(width - 1.001, Math.max(0, p.x - 0.5));
  const y = Math.min(height - 1.001, Math.max(0, p.y - 0.5));
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  const value = (dx: number, dy: number): number => data[(iy + dy) * width + ix + dx] as number;
  const top = value(0, 0) + (value(1, 0) - value(0, 0)) * (x - ix);
  const bottom = value(0, 1) + (value(1, 1) - value(0, 1)) * (x - ix);
  return top + (bottom - top) * (y - iy);
}
