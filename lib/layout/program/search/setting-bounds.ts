/**
 * What is known of the settings of every tree through a shape before any plan is weighed: which it needs for certain inside and outside
 * of the shape, how many more that no tree uses twice, and which of its own something outside may use too. From this follows how few
 * settings a tree may have that goes through a branch, so that branches which cannot be part of a best tree are left out, and which
 * settings of a plan have to be remembered.
 */
import { addAll, allBits, type Bits, countBits, hasBit, keepOnly, noBits, setBit } from "./bits";
import type { Roots, RootWay, SettingNames } from "./setting-names";
import type { Branch, Shape } from "./shape-graph";

export interface SettingBounds {
  /** No tree through the branch at this shape has fewer settings. */
  readonly leastThrough: (shape: Shape, branch: Branch) => number;
  /** No tree has fewer that holds a plan for the shape with so many counted settings and these remembered ones. */
  readonly leastWith: (shape: Shape, counted: number, remembered: readonly number[]) => number;
  /** Whether something outside the shape may use a setting; else it need not be remembered beyond it. */
  readonly isOpen: (shape: Shape, setting: number) => boolean;
  /** Every tree needs it. */
  readonly isNeeded: (setting: number) => boolean;
  readonly neededByAll: number;
}

interface Inside {
  /** Every tree of the shape uses these. */
  readonly needs: Bits;
  /** Some tree of it may use these. */
  readonly may: Bits;
  /** At least so many settings that no tree uses twice. */
  single: number;
}

type Outside = Inside;

export function settingBounds(roots: Roots, names: SettingNames): SettingBounds {
  const inside = insides(names);
  const outside = outsides(roots, names, inside);
  const { size } = names;
  const nothing: Inside = { needs: noBits(size), may: noBits(size), single: 0 };
  const inOf = (shape: Shape | null) => (shape && inside.get(shape)) ?? nothing;
  const outOf = (shape: Shape) => outside.get(shape) ?? nothing;
  const needed = noBits(size);
  for (const ways of roots) {
    const common = allBits(size);
    for (const { shape } of ways) keepOnly(common, inOf(shape).needs);
    addAll(needed, common);
  }
  const base = new Map<Shape, { readonly bits: Bits; readonly count: number }>();
  const baseOf = (shape: Shape) => {
    const before = base.get(shape);
    if (before) return before;
    const bits = Uint32Array.from(outOf(shape).needs);
    addAll(bits, needed);
    const made = { bits, count: countBits(bits) };
    base.set(shape, made);
    return made;
  };
  return {
    leastThrough: (shape, branch) => {
      const bits = Uint32Array.from(outOf(shape).needs);
      addAll(bits, inOf(branch.low).needs);
      addAll(bits, inOf(branch.high).needs);
      addAll(bits, needed);
      const number = names.numberOf(branch);
      if (number !== null) setBit(bits, number);
      return outOf(shape).single + names.single(branch) + inOf(branch.low).single + inOf(branch.high).single + countBits(bits);
    },
    leastWith: (shape, counted, remembered) => {
      const { bits, count } = baseOf(shape);
      let more = 0;
      for (const setting of remembered) if (!hasBit(bits, setting)) more++;
      return counted + outOf(shape).single + count + more;
    },
    isOpen: (shape, setting) => hasBit(outOf(shape).may, setting),
    isNeeded: (setting) => hasBit(needed, setting),
    neededByAll: countBits(needed),
  };
}

/** Settings of the trees of each shape, those it is cut into first. */
function insides({ shapes, size, numberOf, single }: SettingNames): Map<Shape, Inside> {
  const nothing: Inside = { needs: noBits(size), may: noBits(size), single: 0 };
  const found = new Map<Shape, Inside>();
  const of = (shape: Shape | null) => (shape && found.get(shape)) ?? nothing;
  for (const shape of shapes) {
    const all: Inside = { needs: allBits(size), may: noBits(size), single: Number.POSITIVE_INFINITY };
    for (const branch of shape.branches) {
      const [low, high] = [of(branch.low), of(branch.high)];
      const needs = Uint32Array.from(low.needs);
      addAll(needs, high.needs);
      addAll(all.may, low.may);
      addAll(all.may, high.may);
      const number = numberOf(branch);
      if (number !== null) {
        setBit(needs, number);
        setBit(all.may, number);
      }
      keepOnly(all.needs, needs);
      all.single = Math.min(all.single, single(branch) + low.single + high.single);
    }
    found.set(shape, all);
  }
  return found;
}

/** Settings of what lies around each shape in the trees that hold it, the shapes it is cut from first. */
function outsides(roots: Roots, names: SettingNames, inside: ReadonlyMap<Shape, Inside>): Map<Shape, Outside> {
  const { shapes, size, numberOf, single } = names;
  const nothing: Inside = { needs: noBits(size), may: noBits(size), single: 0 };
  const of = (shape: Shape | null) => (shape && inside.get(shape)) ?? nothing;
  const found = new Map(
    shapes.map((shape) => [shape, { needs: allBits(size), may: noBits(size), single: Number.POSITIVE_INFINITY } as Inside]),
  );
  /** One more way in which the shape lies in a tree. */
  const lies = (shape: Shape, around: Outside): void => {
    const all = found.get(shape);
    if (!all) return;
    keepOnly(all.needs, around.needs);
    addAll(all.may, around.may);
    all.single = Math.min(all.single, around.single);
  };
  const together = (parts: readonly Inside[]): Inside => {
    const sum: Inside = { needs: noBits(size), may: noBits(size), single: 0 };
    for (const one of parts) {
      addAll(sum.needs, one.needs);
      addAll(sum.may, one.may);
      sum.single += one.single;
    }
    return sum;
  };
  const anyOf = (ways: readonly RootWay[]): Inside => {
    const any: Inside = { needs: allBits(size), may: noBits(size), single: Number.POSITIVE_INFINITY };
    for (const { shape } of ways) {
      keepOnly(any.needs, of(shape).needs);
      addAll(any.may, of(shape).may);
      any.single = Math.min(any.single, of(shape).single);
    }
    return any;
  };
  roots.forEach((ways, i) => {
    const around = together(roots.filter((_, j) => j !== i).map(anyOf));
    for (const { shape } of ways) if (shape) lies(shape, around);
  });
  for (const shape of [...shapes].reverse()) {
    const around = found.get(shape) ?? nothing;
    for (const branch of shape.branches) {
      const own: Inside = { needs: noBits(size), may: noBits(size), single: single(branch) };
      const number = numberOf(branch);
      if (number !== null) {
        setBit(own.needs, number);
        setBit(own.may, number);
      }
      if (branch.low) lies(branch.low, together([around, own, of(branch.high)]));
      if (branch.high) lies(branch.high, together([around, own, of(branch.low)]));
    }
  }
  return found;
}
