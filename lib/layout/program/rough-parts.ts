/**
 * Into which parts a board that is not flat is cut before it is flattened: as many as there is room for. Each holds pieces with the
 * shop's allowances around them, is long enough for planer and jointer, and comes off by straight cuts. Fronts that hang together in the
 * grain lie closer than that, so their row stays one part.
 */
import { um } from "../units/um";
import { stuckBlanks } from "./blocking";
import type { PlacedPiece, RoughAllowances } from "./cut-request";
import { type Axis, type Blank, type Region, type Span, sizeOf, stockRectOf } from "./region";
import type { KerfByAxis } from "./workshop";

/** A part with the room its pieces need until it is flat. */
export interface Cluster {
  readonly x: Span;
  readonly y: Span;
  readonly blanks: readonly Blank[];
}

export interface RoughNeeds {
  readonly allowances: RoughAllowances;
  /** The widest blade that may part them. */
  readonly kerf: KerfByAxis;
  readonly shortestMachined: number;
}

/** In the order of their first pieces. */
export function roughParts(board: Region, needs: RoughNeeds): readonly Cluster[] {
  let clusters: readonly Cluster[] = board.blanks.map((blank) => withAllowances(blank, board, needs.allowances));
  for (;;) {
    const next = mergedOnce(clusters, needs.kerf) ?? lengthenedOnce(clusters, board, needs);
    if (!next) return clusters;
    clusters = next;
  }
}

function withAllowances(blank: Blank, board: Region, { length, width }: RoughAllowances): Cluster {
  const grown = (axis: Axis, by: number) => ({
    from: Math.max(board[axis].from, blank[axis].from - by),
    to: Math.min(board[axis].to, blank[axis].to + by),
  });
  return { x: grown("x", Math.ceil(length / 2)), y: grown("y", Math.ceil(width / 2)), blanks: [blank] };
}

/** Two that no blade parts become one, and so do all that block one another; null when all come apart. */
function mergedOnce(clusters: readonly Cluster[], kerf: KerfByAxis): readonly Cluster[] | null {
  for (const [i, a] of clusters.entries()) {
    const b = clusters.slice(i + 1).find((other) => roomOn("x", a, other) < kerf.x && roomOn("y", a, other) < kerf.y);
    if (b) return merged(clusters, [a, b]);
  }
  const asBlanks = clusters.map(asBlank);
  const stuck = stuckBlanks(asBlanks, kerf);
  return (
    stuck &&
    merged(
      clusters,
      clusters.filter((_, i) => stuck.includes(asBlanks[i] as Blank)),
    )
  );
}

/** One that is too short for the planer gets more wood beside it, or is joined to its nearest neighbour; null when none can be helped. */
function lengthenedOnce(clusters: readonly Cluster[], board: Region, needs: RoughNeeds): readonly Cluster[] | null {
  for (const cluster of clusters) {
    const missing = needs.shortestMachined - sizeOf(cluster.x);
    if (missing <= 0) continue;
    const beside = clusters.filter((other) => other !== cluster && roomOn("y", cluster, other) < needs.kerf.y);
    const free = freeAlong(cluster, beside, board, needs.kerf.x);
    if (sizeOf(free) >= needs.shortestMachined) {
      const to = Math.min(free.to, cluster.x.to + missing);
      const longer = { ...cluster, x: { from: to - needs.shortestMachined, to } };
      return clusters.map((one) => (one === cluster ? longer : one));
    }
    const [nearest] = [...beside].sort((a, b) => roomOn("x", cluster, a) - roomOn("x", cluster, b));
    if (nearest) return merged(clusters, [cluster, nearest]);
  }
  return null;
}

/** How far it may reach along the grain before it comes too near to those beside it. */
function freeAlong({ x }: Cluster, beside: readonly Cluster[], board: Region, kerf: number): Span {
  const before = beside.filter((other) => other.x.to <= x.from).map((other) => other.x.to + kerf);
  const after = beside.filter((other) => other.x.from >= x.to).map((other) => other.x.from - kerf);
  return { from: Math.max(board.x.from, ...before), to: Math.min(board.x.to, ...after) };
}

function merged(clusters: readonly Cluster[], together: readonly Cluster[]): readonly Cluster[] {
  const [first] = together;
  if (!first) return clusters;
  const spanOf = (axis: Axis) => ({
    from: Math.min(...together.map((one) => one[axis].from)),
    to: Math.max(...together.map((one) => one[axis].to)),
  });
  const one = { x: spanOf("x"), y: spanOf("y"), blanks: together.flatMap(({ blanks }) => blanks) };
  return clusters.flatMap((cluster) => (cluster === first ? [one] : together.includes(cluster) ? [] : [cluster]));
}

/** Distance along an axis; negative by the overlap. */
function roomOn(axis: Axis, a: Cluster, b: Cluster): number {
  return Math.max(a[axis].from, b[axis].from) - Math.min(a[axis].to, b[axis].to);
}

const nothing = { left: um(0), right: um(0), top: um(0), bottom: um(0) };

/** A part as the search knows what must not be cut into. */
export function asBlank(cluster: Cluster, index: number): Blank {
  const piece: PlacedPiece = { pieceId: `r${index + 1}`, label: `R${index + 1}`, rect: stockRectOf(cluster), cleanUp: nothing };
  return { piece, x: cluster.x, y: cluster.y, allowed: "" };
}
