/** Whether the pieces of a part in hand fit into it by sliding in it alone, and what is missing where they do not. */
import { type Um, um } from "../units/um";
import { blocksOf, boundsOf, placedAt } from "./blocks";
import { leastSlide, missingAlong } from "./least-slide";
import type { PartInHand, RestPiece } from "./part-in-hand";
import { type Sawing, stands } from "./stands";
import { type Way, waysApart } from "./ways-apart";

/** A part with its pieces, and how the program as issued parts them. */
export interface InPart {
  readonly held: PartInHand;
  readonly pieces: readonly RestPiece[];
  readonly sawing: Sawing;
  /** The order of the cuts as issued, by places in `pieces`; null where it knows these pieces otherwise. */
  readonly issued: Way | null;
  /** The only ways to look at; absent: all there are. */
  readonly ways?: readonly Way[];
}

/** Ways that need least room, the best first; the rest is not looked at again. */
const FEW_WAYS = 60;

/** The least slide of any way of cutting that keeps what lies before before: the pieces at their new places; null when none fits. */
export function slidInPart(part: InPart): readonly RestPiece[] | null {
  const { pieces, held, sawing } = part;
  const blocks = blocksOf(held, pieces, sawing.board);
  const { kerf } = boundsOf(held, sawing.kerf);
  const slid = bestWays(part).flatMap(({ way }, rank) => {
    const x = leastSlide(blocks, way.x, "x", kerf.x);
    const y = x && leastSlide(blocks, way.y, "y", kerf.y);
    if (!x || !y) return [];
    const slides = blocks.flatMap(({ from }, i) => [Math.abs((x[i] ?? 0) - from.x), Math.abs((y[i] ?? 0) - from.y)]);
    return [{ x, y, rank, most: Math.max(...slides), sum: slides.reduce((sum, slide) => sum + slide, 0) }];
  });
  slid.sort((a, b) => a.most - b.most || a.sum - b.sum || a.rank - b.rank);
  for (const { x, y } of slid) {
    const placed = placedAt(pieces, x, y);
    if (stands(held, placed, sawing)) return placed;
  }
  return null;
}

/** Whether some way has room for all; places nothing. */
export function mayFit(part: InPart): boolean {
  const [best] = bestWays(part);
  return best !== undefined && best.missing.along === 0 && best.missing.across === 0;
}

export interface Missing {
  readonly along: Um;
  readonly across: Um;
}

/** What the part is too short and too narrow by, in the way that needs least; 0 and 0 when sliding is enough. */
export function missingInPart(part: InPart): Missing {
  return bestWays(part)[0]?.missing ?? { along: um(0), across: um(0) };
}

/** The same part, to be looked at again and again with its pieces a little smaller: in the ways that need least room now. */
export function inFewWays(part: InPart): InPart {
  return { ...part, ways: bestWays(part).map(({ way }) => way) };
}

/** Those that need least room, the issued one first among those that need equally much. */
function bestWays(part: InPart): readonly { readonly way: Way; readonly missing: Missing }[] {
  const { held, pieces, sawing } = part;
  const blocks = blocksOf(held, pieces, sawing.board);
  const { size, kerf } = boundsOf(held, sawing.kerf);
  // What does not fit is weighed too, so that it can be said by how much.
  const larger = { kerf, size: { x: size.x * 1.05, y: size.y * 1.05 } };
  const ways = part.ways ?? [...(part.issued ? [part.issued] : []), ...waysApart(blocks, larger)];
  return ways
    .map((way, rank) => ({
      way,
      rank,
      missing: {
        along: um(missingAlong(blocks, way.x, "x", kerf.x)),
        across: um(missingAlong(blocks, way.y, "y", kerf.y)),
      },
    }))
    .sort((a, b) => a.missing.along + a.missing.across - b.missing.along - b.missing.across || a.rank - b.rank)
    .slice(0, FEW_WAYS);
}
