/**
 * The brute force the search is held against: every tree of straight cuts that leave a blank's edge, with nothing remembered but
 * equal costs. It shares no code with the planner. Cuts are measured as the program promises: to the side of the blade that leaves
 * a blank's edge; over wood that is cut away, to its far side. Each is made by the machine that the shop's rules name.
 */

import type { CutRequest } from "@/lib/layout/program/cut-request";
import { type MachineKind, noLimits } from "@/lib/layout/program/machine";
import type { Cost } from "./cost-of-program";

export type Side = "left" | "right" | "top" | "bottom";
const sides: readonly Side[] = ["left", "right", "top", "bottom"];

interface Box {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
}

interface Blank extends Box {
  readonly clean: Readonly<Record<Side, number>>;
}

interface Held extends Box {
  readonly blanks: readonly Blank[];
  readonly state: Readonly<Record<Side, "rough" | "marked" | "straight">>;
  readonly owes: Readonly<Record<Side, number>>;
  readonly short: boolean;
}

interface Tree {
  readonly beyond: number;
  readonly unsafe: number;
  readonly late: number;
  readonly strays: number;
  readonly settings: ReadonlySet<string>;
  readonly turns: number;
  readonly steps: number;
  readonly racked: number;
  /** Edge of its first cut; empty where no saw is needed. */
  readonly first: Side | "";
}

interface Saw {
  readonly id: string;
  readonly kind: MachineKind;
  readonly kerf: number;
  readonly owes: number;
  readonly preferred: boolean;
  readonly limits: typeof noLimits;
}

const nothing: Tree = { beyond: 0, unsafe: 0, late: 0, strays: 0, settings: new Set(), turns: 0, steps: 0, racked: 0, first: "" };

/** The least cost of all trees; "too many" when there are more than `most` different ones. Long edges and ends are not trued. */
export function leastCost(request: CutRequest, most: number): Cost | "too many" | "impossible" {
  const { length, width } = request.board;
  const edges = request.boardEdges;
  const state = (side: Side) => (edges[side] === "trued" ? ("straight" as const) : edges[side]);
  const board: Held = {
    x0: 0,
    x1: length,
    y0: 0,
    y1: width,
    blanks: request.pieces.map(({ rect, cleanUp }) => ({
      x0: rect.x - cleanUp.left,
      x1: rect.x + rect.width + cleanUp.right,
      y0: rect.y - cleanUp.top,
      y1: rect.y + rect.height + cleanUp.bottom,
      clean: cleanUp,
    })),
    state: { left: state("left"), right: state("right"), top: state("top"), bottom: state("bottom") },
    owes: { left: 0, right: 0, top: 0, bottom: 0 },
    short: false,
  };
  const trees = allTrees(board, request, most);
  if (!trees) return "too many";
  const costs = trees.map((t): Cost => [t.beyond, t.unsafe, t.late, t.strays, t.settings.size, t.turns, t.steps, -t.racked]);
  const [least] = costs.sort((a, b) => a.reduce((order, value, i) => order || value - (b[i] ?? 0), 0));
  return least ?? "impossible";
}

function allTrees(held: Held, request: CutRequest, most: number): Tree[] | null {
  const [blank, second] = held.blanks;
  if (!blank) return [{ ...nothing, racked: isOffcut(held, request) ? (held.x1 - held.x0) * (held.y1 - held.y0) : 0 }];
  if (!second && sides.every((side) => at(held, side) === at(blank, side))) return [nothing];
  const trees = new Map<string, Tree>();
  for (const step of [...planings(held, request), ...cuts(held, request)]) {
    const [low = [nothing], high = [nothing]] = step.parts.map((part) => allTrees(part, request, most));
    if (!low || !high) return null;
    for (const a of low) for (const b of high) keep(trees, joined(step, a, b));
    if (trees.size > most) return null;
  }
  return [...trees.values()];
}

