/** What a cut, a plane or the jointer makes of a rectangle in hand. */
import type { Edge, EdgeState } from "./program";
import { type Axis, axisOfEdge, highEdge, isLow, lowEdge, type Region, type Span, sizeOf } from "./region";

export interface Halves {
  /** The wood turned to dust: the blade's width as far as it runs in wood. */
  readonly kerf: Span;
  /** What lies on either side; null where the blade takes everything. */
  readonly low: Region | null;
  readonly high: Region | null;
}

/** How a blade leaves an edge. */
export interface LeftEdge {
  readonly state: EdgeState;
  readonly owes: number;
}

const cleanlySawn: LeftEdge = { state: "sawn", owes: 0 };

/** Parts a region by a blade that covers `blade` on the axis. The caller knows that no blank lies under the blade. */
export function part(region: Region, axis: Axis, blade: Span, left: LeftEdge = cleanlySawn): Halves {
  const whole = region[axis];
  const kerf = { from: Math.max(blade.from, whole.from), to: Math.min(blade.to, whole.to) };
  const side = (span: Span, edge: Edge): Region | null => {
    if (sizeOf(span) <= 0) return null;
    return {
      x: axis === "x" ? span : region.x,
      y: axis === "y" ? span : region.y,
      edges: region.edges[edge] === left.state ? region.edges : { ...region.edges, [edge]: left.state },
      owes: region.owes[edge] === left.owes ? region.owes : { ...region.owes, [edge]: left.owes },
      shortened: region.shortened || axis === "x",
      blanks: region.blanks.filter((blank) => blank[axis].from >= span.from && blank[axis].to <= span.to),
    };
  };
  return {
    kerf,
    low: side({ from: whole.from, to: kerf.from }, highEdge[axis]),
    high: side({ from: kerf.to, to: whole.to }, lowEdge[axis]),
  };
}

/** So much worked off an edge, which is straight afterwards and owes nothing. */
export function worked(region: Region, edge: Edge, amount: number): Region {
  const axis = axisOfEdge[edge];
  const { from, to } = region[axis];
  const span = isLow(edge) ? { from: from + amount, to } : { from, to: to - amount };
  return {
    ...region,
    [axis]: span,
    edges: { ...region.edges, [edge]: "trued" },
    owes: { ...region.owes, [edge]: 0 },
  };
}

/** The wood that comes off with it. */
export function shavings(region: Pick<Region, Axis>, edge: Edge, amount: number): Span {
  const { from, to } = region[axisOfEdge[edge]];
  return isLow(edge) ? { from, to: from + amount } : { from: to - amount, to };
}
