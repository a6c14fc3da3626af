/**
 * The steps worth considering in a rectangle in hand.
 *
 * A cut that parts blanks may be pushed sideways until it leaves the edge of a blank, and the tree stays possible; so only such
 * cuts are listed. Each is measured to the side of the blade that leaves the blank's edge, so that an error in the kerf never
 * reaches a piece where there is wood to spare. A machine that asks for more clean-up than the layout has leaves that much more,
 * and the plane takes it afterwards. What is too thin for a saw goes to the plane as well.
 */
import { chooseTools, type Face } from "./choose-tool";
import type { Hazard } from "./hazard";
import { type Halves, type LeftEdge, shavings, worked } from "./part";
import type { CutKind, Edge } from "./program";
import { type Axis, edgeAt, highEdge, isLow, isStraight, kindAcross, lowEdge, type Region, type Span } from "./region";
import type { Tool, Workshop } from "./workshop";

export interface CandidateCut extends Halves {
  readonly region: Region;
  readonly kind: CutKind | "plane";
  readonly axis: Axis;
  readonly fromEdge: Edge;
  readonly bladeSide: "near" | "far";
  /** µm, always positive. */
  readonly setting: number;
  /** The state of the edges it makes. */
  readonly leaves: LeftEdge;
  /** null: the plane. */
  readonly tool: Tool | null;
  readonly hazard: Hazard;
}

/** Runs of blanks between which the blade finds no room, in order along the axis. */
export function groupsAlong(region: Pick<Region, "blanks">, axis: Axis, kerf: number): Span[] {
  const spans = region.blanks.map((blank) => blank[axis]).sort((a, b) => a.from - b.from || a.to - b.to);
  const groups: Span[] = [];
  for (const span of spans) {
    const last = groups.at(-1);
    // Room for the blade is room enough; spans that merely touch need a kerf of nothing (a knife).
    if (last && span.from - last.to < kerf) groups[groups.length - 1] = { from: last.from, to: Math.max(last.to, span.to) };
    else groups.push(span);
  }
  return groups;
}

/** `peel`: between groups only the first and the last are taken off. `all`: every parting line. */
export type Scope = "peel" | "all";

/** In order of preference where nothing else decides: rips first, trims before partings, from the near edge first. */
export function candidateCuts(region: Region, shop: Workshop, scope: Scope): CandidateCut[] {
  return [...cutsAlong(region, "y", shop, scope), ...cutsAlong(region, "x", shop, scope)];
}

function cutsAlong(region: Region, axis: Axis, shop: Workshop, scope: Scope): CandidateCut[] {
  const groups = groupsAlong(region, axis, shop.thinnestKerf[axis]);
  const head = groups[0];
  const tail = groups.at(-1);
  if (!head || !tail) return [];
  const trimmed = (at: number, keeps: Face["keeps"]): CandidateCut[] => {
    const edge = keeps === "low" ? highEdge[axis] : lowEdge[axis];
    const room = Math.abs(at - edgeAt(region, edge));
    if (room === 0) return [];
    return isPlaned(region, edge, room, shop)
      ? [planedOff(region, axis, edge, room)]
      : sawn(region, { axis, at, keeps }, true, shop);
  };
  const partings = groups.slice(1).flatMap((next, i) => {
    const previous = groups[i];
    if (!previous || (scope === "peel" && i !== 0 && i !== groups.length - 2)) return [];
    return [
      ...sawn(region, { axis, at: previous.to, keeps: "low" }, false, shop),
      ...sawn(region, { axis, at: next.from, keeps: "high" }, false, shop),
    ];
  });
  const first = trimmed(head.from, "high");
  const last = trimmed(tail.to, "low");
  // A rip leaves its good edge by the far trim first and is then measured from it; an end is squared first.
  return axis === "y" ? [...last, ...first, ...partings] : [...first, ...partings, ...last];
}

/** A straight edge from which no more comes off than the plane takes, or than was left for it. */
function isPlaned(region: Region, edge: Edge, room: number, { thinnestSawn }: Workshop): boolean {
  return isStraight(region, edge) && room <= Math.max(thinnestSawn, region.owes[edge]);
}

const safe: Hazard = { beyond: 0, unsafe: 0, late: 0, strays: 0 };

function planedOff(region: Region, axis: Axis, edge: Edge, amount: number): CandidateCut {
  const left = worked(region, edge, amount);
  const low = isLow(edge);
  return {
    region,
    kind: "plane",
    axis,
    fromEdge: edge,
    bladeSide: "far",
    setting: amount,
    leaves: { state: "trued", owes: 0 },
    tool: null,
    hazard: safe,
    kerf: shavings(region, edge, amount),
    low: low ? null : left,
    high: low ? left : null,
  };
}

/** The ways to measure the cut that leaves a face, each with the machine that makes it; beyond a trim nothing is kept. */
function sawn(region: Region, face: Face, trim: boolean, shop: Workshop): CandidateCut[] {
  const { axis, keeps } = face;
  // A crosscut is square only against a straight long edge.
  if (axis === "x" && !isStraight(region, "top") && !isStraight(region, "bottom")) return [];
  const nearEdge = keeps === "low" ? lowEdge[axis] : highEdge[axis];
  const farEdge = keeps === "low" ? highEdge[axis] : lowEdge[axis];
  const near = { fromEdge: nearEdge, bladeSide: "near" } as const;
  const far = { fromEdge: farEdge, bladeSide: "far" } as const;
  // An end of the stock is marked from that end; a long edge is ripped with the wanted part against the fence.
  const ways = trim ? (axis === "x" && keeps === "high" ? [far, near] : [near, far]) : [near];
  const sound = ways.filter(
    ({ fromEdge, bladeSide }) => isStraight(region, fromEdge) || (bladeSide === "far" && region.edges[fromEdge] === "marked"),
  );
  return chooseTools(region, face, sound, shop).map((cut) => ({ ...cut, kind: kindAcross[axis] }));
}