interface Step {
  readonly parts: readonly Held[];
  /** null: the plane. */
  readonly cut: {
    readonly saw: Saw;
    readonly from: Side;
    readonly key: string;
    readonly beyond: number;
    readonly unsafe: number;
    readonly late: number;
  } | null;
}

function at(box: Box, side: Side): number {
  return { left: box.x0, right: box.x1, top: box.y0, bottom: box.y1 }[side];
}

/** Wood between an edge and the nearest blank. */
function room(held: Held, side: Side): number {
  return Math.min(...held.blanks.map((blank) => Math.abs(at(blank, side) - at(held, side))));
}

function isForPlane(held: Held, side: Side, request: CutRequest): boolean {
  const most = Math.max(request.thinnestSawn ?? 500, held.owes[side]);
  return held.state[side] === "straight" && room(held, side) > 0 && room(held, side) <= most;
}

function planings(held: Held, request: CutRequest): Step[] {
  return sides
    .filter((side) => isForPlane(held, side, request))
    .map((side) => {
      const by = room(held, side);
      const edge = {
        left: { x0: held.x0 + by },
        right: { x1: held.x1 - by },
        top: { y0: held.y0 + by },
        bottom: { y1: held.y1 - by },
      }[side];
      return { parts: [{ ...held, ...edge, owes: { ...held.owes, [side]: 0 } }], cut: null };
    });
}

function cuts(held: Held, request: CutRequest): Step[] {
  const steps = new Map<string, Step>();
  for (const axis of ["x", "y"] as const) {
    if (axis === "x" && held.state.top !== "straight" && held.state.bottom !== "straight") continue;
    const [low, high] = axis === "x" ? (["left", "right"] as const) : (["top", "bottom"] as const);
    for (const blank of held.blanks) {
      for (const kept of [low, high]) {
        for (const side of ["near", "far"] as const) {
          const face = at(blank, kept === low ? high : low);
          const step = cutAt(held, request, axis, face, kept, side);
          if (step) steps.set(`${axis} ${face} ${kept} ${side}`, step);
        }
      }
    }
  }
  return [...steps.values()];
}

/** `kept`: the edge on whose side of the face the blanks lie whose edge the cut leaves. */
function cutAt(held: Held, request: CutRequest, axis: "x" | "y", face: number, kept: Side, side: "near" | "far"): Step | null {
  const low = kept === "left" || kept === "top";
  const opposite = { left: "right", right: "left", top: "bottom", bottom: "top" } as const;
  const from = side === "near" ? kept : opposite[kept];
  const lies = held.blanks.filter((blank) => (low ? at(blank, opposite[kept]) <= face : at(blank, opposite[kept]) >= face));
  const others = held.blanks.filter((blank) => !lies.includes(blank));
  if (side === "far" && others.length > 0) return null;
  if (held.state[from] !== "straight" && !(side === "far" && held.state[from] === "marked")) return null;
  if (others.length === 0 && isForPlane(held, opposite[kept], request)) return null;
  let best: Step | null = null;
  for (const saw of sawsFor(axis, request)) {
    let extra = 0;
    while (lies.some((blank) => Math.abs(at(blank, opposite[kept]) - face) + extra + blank.clean[opposite[kept]] < saw.owes))
      extra++;
    const edge = low ? face + extra : face - extra;
    const far = low ? edge + saw.kerf : edge - saw.kerf;
    const beginning = axis === "x" ? held.x0 : held.y0;
    const end = axis === "x" ? held.x1 : held.y1;
    if (edge <= beginning || edge >= end) continue;
    if (others.some((blank) => (low ? at(blank, kept) < far : at(blank, kept) > far))) continue;
    const lacks = (blank: Blank) => blank.clean[kept] + Math.abs(at(blank, kept) - far) < saw.owes;
    if (others.some(lacks)) continue;
    const [lowTo, highFrom] = low ? [edge, Math.min(far, end)] : [Math.max(far, beginning), edge];
    const made = (a: number, b: number, fresh: Side, blanks: readonly Blank[]): Held => ({
      ...held,
      ...(axis === "x" ? { x0: a, x1: b } : { y0: a, y1: b }),
      blanks,
      state: { ...held.state, [fresh]: "straight" },
      owes: { ...held.owes, [fresh]: saw.owes },
      short: held.short || axis === "x",
    });
    const parts = [
      made(beginning, lowTo, axis === "x" ? "right" : "bottom", low ? lies : others),
      made(highFrom, end, axis === "x" ? "left" : "top", low ? others : lies),
    ].filter((one) => one.x1 > one.x0 && one.y1 > one.y0);
    const setting = Math.abs(edge - at(held, from));
    const between = side === "near" ? setting : setting - (highFrom - lowTo);
    const length = axis === "y" ? held.x1 - held.x0 : Math.max(...parts.map((part) => part.x1 - part.x0));
    const { limits } = request;
    const unsafe =
      Number(saw.kind !== "hand" && length < limits.shortestCrosscut) +
      Number((saw.kind === "table" || saw.kind === "band") && axis === "y" && between < limits.narrowestRip);
    const beyond = Number(!mayTake(saw, held, axis, side === "near" ? setting : end - beginning - setting));
    if (beyond > 0 && !saw.preferred) continue;
    const key = `${saw.id} ${axis} ${side} ${setting}`;
    const step: Step = { parts, cut: { saw, from, key, beyond, unsafe, late: Number(axis === "y" && held.short) } };
    if (!best?.cut || beyond < best.cut.beyond || (beyond === best.cut.beyond && unsafe < best.cut.unsafe)) best = step;
  }
  return best;
}

