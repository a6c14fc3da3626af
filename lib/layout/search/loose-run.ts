/** A run of loose pieces turned one way on a board: the pieces in order along the board, what they keep clear of, and their seams. */
import { type Kerfs, kerfsOf, lossBefore } from "../fit/apart";
import { type LyingPiece, lyingPieces } from "../fit/lying-piece";
import { quarterTurn, turnedVector } from "../frame/combine-isometries";
import type { FaceLayout, QuarterTurns } from "../pattern/face-layout";
import { letLoose } from "../pattern/let-loose";
import { placeGroup } from "../pattern/place-group";
import { groupOf } from "../pattern/slots";
import type { PieceId, StockId } from "../piece";
import { um } from "../units/um";
import { GRID_UM } from "./grid";
import { type LaidGroup, layGroup } from "./laid-group";
import type { LooseRequest } from "./loose-request";
import { seamGround } from "./seam-ground";
import { type FixedSeam, type OwnSeam, planSeams, type SeamsLeftOut } from "./seam-plan";
import type { SearchPicture } from "./search-picture";

/** One moving piece, laid with its corner in the first cell. */
export interface RunPiece {
  readonly id: PieceId;
  readonly groupId: string;
  readonly laid: LaidGroup;
  readonly lying: LyingPiece;
  /** Seams to pieces that stay. */
  readonly fixed: readonly FixedSeam[];
  /** Columns of its corner that locked pieces of the run leave it, inclusive. */
  readonly columns: readonly [number, number];
}

/** Between a piece and the next along the board. */
export interface RunLink {
  /** Cells from the corner of the one to that of the next at the least. */
  readonly least: number;
  /** Their seam, if they meet on the face and it counts; `swapped`: the next one is its a. */
  readonly seam: OwnSeam | null;
  readonly swapped: boolean;
}

export interface LooseRun {
  readonly turns: QuarterTurns;
  /** With every moving piece a group of its own. */
  readonly layout: FaceLayout;
  readonly pieces: readonly RunPiece[];
  /** One fewer than pieces. */
  readonly links: readonly RunLink[];
  /** Seams that count. */
  readonly counted: number;
  readonly leftOut: SeamsLeftOut;
}

/** Every piece of `ids` a group of its own, where it lies. */
export function loosened(layout: FaceLayout, ids: readonly PieceId[]): FaceLayout {
  return ids.reduce((before, id) => {
    const change = letLoose(before, id);
    return change.ok ? change.layout : before;
  }, layout);
}

export function looseRun(
  request: LooseRequest,
  turns: QuarterTurns,
  pictureOf: (stockId: StockId) => SearchPicture | null,
): LooseRun {
  const { run, locked, side } = request;
  const stockId = side.board.id;
  const moving = new Set(run.filter((id) => !locked.includes(id)));
  const layout = loosened(request.layout, [...moving]);
  const groupIdOf = (id: PieceId) => groupOf(layout, id)?.id ?? "";
  const groupIds = new Set([...moving].map(groupIdOf));
  const allLaid = [...groupIds].reduce((before, groupId) => {
    const laid = placeGroup(before, groupId, stockId, { x: um(0), y: um(0) }, turns);
    return laid.ok ? laid.layout : before;
  }, layout);
  const plan = planSeams(seamGround(allLaid, (id) => moving.has(id), pictureOf));
  const inOrder = runsForward(layout, turns) ? [...run] : [...run].reverse();
  const kerfs = kerfsOf(layout);
  const lockedHere = lyingPieces(layout).filter((piece) => locked.includes(piece.id) && piece.stockId === stockId);

  const pieces = inOrder.flatMap((id, place): RunPiece[] => {
    if (!moving.has(id)) return [];
    const laid = layGroup(layout, groupIdOf(id), { stockId, turns, apart: groupIds });
    const [lying] = laid.lying;
    if (lying === undefined) return [];
    const fixed = plan.fixed.filter((seam) => (seam.moves === "a" ? seam.a : seam.b) === id);
    const stops = lockedHere.filter((piece) => isTurned(layout, piece, turns));
    const [before, after] = [
      stops.filter((stop) => inOrder.indexOf(stop.id) < place),
      stops.filter((stop) => inOrder.indexOf(stop.id) > place),
    ];
    return [{ id, groupId: groupIdOf(id), laid, lying, fixed, columns: columnsBetween(lying, before, after, kerfs) }];
  });
  const links = pieces.slice(1).map((next, index) => linkOf(pieces[index] as RunPiece, next, plan.own, kerfs));
  const counted = plan.fixed.length + links.filter(({ seam }) => seam !== null).length;
  return { turns, layout, pieces, links, counted, leftOut: plan.leftOut };
}

/** Whether the run's order on the face goes the way of x along the board. */
function runsForward({ face }: FaceLayout, turns: QuarterTurns): boolean {
  const along = face.grain === "horizontal" ? { x: 1, y: 0 } : { x: 0, y: 1 };
  return turnedVector(quarterTurn(turns), along.x, along.y).x > 0;
}

/** A locked piece that lies the other way round keeps no order with the rest; it is only in the way. */
function isTurned(layout: FaceLayout, { id }: LyingPiece, turns: QuarterTurns): boolean {
  return groupOf(layout, id)?.placement?.turns === turns;
}

function columnsBetween(
  lying: LyingPiece,
  before: readonly LyingPiece[],
  after: readonly LyingPiece[],
  kerfs: Kerfs,
): readonly [number, number] {
  const starts = before.map((stop) => stop.spans.along.to + lossBefore("along", stop, lying, kerfs) - lying.spans.along.from);
  const ends = after.map((stop) => stop.spans.along.from - lossBefore("along", lying, stop, kerfs) - lying.spans.along.to);
  return [Math.ceil(Math.max(0, ...starts) / GRID_UM), Math.floor(Math.min(Number.MAX_SAFE_INTEGER, ...ends) / GRID_UM)];
}

function linkOf(piece: RunPiece, next: RunPiece, own: readonly OwnSeam[], kerfs: Kerfs): RunLink {
  const least = piece.lying.spans.along.to + lossBefore("along", piece.lying, next.lying, kerfs) - next.lying.spans.along.from;
  const seam = own.find(({ a, b }) => (a === piece.id && b === next.id) || (a === next.id && b === piece.id)) ?? null;
  return { least: Math.ceil(least / GRID_UM), seam, swapped: seam?.a === next.id };
}
