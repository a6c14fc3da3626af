/**
 * What may hurt somebody, or goes against the order in which a shop works, at one cut. Reminders chosen by the shop's own limits; no
 * safety assessment.
 */
import type { Machine } from "./machine";
import type { Halves, LeftEdge } from "./part";
import type { ShopLimits } from "./program";
import { type Axis, type Region, sizeOf } from "./region";
import type { Tool } from "./workshop";

/** A cut as it would be made, before it is known by which machine. */
export interface CutShape extends Halves {
  readonly region: Region;
  readonly axis: Axis;
  readonly bladeSide: "near" | "far";
  /** µm, always positive. */
  readonly setting: number;
  readonly leaves: LeftEdge;
}

/** Counts that add up over a tree; the first that differs decides. */
export interface Hazard {
  /** Cuts that no machine of the shop may take. */
  readonly beyond: number;
  /** Holds of something shorter or narrower than the shop's limits. */
  readonly unsafe: number;
  /** Rips of parts that a crosscut has already shortened: long parts are kept long until last. */
  readonly late: number;
  /** Cuts on another machine than the one the layout was spaced for. */
  readonly strays: number;
}

/** More cuts than any program has; hazards of whole trees stay below 2^53 as one number. */
const most = 8192;

/** One number that sorts hazards and adds up as they do. */
export function rankOf({ beyond, unsafe, late, strays }: Hazard): number {
  return ((beyond * most + unsafe) * most + late) * most + strays;
}

/**
 * No plan for a rectangle has less: one late rip where a shortened part is not yet at its width, and too much of it is left for the
 * plane.
 */
export function leastRank(region: Region | null, thinnestSawn: number): number {
  if (!region?.shortened) return 0;
  const planed = 2 * thinnestSawn + region.owes.top + region.owes.bottom;
  return region.blanks.some((blank) => sizeOf(region.y) - sizeOf(blank.y) > planed) ? most : 0;
}

export function hazardOf(cut: CutShape, tool: Tool, limits: ShopLimits): Hazard {
  return {
    beyond: Number(!mayTake(tool.machine, cut)),
    unsafe: unsafeHolds(cut, tool.machine, limits),
    late: Number(cut.axis === "y" && cut.region.shortened),
    strays: Number(!tool.preferred),
  };
}

/** Whether the machine may take the cut as the shop says of it. */
export function mayTake({ limits }: Machine, cut: CutShape): boolean {
  const { region, axis } = cut;
  if (sizeOf(region.x) < limits.shortest || sizeOf(region.y) < limits.narrowest) return false;
  if (axis === "x") return limits.crosscuts && sizeOf(region.y) <= (limits.longestCrosscut ?? Number.POSITIVE_INFINITY);
  return limits.rips && atFence(cut) <= (limits.widestRip ?? Number.POSITIVE_INFINITY);
}

/** The kept part runs along the fence; of a cut by a mark it is the part beyond the mark. */
function atFence({ region, axis, bladeSide, setting }: CutShape): number {
  return bladeSide === "near" ? setting : sizeOf(region[axis]) - setting;
}

export function unsafeHolds(cut: CutShape, machine: Machine, limits: ShopLimits): number {
  return Number(isHeldShort(cut, machine, limits)) + Number(isNarrowRip(cut, machine, limits));
}

/**
 * What a crosscut leaves is held at one of its ends, so the longer of the two counts; what a rip leaves is as long as before. A hand
 * saw's work is held by the bench.
 */
export function isHeldShort(cut: CutShape, machine: Pick<Machine, "kind">, limits: ShopLimits): boolean {
  if (machine.kind === "hand") return false;
  const longest =
    cut.axis === "y" ? sizeOf(cut.region.x) : Math.max(cut.low ? sizeOf(cut.low.x) : 0, cut.high ? sizeOf(cut.high.x) : 0);
  return longest < limits.shortestCrosscut;
}

/** What runs between the fence and the blade of a rip is narrower than a hand may push. Track and hand saws have no fence. */
export function isNarrowRip(cut: CutShape, machine: Pick<Machine, "kind">, limits: ShopLimits): boolean {
  if (cut.axis !== "y" || machine.kind === "track" || machine.kind === "hand") return false;
  const between = cut.bladeSide === "near" ? cut.setting : cut.setting - sizeOf(cut.kerf);
  return between < limits.narrowestRip;
}
