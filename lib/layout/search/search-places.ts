/**
 * Better places for a rigid group on one board: every place of its corner on the half-millimetre grid, both ways round along the grain
 * and on both sides where both have a picture, each valued exactly; the best few that really differ, beside the present one.
 *
 * A generator, so that whoever runs it can report progress, stop between two slices and go on later; the number of slices follows from the
 * sizes alone. Working memory stays below 50 bytes a place and orientation.
 */
import { kerfsOf } from "../fit/apart";
import { lyingPieces } from "../fit/lying-piece";
import type { StockPoint } from "../frame/point";
import type { QuarterTurns } from "../pattern/face-layout";
import { groupById } from "../pattern/layout-change";
import { turnsAlongGrain } from "../pattern/place-group";
import type { StockId } from "../piece";
import { um } from "../units/um";
import { type SideName, type SideTables, sideTables } from "./board-side";
import { comparePlaces, type PlaceComparison } from "./compare-places";
import { GRID_UM } from "./grid";
import { type NoPlace, whyNone } from "./no-place";
import { type PlaceRequest, sceneGround } from "./place-request";
import { type SceneScan, scanPlaces } from "./place-scan";
import { type PlaceValue, placeValue } from "./place-value";
import { type PresentPlace, presentPlace } from "./present-place";
import { areAlike, type ChosenPlace, chooseDifferent, marksOf } from "./really-differ";
import { countedSeams, makeScene, type Scene } from "./scene";
import type { SeamsLeftOut } from "./seam-plan";
import { inShare, type Slices } from "./slices";

/** Where a group could lie: as `placeGroup` takes it, in the frame of that side. */
export interface GroupPlace {
  readonly side: SideName;
  readonly stockId: StockId;
  readonly corner: StockPoint;
  readonly turns: QuarterTurns;
}

export interface FoundPlace {
  readonly place: GroupPlace;
  readonly value: PlaceValue;
  /** Against the present place; null where there is none to compare with. */
  readonly against: PlaceComparison | null;
  /** So near the present place that it shows the same wood. */
  readonly likePresent: boolean;
}

export interface PlaceSearch {
  /** Best first. */
  readonly places: readonly FoundPlace[];
  /** The place the group has now, if it lies on this board and wholly within its rectangle. */
  readonly present: PresentPlace | null;
  /** Places looked at, and those that are allowed. */
  readonly positions: number;
  readonly allowed: number;
  /** Null where no side could be searched. */
  readonly seams: { readonly counted: number; readonly leftOut: SeamsLeftOut } | null;
  /** Why there is no place; null where there is one. */
  readonly none: NoPlace | null;
  /** Sides that were not searched: other pieces of the layout lie on the other one, and a set cannot lie on both. */
  readonly sidesLeftOut: readonly SideName[];
}

/** Yields the share done, 0..1. Throws on a group that the layout does not have. */
export function* searchPlaces(request: PlaceRequest): Slices<PlaceSearch> {
  const sides = yield* inShare(sidesToSearch(request), 0, 0);
  const turns = turnsToSearch(request);
  const scenes = sides.flatMap((side) => turns.map((turn) => makeScene(sceneGround(request), side, turn)));
  const scanned = yield* scanAll(scenes, request);
  const chosen = yield* inShare(chooseDifferent(scanned, request.count, request.apart), scenes.length / (scenes.length + 1), 0);
  const present = presentPlace(request, sides);
  const allowed = scanned.reduce((sum, scan) => sum + scan.allowed, 0);
  const plan = scenes[0]?.seams;
  return {
    places: chosen.map((place) => foundPlace(place, request, present)),
    present,
    positions: scanned.reduce((sum, { totals }) => sum + totals.length, 0),
    allowed,
    seams: plan === undefined ? null : { counted: countedSeams(plan), leftOut: plan.leftOut },
    none: allowed > 0 ? null : whyNone(scanned),
    sidesLeftOut: request.sides.filter(({ side }) => !sides.some((searched) => searched.side === side)).map(({ side }) => side),
  };
}

function* scanAll(scenes: readonly Scene[], { weights, count }: PlaceRequest): Slices<SceneScan[]> {
  const scanned: SceneScan[] = [];
  for (const scene of scenes) {
    const best = Math.max(-1, ...scanned.map(({ columnBest }) => columnBest.reduce((p, q) => Math.max(p, q), -1)));
    const scan = scanPlaces(scene, weights, count === 1 ? best : null);
    const share = 1 / (scenes.length + 1);
    scanned.push({ scene, ...(yield* inShare(scan, scanned.length * share, share)) });
  }
  return scanned;
}

/** Pieces of the layout on this board lie on one side; a group among others cannot be laid on the other. */
function* sidesToSearch({ layout, groupId, sides, layoutSide, leastOffcut }: PlaceRequest): Slices<SideTables[]> {
  const others = lyingPieces(layout).filter((piece) => piece.groupId !== groupId);
  const found: SideTables[] = [];
  for (const side of sides) {
    const here = others.filter(({ stockId }) => stockId === side.board.id);
    if (here.length > 0 && side.side !== layoutSide) continue;
    found.push(yield* sideTables(side, here, kerfsOf(layout), leastOffcut));
  }
  return found;
}

/** The present way round first, so that it is kept where the other is just as good. */
function turnsToSearch({ layout, groupId }: PlaceRequest): readonly QuarterTurns[] {
  const [first, second] = turnsAlongGrain(layout.face.grain);
  return groupById(layout, groupId)?.placement?.turns === second ? [second, first] : [first, second];
}

function foundPlace(
  { scene, column, row }: ChosenPlace,
  { weights, apart }: PlaceRequest,
  present: PresentPlace | null,
): FoundPlace {
  const value = placeValue(scene, column, row, weights);
  const corner = { x: um(column * GRID_UM), y: um(row * GRID_UM) };
  return {
    place: { side: scene.side.side, stockId: scene.side.board.id, corner, turns: scene.laid.turns },
    value,
    against: present === null ? null : comparePlaces(value.parts, present.value.parts),
    likePresent: present !== null && areAlike(marksOf(scene, column, row), present.marks, apart),
  };
}
