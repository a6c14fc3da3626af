/** Writes a chosen tree down as the program the bench follows: truing, then steps with names, settings, turns and cautions. */
import { um } from "../units/um";
import type { KerfByAxis } from "./candidate-cuts";
import { cautionsOf } from "./choose-cautions";
import { conservationOf } from "./conservation";
import { type CutPlan, settingKey } from "./cut-plan";
import type { CutRequest } from "./cut-request";
import { type PartNamer, partNamer } from "./name-parts";
import { type OrderedCut, orderOfWork } from "./order-of-work";
import type { CleanUp, CutProgram, CutStep, Part, SearchReport } from "./program";
import { axisOfEdge, everyEdge, type Region, regionKey, stockRectOf, wholeBoard } from "./region";
import { type TruingWay, truingTakes } from "./truing";

export interface ChosenTree {
  readonly way: TruingWay;
  /** null: truing alone does it. */
  readonly plan: CutPlan | null;
}

export function writeProgram(request: CutRequest, kerf: KerfByAxis, tree: ChosenTree, search: SearchReport): CutProgram {
  const namer = partNamer(kerf, request.limits);
  const truing = truingSteps(request, tree, namer);
  const steps = [...truing, ...cutSteps(request, tree.plan, truing, namer)];
  const parts = finalParts(steps);
  const blanks = parts.filter((part) => part.pieceId !== null);
  const pieces = blanks.map((part) => finished(part, request));
  const program = {
    steps,
    kerf: request.kerf,
    cleanUps: blanks.flatMap((part) => cleanUpsOf(part, request)),
    pieces,
    offcuts: parts.filter((part) => part.kind === "offcut"),
    waste: parts.filter((part) => part.kind === "waste"),
    settings: new Set(steps.filter((step) => step.kind !== "true").map((step) => step.settingNumber)).size,
    search,
  };
  return { ...program, conservation: conservationOf(request.board, program) };
}

function truingSteps(request: CutRequest, { way, plan }: ChosenTree, namer: PartNamer): readonly CutStep[] {
  let rect = wholeBoard(request) as Pick<Region, "x" | "y">;
  let part: Part = { id: "board", kind: "board", label: null, pieceId: null, rect: stockRectOf(rect) };
  return way.edges.map((edge, i) => {
    const axis = axisOfEdge[edge];
    const takes = truingTakes(edge, request);
    const { from, to } = rect[axis];
    const low = edge === "left" || edge === "top";
    const shavings = { ...rect, [axis]: low ? { from, to: from + takes } : { from: to - takes, to } };
    rect = { ...rect, [axis]: low ? { from: from + takes, to } : { from, to: to - takes } };
    const before = part;
    part = { ...before, id: `${i + 1}.1`, rect: stockRectOf(rect) };
    // Where nothing is left to saw, the last edge trued leaves the piece.
    if (!plan && i === way.edges.length - 1) part = namer.nameAll(before, [way.board], i + 1)[0] ?? part;
    return {
      number: i + 1,
      kind: "true",
      part: before,
      fromEdge: edge,
      fromEdgeState: "rough",
      setting: um(takes),
      bladeSide: "far",
      kerf: stockRectOf(shavings),
      yields: [part],
      trim: true,
      settingNumber: 0,
      turn: "none",
      cautions: before.rect.width < request.limits.shortestMachined ? ["too-short-for-planer"] : [],
    };
  });
}

function cutSteps(request: CutRequest, plan: CutPlan | null, truing: readonly CutStep[], namer: PartNamer): readonly CutStep[] {
  if (!plan) return [];
  const board = truing.at(-1)?.yields[0];
  const root = plan.cut.region;
  const inHand = new Map<string, Part>();
  inHand.set(regionKey(root), board ?? { id: "board", kind: "board", label: null, pieceId: null, rect: stockRectOf(root) });
  const settings = new Map<string, number>();
  return orderOfWork(plan).map((ordered, i) => {
    const { cut } = ordered.plan;
    const part = inHand.get(regionKey(cut.region));
    if (!part) throw new Error("a part is cut before it exists");
    const number = truing.length + i + 1;
    const sides = cut.fromEdge === "left" || cut.fromEdge === "top" ? [cut.low, cut.high] : [cut.high, cut.low];
    const regions = sides.filter((side) => side !== null);
    const yields = namer.nameAll(part, regions, number);
    for (const [j, region] of regions.entries()) {
      const made = yields[j];
      if (made) inHand.set(regionKey(region), made);
    }
    const key = settingKey(cut);
    settings.set(key, settings.get(key) ?? settings.size + 1);
    return stepOf(ordered, number, part, yields, settings.get(key) ?? 0, request);
  });
}

function stepOf(
  ordered: OrderedCut,
  number: number,
  part: Part,
  yields: readonly Part[],
  setting: number,
  request: CutRequest,
): CutStep {
  const { cut } = ordered.plan;
  return {
    number,
    kind: cut.kind,
    part,
    fromEdge: cut.fromEdge,
    fromEdgeState: cut.region.edges[cut.fromEdge],
    setting: um(cut.setting),
    bladeSide: cut.bladeSide,
    kerf: stockRectOf({ x: cut.region.x, y: cut.region.y, [cut.axis]: cut.kerf }),
    yields,
    trim: yields.length < 2 || yields.some((made) => made.kind === "waste"),
    settingNumber: setting,
    turn: ordered.turn,
    cautions: cautionsOf(cut, yields, request.limits),
  };
}

/** Parts that no step takes in hand again, in the order in which they come off. */
function finalParts(steps: readonly CutStep[]): readonly Part[] {
  const cutAgain = new Set(steps.map((step) => step.part.id));
  return steps.flatMap((step) => step.yields).filter((part) => !cutAgain.has(part.id));
}

function pieceOf(part: Part, request: CutRequest) {
  const piece = request.pieces.find(({ pieceId }) => pieceId === part.pieceId);
  if (!piece) throw new Error(`no piece ${part.pieceId} was asked for`);
  return piece;
}

function cleanUpsOf(part: Part, request: CutRequest): readonly CleanUp[] {
  const { cleanUp } = pieceOf(part, request);
  return everyEdge.filter((edge) => cleanUp[edge] > 0).map((edge) => ({ partId: part.id, edge, amount: cleanUp[edge] }));
}

function finished(part: Part, request: CutRequest): Part {
  return { ...part, kind: "piece", rect: pieceOf(part, request).rect };
}