function sawsFor(axis: "x" | "y", { machines, kerf }: CutRequest): Saw[] {
  const kind = axis === "x" ? "crosscut" : "rip";
  if (!machines) return [{ id: kind, kind: "table", kerf: kerf[kind], owes: 0, preferred: true, limits: noLimits }];
  const first = machines[kind];
  const rest = [machines.rip, machines.crosscut, ...machines.others].filter(({ id }) => id !== first.id);
  const saws = [first, ...["table", "track", "band", "hand"].flatMap((name) => rest.filter((saw) => saw.kind === name))];
  return saws.map((saw, i) => ({ ...saw, owes: i === 0 ? 0 : saw.cleanUp, preferred: i === 0 }));
}

function mayTake({ limits }: Saw, held: Held, axis: "x" | "y", atFence: number): boolean {
  const wide = held.y1 - held.y0;
  if (held.x1 - held.x0 < limits.shortest || wide < limits.narrowest) return false;
  if (axis === "x") return limits.crosscuts && (limits.longestCrosscut === null || wide <= limits.longestCrosscut);
  return limits.rips && (limits.widestRip === null || atFence <= limits.widestRip);
}

function joined({ cut }: Step, a: Tree, b: Tree): Tree {
  const turn = (tree: Tree) => Number(cut !== null && tree.first !== "" && tree.first !== cut.from);
  return {
    beyond: a.beyond + b.beyond + (cut?.beyond ?? 0),
    unsafe: a.unsafe + b.unsafe + (cut?.unsafe ?? 0),
    late: a.late + b.late + (cut?.late ?? 0),
    strays: a.strays + b.strays + Number(cut !== null && !cut.saw.preferred),
    settings: new Set([...a.settings, ...b.settings, ...(cut ? [cut.key] : [])]),
    turns: a.turns + b.turns + turn(a) + turn(b),
    steps: a.steps + b.steps + 1,
    racked: a.racked + b.racked,
    first: cut ? cut.from : a.first || b.first,
  };
}

function keep(trees: Map<string, Tree>, tree: Tree): void {
  const { settings, ...rest } = tree;
  trees.set(JSON.stringify([[...settings].sort(), rest]), tree);
}

const isOffcut = (box: Box, { limits }: CutRequest) =>
  box.x1 - box.x0 >= limits.offcutLength && box.y1 - box.y0 >= limits.offcutWidth;
