/** The usable outline of a blank from those of its boards: what is usable of each strip, in one piece where joints join it. */
import type { StockPoint, StockRect } from "../../frame/point";
import { type Um, um } from "../../units/um";
import { cutPolygon } from "../cut-polygon";
import { movedPolygon } from "../move-area";
import { polygonFault } from "../polygon-fault";
import type { BlankMember } from "./blank-plan";
import type { StripLayout } from "./blank-strips";
import { areaOf, mergedRings } from "./merge-rings";

export type BlankOutline =
  | {
      readonly ok: true;
      /** null: the whole rectangle is usable. */
      readonly outline: readonly StockPoint[] | null;
      /** What is enclosed by usable wood and not usable itself: beside a joint where both edges dip. */
      readonly holes: readonly (readonly StockPoint[])[];
      /** Usable parts that hang together with no other: the largest is the outline, these are left out. */
      readonly leftOut: number;
      /** Of each joint, how much has usable wood on both sides. */
      readonly soundAlong: readonly Um[];
    }
  /** The outlines cross in a way that rounding to whole micrometres does not untie. */
  | { readonly ok: false; readonly reason: "no-wood" | "tangled" };

export function blankOutline(members: readonly BlankMember[], { strips, joints, length, width }: StripLayout): BlankOutline {
  const parts = strips.map(({ blankFromMember, rect }, index) => usableOf(members[index], blankFromMember, rect));
  const lines = [um(0), ...joints.map(({ across }) => across), width];
  const rings = mergedRings(
    parts.filter((corners) => corners.length >= 3),
    lines,
  );
  const [largest, ...others] = rings.filter(({ area }) => area > 0);
  const holes = rings.filter(({ area }) => area < 0);
  if (!largest) return { ok: false, reason: "no-wood" };
  if ([largest, ...holes].some(({ corners }) => polygonFault(corners) !== null)) return { ok: false, reason: "tangled" };
  const whole = largest.corners.length === 4 && largest.area === length * width;
  return {
    ok: true,
    outline: whole ? null : largest.corners,
    holes: holes.map(({ corners }) => [...corners].reverse()),
    leftOut: others.length,
    soundAlong: joints.map(({ across }, index) => sound(parts[index] ?? [], parts[index + 1] ?? [], across)),
  };
}

/** The usable wood of one board within its strip, clockwise as seen. */
function usableOf(
  member: BlankMember | undefined,
  map: Parameters<typeof movedPolygon>[0],
  rect: StockRect,
): readonly StockPoint[] {
  if (!member) throw new Error("a strip of a blank belongs to no board");
  const { outline, length, width } = member;
  const zero = um(0);
  const drawn = outline ?? [
    { x: zero, y: zero },
    { x: length, y: zero },
    { x: length, y: width },
    { x: zero, y: width },
  ];
  const moved = movedPolygon(map, areaOf(drawn) < 0 ? [...drawn].reverse() : drawn);
  return cutPolygon(moved, [
    { axis: "y", limit: rect.y, keeps: "above" },
    { axis: "y", limit: um(rect.y + rect.height), keeps: "below" },
  ]);
}

/** Where the one has wood above the line and the other below it. */
function sound(above: readonly StockPoint[], below: readonly StockPoint[], y: Um): Um {
  const [upper, lower] = [reachesTo(above, y), reachesTo(below, y)];
  const stops = [...new Set([...upper, ...lower].flatMap(({ from, to }) => [from, to]))].sort((p, q) => p - q);
  const shared = stops.slice(1).reduce((sum, end, index) => {
    const start = stops[index] ?? end;
    return covers(upper, start, end) && covers(lower, start, end) ? sum + end - start : sum;
  }, 0);
  return um(shared);
}

interface Reach {
  readonly from: Um;
  readonly to: Um;
  readonly sense: number;
}

function reachesTo(corners: readonly StockPoint[], y: Um): Reach[] {
  return corners.flatMap((from, index) => {
    const to = corners[(index + 1) % corners.length] ?? from;
    if (from.y !== y || to.y !== y || from.x === to.x) return [];
    return from.x < to.x ? [{ from: from.x, to: to.x, sense: 1 }] : [{ from: to.x, to: from.x, sense: -1 }];
  });
}

/** Edges that run there and back cancel out. */
function covers(reaches: readonly Reach[], from: Um, to: Um): boolean {
  return reaches.reduce((sum, reach) => (reach.from <= from && reach.to >= to ? sum + reach.sense : sum), 0) !== 0;
}
