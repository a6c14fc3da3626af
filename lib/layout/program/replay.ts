/**
 * Carries a program out on rectangles, knowing nothing of how it was planned: from each step only the part in hand, the kind, the
 * stage, the edge, the setting and the side of the blade are used, with the width of the machine's blade. It shares no code with the
 * planner, so that an error in one cannot hide in the other.
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
  /** Measured from an edge that is rough, or no crosscut fence edge is straight, or an edge is planed that is rough. */
  | "edge-not-straight"
  /** A step names a machine that the program does not know. */
  | "unknown-machine"
  /** A fine cut in a part that has yet to be flattened, or a rough one in a part that is flat. */
  | "wrong-stage"
  /** The setting is not positive or the blade misses the part. */
  | "blade-misses"
  /** More or fewer parts come off than the step says. */
  | "yields-differ";

interface Held {
  readonly rect: StockRect;
  readonly edges: Readonly<Record<Edge, EdgeState>>;
  /** Through planer and jointer, or from a board that was flat as it came. */
  readonly flat: boolean;
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
  const bench = new Map<string, Held>([["board", { rect: whole, edges, flat: !hasRoughStage(program) }]]);
  const names = new Map<string, Part>();
  let kerf = 0;
  let cleanUp = 0;
  for (const step of program.steps) {
    const held = bench.get(step.part.id);
    if (!held) return { ok: false, step: step.number, reason: "part-not-in-hand" };
    const done = workedOn(held, step, program);
    if (typeof done === "string") return { ok: false, step: step.number, reason: done };
    if (done.length !== step.yields.length) return { ok: false, step: step.number, reason: "yields-differ" };
    bench.delete(step.part.id);
    const lost = area(held.rect) - done.reduce((sum, one) => sum + area(one.rect), 0);
    if (step.kind === "rip" || step.kind === "crosscut") kerf += lost;
    else cleanUp += lost;
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

function workedOn(held: Held, step: CutStep, program: CutProgram): readonly Held[] | ReplayFault {
  if ((step.stage === "rough" || step.kind === "flatten") === held.flat && hasRoughStage(program)) return "wrong-stage";
  switch (step.kind) {
    case "true":
      return trued(held, step);
    case "plane":
      return held.edges[step.fromEdge] === "trued" || held.edges[step.fromEdge] === "sawn"
        ? trued(held, step)
        : "edge-not-straight";
    case "flatten":
      return [{ ...held, flat: true }];
    default: {
      if (step.machineId === undefined) return sawn(held, step, program.kerf[step.kind]);
      const machine = program.machines?.find(({ id }) => id === step.machineId);
      return machine ? sawn(held, step, machine.kerf) : "unknown-machine";
    }
  }
}

const hasRoughStage = (program: CutProgram): boolean => program.steps.some(({ kind }) => kind === "flatten");

function trued(held: Held, step: CutStep): readonly Held[] | ReplayFault {
  const { fromEdge, setting } = step;
  if (setting < 0 || setting >= (isAlong(fromEdge) ? held.rect.width : held.rect.height)) return "blade-misses";
  return [{ ...held, rect: shaved(held.rect, fromEdge, setting), edges: { ...held.edges, [fromEdge]: "trued" } }];
}

/** Whether a cut may be measured so. A rough cut follows a line marked from whatever edge there is. */
function mayMeasure(held: Held, { kind, stage, fromEdge, bladeSide }: CutStep): boolean {
  if (stage === "rough") return true;
  if (kind === "crosscut" && !isStraight(held.edges.top) && !isStraight(held.edges.bottom)) return false;
  return isStraight(held.edges[fromEdge]) || (held.edges[fromEdge] === "marked" && bladeSide === "far");
}

const isStraight = (state: EdgeState): boolean => state === "trued" || state === "sawn";

/** The parts left, that next to the measured edge first. */
function sawn(held: Held, step: CutStep, blade: number): readonly Held[] | ReplayFault {
  const { fromEdge, setting, bladeSide } = step;
  if (isAlong(fromEdge) !== (step.kind === "crosscut")) return "blade-misses";
  if (!mayMeasure(held, step)) return "edge-not-straight";
  const size = isAlong(fromEdge) ? held.rect.width : held.rect.height;
  const nearPart = bladeSide === "near" ? setting : Math.max(setting - blade, 0);
  const farPart = Math.max(bladeSide === "near" ? size - setting - blade : size - setting, 0);
  if (setting <= 0 || setting >= size) return "blade-misses";
  const other = opposite[fromEdge];
  const left = step.stage !== "rough" ? "sawn" : step.kind === "crosscut" ? "marked" : "rough";
  const near: Held = { ...held, rect: shaved(held.rect, other, size - nearPart), edges: { ...held.edges, [other]: left } };
  const far: Held = { ...held, rect: shaved(held.rect, fromEdge, size - farPart), edges: { ...held.edges, [fromEdge]: left } };
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
