/**
 * Carries a program out on rectangles, knowing nothing of how it was planned: from each step only the part in hand, the kind, the
 * edge, the setting and the side of the blade are used, with the width of the blade. It shares no code with the planner, so that
 * an error in one cannot hide in the other.
 */
import type { StockRect } from "../frame/point";
import { um } from "../units/um";
import type { CutProgram, CutStep, Edge, EdgeState, Part } from "./program";

export type ReplayOutcome =
  /** `parts`: what lies on the bench at the end, pieces after their clean-up. `dust`: µm² by what made it. */
  | { readonly ok: true; readonly parts: readonly Part[]; readonly dust: { readonly kerf: number; readonly cleanUp: number } }
  | { readonly ok: false; readonly step: number; readonly reason: ReplayFault };

export type ReplayFault =
  | "part-not-in-hand"
  /** Measured from an edge that is rough, or no crosscut fence edge is straight. */
  | "edge-not-straight"
  /** The setting is not positive or the blade misses the part. */
  | "blade-misses"
  /** More or fewer parts come off than the step says. */
  | "yields-differ";

interface Held {
  readonly rect: StockRect;
  readonly edges: Readonly<Record<Edge, EdgeState>>;
}

/** Low: left or top. Lengths run from the low edge along the axis the cut parts. */
const isLow = (edge: Edge): boolean => edge === "left" || edge === "top";
const isAlong = (edge: Edge): boolean => edge === "left" || edge === "right";
const opposite: Readonly<Record<Edge, Edge>> = { left: "right", right: "left", top: "bottom", bottom: "top" };
const area = (rect: StockRect): number => rect.width * rect.height;

export function replay(
  board: { readonly length: number; readonly width: number },
  edges: Readonly<Record<Edge, EdgeState>>,
  program: CutProgram,
): ReplayOutcome {
  const whole = { x: um(0), y: um(0), width: um(board.length), height: um(board.width) };
  const bench = new Map<string, Held>([["board", { rect: whole, edges }]]);
  const names = new Map<string, Part>();
  let kerf = 0;
  let cleanUp = 0;
  for (const step of program.steps) {
    const held = bench.get(step.part.id);
    if (!held) return { ok: false, step: step.number, reason: "part-not-in-hand" };
    const done = step.kind === "true" ? trued(held, step) : sawn(held, step, program.kerf[step.kind]);
    if (typeof done === "string") return { ok: false, step: step.number, reason: done };
    if (done.length !== step.yields.length) return { ok: false, step: step.number, reason: "yields-differ" };
    bench.delete(step.part.id);
    const lost = area(held.rect) - done.reduce((sum, one) => sum + area(one.rect), 0);
    if (step.kind === "true") cleanUp += lost;
    else kerf += lost;
    for (const [i, made] of step.yields.entries()) {
      const one = done[i];
      if (one) bench.set(made.id, one);
      names.set(made.id, made);
    }
  }
  const parts = [...bench].map(([id, held]): Part => {
    const cleaned = cleanedUp(held.rect, id, program);
    cleanUp += area(held.rect) - area(cleaned);
    const name = names.get(id) ?? { kind: "board", label: null, pieceId: null };
    return { id, kind: name.pieceId === null ? name.kind : "piece", label: name.label, pieceId: name.pieceId, rect: cleaned };
  });
  return { ok: true, parts, dust: { kerf, cleanUp } };
}

function trued(held: Held, step: CutStep): readonly Held[] | ReplayFault {
  if (step.setting < 0) return "blade-misses";
  return [{ rect: shaved(held.rect, step.fromEdge, step.setting), edges: { ...held.edges, [step.fromEdge]: "trued" } }];
}

/** The parts left, that next to the measured edge first. */
function sawn(held: Held, step: CutStep, blade: number): readonly Held[] | ReplayFault {
  const { fromEdge, setting, bladeSide } = step;
  if (isAlong(fromEdge) !== (step.kind === "crosscut")) return "blade-misses";
  if (held.edges[fromEdge] === "rough") return "edge-not-straight";
  if (step.kind === "crosscut" && held.edges.top === "rough" && held.edges.bottom === "rough") return "edge-not-straight";
  const size = isAlong(fromEdge) ? held.rect.width : held.rect.height;
  const nearPart = bladeSide === "near" ? setting : Math.max(setting - blade, 0);
  const farPart = Math.max(bladeSide === "near" ? size - setting - blade : size - setting, 0);
  if (setting <= 0 || setting >= size) return "blade-misses";
  const other = opposite[fromEdge];
  const near: Held = { rect: shaved(held.rect, other, size - nearPart), edges: { ...held.edges, [other]: "sawn" } };
  const far: Held = { rect: shaved(held.rect, fromEdge, size - farPart), edges: { ...held.edges, [fromEdge]: "sawn" } };
  return [near, far].filter((one) => area(one.rect) > 0);
}

/** The rectangle with so much taken off one edge. */
function shaved(rect: StockRect, edge: Edge, amount: number): StockRect {
  const shift = isLow(edge) ? amount : 0;
  return isAlong(edge)
    ? { ...rect, x: um(rect.x + shift), width: um(rect.width - amount) }
    : { ...rect, y: um(rect.y + shift), height: um(rect.height - amount) };
}

function cleanedUp(rect: StockRect, id: string, program: CutProgram): StockRect {
  return program.cleanUps.filter((one) => one.partId === id).reduce((left, one) => shaved(left, one.edge, one.amount), rect);
}
