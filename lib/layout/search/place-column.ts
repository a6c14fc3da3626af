/**
 * All picked places of one column at once. What a column shares is worked out once; after that one place costs what its seams cost,
 * and half its rows for symmetry.
 */
import { movesIntoArea } from "../fit/keep-clear";
import type { PieceId } from "../piece";
import { lowerRooms, ROOM_ENOUGH, roomOn } from "./clear-room";
import { matchValue, stepValue } from "./correlation";
import { type FixedSeamScratch, fixedSeamScratch, readFixedSeam, stillSums } from "./fixed-seam";
import { pieceAt } from "./laid-group";
import { partNames } from "./objective";
import { type OwnSeamScratch, ownSeamScratch, readOwnSeam } from "./own-seam";
import { type PrefixSums, prefixSums } from "./prefix-sums";
import type { Scene } from "./scene";
import { lagOf, type PickedRows, type SeamReadings, seamReadings } from "./seam-readings";

/** Working space for the columns of one scene, and what was read last, by index into the picked rows. */
export interface ColumnDesk {
  readonly scene: Scene;
  readonly own: OwnSeamScratch;
  readonly fixed: FixedSeamScratch;
  readonly still: readonly PrefixSums[];
  readonly bands: readonly PrefixSums[];
  readonly readings: SeamReadings;
  /** Sums over all seams. */
  readonly match: Float64Array;
  readonly step: Float64Array;
  /** Of the place last valued, in the order of `partNames`; NaN where a part does not apply. */
  readonly parts: Float64Array;
}

/** `most`: rows that may be picked at once. */
export function columnDesk(scene: Scene, most: number): ColumnDesk {
  const { height } = scene.side.picture;
  return {
    scene,
    own: ownSeamScratch(height),
    fixed: fixedSeamScratch(height),
    still: scene.seams.fixed.map(stillSums),
    bands: (scene.symmetry?.bands ?? []).map(() => prefixSums(height)),
    readings: seamReadings(most),
    match: new Float64Array(most),
    step: new Float64Array(most),
    parts: new Float64Array(partNames.length),
  };
}

interface SeamPieces {
  readonly a: PieceId;
  readonly b: PieceId;
}

/** Called after each seam with what it reads at the picked rows. */
export type OnSeam = (seam: SeamPieces, readings: SeamReadings) => void;

/** Adds up match and step over all seams at the picked rows, own seams first, each kind in the order of the face. */
export function readSeams(desk: ColumnDesk, column: number, picked: PickedRows, steps: boolean, onSeam?: OnSeam): void {
  const { scene, readings } = desk;
  const { wood } = scene.side;
  desk.match.fill(0, 0, picked.count);
  desk.step.fill(0, 0, picked.count);
  for (const seam of scene.seams.own) {
    readOwnSeam(seam, wood, column, picked, { steps, readings, scratch: desk.own });
    addSeam(desk, picked.count);
    onSeam?.(seam, readings);
  }
  scene.seams.fixed.forEach((seam, index) => {
    const still = desk.still[index] as PrefixSums;
    readFixedSeam(seam, still, wood, column, picked, { steps, readings, scratch: desk.fixed });
    addSeam(desk, picked.count);
    onSeam?.(seam, readings);
  });
}

function addSeam({ readings, match, step }: ColumnDesk, count: number): void {
  for (let index = 0; index < count; index++) {
    const told = readings.match[index] as number;
    match[index] = (match[index] as number) + matchValue(told);
    step[index] = (step[index] as number) + stepValue(told, readings.peak[index] as number, lagOf(readings, index));
  }
}

/** Room by slides across the board, for every row of places of a column. */
export function roomsAcross({ laid, side }: Scene, column: number, into: Uint16Array): void {
  into.fill(ROOM_ENOUGH);
  const moves = laid.lying.flatMap((piece) => {
    const { spans } = pieceAt(piece, column, 0);
    return side.areas
      .filter(({ within }) => within.along.to >= spans.along.from && within.along.from <= spans.along.to)
      .flatMap(({ area }) => movesIntoArea(spans, area, "across"));
  });
  lowerRooms(
    moves,
    into.length,
    (row, room) => {
      into[row] = Math.min(into[row] as number, room);
    },
    (row) => roomOn("across", laid.lying, side.areas, column, row),
  );
}
