/**
 * Every rectangle that a tree of cuts may bring to hand, remembered by shape: rectangles with blanks of the same sizes at the same
 * places are cut alike wherever they lie in the board. Hazards add up, so the least of a shape is known from its parts, and only cuts
 * that a safest tree may begin with are kept: every tree through what is left is a safest one.
 */
import { type CandidateCut, candidateCuts, type Scope } from "../candidate-cuts";
import { offcutAreaOf, settingKey } from "../cut-plan";
import { leastRank, rankOf } from "../hazard";
import { type Blank, isFinished, type Region, shapeKey } from "../region";
import type { Workshop } from "../workshop";

export interface Shape {
  /** The first rectangle of this shape that was met. */
  readonly region: Region;
  /** In the order of `candidateCuts`; every one begins a safest tree. Empty: it cannot be cut. */
  readonly branches: readonly Branch[];
  /** Hazards of its safest trees (`rankOf`). */
  readonly rank: number;
}

export interface Branch {
  readonly cut: CandidateCut;
  /** null: that side needs no more work. */
  readonly low: Shape | null;
  readonly high: Shape | null;
  readonly setting: string | null;
  readonly offcutArea: number;
}

/** What rectangles are worked by: fine cuts leave blanks, rough ones parts that hold them. */
export interface Rules {
  readonly stepsIn: (region: Region) => readonly CandidateCut[];
  readonly isFinished: (region: Region) => boolean;
  /** No tree through it has a lesser rank; a test that costs no search. */
  readonly leastRank: (region: Region | null) => number;
}

export function fineRules(shop: Workshop, scope: Scope): Rules {
  return {
    stepsIn: (region) => candidateCuts(region, shop, scope),
    isFinished,
    leastRank: (region) => leastRank(region, shop.thinnestSawn),
  };
}

/** So that equal shapes list their blanks alike. */
const byPlace = (a: Blank, b: Blank): number => a.y.from - b.y.from || a.x.from - b.x.from;

export interface Explored {
  /** One for each root, null where nothing is left to do; the whole is null once the budget is spent. */
  readonly shapes: readonly (Shape | null)[] | null;
  /** In plans weighed. */
  readonly steps: number;
}

/** Looking at a cut takes about as long as weighing so many plans. */
const perCut = 10;

/** The shapes below each root. */
export function exploreShapes(roots: readonly Region[], rules: Rules, shop: Workshop, budget: number): Explored {
  const known = new Map<string, Shape>();
  let steps = 0;

  /** undefined: the budget is spent. */
  function shapeOf(region: Region | null): Shape | null | undefined {
    if (!region || rules.isFinished(region)) return null;
    const key = shapeKey(region);
    const before = known.get(key);
    if (before) return before;
    let rank = Number.POSITIVE_INFINITY;
    let branches: Branch[] = [];
    for (const cut of rules.stepsIn(region)) {
      steps += perCut;
      if (steps > budget) return undefined;
      const own = rankOf(cut.hazard);
      const least = own + rules.leastRank(cut.low) + rules.leastRank(cut.high);
      if (least > rank) continue;
      const low = shapeOf(cut.low);
      const high = low === undefined ? undefined : shapeOf(cut.high);
      if (low === undefined || high === undefined) return undefined;
      const whole = own + (low?.rank ?? 0) + (high?.rank ?? 0);
      if (whole > rank || whole === Number.POSITIVE_INFINITY) continue;
      const branch = { cut, low, high, setting: settingKey(cut), offcutArea: offcutAreaOf(cut, shop.limits) };
      branches = whole < rank ? [branch] : [...branches, branch];
      rank = whole;
    }
    const shape = { region, branches, rank };
    known.set(key, shape);
    return shape;
  }

  const shapes: (Shape | null)[] = [];
  for (const root of roots) {
    const shape = shapeOf({ ...root, blanks: [...root.blanks].sort(byPlace) });
    if (shape === undefined) return { shapes: null, steps };
    shapes.push(shape);
  }
  return { shapes, steps };
}
