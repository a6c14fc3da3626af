/**
 * The rough cuts of a board that is not flat: they part the rough parts and take off what is worth keeping as an offcut. What else lies
 * around a part is planed with it. Each follows a line marked on the face, so it may be measured from any edge; the allowances take up
 * what that leaves uncertain.
 */
import { type CandidateCut, groupsAlong } from "./candidate-cuts";
import { type CutShape, type Hazard, mayTake, unsafeHolds } from "./hazard";
import { type LeftEdge, part } from "./part";
import type { Edge, ShopLimits } from "./program";
import { type Axis, edgeAt, everyEdge, highEdge, isLow, kindAcross, lowEdge, type Region, roomAt, sizeOf } from "./region";
import type { Rules } from "./search/shape-graph";
import type { Tool, Workshop } from "./workshop";

/** A rough rip leaves no edge to rely on; from an end that was cut rough a line can still be marked. */
const leftBy: Readonly<Record<Axis, LeftEdge>> = { x: { state: "marked", owes: 0 }, y: { state: "rough", owes: 0 } };

export function roughRules(shop: Workshop): Rules {
  return {
    stepsIn: (region) => [...cutsAlong(region, "y", shop), ...cutsAlong(region, "x", shop)],
    isFinished: (region) =>
      region.blanks.length === 0 ||
      (region.blanks.length === 1 && everyEdge.every((edge) => !isWorthKeeping(region, edge, shop))),
    leastRank: () => 0,
  };
}

/** The widest blade that may make a rough cut. */
export function widestKerf({ tools }: Workshop, axis: Axis): number {
  return Math.max(...tools[axis].map(({ machine }) => machine.kerf));
}

function cutsAlong(region: Region, axis: Axis, shop: Workshop): CandidateCut[] {
  const groups = groupsAlong(region, axis, widestKerf(shop, axis));
  const strips = [highEdge[axis], lowEdge[axis]].filter((edge) => isWorthKeeping(region, edge, shop));
  return [
    ...strips.flatMap((edge) => {
      const at = isLow(edge) ? (groups[0]?.from ?? 0) : (groups.at(-1)?.to ?? 0);
      return cutAt(region, axis, at, isLow(edge) ? "high" : "low", shop);
    }),
    ...groups
      .slice(1)
      .flatMap((next, i) => [
        ...cutAt(region, axis, groups[i]?.to ?? 0, "low", shop),
        ...cutAt(region, axis, next.from, "high", shop),
      ]),
  ];
}

/** Between an edge and the parts there is an offcut to be had. */
function isWorthKeeping(region: Region, edge: Edge, shop: Workshop): boolean {
  const { offcutLength, offcutWidth }: ShopLimits = shop.limits;
  const along = edge === "left" || edge === "right";
  const room = roomAt(region, edge) - widestKerf(shop, along ? "x" : "y");
  if (sizeOf(along ? region.y : region.x) < (along ? offcutWidth : offcutLength)) return false;
  return room >= Math.max(1, along ? offcutLength : offcutWidth);
}

function cutAt(region: Region, axis: Axis, at: number, keeps: "low" | "high", shop: Workshop): CandidateCut[] {
  const fromEdge = keeps === "low" ? lowEdge[axis] : highEdge[axis];
  const setting = Math.abs(at - edgeAt(region, fromEdge));
  const cuts = shop.tools[axis].flatMap((tool): CandidateCut[] => {
    const { kerf } = tool.machine;
    const halves = part(region, axis, keeps === "low" ? { from: at, to: at + kerf } : { from: at - kerf, to: at }, leftBy[axis]);
    const shape: CutShape = { ...halves, region, axis, bladeSide: "near", setting, leaves: leftBy[axis] };
    const hazard = hazardOfRough(shape, tool, shop.limits);
    if (hazard.beyond > 0 && !tool.preferred) return [];
    return [{ ...shape, kind: kindAcross[axis], fromEdge, tool, hazard }];
  });
  const [best] = cuts.sort((a, b) => compareHazards(a.hazard, b.hazard) || roughRank(a.tool) - roughRank(b.tool));
  return best ? [best] : [];
}

/** A board that is not flat rocks on a saw table. */
function hazardOfRough(cut: CutShape, tool: Tool, limits: ShopLimits): Hazard {
  const unsafe = unsafeHolds(cut, tool.machine, limits) + Number(tool.machine.kind === "table");
  return { beyond: Number(!mayTake(tool.machine, cut)), unsafe, late: 0, strays: 0 };
}

const compareHazards = (a: Hazard, b: Hazard): number => a.beyond - b.beyond || a.unsafe - b.unsafe;

/** Where equally safe: what is moved over the board before what the board is moved over. */
const roughOrder = ["track", "band", "hand", "table"];
const roughRank = (tool: Tool | null): number => (tool ? roughOrder.indexOf(tool.machine.kind) : 0);
