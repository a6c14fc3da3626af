/**
 * Can straight cuts from edge to edge part these blanks, and if not, which of them block one another?
 *
 * Taking any possible cut first never spoils a later one: it only removes blanks from either side, which widens the room between
 * those that are left. So greedy parting is a complete test, and the rectangles it gets stuck in are the same in any order.
 */
import type { PieceId } from "../piece";
import { groupsAlong, type KerfByAxis } from "./candidate-cuts";
import type { Axis, Blank, Region } from "./region";

/** Blanks of the first rectangle that no cut can part; null when all come apart. */
function stuckBlanks(blanks: readonly Blank[], region: Region, kerf: KerfByAxis): readonly Blank[] | null {
  const waiting: (readonly Blank[])[] = [blanks];
  for (let group = waiting.pop(); group; group = waiting.pop()) {
    if (group.length < 2) continue;
    const parted = partedAlong(group, region, "y", kerf.y) ?? partedAlong(group, region, "x", kerf.x);
    if (!parted) return group;
    waiting.push(...parted);
  }
  return null;
}

function partedAlong(blanks: readonly Blank[], region: Region, axis: Axis, kerf: number): (readonly Blank[])[] | null {
  const groups = groupsAlong({ ...region, blanks }, axis, kerf);
  if (groups.length < 2) return null;
  return groups.map((span) => blanks.filter((blank) => blank[axis].from >= span.from && blank[axis].to <= span.to));
}

/**
 * The pieces that block one another, in the order given; null when the layout can be sawn. The set is one from which no piece can
 * be left out without freeing the rest; the smallest of those met by trying the pieces from either end.
 */
export function blockingPieces(region: Region, kerf: KerfByAxis): readonly PieceId[] | null {
  const stuck = stuckBlanks(region.blanks, region, kerf);
  if (!stuck) return null;
  const forward = leftOut(stuck, stuck, region, kerf);
  const backward = leftOut(stuck, [...stuck].reverse(), region, kerf);
  const least = backward.length < forward.length ? backward : forward;
  return region.blanks.filter((blank) => least.includes(blank)).map((blank) => blank.piece.pieceId);
}

function leftOut(stuck: readonly Blank[], order: readonly Blank[], region: Region, kerf: KerfByAxis): readonly Blank[] {
  let kept = stuck;
  for (const blank of order) {
    const fewer = stuckBlanks(
      kept.filter((other) => other !== blank),
      region,
      kerf,
    );
    if (fewer) kept = fewer;
  }
  return kept;
}
