/**
 * Carries the rest of a program out from the parts in hand, knowing nothing of how it was planned: from each step only the part in
 * hand, the kind, the stage, the edge, the setting and the side of the blade are used, with the width of the blade. It shares no code
 * with what plans the rest.
 */
import type { StockRect } from "../frame/point";
import type { CutProgram, CutStep, Edge, EdgeState, Part } from "../program/program";
import { um } from "../units/um";

export interface OnBench {
  readonly rect: StockRect;
  readonly edges: Readonly<Record<Edge, EdgeState>>;
}

export type RestReplay =
  /** `parts`: what lies on the bench at the end, before clean-up. Dust in µm². */
  | { readonly ok: true; readonly parts: ReadonlyMap<string, OnBench>; readonly kerf: number; readonly shavings: number }
  | {
      readonly ok: false;
      readonly step: number;
      readonly reason: "part-not-in-hand" | "edge-not-straight" | "blade-misses" | "yields-differ";
    };

export function replayRest(
  inHand: readonly { readonly part: Part; readonly edges: Readonly<Record<Edge, EdgeState>> }[],
  steps: readonly CutStep[],
  saws: Pick<CutProgram, "kerf" | "machines">,
): RestReplay {
  const bench = new Map<string, OnBench>(inHand.map(({ part, edges }) => [part.id, { rect: part.rect, edges }]));
  let kerf = 0;
  let shavings = 0;
  for (const step of steps) {
    const held = bench.get(step.part.id);
    if (!held) return { ok: false, step: step.number, reason: "part-not-in-hand" };
    const left = workOn(held, step, saws);
    if (typeof left === "string") return { ok: false, step: step.number, reason: left };
    if (left.length !== step.yields.length) return { ok: false, step: step.number, reason: "yields-differ" };
    bench.delete(step.part.id);
    const lost = square(held.rect) - left.reduce((sum, { rect }) => sum + square(rect), 0);
    if (step.kind === "rip" || step.kind === "crosscut") kerf += lost;
    else shavings += lost;
    for (const [i, one] of left.entries()) bench.set(step.yields[i]?.id ?? "", one);
  }
  return { ok: true, parts: bench, kerf, shavings };
}

const square = (rect: StockRect): number => rect.width * rect.height;
const straight = (state: EdgeState): boolean => state === "trued" || state === "sawn";

function workOn(held: OnBench, step: CutStep, saws: Pick<CutProgram, "kerf" | "machines">) {
  const { kind, fromEdge, setting, bladeSide, stage } = step;
  if (kind === "flatten") return [held];
  const [x0, y0] = [held.rect.x, held.rect.y];
  const [x1, y1] = [x0 + held.rect.width, y0 + held.rect.height];
  // Seen from the edge measured from: `at` turns a distance into the rectangle on either side of it.
  const size = fromEdge === "left" || fromEdge === "right" ? x1 - x0 : y1 - y0;
  const between = (from: number, to: number): StockRect => {
    switch (fromEdge) {
      case "left":
        return box(x0 + from, y0, x0 + to, y1);
      case "right":
        return box(x1 - to, y0, x1 - from, y1);
      case "top":
        return box(x0, y0 + from, x1, y0 + to);
      case "bottom":
        return box(x0, y1 - to, x1, y1 - from);
    }
  };
  if (setting >= size || setting < 0) return "blade-misses";
  if (kind === "true" || kind === "plane") {
    if (kind === "plane" && !straight(held.edges[fromEdge])) return "edge-not-straight";
    return [{ rect: between(setting, size), edges: { ...held.edges, [fromEdge]: "trued" as const } }];
  }
  if ((kind === "crosscut") !== (fromEdge === "left" || fromEdge === "right") || setting === 0) return "blade-misses";
  if (stage !== "rough") {
    if (kind === "crosscut" && !straight(held.edges.top) && !straight(held.edges.bottom)) return "edge-not-straight";
    const marked = held.edges[fromEdge] === "marked" && bladeSide === "far";
    if (!straight(held.edges[fromEdge]) && !marked) return "edge-not-straight";
  }
  const blade = saws.machines?.find(({ id }) => id === step.machineId)?.kerf ?? saws.kerf[kind];
  const [near, far] = bladeSide === "near" ? [setting, setting + blade] : [setting - blade, setting];
  const beyond: Edge = { left: "right", right: "left", top: "bottom", bottom: "top" }[fromEdge] as Edge;
  const state: EdgeState = stage !== "rough" ? "sawn" : kind === "crosscut" ? "marked" : "rough";
  return [
    ...(near > 0 ? [{ rect: between(0, near), edges: { ...held.edges, [beyond]: state } }] : []),
    ...(far < size ? [{ rect: between(far, size), edges: { ...held.edges, [fromEdge]: state } }] : []),
  ];
}

function box(x0: number, y0: number, x1: number, y1: number): StockRect {
  return { x: um(x0), y: um(y0), width: um(x1 - x0), height: um(y1 - y0) };
}
