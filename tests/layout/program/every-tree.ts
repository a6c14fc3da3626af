/**
 * The brute force the search is held against: every tree of straight cuts that leave a blank's edge, with nothing remembered but
 * equal costs. It shares no code with the planner. Cuts are measured as the program promises: to the side of the blade that leaves
 * a blank's edge; over wood that is cut away, to its far side.
 */
import type { ShopLimits } from "@/lib/layout/program/program";
import type { Cost } from "./cost-of-program";

export interface Box {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
}

export type BoardEdge = "x low" | "x high" | "y low" | "y high";

interface Tree {
  readonly unsafe: number;
  readonly late: number;
  readonly settings: ReadonlySet<string>;
  readonly turns: number;
  readonly cuts: number;
  readonly racked: number;
  /** Kind and edge of its first cut; empty where none is needed. */
  readonly first: string;
}

interface Shop {
  readonly limits: ShopLimits;
  readonly kerf: { readonly x: number; readonly y: number };
  readonly board: Box;
  /** Edges of the board that nothing may be measured from: "x low", "y high", … */
  readonly rough: ReadonlySet<BoardEdge>;
  /** Give up beyond so many trees; tests count how often that happens. */
  readonly most: number;
}

const nothing: Tree = { unsafe: 0, late: 0, settings: new Set(), turns: 0, cuts: 0, racked: 0, first: "" };

/** The least cost of all trees; "too many" when there are more than the shop's `most` different ones. */
export function leastCost(blanks: readonly Box[], shop: Shop): Cost | "too many" | "impossible" {
  const trees = allTrees(shop.board, blanks, shop);
  if (!trees) return "too many";
  const costs = trees.map((t): Cost => [t.unsafe, t.late, t.settings.size, t.turns, t.cuts, -t.racked]);
  const [least] = costs.sort((a, b) => a.reduce((order, value, i) => order || value - (b[i] ?? 0), 0));
  return least ?? "impossible";
}

function allTrees(box: Box, blanks: readonly Box[], shop: Shop): Tree[] | null {
  const [blank] = blanks;
  if (!blank) return [{ ...nothing, racked: isOffcut(box, shop) ? (box.x1 - box.x0) * (box.y1 - box.y0) : 0 }];
  if (blanks.length === 1 && same(box, blank)) return [nothing];
  const trees = new Map<string, Tree>();
  for (const axis of ["x", "y"] as const) {
    for (const blade of bladesAlong(axis, box, blanks, shop)) {
      const parts = blade.parts.map((part) =>
        allTrees(
          part,
          blanks.filter((one) => isInside(one, part)),
          shop,
        ),
      );
      const [low, high = [nothing]] = parts;
      if (!low || !high || parts.includes(null)) return null;
      for (const a of low)
        for (const b of high) for (const way of blade.ways) keep(trees, joined(axis, way, blade.parts, box, a, b, shop));
      if (trees.size > shop.most) return null;
    }
  }
  return [...trees.values()];
}

interface Way {
  readonly edge: BoardEdge;
  readonly side: "near" | "far";
  readonly setting: number;
  readonly between: number;
}

function bladesAlong(axis: "x" | "y", box: Box, blanks: readonly Box[], shop: Shop) {
  // Without a straight long edge nothing lies square against the fence.
  if (axis === "x" && !isStraight(box, "y low", shop) && !isStraight(box, "y high", shop)) return [];
  const kerf = shop.kerf[axis];
  const of = (one: Box) => (axis === "x" ? { from: one.x0, to: one.x1 } : { from: one.y0, to: one.y1 });
  const whole = of(box);
  const faces = blanks.flatMap((one) => [
    { from: of(one).to, exactLow: true },
    { from: of(one).from - kerf, exactLow: false },
  ]);
  const blades = [];
  for (const { from, exactLow } of faces) {
    const to = from + kerf;
    const free = blanks.every((one) => of(one).to <= from || of(one).from >= to);
    if (!free || from >= whole.to || to <= whole.from) continue;
    const lowest = Math.max(from, whole.from);
    const highest = Math.min(to, whole.to);
    const below = blanks.some((one) => of(one).to <= from);
    const above = blanks.some((one) => of(one).from >= to);
    const ways: Way[] = [];
    if (exactLow && below)
      ways.push({ edge: `${axis} low`, side: "near", setting: from - whole.from, between: from - whole.from });
    if (exactLow && !above)
      ways.push({ edge: `${axis} high`, side: "far", setting: whole.to - from, between: whole.to - highest });
    if (!exactLow && above) ways.push({ edge: `${axis} high`, side: "near", setting: whole.to - to, between: whole.to - to });
    if (!exactLow && !below)
      ways.push({ edge: `${axis} low`, side: "far", setting: to - whole.from, between: lowest - whole.from });
    const cut = (a: number, b: number): Box => (axis === "x" ? { ...box, x0: a, x1: b } : { ...box, y0: a, y1: b });
    const parts = [cut(whole.from, lowest), cut(highest, whole.to)].filter((one) => one.x1 > one.x0 && one.y1 > one.y0);
    blades.push({ ways: ways.filter(({ edge }) => isStraight(box, edge, shop)), parts });
  }
  return blades;
}

function joined(axis: "x" | "y", way: Way, parts: readonly Box[], box: Box, a: Tree, b: Tree, { limits, board }: Shop): Tree {
  const held = axis === "y" ? box.x1 - box.x0 : Math.max(...parts.map((one) => one.x1 - one.x0));
  const first = way.edge;
  const turn = (tree: Tree) => Number(tree.first !== "" && tree.first !== first);
  return {
    unsafe:
      a.unsafe + b.unsafe + Number(held < limits.shortestCrosscut) + Number(axis === "y" && way.between < limits.narrowestRip),
    late: a.late + b.late + Number(axis === "y" && box.x1 - box.x0 < board.x1 - board.x0),
    settings: new Set([...a.settings, ...b.settings, `${axis} ${way.side} ${way.setting}`]),
    turns: a.turns + b.turns + turn(a) + turn(b),
    cuts: a.cuts + b.cuts + 1,
    racked: a.racked + b.racked,
    first,
  };
}

function keep(trees: Map<string, Tree>, tree: Tree): void {
  const { settings, ...rest } = tree;
  trees.set(JSON.stringify([[...settings].sort(), rest]), tree);
}

/** An edge inside the board has been sawn. */
function isStraight(box: Box, edge: BoardEdge, { board, rough }: Shop): boolean {
  const at = {
    "x low": box.x0 === board.x0,
    "x high": box.x1 === board.x1,
    "y low": box.y0 === board.y0,
    "y high": box.y1 === board.y1,
  };
  return !(rough.has(edge) && at[edge]);
}

const same = (a: Box, b: Box) => a.x0 === b.x0 && a.x1 === b.x1 && a.y0 === b.y0 && a.y1 === b.y1;
const isInside = (a: Box, b: Box) => a.x0 >= b.x0 && a.x1 <= b.x1 && a.y0 >= b.y0 && a.y1 <= b.y1;
const isOffcut = (box: Box, { limits }: Shop) => box.x1 - box.x0 >= limits.offcutLength && box.y1 - box.y0 >= limits.offcutWidth;
