/**
 * The cuts worth considering through a rectangle in hand.
 *
 * A cut that parts blanks may be pushed sideways until it leaves the edge of a blank, and the tree stays possible; so only such
 * cuts are listed. Each is measured to the side of the blade that leaves the blank's edge, so that an error in the kerf never
 * reaches a piece where there is wood to spare.
 */
import type { CutKind, Edge } from "./program";
import { type Axis, type Halves, highEdge, isStraight, kindAcross, lowEdge, part, type Region, type Span } from "./region";

export interface CandidateCut extends Halves {
  readonly region: Region;
  readonly kind: CutKind;
  readonly axis: Axis;
  readonly fromEdge: Edge;
  readonly bladeSide: "near" | "far";
  /** µm, always positive. */
  readonly setting: number;
}

export type KerfByAxis = Readonly<Record<Axis, number>>;

/** Runs of blanks between which the blade finds no room, in order along the axis. */
export function groupsAlong(region: Region, axis: Axis, kerf: number): Span[] {
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
export function candidateCuts(region: Region, kerf: KerfByAxis, scope: Scope): CandidateCut[] {
  return [...cutsAlong(region, "y", kerf.y, scope), ...cutsAlong(region, "x", kerf.x, scope)];
}

function cutsAlong(region: Region, axis: Axis, kerf: number, scope: Scope): CandidateCut[] {
  // A crosscut is square only against a straight long edge.
  if (axis === "x" && !isStraight(region, "top") && !isStraight(region, "bottom")) return [];
  const groups = groupsAlong(region, axis, kerf);
  const head = groups[0];
  const tail = groups.at(-1);
  if (!head || !tail) return [];
  const whole = region[axis];
  const cuts: CandidateCut[] = [];
  const add = (face: number, toward: "low" | "high", trim: boolean): void => {
    cuts.push(...measured(region, axis, kerf, face, toward, trim));
  };
  const trimHead = () => head.from > whole.from && add(head.from, "high", true);
  const trimTail = () => tail.to < whole.to && add(tail.to, "low", true);
  // A rip leaves its good edge by the far trim first and is then measured from it; an end is squared first.
  if (axis === "y") trimTail();
  trimHead();
  for (const [i, next] of groups.entries()) {
    const previous = groups[i - 1];
    if (!previous || (scope === "peel" && i !== 1 && i !== groups.length - 1)) continue;
    add(previous.to, "low", false);
    add(next.from, "high", false);
  }
  if (axis === "x") trimTail();
  return cuts;
}

/**
 * The ways to measure the cut whose exact face (the side of the blade at the blank's edge) lies at `face`, the blank on the
 * `keeps` side of it. Where the blade fills the room between two blanks exactly, both faces come here in turn.
 */
function measured(region: Region, axis: Axis, kerf: number, face: number, keeps: "low" | "high", trim: boolean): CandidateCut[] {
  const whole = region[axis];
  const halves = part(region, axis, keeps === "low" ? { from: face, to: face + kerf } : { from: face - kerf, to: face });
  const base = { ...halves, region, axis, kind: kindAcross[axis] };
  const low = { ...base, fromEdge: lowEdge[axis], setting: face - whole.from } as const;
  const high = { ...base, fromEdge: highEdge[axis], setting: whole.to - face } as const;
  const near = keeps === "low" ? low : high;
  const far = keeps === "low" ? high : low;
  const ways: CandidateCut[] = [{ ...near, bladeSide: "near" }];
  if (trim) ways.push({ ...far, bladeSide: "far" });
  // An end of the stock is marked from that end; a long edge is ripped with the wanted part against the fence.
  if (trim && axis === "x" && keeps === "high") ways.reverse();
  return ways.filter((way) => isStraight(region, way.fromEdge));
}
