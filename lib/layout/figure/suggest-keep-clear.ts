/**
 * Suggests areas to keep clear: knots, told by three signs together. There is contrast along the grain; no line in the place runs
 * with the grain; and it is darker than the wood before and after it along the grain, which bands and streaks are not. For a maker to
 * look at and take up or leave, never applied by themselves.
 *
 * That grain flows round a knot was tried as a fourth sign and told nothing that these do not.
 */

import type { KeepClearKind, KeepClearShape } from "../stock/board";
import { umFromMm } from "../units/um";
import { type TensorSums, tensorOver, tensorSums } from "./gradients";
import { type GreyPicture, greyPicture } from "./grey-picture";
import { type KnotPlace, knotPlaces, LEAST_CONTRAST } from "./knot-places";
import type { StockPicture } from "./stock-picture";
import { coherenceOf, lineDirection } from "./structure-tensor";
import { meanOver, type Sums, sumsOf } from "./sums";

export interface KeepClearSuggestion {
  readonly kind: Extract<KeepClearKind, "knot">;
  /** May overhang the board's edge, as knots do. */
  readonly area: Extract<KeepClearShape, { shape: "ellipse" }>;
  /** 0…1: how far the three signs rise from what is just enough to what leaves no doubt, as their geometric mean. */
  readonly score: number;
}

/** Knots of 4 mm radius still have eight pixels across, and sensor noise and fibre are averaged away. */
const KNOT_PX_PER_MM = 1;
/** From what is just enough of a sign to what leaves no doubt. */
const SIGNS = {
  /** Logarithm of the ratio to the board's own contrast along the grain: 12 to 90 times. */
  contrast: [LEAST_CONTRAST, Math.log(90)],
  /** 1: all lines run with the grain; 0: no direction; −1: all across it. Clear wood has 0.8 and more, arches' tips 0.7. */
  withGrain: [0.65, 0],
  /** Logarithm of light before and after along the grain over light within: 3 % is about what the eye tells at all, 12 % catches it. */
  darkness: [0.03, 0.12],
} as const;
/** Least product of the three: two signs beyond doubt carry a third that has risen by a tenth, three middling ones carry each other. */
const LEAST_TOGETHER = 0.1;
/** Lines within 50° of the board's length go with the grain: it swerves that far beside a knot. */
const SWERVE_RAD = (50 * Math.PI) / 180;
/** Of two places one of which lies within twice the other's ellipse the weaker is a part of the stronger. */
const ONE_KNOT = 2;

/** From the surest down. */
export function suggestKeepClear(picture: StockPicture): KeepClearSuggestion[] {
  const grey = greyPicture(picture, KNOT_PX_PER_MM);
  const { places, gradients } = knotPlaces(grey);
  const light = sumsOf(grey.light, grey.width, grey.height);
  const tensors = tensorSums(gradients, grey.width, grey.height);
  const scored = places.flatMap((place) => {
    const score = scoreOf(place, light, tensors);
    return score === null ? [] : [{ place, score }];
  });
  // Sorting is stable, so of equals the one with more contrast stays first.
  scored.sort((a, b) => b.score - a.score);
  const kept: typeof scored = [];
  for (const one of scored) {
    if (!kept.some(({ place }) => isWithin(one.place, place, ONE_KNOT) || isWithin(place, one.place, 1))) kept.push(one);
  }
  return kept.map(({ place, score }) => ({ kind: "knot", area: areaOf(place, grey), score }));
}

/** null where a sign is missing, or all are weak. */
function scoreOf(place: KnotPlace, light: Sums, tensors: TensorSums): number | null {
  const darkness = darknessOf(place, light);
  if (darkness === null) return null;
  const signs = [
    risen(place.contrast, SIGNS.contrast),
    risen(withGrain(place, tensors), SIGNS.withGrain),
    risen(darkness, SIGNS.darkness),
  ];
  if (signs.some((sign) => sign < 0)) return null;
  const product = signs.reduce((all, sign) => all * Math.min(1, sign), 1);
  return product < LEAST_TOGETHER ? null : Math.cbrt(product);
}

function risen(value: number, [enough, certain]: readonly [number, number]): number {
  return (value - enough) / (certain - enough);
}

/** Half width and height of the upright box round a place's ellipse. */
function halfBox({ long, short, turn }: KnotPlace): { readonly x: number; readonly y: number } {
  return {
    x: Math.hypot(long * Math.cos(turn), short * Math.sin(turn)),
    y: Math.hypot(long * Math.sin(turn), short * Math.cos(turn)),
  };
}

/** Against the darker of the two sides, so that an arch's tip, darker than one side only, is none; null without a side. */
function darknessOf(place: KnotPlace, light: Sums): number | null {
  const { x, y } = place;
  const half = halfBox(place);
  const [top, bottom] = [y - 0.8 * half.y, y + 0.8 * half.y];
  const within = meanOver(light, x - 0.8 * half.x, top, x + 0.8 * half.x, bottom);
  const before = meanOver(light, x - 3 * half.x, top, x - 1.5 * half.x, bottom);
  const after = meanOver(light, x + 1.5 * half.x, top, x + 3 * half.x, bottom);
  const sides = [before, after].filter((side) => side !== null);
  if (within === null || sides.length === 0) return null;
  return Math.log(Math.max(1, Math.min(...sides)) / Math.max(1, within));
}

/** How far lines inside run with the grain (1), any way (0) or across it (−1). */
function withGrain(place: KnotPlace, tensors: TensorSums): number {
  const { x, y } = place;
  const half = halfBox(place);
  const tensor = tensorOver(tensors, x - 0.7 * half.x, y - 0.7 * half.y, x + 0.7 * half.x, y + 0.7 * half.y);
  const coherence = coherenceOf(tensor);
  return Math.abs(lineDirection(tensor)) < SWERVE_RAD ? coherence : -coherence;
}

/** Whether a place's centre lies within another's ellipse made `times` as large. */
function isWithin(place: KnotPlace, other: KnotPlace, times: number): boolean {
  const dx = place.x - other.x;
  const dy = place.y - other.y;
  const u = (dx * Math.cos(other.turn) + dy * Math.sin(other.turn)) / (times * other.long);
  const v = (dy * Math.cos(other.turn) - dx * Math.sin(other.turn)) / (times * other.short);
  return u * u + v * v < 1;
}

function areaOf({ x, y, long, short, turn }: KnotPlace, { pxPerMm }: GreyPicture): KeepClearSuggestion["area"] {
  return {
    shape: "ellipse",
    centre: { x: umFromMm(x / pxPerMm), y: umFromMm(y / pxPerMm) },
    radiusX: umFromMm(long / pxPerMm),
    radiusY: umFromMm(short / pxPerMm),
    turnDeg: (turn * 180) / Math.PI,
  };
}
