/**
 * What the bench is told of a run round corners beside the cuts: how each corner is parted and what that takes of the show face and
 * of the inner face, the length of every side on both faces, the wood it takes, and how it stands folded. Lengths in µm.
 */
import type { PieceId } from "../../piece";
import { type Um, um } from "../../units/um";
import type { WrapCorner, WrapFace } from "../face";
import type { FaceLayout } from "../face-layout";
import { spacingAt } from "../loss";
import { pieceIdAt } from "../piece-names";
import { rulesOf } from "../rules-of";
import { type WoodNeeded, woodNeeded } from "../wood-needed";
import { bevelDegOf, hungGapOf, innerBeyond, lossAtCorner } from "./corner-loss";
import { type FoldedSide, foldOf } from "./fold";
import { cornersOf } from "./wrap-rules";

export interface WrapCornerPlan {
  readonly before: PieceId;
  readonly after: PieceId;
  readonly corner: WrapCorner;
  /** On the show face as hung. */
  readonly hungGap: Um;
  /** Both ends, from square; 0 where they are. */
  readonly bevelDeg: number;
  /**
   * How the two sides come apart. Null at the corner that closes a run: its two ends are the ends of the run, cut each by itself, and
   * the figure cannot run on there.
   */
  readonly parted: {
    readonly way: "square" | "squareThenBevels" | "oneBevel";
    readonly loss: { readonly show: Um; readonly inner: Um };
    /** Between the show edges in the wood. */
    readonly spacing: Um;
    /** Spacing less hung gap. */
    readonly jump: Um;
  } | null;
}

export interface WrapEnd {
  readonly bevelDeg: number;
  /** How far the inner face reaches beyond the show edge; negative where it falls short. */
  readonly innerBeyond: Um;
}

export interface WrapSidePlan {
  readonly piece: PieceId;
  readonly show: Um;
  readonly inner: Um;
  readonly ends: { readonly near: WrapEnd; readonly far: WrapEnd };
}

export interface WrapPlan {
  readonly wood: WoodNeeded;
  /** Of the unfolded show face, end to end. */
  readonly run: Um;
  readonly corners: readonly WrapCornerPlan[];
  readonly sides: readonly WrapSidePlan[];
  readonly fold: readonly FoldedSide[];
  /** How far a closed run misses its own start, and by how many degrees its turns miss a whole one; null for an open run. */
  readonly closure: { readonly off: Um; readonly turnOffDeg: number } | null;
}

/** null for a face of another pattern. */
export function wrapPlan(layout: FaceLayout): WrapPlan | null {
  const { face } = layout;
  if (face.pattern !== "wrap") return null;
  const fold = foldOf(face);
  const { at, directionDeg } = fold.end;
  return {
    wood: woodNeeded(layout),
    run: rulesOf(face).size(face).width,
    corners: face.corners.map((_, index) => cornerPlan(layout, face, index)),
    sides: face.sides.map((_, side) => sidePlan(face, side)),
    fold: fold.sides,
    closure: face.closed ? { off: um(Math.round(Math.hypot(at.x, at.y))), turnOffDeg: directionDeg - 360 } : null,
  };
}

function cornerPlan(layout: FaceLayout, face: WrapFace, index: number): WrapCornerPlan {
  const corner = face.corners[index];
  if (corner === undefined) throw new RangeError(`no corner ${index}`);
  const closing = index === face.sides.length - 1;
  const names = { before: pieceIdAt(index), after: pieceIdAt(closing ? 0 : index + 1) };
  const hungGap = hungGapOf(corner, face.thickness);
  const bevelDeg = bevelDegOf(corner);
  if (closing) return { ...names, corner, hungGap, bevelDeg, parted: null };
  const loss = lossAtCorner({ ...layout, face }, corner);
  const spacing = spacingAt(loss.show, hungGap, layout.spacing);
  const way = bevelDeg === 0 ? "square" : corner.kind === "mitre" ? corner.parting : "squareThenBevels";
  return { ...names, corner, hungGap, bevelDeg, parted: { way, loss, spacing, jump: um(spacing - hungGap) } };
}

function sidePlan(face: WrapFace, side: number): WrapSidePlan {
  const [near, far] = cornersOf(face, side).map((corner) =>
    corner === null
      ? { bevelDeg: 0, innerBeyond: um(0) }
      : { bevelDeg: bevelDegOf(corner), innerBeyond: innerBeyond(corner, face.thickness) },
  );
  const show = face.sides[side];
  if (near === undefined || far === undefined || show === undefined) throw new RangeError(`no side ${side}`);
  return { piece: pieceIdAt(side), show, inner: um(show + near.innerBeyond + far.innerBeyond), ends: { near, far } };
}
