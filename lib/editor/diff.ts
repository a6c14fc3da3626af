/**
 * What one step changes, with both sides of it, so that undo is mechanical: the inverse of a diff is the diff with its sides exchanged.
 * A diff names whole parts (the sizes, a loss, a group) and never a field inside one, so that two diffs either touch the same part or
 * can be applied in any order.
 */
import type { FaceLayout, PieceGroup } from "@/lib/layout";
import { sameBytes, type TableDocument } from "./document";

type LayoutParts = Omit<FaceLayout, "groups">;
type SawParts = Omit<TableDocument, "layout">;

/** One side of everything that changed outside the groups. */
export interface DiffSide {
  readonly layout: Partial<LayoutParts>;
  readonly saws: Partial<SawParts>;
}

/** null: the group is not there on that side. */
export interface GroupChange {
  readonly id: string;
  readonly before: PieceGroup | null;
  readonly after: PieceGroup | null;
}

export interface Diff {
  readonly before: DiffSide;
  readonly after: DiffSide;
  readonly groups: readonly GroupChange[];
  /** Ids of all groups in order, when a group came, went or changed places in the list. */
  readonly order: { readonly before: readonly string[]; readonly after: readonly string[] } | null;
}

const layoutParts = [
  "face",
  "crosscut",
  "rip",
  "spacing",
  "anchorX",
  "anchorY",
] as const satisfies readonly (keyof LayoutParts)[];
const sawParts = ["crosscutSawId", "ripSawId"] as const satisfies readonly (keyof SawParts)[];

/** The diff that leads from one document to the other. */
export function diffBetween(before: TableDocument, after: TableDocument): Diff {
  const changedLayout = layoutParts.filter((part) => !sameBytes(before.layout[part], after.layout[part]));
  const changedSaws = sawParts.filter((part) => before[part] !== after[part]);
  return {
    before: { layout: picked(before.layout, changedLayout), saws: picked(before, changedSaws) },
    after: { layout: picked(after.layout, changedLayout), saws: picked(after, changedSaws) },
    groups: groupChanges(before.layout.groups, after.layout.groups),
    order: orderChange(idsOf(before.layout.groups), idsOf(after.layout.groups)),
  };
}

/** The document with the after side of the diff in place. The caller has made sure that the parts touched stand as the before side says. */
export function applyDiff(document: TableDocument, diff: Diff): TableDocument {
  const byId = new Map(document.layout.groups.map((group) => [group.id, group]));
  for (const { id, after } of diff.groups) {
    if (after === null) byId.delete(id);
    else byId.set(id, after);
  }
  const order = diff.order?.after ?? idsOf(document.layout.groups);
  const groups = order.flatMap((id) => byId.get(id) ?? []);
  return { ...document, ...diff.after.saws, layout: { ...document.layout, ...diff.after.layout, groups } };
}

/** The diff that undoes this one. */
export function inverted(diff: Diff): Diff {
  return {
    before: diff.after,
    after: diff.before,
    groups: diff.groups.map(({ id, before, after }) => ({ id, before: after, after: before })),
    order: diff.order && { before: diff.order.after, after: diff.order.before },
  };
}

/** One diff for two that follow each other. */
export function combined(first: Diff, second: Diff): Diff {
  const groups = new Map(first.groups.map((change) => [change.id, change]));
  for (const change of second.groups) {
    groups.set(change.id, { ...change, before: (groups.get(change.id) ?? change).before });
  }
  const order =
    first.order || second.order
      ? { before: (first.order ?? second.order)?.before ?? [], after: (second.order ?? first.order)?.after ?? [] }
      : null;
  return {
    before: mergedSides(second.before, first.before),
    after: mergedSides(first.after, second.after),
    groups: [...groups.values()],
    order,
  };
}

export function isEmptyDiff(diff: Diff): boolean {
  return (
    diff.groups.length === 0 &&
    diff.order === null &&
    Object.keys(diff.after.layout).length === 0 &&
    Object.keys(diff.after.saws).length === 0
  );
}

/**
 * Names of everything a diff touches: pieces by id, other parts by name. Two diffs that share none can both be kept. The order of the groups
 * follows from the pieces that changed groups and is not counted by itself.
 */
export function touchedBy(diff: Diff): ReadonlySet<string> {
  const pieces = diff.groups.flatMap(({ before, after }) => [...(before?.pieceIds ?? []), ...(after?.pieceIds ?? [])]);
  return new Set([...pieces, ...Object.keys(diff.after.layout), ...Object.keys(diff.after.saws)]);
}

function groupChanges(before: readonly PieceGroup[], after: readonly PieceGroup[]): GroupChange[] {
  const old = new Map(before.map((group) => [group.id, group]));
  const fresh = new Map(after.map((group) => [group.id, group]));
  const ids = [...old.keys(), ...[...fresh.keys()].filter((id) => !old.has(id))];
  return ids.flatMap((id) => {
    const change = { id, before: old.get(id) ?? null, after: fresh.get(id) ?? null };
    return sameBytes(change.before, change.after) ? [] : [change];
  });
}

function orderChange(before: readonly string[], after: readonly string[]): Diff["order"] {
  return sameBytes(before, after) ? null : { before, after };
}

function idsOf(groups: readonly PieceGroup[]): string[] {
  return groups.map(({ id }) => id);
}

function mergedSides(under: DiffSide, over: DiffSide): DiffSide {
  return { layout: { ...under.layout, ...over.layout }, saws: { ...under.saws, ...over.saws } };
}

function picked<Whole extends object, Key extends keyof Whole>(whole: Whole, keys: readonly Key[]): Partial<Pick<Whole, Key>> {
  const part: Partial<Pick<Whole, Key>> = {};
  for (const key of keys) part[key] = whole[key];
  return part;
}
