/** The parts of the objective at one picked place, from what its column has read. */

import { clearValue } from "./clear-room";
import { type CellRect, restArea, restRect, type TakenCells } from "./largest-rest";
import type { ColumnDesk } from "./place-column";
import { countedSeams, type Scene } from "./scene";
import { symmetryAt } from "./symmetry";

/** Which parts are wanted; the rest come out as 0 where they apply. */
export interface Wanted {
  readonly seams: boolean;
  readonly symmetry: boolean;
  readonly rest: boolean;
}

export const EVERYTHING: Wanted = { seams: true, symmetry: true, rest: true };

const NONE = Number.NaN;

/** Fills the desk's parts. `index`: of the row among the picked ones; `room`: to the nearest keep-clear area, µm, at most `ROOM_ENOUGH`. */
export function readParts(desk: ColumnDesk, column: number, row: number, index: number, room: number, wanted: Wanted): void {
  const { scene, match, step, bands, parts } = desk;
  const { rest } = scene.side;
  const count = countedSeams(scene.seams);
  parts[0] = count === 0 ? NONE : wanted.seams ? (match[index] as number) / count : 0;
  parts[1] = count === 0 ? NONE : wanted.seams ? (step[index] as number) / count : 0;
  parts[2] = scene.symmetry === null ? NONE : wanted.symmetry ? symmetryAt(scene.symmetry, bands, row) : 0;
  parts[3] = clearValue(room);
  parts[4] = rest.whole === 0 ? NONE : wanted.rest ? restArea(rest, takenAt(scene, column, row)) / rest.whole : 0;
  parts[5] = scene.stock;
}

/** The largest rectangle that is left, in cells. */
export function leftAt(scene: Scene, column: number, row: number): CellRect | null {
  return restRect(scene.side.rest, takenAt(scene, column, row));
}

function takenAt({ taken }: Scene, column: number, row: number): TakenCells {
  return { left: taken.left + column, right: taken.right + column, top: taken.top + row, bottom: taken.bottom + row };
}
