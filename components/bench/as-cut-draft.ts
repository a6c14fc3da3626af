/** What the sheet "As cut" asks of one step, and the entries that its answers come to. No React. */
import type { CutStep, Edge, KerfReach, Part, Um } from "@/lib/layout";
import { isSawn, um } from "@/lib/layout";
import { type AsCut, type AsCutEntry, asCutSubject } from "@/lib/schemas/as-cut";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import type { OrderStep } from "@/lib/schemas/order-steps";
import { plannedKerf } from "@/lib/words/as-cut";
import { capital } from "@/lib/words/capital";
import { partName } from "@/lib/words/part-name";
import type { AsCutChange } from "./use-as-cut";

/** One length to measure. */
export interface SizeAsked {
  readonly key: string;
  readonly label: string;
  readonly boardId: string;
  readonly partId: string;
  readonly edge: Edge;
  readonly planned: Um;
}

export interface AsCutDraft {
  readonly kerf: Um | null;
  readonly reach: KerfReach;
  /** By the key of what is asked. */
  readonly sizes: Readonly<Record<string, Um>>;
}

/** The kerf that was planned where the step tells a kerf; null where it does not. */
export function kerfAsked(step: OrderStep, snapshot: OrderSnapshot): Um | null {
  if (step.kind === "test-cut") return plannedKerf({ stepId: step.id }, snapshot);
  if (step.kind !== "cut" || !isSawn(step.cut.kind) || isDoneBefore(step)) return null;
  return plannedKerf({ stepId: step.id }, snapshot);
}

/** Every wanted part that comes off: the size that the cut made, of fronts both sizes. Of a cut of an earlier revision what still lies there. */
export function sizesAsked(step: OrderStep): readonly SizeAsked[] {
  if (step.kind !== "cut" || !isSawn(step.cut.kind)) return [];
  const { cut, board } = step;
  const inHand = new Map(board.asCut?.inHand.map(({ part }) => [part.id, part]));
  const parts = isDoneBefore(step) ? cut.yields.flatMap(({ id }) => inHand.get(id) ?? []) : cut.yields;
  return parts.filter(({ kind }) => kind !== "waste").flatMap((part) => sizesOf(part, cut, board.boardId));
}

const isDoneBefore = (step: Extract<OrderStep, { kind: "cut" }>): boolean =>
  step.board.asCut?.done.includes(step.cut.number) ?? false;

function sizesOf(part: Part, cut: CutStep, boardId: string): SizeAsked[] {
  const made = madeEdge(part, cut);
  const lengthwise = cut.kind === "crosscut";
  const name = capital(partName(part));
  const asked = (along: boolean, edge: Edge): SizeAsked => ({
    key: `${part.id} ${edge}`,
    label: `${name}, ${along ? "length" : "width"}`,
    boardId,
    partId: part.id,
    edge,
    planned: along ? part.rect.width : part.rect.height,
  });
  const own = asked(lengthwise, made);
  // Only a piece is measured all round; a strip gets its other size at the cuts that follow.
  return part.pieceId === null ? [own] : [own, asked(!lengthwise, lengthwise ? "bottom" : "right")];
}

/** The edge of the part that this cut made. */
function madeEdge(part: Part, { part: before, fromEdge }: CutStep): Edge {
  const opposite: Readonly<Record<Edge, Edge>> = { left: "right", right: "left", top: "bottom", bottom: "top" };
  const at = (rect: Part["rect"]) =>
    ({ left: rect.x, right: rect.x + rect.width, top: rect.y, bottom: rect.y + rect.height })[fromEdge];
  return at(part.rect) === at(before.rect) ? opposite[fromEdge] : fromEdge;
}

/** The draft as entries already say. */
export function draftOf(step: OrderStep, snapshot: OrderSnapshot, asCut: readonly AsCut[]): AsCutDraft {
  const kerf = asCut.find(({ entry }) => entry.kind === "kerf" && entry.stepId === step.id)?.entry;
  const sizes = sizesAsked(step).map((asked) => [asked.key, um(asked.planned + (sizeEntry(asked, asCut)?.by ?? 0))] as const);
  return {
    kerf: kerf?.kind === "kerf" ? kerf.kerf : kerfAsked(step, snapshot),
    reach: kerf?.kind === "kerf" ? kerf.reach : step.kind === "test-cut" ? "all" : "on",
    sizes: Object.fromEntries(sizes),
  };
}

function sizeEntry({ boardId, partId, edge }: SizeAsked, asCut: readonly AsCut[]) {
  const subject = asCutSubject({ kind: "size", boardId, partId, edge, by: um(0) });
  const entry = asCut.find((one) => asCutSubject(one.entry) === subject)?.entry;
  return entry?.kind === "size" ? entry : undefined;
}

/** What saving the draft does: only what differs from what is entered already; what is as planned again is taken back. */
export function changeOf(
  step: OrderStep,
  snapshot: OrderSnapshot,
  asCut: readonly AsCut[],
  draft: AsCutDraft,
  ticked: boolean,
): AsCutChange {
  const planned = kerfAsked(step, snapshot);
  const wanted: AsCutEntry[] = [];
  const asPlanned: string[] = [];
  const kerf: AsCutEntry | null =
    draft.kerf === null ? null : { kind: "kerf", stepId: step.id, kerf: draft.kerf, reach: draft.reach };
  if (kerf) draft.kerf === planned ? asPlanned.push(asCutSubject(kerf)) : wanted.push(kerf);
  for (const { key, planned: size, boardId, partId, edge } of sizesAsked(step)) {
    const entry: AsCutEntry = { kind: "size", boardId, partId, edge, by: um((draft.sizes[key] ?? size) - size) };
    if (entry.by === 0) asPlanned.push(asCutSubject(entry));
    else wanted.push(entry);
  }
  const same = (entry: AsCutEntry) => asCut.some((one) => JSON.stringify(one.entry) === JSON.stringify(entry));
  const entries = wanted.filter((entry) => !same(entry));
  const sizes = entries.some(({ kind }) => kind === "size");
  return {
    entries,
    takenBack: asCut.filter(({ entry }) => asPlanned.includes(asCutSubject(entry))),
    // What has come off has been cut.
    tick: sizes && !ticked ? step.id : null,
  };
}
