/**
 * What the cuts of a cut-out take, and how far that moves its parts (engine: patterns on solid stock, cut-out). With c_k what is
 * missing of the figure at cut k of a row, its spacing less the gap that hangs there, part i of the row has to be moved along the
 * rail by
 *
 *   shift_i = −Σ_{k<i} c_k + shift_a
 *
 * to be glued in its place; the anchor a decides which part stays. Where the fronts are fitted by as much as their gaps and the
 * spacing is tight, c_k is simply what the saw and the clean-up took. Across the grain everything closes up by the rips' losses.
 * Lengths in µm.
 */
import { type Um, um } from "../../units/um";
import type { CutOutFace } from "../face";
import { lossOf, spacingOf } from "../loss";
import type { CutSettings } from "../pattern-rules";
import { piecesOfCutOut, startsAlong } from "./cut-out-pieces";
import { anchorAlong, bySide } from "./rail-axes";

/** One crosscut of a row, between a part and the next. */
export interface RowCut {
  /** Between the edges as they hang: nothing, the gap of a front, or those of two. */
  readonly gap: Um;
  /** Kerf, clean-up of a fixed part's end, fitting of a front's. */
  readonly loss: Um;
  /** Between the same edges in the wood. */
  readonly spacing: Um;
  /** Spacing less gap: how far the figure jumps here. */
  readonly jump: Um;
}

export function cutsOfRow(layout: CutSettings<CutOutFace>, row: number): RowCut[] {
  const { face, crosscut, spacing: rule } = layout;
  const gaps = bySide(face.gap, face.grain);
  const parts = face.rows[row]?.parts ?? [];
  return parts.slice(1).map((after, index) => {
    const before = parts[index];
    const front = { before: before?.kind === "front", after: after.kind === "front" };
    const gap = um((front.before ? gaps.far : 0) + (front.after ? gaps.near : 0));
    const cut = {
      kerf: crosscut.kerf,
      cleanUpBefore: front.before ? face.fitting : crosscut.cleanUpBefore,
      cleanUpAfter: front.after ? face.fitting : crosscut.cleanUpAfter,
    };
    const spacing = spacingOf(cut, gap, rule);
    return { gap, loss: lossOf(cut), spacing, jump: um(spacing - gap) };
  });
}

/** What parts a strip from the row beside it: the rip's kerf, and its clean-up where the rails are jointed. */
export function lossAcross({ face, rip }: CutSettings<CutOutFace>): Um {
  return face.rails === "jointed" ? lossOf(rip) : rip.kerf;
}

/** How far each part of a row lies in the wood beyond its place on the strips: −shift_i, positive towards the end of the row. */
export function offsetsOfRow(layout: CutSettings<CutOutFace>, row: number): number[] {
  const jumps = cutsOfRow(layout, row).map(({ jump }) => jump);
  const fromStart = [0];
  for (const jump of jumps) fromStart.push((fromStart.at(-1) ?? 0) + jump);
  const still = stillOffset(layout, row, fromStart);
  return fromStart.map((offset) => offset - still);
}

/** The offset, counted from the start of the row, of what the anchor holds in its place. */
function stillOffset(layout: CutSettings<CutOutFace>, row: number, fromStart: readonly number[]): number {
  const anchor = anchorAlong(layout, layout.face.grain);
  const whole = fromStart.at(-1) ?? 0;
  if (anchor === "start") return 0;
  if (anchor === "end") return whole;
  const part = anchor === "centre" ? null : partAtAnchor(layout.face, row, anchor.piece);
  return part === null ? Math.floor(whole / 2) : (fromStart[part] ?? 0);
}

/** The anchor piece itself, or in another row the part that hangs where its middle is; null where the anchor is a strip. */
function partAtAnchor(face: CutOutFace, row: number, id: string): number | null {
  const piece = piecesOfCutOut(face)[Number(id.slice(1)) - 1];
  if (piece === undefined || piece.role === "strip") return null;
  if (piece.row === row) return piece.part;
  const middle = (startsAlong(face, piece.row)[piece.part] ?? 0) + (face.rows[piece.row]?.parts[piece.part]?.width ?? 0) / 2;
  const starts = startsAlong(face, row);
  const beyond = starts.findIndex((start) => start > middle);
  return (beyond < 0 ? starts.length : beyond) - 1;
}
