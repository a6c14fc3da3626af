/** What a run of loose pieces is worth as it lies: the parts that are means over seams and pieces, every seam, and what is left. */
import { kerfsOf } from "../fit/apart";
import { lyingPieces } from "../fit/lying-piece";
import type { StockRect } from "../frame/point";
import type { FaceLayout } from "../pattern/face-layout";
import type { PieceId, StockId } from "../piece";
import { leastCells } from "./board-side";
import { clearValue, roomAt } from "./clear-room";
import { matchValue, stepValue } from "./correlation";
import { largestRect } from "./largest-rest";
import type { LooseRequest } from "./loose-request";
import { boundedArea } from "./place-areas";
import { inStock, type SeamValue, seamValueOf } from "./place-value";
import { liesIn, type ProfileWindow, profileIn } from "./profile-window";
import { readProfiles } from "./read-profiles";
import { seamGround } from "./seam-ground";
import { type FixedSeam, type OwnSeam, planSeams } from "./seam-plan";
import { lagOf, type SeamReadings } from "./seam-readings";
import type { SearchPicture } from "./search-picture";
import type { Slices } from "./slices";
import { usableCells } from "./usable-cells";

export interface LooseValue {
  /** (w_match · match + w_clear · clear) / (w_match + w_clear), over the parts that apply, 0..1. */
  readonly total: number;
  /** Match and step as for a set, over the seams of the pieces that move; null without such a seam. Clear: mean over those pieces. */
  readonly parts: { readonly match: number | null; readonly step: number | null; readonly clear: number };
  readonly seams: readonly SeamValue[];
  /** The largest rectangle worth keeping that is left of the board. */
  readonly leaves: StockRect | null;
}

type PictureOf = (stockId: StockId) => SearchPicture | null;

/** In slices. Null where a moving piece does not lie on the board, or reaches over its picture. */
export function* looseValue(
  layout: FaceLayout,
  moving: ReadonlySet<PieceId>,
  request: LooseRequest,
  pictureOf: PictureOf,
): Slices<LooseValue | null> {
  const { board, picture } = request.side;
  const here = lyingPieces(layout).filter(({ stockId }) => stockId === board.id);
  const lying = here.filter(({ id }) => moving.has(id));
  const { own, fixed } = planSeams(seamGround(layout, (id) => moving.has(id), pictureOf));
  const windows = [...own.flatMap(({ first, second }) => [first, second]), ...fixed.map(({ moving: window }) => window)];
  if (lying.length < moving.size || !windows.every((window) => liesIn(picture, window))) return null;

  const readings = [...own.map((seam) => readOwn(picture, seam)), ...fixed.map((seam) => readFixed(picture, seam))];
  const mean = (value: (reading: SeamReadings) => number) =>
    readings.length === 0 ? null : readings.reduce((sum, reading) => sum + value(reading), 0) / readings.length;
  const areas = board.keepClear.map(({ area }) => boundedArea(area));
  const parts = {
    match: mean(({ match }) => matchValue(match[0] as number)),
    step: mean((reading) => stepValue(reading.match[0] as number, reading.peak[0] as number, lagOf(reading, 0))),
    clear: lying.reduce((sum, piece) => sum + clearValue(roomAt([piece], areas, 0, 0)), 0) / Math.max(1, lying.length),
  };
  const cells = yield* usableCells(board, here, kerfsOf(layout));
  const rest = yield* largestRect(cells, leastCells(request.leastOffcut));
  return {
    total: totalOfLoose(parts, request.weights),
    parts,
    seams: [...own, ...fixed].map((seam, index) => seamValueOf(seam, readings[index] as SeamReadings)),
    leaves: rest === null ? null : inStock(rest),
  };
}

function totalOfLoose({ match, clear }: LooseValue["parts"], weights: LooseRequest["weights"]): number {
  const weight = (match === null ? 0 : weights.match) + weights.clear;
  return weight > 0 ? ((match === null ? 0 : weights.match * match) + weights.clear * clear) / weight : 0;
}

function readOwn(picture: SearchPicture, { first, second, rows, reversed }: OwnSeam): SeamReadings {
  const profile = (window: ProfileWindow) => inDirection(profileIn(picture, { ...window, rows }), reversed, window.depth);
  return readProfiles(profile(first), profile(second));
}

function readFixed(picture: SearchPicture, { moving, moves, rows, still, stillDepth }: FixedSeam): SeamReadings {
  const mine = inDirection(profileIn(picture, { ...moving, rows }), moving.reversed, moving.depth);
  const other = inDirection(still.slice(), moving.reversed, stillDepth);
  return moves === "a" ? readProfiles(mine, other) : readProfiles(other, mine);
}

/** Profiles come in the direction of y; a seam that runs against it is read the other way. */
function inDirection(grey: Int32Array, reversed: boolean, depth: number) {
  return { grey: reversed ? grey.reverse() : grey, depth };
}
