/**
 * Changes of a cut-out by hand: a divider or a strip is moved, a row moved up or down, a divider put in, a part taken out. Refused
 * where something would come to nothing, saying how far it can go. Moving leaves all other wood where it is; putting in and taking
 * out leaves the anchor in its place, as every change of sizes does. Where a part of one row is the anchor, the others follow the
 * part of theirs that hangs there, which may become another one.
 */
import { type Um, um } from "../../units/um";
import { changeFace, changeFaceRenaming, type FaceChange, type Renaming } from "../change-face";
import type { CutOutFace, CutOutPart, CutOutRow } from "../face";
import type { FaceLayout } from "../face-layout";
import { groupAt, originOf } from "../group-origin";
import { pieceIdAt } from "../piece-names";
import { indexOfPart } from "./cut-out-pieces";
import { bySide } from "./rail-axes";

/** A part of a row, both counted from 0. */
export interface PartPlace {
  readonly row: number;
  readonly part: number;
}

export type CutOutRefusal =
  | { readonly reason: "not-a-cut-out" }
  | { readonly reason: "no-such-place" }
  /** Only a fixed part between two fronts can be moved or joins two openings. */
  | { readonly reason: "not-a-divider" }
  | { readonly reason: "not-a-front" }
  /** The first and the last strip have fronts on one side only: move the row instead. */
  | { readonly reason: "outer-strip" }
  /** `by` can be no less than `least` and no more than `most`, which lie on either side of 0. */
  | { readonly reason: "no-room"; readonly least: Um; readonly most: Um }
  /** The opening is this much too short for two fronts and the divider. */
  | { readonly reason: "opening-too-short"; readonly missing: Um }
  /** A row keeps one front at least. */
  | { readonly reason: "last-front" };

export type CutOutChange = ({ readonly ok: true } & FaceChange) | { readonly ok: false; readonly refusal: CutOutRefusal };

/** The least that is left of a front, a strip or a fixed part when something is moved by hand: 10 mm (common practice, no source). */
export const LEAST_LEFT: Um = um(10_000);

/** Moves the fixed part between two fronts: the opening before it grows by what the one after it loses. */
export function moveDivider(layout: FaceLayout, { row, part }: PartPlace, by: Um, leastLeft = LEAST_LEFT): CutOutChange {
  const { face } = layout;
  if (face.pattern !== "cutOut") return refused({ reason: "not-a-cut-out" });
  const parts = face.rows[row]?.parts ?? [];
  const [before, divider, after] = [parts[part - 1], parts[part], parts[part + 1]];
  if (divider === undefined) return refused({ reason: "no-such-place" });
  if (divider.kind !== "fixed" || before?.kind !== "front" || after?.kind !== "front")
    return refused({ reason: "not-a-divider" });
  const least = leastOpening(face, leastLeft);
  const tooFar = outOfRoom(by, before.width - least, after.width - least);
  if (tooFar) return refused(tooFar);
  const moved = parts.with(part - 1, widened(before, by)).with(part + 1, widened(after, -by));
  return inPlace(layout, withRow(face, row, { parts: moved }));
}

/** Moves a strip between two rows across the grain: the row before it grows by what the one after it loses. */
export function moveStrip(layout: FaceLayout, strip: number, by: Um, leastLeft = LEAST_LEFT): CutOutChange {
  const { face } = layout;
  if (face.pattern !== "cutOut") return refused({ reason: "not-a-cut-out" });
  if (face.strips[strip] === undefined) return refused({ reason: "no-such-place" });
  const [before, after] = [face.rows[strip - 1], face.rows[strip]];
  if (before === undefined || after === undefined) return refused({ reason: "outer-strip" });
  const least = leastRow(face, leastLeft);
  const tooFar = outOfRoom(by, before.height - least, after.height - least);
  if (tooFar) return refused(tooFar);
  const grown = withRow(face, strip - 1, { height: um(before.height + by) });
  return inPlace(layout, withRow(grown, strip, { height: um(after.height - by) }));
}

/** Moves a whole row across the grain: the strip before it grows by what the one after it loses. */
export function moveRow(layout: FaceLayout, row: number, by: Um, leastLeft = LEAST_LEFT): CutOutChange {
  const { face } = layout;
  if (face.pattern !== "cutOut") return refused({ reason: "not-a-cut-out" });
  const [before, after] = [face.strips[row], face.strips[row + 1]];
  if (before === undefined || after === undefined) return refused({ reason: "no-such-place" });
  const tooFar = outOfRoom(by, before - something(leastLeft), after - something(leastLeft));
  if (tooFar) return refused(tooFar);
  return inPlace(layout, { ...face, strips: face.strips.with(row, um(before + by)).with(row + 1, um(after - by)) });
}

