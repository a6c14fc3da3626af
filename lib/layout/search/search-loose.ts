/**
 * Better places for loose pieces: a run along the grain whose pieces each get a place of their own on one board, in their order and the
 * saw's loss apart, so that neighbours match as well as they can around knots. Locked pieces stay, and the rest goes round them.
 *
 * Two rounds of dynamic programming, each way round along the grain: one over the request's grid, made coarser until the pairs of
 * places fit the budget, and one over every half-millimetre place less than a step of that grid around the first's answer. Each is exact
 * over the places it tries; on the finest grid the first is exact altogether, and the second has nothing to add.
 */
import type { StockPoint } from "../frame/point";
import type { FaceLayout, QuarterTurns } from "../pattern/face-layout";
import { placeGroup, turnsAlongGrain } from "../pattern/place-group";
import type { PieceId, StockId } from "../piece";
import { type Um, um } from "../units/um";
import { GRID_UM } from "./grid";
import { bestChain } from "./loose-chain";
import type { LooseRequest } from "./loose-request";
import { type LooseRun, looseRun } from "./loose-run";
import { looseDesk } from "./loose-scores";
import { columnRanges, pairsOf, type States, statesAround, statesOn } from "./loose-states";
import { type LooseValue, looseValue } from "./loose-value";
import { boundedArea } from "./place-areas";
import { placesOf } from "./place-scan";
import { inTheWay, type Obstacle, type PlaceTable } from "./place-table";
import type { SearchPicture } from "./search-picture";
import { inShare, type Slices } from "./slices";
import { type WoodSums, woodSums } from "./wood-sums";

export interface LoosePlace {
  readonly piece: PieceId;
  readonly corner: StockPoint;
  readonly turns: QuarterTurns;
}

export type NoRun =
  /** Every piece of the run is locked, or there is none. */
  | { readonly reason: "nothing-to-move" }
  /** The piece has no place on the board by itself; these, the fewest, stand in the way of any one. None: it is too large. */
  | { readonly reason: "no-place"; readonly piece: PieceId; readonly obstacles: readonly Obstacle[] }
  /** Every piece has places, but not one after another in the order of the run. */
  | { readonly reason: "no-order" };

export type LooseSearch =
  | {
      readonly found: true;
      /** In the order of the run on the face. */
      readonly places: readonly LoosePlace[];
      /** The layout with those pieces let loose and laid there. */
      readonly layout: FaceLayout;
      readonly value: LooseValue;
      /** What the run is worth where it lies; null where not all of it lies on this board. */
      readonly present: LooseValue | null;
      /** The grid of the first round, µm. */
      readonly grid: { readonly along: Um; readonly across: Um };
    }
  | ({ readonly found: false } & NoRun);

/** Yields the share done, 0..1. */
export function* searchLoose(request: LooseRequest): Slices<LooseSearch> {
  const moving = new Set(request.run.filter((id) => !request.locked.includes(id)));
  if (moving.size === 0) return { found: false, reason: "nothing-to-move" };
  const pictures = new Map(request.neighbours.map(({ stockId, picture }) => [stockId, picture]));
  const pictureOf = (stockId: StockId): SearchPicture | null =>
    stockId === request.side.board.id ? request.side.picture : (pictures.get(stockId) ?? null);
  const wood = woodSums(request.side.picture);
  let best: Extract<Turned, { found: true }> | null = null;
  let failure: NoRun | null = null;
  for (const [index, turns] of turnsAlongGrain(request.layout.face.grain).entries()) {
    const run = looseRun(request, turns, pictureOf);
    const turned = yield* inShare(searchTurned(request, run, wood), index * 0.45, 0.45);
    if (!turned.found) failure ??= turned;
    else if (best === null || turned.score > best.score) best = turned;
  }
  if (best === null) return { found: false, ...(failure ?? { reason: "no-order" }) };
  const layout = layRun(best, request.side.board.id);
  const value = yield* inShare(looseValue(layout, moving, request, pictureOf), 0.9, 0);
  const present = yield* inShare(looseValue(request.layout, moving, request, pictureOf), 0.95, 0);
  if (value === null) throw new Error("a run that was found does not lie on its board");
  const places = request.run.flatMap((id) => best.places.filter(({ piece }) => piece === id));
  return { found: true, places, layout, value, present, grid: best.grid };
}

type Turned =
  | {
      readonly found: true;
      readonly run: LooseRun;
      readonly score: number;
      readonly places: readonly LoosePlace[];
      readonly grid: { readonly along: Um; readonly across: Um };
    }
  | ({ readonly found: false } & NoRun);

function* searchTurned(request: LooseRequest, run: LooseRun, wood: WoodSums): Slices<Turned> {
  const areas = request.side.board.keepClear.map(({ area }) => boundedArea(area));
  const tables: PlaceTable[] = [];
  for (const { id, laid } of run.pieces) {
    const { table } = yield* inShare(placesOf({ laid, side: { board: request.side.board, areas } }, false), 0, 0);
    if (!table.blocked.includes(0)) return { found: false, reason: "no-place", piece: id, obstacles: inTheWay(table) };
    tables.push(table);
  }
  const ranges = columnRanges(run, tables);
  if (ranges === null) return { found: false, reason: "no-order" };
  const desk = looseDesk(run, wood, areas, request.weights);
  const first = firstRound(request, tables, ranges);
  const coarse = yield* inShare(bestChain(run, first.states, desk), 0.1, 0.45);
  if (coarse === null) return { found: false, reason: "no-order" };
  const around = first.states.map(({ columns, rows }, index) => {
    const state = coarse.states[index] as number;
    const place = { column: columns[state] as number, row: rows[state] as number };
    return statesAround(
      tables[index] as PlaceTable,
      ranges[index] as readonly [number, number],
      place,
      first.along,
      first.across,
    );
  });
  desk.strips.clear();
  const fine = (yield* inShare(bestChain(run, around, desk), 0.55, 0.45)) ?? coarse;
  const places = run.pieces.map(({ id }, index): LoosePlace => {
    const { columns, rows } = around[index] as States;
    const state = fine.states[index] as number;
    const corner = { x: um((columns[state] as number) * GRID_UM), y: um((rows[state] as number) * GRID_UM) };
    return { piece: id, corner, turns: run.turns };
  });
  return {
    found: true,
    run,
    score: fine.score,
    places,
    grid: { along: um(first.along * GRID_UM), across: um(first.across * GRID_UM) },
  };
}

interface Round {
  readonly states: States[];
  /** Cells. */
  readonly along: number;
  readonly across: number;
}

function firstRound(
  { grid, mostPairs }: LooseRequest,
  tables: readonly PlaceTable[],
  ranges: readonly (readonly [number, number])[],
): Round {
  let along = Math.max(1, Math.round(grid.along / GRID_UM));
  let across = Math.max(1, Math.round(grid.across / GRID_UM));
  for (;;) {
    const states = tables.map((table, index) => statesOn(table, ranges[index] as readonly [number, number], along, across));
    const isCoarsest = tables.every(({ columns, rows }) => along >= columns && across >= rows);
    if (isCoarsest || pairsOf(states) <= mostPairs) return { states, along, across };
    along *= 2;
    across *= 2;
  }
}

function layRun({ run, places }: Extract<Turned, { found: true }>, stockId: StockId): FaceLayout {
  return places.reduce((before, { piece, corner, turns }) => {
    const groupId = run.pieces.find(({ id }) => id === piece)?.groupId ?? "";
    const laid = placeGroup(before, groupId, stockId, corner, turns);
    return laid.ok ? laid.layout : before;
  }, run.layout);
}
