/** The bench while a program is written down: what lies on it, the steps so far, and how the saws have stood. */
import { um } from "../units/um";
import type { CandidateCut } from "./candidate-cuts";
import { cautionsOf, planeCautions } from "./choose-cautions";
import { type CutPlan, settingKey } from "./cut-plan";
import type { CutRequest } from "./cut-request";
import { partNamer } from "./name-parts";
import { type OrderedCut, orderOfWork } from "./order-of-work";
import { shavings, worked } from "./part";
import type { CutStep, Edge, Part } from "./program";
import { axisOfEdge, isLow, type Region, regionKey, stockRectOf, wholeBoard } from "./region";
import type { Workshop } from "./workshop";

export interface Bench {
  readonly steps: readonly CutStep[];
  /** Carries trees out, cuts of one setting after each other. */
  readonly cut: (trees: readonly CutPlan[], stage: "rough" | "fine") => void;
  readonly flatten: (region: Region) => void;
  /** Trues one edge of a part; `done`: nothing is left to saw afterwards. */
  readonly trueEdge: (region: Region, edge: Edge, takes: number, done: boolean) => Region;
}

export function openBench(request: CutRequest, shop: Workshop): Bench {
  const steps: CutStep[] = [];
  const namer = partNamer(shop.kerf, request.limits);
  const whole = stockRectOf(wholeBoard(request));
  const inHand = new Map<string, Part>();
  inHand.set(regionKey(wholeBoard(request)), { id: "board", kind: "board", label: null, pieceId: null, rect: whole });
  const settings = new Map<string, number>();

  function partAt(region: Region): Part {
    const part = inHand.get(regionKey(region));
    if (!part) throw new Error("a part is worked on before it exists");
    return part;
  }

  function settingNumber(cut: CandidateCut): number {
    const key = settingKey(cut);
    if (key === null) return 0;
    const number = settings.get(key) ?? settings.size + 1;
    settings.set(key, number);
    return number;
  }

  function cutOnce({ plan, turn }: OrderedCut, stage: "rough" | "fine"): void {
    const { cut } = plan;
    const number = steps.length + 1;
    const part = partAt(cut.region);
    const sides = (isLow(cut.fromEdge) ? [cut.low, cut.high] : [cut.high, cut.low]).filter((side) => side !== null);
    const yields = stage === "rough" ? namer.nameRough(part, sides, number) : namer.nameAll(part, sides, number);
    yields.forEach((made, i) => {
      const side = sides[i];
      if (side) inHand.set(regionKey(side), made);
    });
    steps.push({
      number,
      kind: cut.kind,
      ...(stage === "rough" && { stage }),
      ...(shop.named && cut.tool && { machineId: cut.tool.machine.id }),
      part,
      fromEdge: cut.fromEdge,
      fromEdgeState: cut.region.edges[cut.fromEdge],
      setting: um(cut.setting),
      bladeSide: cut.bladeSide,
      kerf: stockRectOf({ x: cut.region.x, y: cut.region.y, [cut.axis]: cut.kerf }),
      yields,
      trim: yields.length < 2 || yields.some(({ kind }) => kind === "waste"),
      settingNumber: settingNumber(cut),
      turn,
      cautions: cautionsOf(cut, part, yields, request.limits, stage),
    });
  }

  function workedOn(
    region: Region,
    after: Region,
    step: Pick<CutStep, "kind" | "fromEdge" | "setting" | "kerf">,
    part: Part,
  ): void {
    const before = partAt(region);
    inHand.set(regionKey(after), part);
    steps.push({
      number: steps.length + 1,
      part: before,
      fromEdgeState: region.edges[step.fromEdge],
      bladeSide: "far",
      yields: [part],
      trim: step.kind === "true",
      settingNumber: 0,
      turn: "none",
      cautions: planeCautions(before, request.limits),
      ...step,
    });
  }

  return {
    steps,
    cut: (trees, stage) => {
      for (const ordered of orderOfWork(trees)) cutOnce(ordered, stage);
    },
    flatten: (region) => {
      const part = partAt(region);
      const dust = { ...part.rect, width: um(0), height: um(0) };
      const flat = { ...part, id: `${steps.length + 1}.1` };
      workedOn(region, region, { kind: "flatten", fromEdge: "top", setting: um(0), kerf: dust }, flat);
    },
    trueEdge: (region, edge, takes, done) => {
      const after = worked(region, edge, takes);
      const number = steps.length + 1;
      const before = partAt(region);
      const dust = stockRectOf({ x: region.x, y: region.y, [axisOfEdge[edge]]: shavings(region, edge, takes) });
      const same = { ...before, id: `${number}.1`, rect: stockRectOf(after) };
      // Where nothing is left to saw, the last edge trued leaves the piece.
      const part = done ? (namer.nameAll(before, [after], number)[0] ?? same) : same;
      workedOn(region, after, { kind: "true", fromEdge: edge, setting: um(takes), kerf: dust }, part);
      return after;
    },
  };
}
