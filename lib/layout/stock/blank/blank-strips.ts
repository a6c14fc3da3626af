/**
 * Where each board lies in the blank, and what is taken off its edges. Strips follow one another from the upper edge down without a
 * gap: a glue line has no width.
 *
 *   strip_i = width_i − upper_i − lower_i        upper_i = trim + jointing where glued
 *   top_i   = Σ strip_k, k < i                   left_i  = along_i − min along
 */
import { quarterTurn } from "../../frame/combine-isometries";
import type { Isometry } from "../../frame/isometry";
import type { StockRect } from "../../frame/point";
import type { StockId } from "../../piece";
import { type Um, um } from "../../units/um";
import type { BlankPlan, PlacedMember } from "./blank-plan";

export interface BlankStrip {
  readonly id: StockId;
  /** Takes a point of the board's own picture to the blank. A shift, or half a turn and a shift. */
  readonly blankFromMember: Isometry;
  /** What is left of the board, in the blank's frame. */
  readonly rect: StockRect;
  /** Taken off upper and lower edge as the board lies, jointing included. */
  readonly takes: { readonly upper: Um; readonly lower: Um };
}

/** Two neighbours and how much of the joint has wood on both sides. */
export interface BlankJoint {
  /** From the upper edge of the blank. */
  readonly across: Um;
  readonly above: StockId;
  readonly below: StockId;
  /** Along the blank, where both boards lie. */
  readonly from: Um;
  readonly to: Um;
}

export interface StripLayout {
  readonly length: Um;
  readonly width: Um;
  readonly strips: readonly BlankStrip[];
  readonly joints: readonly BlankJoint[];
}

export type StripRefusal =
  | { readonly reason: "too-few" }
  | { readonly reason: "twice"; readonly id: StockId }
  /** More is taken off than there is; `by`: how much too much, at least 1. */
  | { readonly reason: "nothing-left"; readonly id: StockId; readonly by: Um }
  /** Neighbours lie so far apart along the grain that they do not meet. */
  | { readonly reason: "apart"; readonly above: StockId; readonly below: StockId; readonly by: Um };

export type StripOutcome =
  | { readonly ok: true; readonly layout: StripLayout }
  | { readonly ok: false; readonly refusal: StripRefusal };

const refused = (refusal: StripRefusal): StripOutcome => ({ ok: false, refusal });

export function blankStrips({ members, jointing }: BlankPlan<PlacedMember>): StripOutcome {
  if (members.length < 2) return refused({ reason: "too-few" });
  const twice = members.find(({ id }, index) => members.some((other, before) => before < index && other.id === id));
  if (twice) return refused({ reason: "twice", id: twice.id });

  const left = Math.min(...members.map(({ along }) => along));
  const strips: BlankStrip[] = [];
  let top = 0;
  for (const [index, member] of members.entries()) {
    const { id, length, width, along, trim } = member;
    const takes = {
      upper: um(trim.upper + (index > 0 ? jointing : 0)),
      lower: um(trim.lower + (index < members.length - 1 ? jointing : 0)),
    };
    const height = width - takes.upper - takes.lower;
    if (height <= 0) return refused({ reason: "nothing-left", id, by: um(1 - height) });
    const rect = { x: um(along - left), y: um(top), width: length, height: um(height) };
    strips.push({ id, blankFromMember: placeOf(member, rect, takes.upper), rect, takes });
    top += height;
  }
  const joints = strips.slice(1).map((below, index) => jointOf(strips[index] ?? below, below));
  const apart = joints.find(({ from, to }) => to <= from);
  if (apart) return refused({ reason: "apart", above: apart.above, below: apart.below, by: um(apart.from - apart.to + 1) });
  const right = Math.max(...strips.map(({ rect }) => rect.x + rect.width));
  return { ok: true, layout: { length: um(right), width: um(top), strips, joints } };
}

/** As it lies, the board's upper edge is `taken` above its strip. */
function placeOf({ endForEnd, length, width }: PlacedMember, rect: StockRect, taken: Um): Isometry {
  const top = rect.y - taken;
  return endForEnd ? quarterTurn(2, rect.x + length, top + width) : quarterTurn(0, rect.x, top);
}

function jointOf(above: BlankStrip, below: BlankStrip): BlankJoint {
  return {
    across: below.rect.y,
    above: above.id,
    below: below.id,
    from: um(Math.max(above.rect.x, below.rect.x)),
    to: um(Math.min(above.rect.x + above.rect.width, below.rect.x + below.rect.width)),
  };
}
