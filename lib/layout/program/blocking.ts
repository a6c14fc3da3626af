/**
 * Can straight cuts from edge to edge part these blanks, and if not, which of them block one another?
 *
 * Taking any possible cut first never spoils a later one: it only removes blanks from either side, which widens the room between
 * those that are left. So greedy parting is a complete test, and the rectangles it gets stuck in are the same in any order.
 */
import type { PieceId } from "../piece";
import { groupsAlong } from "./candidate-cuts";
import type { Axis, Blank } from "./region";
import type { KerfByAxis } from "./workshop";

/** Blanks of the first rectangle that no cut can part; null when all come apart. */
export function stuckBlanks(blanks: readonly Blank[], kerf: KerfByAxis): readonly Blank[] | null {
  const waiting: (readonly Blank[])[] = [blanks];
  for (let group = waiting.pop(); group; group = waiting.pop()) {
    if (group.length < 2) continue;
    const parted = partedAlong(group, "y", kerf.y) ?? partedAlong(group, "x", kerf.x);
    if (!parted) return group;
    waiting.push(...parted);
  }
  return null;
}

function partedAlong(blanks: readonly Blank[], axis: Axis, kerf: number): (readonly Blank[])[] | null {
  const groups = groupsAlong({ blanks }, axis, kerf);
  if (groups.length < 2) return null;
  return groups.map((span) => blanks.filter((blank) => blank[axis].from >= span.from && blank[axis].to <= span.to));
}

/**
 * The pieces that block one another, in the order given; null when the layout can be sawn. The set is one from which no piece can
 * be left out without freeing the rest; the smallest of those met by trying the pieces from either end.
 */
export function blockingPieces(blanks: readonly Blank[], kerf: KerfByAxis): readonly PieceId[] | null {
  const stuck = stuckBlanks(blanks, kerf);
  if (!stuck) return null;
  const forward = leftOut(stuck, stuck, kerf);
  const backward = leftOut(stuck, [...stuck].reverse(), kerf);
  const least = backward.length < forward.length ? backward : forward;
  return blanks.filter((blank) => least.includes(blank)).map((blank) => blank.piece.pieceId);
}

function leftOut(stuck: readonly Blank[], order: readonly Blank[], kerf: KerfByAxis): readonly Blank[] {
  let kept = stuck;
  for (const blank of order) {
    const fewer = stuckBlanks(
      kept.filter((other) => other !== blank),
      kerf,
    );
    if (fewer) kept = fewer;
  }
  return kept;
}
