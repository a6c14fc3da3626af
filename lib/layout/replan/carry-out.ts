/** Carries the steps that are done out on rectangles, with what was entered about them: what lies on the bench now. */
import type { StockRect } from "../frame/point";
import { type CutStep, type Edge, isSawn } from "../program/program";
import type { AsCutEntry, EntryFault } from "./as-cut";
import { cutAsDone } from "./cut-as-done";
import { doneSteps } from "./done-steps";
import { openSteps, type PartInHand, type RestRequest, wasteInHand } from "./part-in-hand";
import { depthFrom, grownAt, sliceOf } from "./rect-edge";
import { kerfsAsCut } from "./true-kerf";

export type CarriedOut =
  | {
      readonly ok: true;
      /** Every rectangle of the board's wood, in the order in which they came to hand. */
      readonly bench: readonly PartInHand[];
      /** Steps done since the revision was issued, as they were cut. */
      readonly steps: readonly CutStep[];
      /** Numbers of steps that count as done because a later one is. */
      readonly implied: readonly number[];
    }
  | RestFault;

export type RestFault =
  | { readonly ok: false; readonly reason: "entry"; readonly entry: AsCutEntry; readonly fault: EntryFault }
  /** A ticked step that cannot have been done with the wood as it was entered. */
  | { readonly ok: false; readonly reason: "step"; readonly step: number };

type SizeEntry = Extract<AsCutEntry, { kind: "size" }>;

export function carryOut(request: RestRequest): CarriedOut {
  const unknown = unknownIn(request);
  if (unknown) return unknown;
  const kerfs = kerfsAsCut(request);
  const { steps, implied } = doneSteps(openSteps(request), request.done);
  const bench = new Map<string, PartInHand>();
  const sizes = request.entries.filter((entry) => entry.kind === "size");
  const used = new Set<SizeEntry>();
  const measured = (partId: string, edge: Edge): number | undefined => {
    const entry = sizes.find((one) => one.partId === partId && one.edge === edge);
    if (entry) used.add(entry);
    return entry?.by;
  };

  /** Lays a part down, shorter at the edges where it was found so though its own cut did not make them. */
  const layDown = (held: PartInHand): EntryFaultAt | null => {
    let { rect } = held.part;
    const lost: StockRect[] = [];
    for (const entry of sizes) {
      if (entry.partId !== held.part.id || used.has(entry)) continue;
      if (entry.by > 0) return { entry, fault: "longer-at-earlier-cut" };
      if (-entry.by >= depthFrom(rect, entry.edge)) return { entry, fault: "more-than-there-is" };
      lost.push(sliceOf(rect, entry.edge, 0, -entry.by));
      rect = grownAt(rect, entry.edge, entry.by);
    }
    bench.set(held.part.id, { ...held, part: { ...held.part, rect } });
    for (const one of lost) {
      const broken = wasteInHand(freeId(bench, `${held.part.id}.lost`), one);
      bench.set(broken.part.id, broken);
    }
    return null;
  };

  for (const held of request.start) {
    const fault = layDown(held);
    if (fault) return { ok: false, reason: "entry", ...fault };
  }
  const made: CutStep[] = [];
  for (const step of steps) {
    const held = bench.get(step.part.id);
    const cut = held && cutAsDone({ held, step, blade: kerfs.at(step), owes: kerfs.owedAfter(step) }, measured);
    if (!cut) return { ok: false, reason: "step", step: step.number };
    if (!cut.ok) {
      const entry = sizes.find(({ partId }) => step.yields.some(({ id }) => id === partId));
      if (cut.reason === "more-than-there-is" && entry) return { ok: false, reason: "entry", entry, fault: cut.reason };
      return { ok: false, reason: "step", step: step.number };
    }
    bench.delete(step.part.id);
    for (const part of cut.parts) {
      const fault = layDown(part);
      if (fault) return { ok: false, reason: "entry", ...fault };
    }
    made.push({
      ...cut.step,
      ...(isSawn(step.kind) && { blade: kerfs.at(step) }),
      yields: cut.step.yields.map((part) => bench.get(part.id)?.part ?? part),
    });
  }
  return { ok: true, bench: [...bench.values()], steps: made, implied };
}

type EntryFaultAt = { readonly entry: AsCutEntry; readonly fault: EntryFault };

/** A revision may find wood missing at a part that an earlier one found too short already. */
function freeId(bench: ReadonlyMap<string, PartInHand>, name: string): string {
  let number = 1;
  while (bench.has(`${name}${number}`)) number += 1;
  return `${name}${number}`;
}

/** The first entry that names what the program does not know. */
function unknownIn(request: RestRequest): RestFault | null {
  const steps = openSteps(request);
  const parts = new Set([
    ...request.start.map(({ part }) => part.id),
    ...steps.flatMap(({ yields }) => yields.map(({ id }) => id)),
  ]);
  const faultOf = (entry: AsCutEntry): EntryFault | null => {
    switch (entry.kind) {
      case "kerf":
        return steps.some(({ number, kind }) => number === entry.step && isSawn(kind)) ? null : "unknown-step";
      case "size":
        return parts.has(entry.partId) ? null : "unknown-part";
      case "spoiled":
        return request.pieces.some(({ pieceId }) => pieceId === entry.pieceId) ? null : "unknown-piece";
    }
  };
  for (const entry of request.entries) {
    const fault = faultOf(entry);
    if (fault) return { ok: false, reason: "entry", entry, fault };
  }
  return null;
}
