/**
 * The machine that makes a cut: the preferred one where it may take the cut and holds nothing short or narrow; else the first of the
 * shop's others that makes it with fewer such holds, if its blade fits between the blanks and what it leaves can be cleaned up.
 */
import { type CutShape, type Hazard, hazardOf } from "./hazard";
import { part } from "./part";
import type { Edge } from "./program";
import { type Axis, edgeAt, highEdge, lowEdge, type Region } from "./region";
import type { Tool, Workshop } from "./workshop";

/** Where a cut leaves the edge of blanks. */
export interface Face {
  readonly axis: Axis;
  /** The blanks' edge. */
  readonly at: number;
  /** On which side of it they lie. */
  readonly keeps: "low" | "high";
}

export interface Measured {
  readonly fromEdge: Edge;
  readonly bladeSide: "near" | "far";
}

export interface ToolCut extends CutShape {
  readonly tool: Tool;
  readonly hazard: Hazard;
}

/** How each tool would leave a face, worked out once for all ways to measure the cut; null where it does not fit. */
type Fit = Pick<CutShape, "kerf" | "low" | "high" | "leaves"> & { readonly face: number };

/** For each way to measure the cut the machine that makes it; a way for which no saw of the shop fits is left out. */
export function chooseTools(region: Region, face: Face, ways: readonly Measured[], shop: Workshop): (ToolCut & Measured)[] {
  const fits: (Fit | null)[] = [];
  return ways.flatMap((way) => {
    let best: (ToolCut & Measured) | null = null;
    for (const [i, tool] of shop.tools[face.axis].entries()) {
      let fit = fits[i];
      if (fit === undefined) {
        fit = fitOf(tool, region, face);
        fits[i] = fit;
      }
      if (!fit) continue;
      const cut = measured(fit, region, face.axis, way);
      const hazard = hazardOf(cut, tool, shop.limits);
      // Only the preferred machine stands in where none may take the cut: its blade is what the layout reckons with.
      if (hazard.beyond > 0 && !tool.preferred) continue;
      if (!best || isLess(hazard, best.hazard)) best = { ...cut, fromEdge: way.fromEdge, tool, hazard };
      if (hazard.beyond === 0 && hazard.unsafe === 0) break;
    }
    return best ?? [];
  });
}

const isLess = (a: Hazard, b: Hazard): boolean => (a.beyond - b.beyond || a.unsafe - b.unsafe) < 0;

function measured({ face, kerf, low, high, leaves }: Fit, region: Region, axis: Axis, way: Measured): CutShape {
  const { from, to } = region[axis];
  const setting = way.fromEdge === lowEdge[axis] ? face - from : to - face;
  return { region, axis, bladeSide: way.bladeSide, setting, kerf, low, high, leaves };
}

/** null where its blade or its clean-up finds no room, and where nothing would come off. */
function fitOf(tool: Tool, region: Region, { axis, at, keeps }: Face): Fit | null {
  const low = keeps === "low";
  const whole = region[axis];
  const extra = tool.owes === 0 ? 0 : leftForCleanUp(region, axis, at, keeps, tool.owes);
  const face = low ? at + extra : at - extra;
  if (face <= whole.from || face >= whole.to) return null;
  const { kerf } = tool.machine;
  const leaves = { state: "sawn", owes: tool.owes } as const;
  const halves = part(region, axis, low ? { from: face, to: face + kerf } : { from: face - kerf, to: face }, leaves);
  const [kept, other] = low ? [halves.low, halves.high] : [halves.high, halves.low];
  const parted = (kept?.blanks.length ?? 0) + (other?.blanks.length ?? 0);
  if (parted < region.blanks.length) return null;
  // Where much is left for clean-up, the blade must not run beyond the next blank.
  if (extra > 0 && kept?.blanks.some((blank) => (low ? blank[axis].to > at : blank[axis].from < at))) return null;
  if (tool.owes > 0 && other && !canBeCleaned(other, low ? lowEdge[axis] : highEdge[axis])) return null;
  return { ...halves, leaves, face };
}

/** What the blanks at a face lack for the clean-up that a machine asks for. */
function leftForCleanUp(region: Region, axis: Axis, at: number, keeps: "low" | "high", owes: number): number {
  const edge = keeps === "low" ? highEdge[axis] : lowEdge[axis];
  const lacks = region.blanks
    .filter((blank) => (keeps === "low" ? blank[axis].to <= at : blank[axis].from >= at))
    .map((blank) => owes - blank.piece.cleanUp[edge] - Math.abs(edgeAt(blank, edge) - at));
  return Math.max(0, ...lacks);
}

/** Every blank has the wood at this edge that the machine's clean-up takes. */
function canBeCleaned(region: Region, edge: Edge): boolean {
  return region.blanks.every(
    (blank) => blank.piece.cleanUp[edge] + Math.abs(edgeAt(blank, edge) - edgeAt(region, edge)) >= region.owes[edge],
  );
}
