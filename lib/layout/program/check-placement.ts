/** What can be said against a placement before any cut is sought: outside the board, or closer than the loss between two. */
import { um } from "../units/um";
import type { CutProgramOutcome } from "./program";
import type { Axis, Blank, Region } from "./region";
import type { KerfByAxis } from "./workshop";

type Refusal = Extract<CutProgramOutcome, { ok: false }>;

/** The worst of them, the first in the order given where two are equally bad; null when the placement is sound. */
export function placementRefusal(region: Region, kerf: KerfByAxis): Refusal | null {
  if (region.blanks.length === 0) return { ok: false, reason: "nothing-to-cut" };
  return furthestOutside(region) ?? closestPair(region.blanks, kerf);
}

/** The piece whose blank reaches furthest over the rectangle's edges. */
export function furthestOutside(region: Region): Extract<Refusal, { reason: "outside" }> | null {
  let worst: Extract<Refusal, { reason: "outside" }> | null = null;
  for (const blank of region.blanks) {
    const by = Math.max(
      region.x.from - blank.x.from,
      blank.x.to - region.x.to,
      region.y.from - blank.y.from,
      blank.y.to - region.y.to,
    );
    if (by > (worst?.by ?? 0)) worst = { ok: false, reason: "outside", piece: blank.piece.pieceId, by: um(by) };
  }
  return worst;
}

/** Two blanks come apart by one cut when there is room for its kerf between them along x or along y. */
function closestPair(blanks: readonly Blank[], kerf: KerfByAxis): Extract<Refusal, { reason: "too-close" }> | null {
  let worst: Extract<Refusal, { reason: "too-close" }> | null = null;
  for (const [i, a] of blanks.entries()) {
    for (const b of blanks.slice(i + 1)) {
      const missing = Math.min(kerf.x - room(a, b, "x"), kerf.y - room(a, b, "y"));
      if (missing > (worst?.missing ?? 0))
        worst = { ok: false, reason: "too-close", pieces: [a.piece.pieceId, b.piece.pieceId], missing: um(missing) };
    }
  }
  return worst;
}

/** Distance between two blanks along an axis; negative by the overlap where they overlap. */
function room(a: Blank, b: Blank, axis: Axis): number {
  return Math.max(a[axis].from, b[axis].from) - Math.min(a[axis].to, b[axis].to);
}
