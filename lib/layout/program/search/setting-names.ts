/**
 * Settings that some tree may use twice, by number. A setting that no tree uses twice adds up like anything else and needs no name; in a
 * row of unlike fronts that is every one but that of the sliver.
 */
import { addAll, addShared, type Bits, hasBit, noBits, setBit } from "./bits";
import type { Branch, Shape } from "./shape-graph";

/** One way in which a part to be cut may begin; null: nothing is left to do. */
export interface RootWay {
  readonly way: number;
  readonly shape: Shape | null;
}

/** The ways of each part to be cut. */
export type Roots = readonly (readonly RootWay[])[];

export interface SettingNames {
  /** Every shape once, those it is cut into before it. */
  readonly shapes: readonly Shape[];
  /** How many settings have a number. */
  readonly size: number;
  /** The number of a branch's setting; null: it has none, or no tree uses it twice. */
  readonly numberOf: (branch: Branch) => number | null;
  /** 1: a setting that no tree uses twice. */
  readonly single: (branch: Branch) => number;
}

export function settingNames(roots: Roots): SettingNames {
  const shapes = inOrder(roots);
  const names = new Map<string, number>();
  for (const { branches } of shapes)
    for (const { setting } of branches) if (setting !== null && !names.has(setting)) names.set(setting, names.size);
  const repeated = repeatedSettings(roots, shapes, names);
  const numbers = new Map<string, number>();
  for (const [name, index] of names) if (hasBit(repeated, index)) numbers.set(name, numbers.size);
  const numberOf = ({ setting }: Branch) => (setting === null ? null : (numbers.get(setting) ?? null));
  return {
    shapes,
    size: numbers.size,
    numberOf,
    single: (branch) => Number(branch.setting !== null && numberOf(branch) === null),
  };
}

function inOrder(roots: Roots): Shape[] {
  const order = new Set<Shape>();
  const visit = (shape: Shape | null): void => {
    if (!shape || order.has(shape)) return;
    for (const { low, high } of shape.branches) {
      visit(low);
      visit(high);
    }
    order.add(shape);
  };
  for (const ways of roots) for (const { shape } of ways) visit(shape);
  return [...order];
}

function repeatedSettings(roots: Roots, shapes: readonly Shape[], names: ReadonlyMap<string, number>): Bits {
  const repeated = noBits(names.size);
  const none = noBits(names.size);
  const below = new Map<Shape, Bits>();
  const of = (shape: Shape | null) => (shape && below.get(shape)) ?? none;
  for (const shape of shapes) {
    const all = noBits(names.size);
    for (const { low, high, setting } of shape.branches) {
      addShared(repeated, of(low), of(high));
      const number = setting === null ? undefined : names.get(setting);
      if (number !== undefined) {
        if (hasBit(of(low), number) || hasBit(of(high), number)) setBit(repeated, number);
        setBit(all, number);
      }
      addAll(all, of(low));
      addAll(all, of(high));
    }
    below.set(shape, all);
  }
  const before = noBits(names.size);
  for (const ways of roots) {
    const all = noBits(names.size);
    for (const { shape } of ways) addAll(all, of(shape));
    addShared(repeated, before, all);
    addAll(before, all);
  }
  return repeated;
}