/** Parts a front in two by a divider of this width in its middle; the second front and the divider join the set. */
export function addDivider(layout: FaceLayout, { row, part }: PartPlace, width: Um, leastLeft = LEAST_LEFT): CutOutChange {
  const { face } = layout;
  if (face.pattern !== "cutOut") return refused({ reason: "not-a-cut-out" });
  const parts = face.rows[row]?.parts ?? [];
  const front = parts[part];
  if (front === undefined) return refused({ reason: "no-such-place" });
  if (front.kind !== "front") return refused({ reason: "not-a-front" });
  const room = front.width - width;
  const missing = 2 * leastOpening(face, leastLeft) - room;
  if (missing > 0) return refused({ reason: "opening-too-short", missing: um(missing) });
  const first = Math.floor(room / 2);
  const parted: CutOutPart[] = [
    { kind: "front", width: um(first) },
    { kind: "fixed", width },
    { kind: "front", width: um(room - first) },
  ];
  const next = withRow(face, row, { parts: parts.toSpliced(part, 1, ...parted) });
  return { ok: true, ...changeFaceRenaming(layout, next, movedOn(indexOfPart(face, row, part), 2)) };
}

/** Takes out a divider, so that the openings beside it become one, or a front, so that the fixed parts beside it do. */
export function removePart(layout: FaceLayout, { row, part }: PartPlace): CutOutChange {
  const { face } = layout;
  if (face.pattern !== "cutOut") return refused({ reason: "not-a-cut-out" });
  const parts = face.rows[row]?.parts ?? [];
  const [before, removed, after] = [parts[part - 1], parts[part], parts[part + 1]];
  if (removed === undefined) return refused({ reason: "no-such-place" });
  if (before === undefined || after === undefined || before.kind !== after.kind || before.kind === removed.kind) {
    return refused({ reason: "not-a-divider" });
  }
  if (removed.kind === "front" && parts.filter(({ kind }) => kind === "front").length === 1) {
    return refused({ reason: "last-front" });
  }
  const joined = widened(before, removed.width + after.width);
  const next = withRow(face, row, { parts: parts.toSpliced(part - 1, 3, joined) });
  return { ok: true, ...changeFaceRenaming(layout, next, takenOut(indexOfPart(face, row, part), 2)) };
}

function refused(refusal: CutOutRefusal): CutOutChange {
  return { ok: false, refusal };
}

function outOfRoom(by: Um, before: number, after: number): CutOutRefusal | null {
  const [least, most] = [Math.min(0, -before), Math.max(0, after)];
  return by < least || by > most ? { reason: "no-room", least: um(least), most: um(most) } : null;
}

function leastOpening(face: CutOutFace, leastLeft: Um): number {
  const { near, far } = bySide(face.gap, face.grain);
  return near + far + something(leastLeft);
}

function leastRow(face: CutOutFace, leastLeft: Um): number {
  const { above, below } = bySide(face.gap, face.grain);
  return above + below + something(leastLeft);
}

/** Nothing is left at nothing. */
function something(length: Um): number {
  return Math.max(1, length);
}

function widened(part: CutOutPart, by: number): CutOutPart {
  return { ...part, width: um(part.width + by) };
}

function withRow(face: CutOutFace, row: number, change: Partial<CutOutRow>): CutOutFace {
  return { ...face, rows: face.rows.map((old, index) => (index === row ? { ...old, ...change } : old)) };
}

/** Along the grain and across it the strips lie in the chart as before, so what is not changed keeps its place with the origin. */
function inPlace(layout: FaceLayout, face: CutOutFace): CutOutChange {
  const { layout: next, swapsUndone } = changeFace(layout, face);
  const origins = new Map(layout.groups.map((group) => [group.id, originOf(layout, group)]));
  const groups = next.groups.map((group) => groupAt(next, group, origins.get(group.id) ?? null));
  return { ok: true, layout: { ...next, groups }, swapsUndone };
}

/** Names when `count` pieces come in after the one at `index`. */
function movedOn(index: number, count: number): Renaming {
  return (id) => pieceIdAt(Number(id.slice(1)) - 1 > index ? Number(id.slice(1)) - 1 + count : Number(id.slice(1)) - 1);
}

/** Names when `count` pieces from `index` on go. */
function takenOut(index: number, count: number): Renaming {
  return (id) => {
    const before = Number(id.slice(1)) - 1;
    if (before < index) return id;
    return before < index + count ? null : pieceIdAt(before - count);
  };
}
