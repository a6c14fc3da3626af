/** What one place of a group is worth, in full: total, parts, every seam, and what is left of the board. */
import type { StockRect } from "../frame/point";
import type { PieceId } from "../piece";
import { type Um, um } from "../units/um";
import { ROOM_ENOUGH, roomAt } from "./clear-room";
import { LEAST_PEAK } from "./correlation";
import { GRID_UM } from "./grid";
import type { CellRect } from "./largest-rest";
import { type Parts, partsFrom, totalOfValues, type Weights, weightsInOrder } from "./objective";
import { columnDesk, readSeams } from "./place-column";
import { EVERYTHING, leftAt, readParts } from "./place-parts";
import type { Scene } from "./scene";
import { lagOf, type SeamReadings } from "./seam-readings";
import { readBands } from "./symmetry";

/** A seam as its place has it; null: cannot be told, for one edge shows no figure, or it is not found again within 8 mm. */
export interface SeamValue {
  readonly a: PieceId;
  readonly b: PieceId;
  /** Correlation at lag 0, −1..1. */
  readonly match: number | null;
  /** How far b's figure lies on along the seam, from `from` to `to`, µm, in steps of the grid. */
  readonly step: Um | null;
  /** Correlation at that step. */
  readonly peak: number | null;
}

export interface PlaceValue {
  /** 0..1 by the weights asked with. */
  readonly total: number;
  readonly parts: Parts;
  readonly seams: readonly SeamValue[];
  /** Shortest straight slide to a keep-clear area, µm, rounded down; null: 30 mm or more, or none in its way. */
  readonly room: Um | null;
  /** The largest rectangle worth keeping that is left, in the stock frame of the side. */
  readonly leaves: StockRect | null;
}

/** The corner of the group lies in this cell, at the phase the scene was made for; it has to lie on the picture. */
export function placeValue(scene: Scene, column: number, row: number, weights: Weights): PlaceValue {
  const desk = columnDesk(scene, 1);
  const seams: SeamValue[] = [];
  readSeams(desk, column, { count: 1, rows: Int32Array.of(row) }, true, (seam, readings) =>
    seams.push(seamValueOf(seam, readings)),
  );
  if (scene.symmetry !== null) readBands(scene.symmetry, scene.side.wood, column, desk.bands);
  const room = roomAt(scene.laid.lying, scene.side.areas, column, row);
  readParts(desk, column, row, 0, room, EVERYTHING);
  const left = leftAt(scene, column, row);
  return {
    total: totalOfValues(desk.parts, weightsInOrder(weights)),
    parts: partsFrom(desk.parts),
    seams,
    room: room < ROOM_ENOUGH ? um(room) : null,
    leaves: left === null ? null : inStock(left),
  };
}

/** The value of a seam from its readings at index 0. */
export function seamValueOf({ a, b }: Pick<SeamValue, "a" | "b">, readings: SeamReadings): SeamValue {
  const [match, peak] = [readings.match[0] as number, readings.peak[0] as number];
  const told = !Number.isNaN(match);
  const found = told && peak >= LEAST_PEAK;
  return { a, b, match: told ? match : null, step: found ? um(lagOf(readings, 0) * GRID_UM) : null, peak: found ? peak : null };
}

export function inStock({ column, row, columns, rows }: CellRect): StockRect {
  return { x: um(column * GRID_UM), y: um(row * GRID_UM), width: um(columns * GRID_UM), height: um(rows * GRID_UM) };
}
