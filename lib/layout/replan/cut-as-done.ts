/**
 * One cut as it was really made: where the blade ran, how wide it was, and the parts that came off. Distances run from the edge the
 * cut was measured from, into the part in hand.
 *
 * A setting leaves the part on its side of the blade exact, and the true kerf is taken from the other. A part that was measured says
 * where the blade ran on its side; the other part counts as planned, or as less where the blade cannot have left so much: wood that
 * nobody measured is never counted on.
 */

import type { CutStep, Edge, EdgeState, Part } from "../program/program";
import { type Um, um } from "../units/um";
import type { PartInHand } from "./part-in-hand";
import { depthFrom, edgeAt, oppositeOf, sliceOf } from "./rect-edge";

/** µm that a part is longer than planned at one of its edges, where it was measured. */
export type Measured = (partId: string, edge: Edge) => number | undefined;

export type CutAsDone =
  | {
      readonly ok: true;
      /** With the true parts and the wood that turned to dust. */
      readonly step: CutStep;
      readonly parts: readonly PartInHand[];
    }
  | { readonly ok: false; readonly reason: "blade-misses" | "more-than-there-is" };

export interface AsDone {
  readonly held: PartInHand;
  readonly step: CutStep;
  /** Width of the blade. */
  readonly blade: number;
  /** What has to be planed off an edge that the machine of this step leaves. */
  readonly owes: Um;
}

export function cutAsDone(done: AsDone, measured: Measured): CutAsDone {
  switch (done.step.kind) {
    case "true":
    case "plane":
      return worked(done, measured);
    case "flatten":
      return flattened(done);
    default:
      return sawn(done, measured);
  }
}

/** One edge jointed or planed: straight, and nothing owed there any more. */
function worked({ held, step }: AsDone, measured: Measured): CutAsDone {
  const { fromEdge } = step;
  const [made] = step.yields;
  const depth = depthFrom(held.part.rect, fromEdge);
  const takes = step.setting - ((made && measured(made.id, fromEdge)) ?? 0);
  if (!made || takes >= depth) return { ok: false, reason: "blade-misses" };
  if (takes < 0) return { ok: false, reason: "more-than-there-is" };
  const rect = sliceOf(held.part.rect, fromEdge, takes, depth);
  const part: PartInHand = {
    ...held,
    part: { ...made, rect },
    edges: { ...held.edges, [fromEdge]: "trued" },
    owes: { ...held.owes, [fromEdge]: um(0) },
  };
  const kerf = sliceOf(held.part.rect, fromEdge, 0, takes);
  return { ok: true, step: { ...step, part: held.part, kerf, yields: [part.part] }, parts: [part] };
}

function flattened({ held, step }: AsDone): CutAsDone {
  const [made] = step.yields;
  if (!made) return { ok: false, reason: "blade-misses" };
  const part = { ...held, part: { ...made, rect: held.part.rect }, flat: true };
  return { ok: true, step: { ...step, part: held.part, yields: [part.part] }, parts: [part] };
}

function sawn({ held, step, blade, owes }: AsDone, measured: Measured): CutAsDone {
  const { fromEdge, setting, bladeSide } = step;
  const depth = depthFrom(held.part.rect, fromEdge);
  if (setting >= depth) return { ok: false, reason: "blade-misses" };
  const planned = plannedSides(step);
  const byNear = planned.near && measured(planned.near.id, oppositeOf[fromEdge]);
  const byFar = planned.far && measured(planned.far.id, fromEdge);
  let nearEnd = (bladeSide === "near" ? setting : setting - blade) + (byNear ?? 0);
  let farStart = (bladeSide === "near" ? setting + blade : setting) - (byFar ?? 0);
  if (byNear !== undefined && byFar === undefined) farStart = Math.max(farStart, nearEnd + blade);
  if (byFar !== undefined && byNear === undefined) nearEnd = Math.min(nearEnd, farStart - blade);
  if (nearEnd > farStart || nearEnd > depth || farStart < 0) return { ok: false, reason: "more-than-there-is" };
  nearEnd = Math.max(nearEnd, 0);
  farStart = Math.min(farStart, depth);
  const side = (from: number, to: number, part: Part | undefined, edge: Edge): PartInHand[] => {
    if (to <= from) return [];
    // A rest that the plan did not know of is nothing to count on.
    const name = part ?? { id: `${step.number}.rest`, kind: "waste" as const, label: null, pieceId: null };
    const rect = sliceOf(held.part.rect, fromEdge, from, to);
    const left = { edges: { ...held.edges, [edge]: leftBy(step) }, owes: { ...held.owes, [edge]: owes } };
    return [{ ...held, ...left, part: { ...name, rect } }];
  };
  const parts = [...side(0, nearEnd, planned.near, oppositeOf[fromEdge]), ...side(farStart, depth, planned.far, fromEdge)];
  const kerf = sliceOf(held.part.rect, fromEdge, nearEnd, farStart);
  return { ok: true, step: { ...step, part: held.part, kerf, yields: parts.map(({ part }) => part) }, parts };
}

/** A rough rip leaves an edge that nothing may be measured from, a rough crosscut one to mark from. */
function leftBy({ stage, kind }: CutStep): EdgeState {
  if (stage !== "rough") return "sawn";
  return kind === "crosscut" ? "marked" : "rough";
}

/** The parts that the plan expects on either side of the blade, told by where they lie. */
function plannedSides({ part, fromEdge, yields }: CutStep): { readonly near: Part | undefined; readonly far: Part | undefined } {
  const near = yields.find(({ rect }) => edgeAt(rect, fromEdge) === edgeAt(part.rect, fromEdge));
  return { near, far: yields.find((one) => one !== near) };
}
