/** How the steps still to be done part the pieces of a part in hand, and which steps those are. */
import type { PieceId } from "../piece";
import type { CutStep } from "../program/program";
import type { RestPiece } from "./part-in-hand";
import { edgeAt, isEnd, isLow } from "./rect-edge";
import type { Way } from "./ways-apart";

/** The steps that cut a part and what comes off it, in the order of the program. */
export function stepsOf(partId: string, steps: readonly CutStep[]): readonly CutStep[] {
  const inHand = new Set([partId]);
  return steps.filter((step) => {
    if (!inHand.has(step.part.id)) return false;
    for (const { id } of step.yields) inHand.add(id);
    return true;
  });
}

/** Pairs of places in `pieces`; of pieces that the steps do not know nothing is said. */
export function issuedWay(partId: string, pieces: readonly RestPiece[], steps: readonly CutStep[]): Way {
  const x: (readonly [number, number])[] = [];
  const y: (readonly [number, number])[] = [];
  const placeOf = new Map<PieceId, number>(pieces.map(({ pieceId }, i) => [pieceId, i]));
  const under = (id: string): number[] => {
    const step = steps.find(({ part }) => part.id === id);
    if (!step) return [];
    const groups = step.yields.map(({ id: made, pieceId }) => {
      const deeper = under(made);
      const own = pieceId === null ? undefined : placeOf.get(pieceId);
      return deeper.length === 0 && own !== undefined ? [own] : deeper;
    });
    const [near = [], far = []] = inOrder(step, groups);
    const pairs = near.flatMap((a) => far.map((b) => [a, b] as const));
    (isEnd(step.fromEdge) ? x : y).push(...pairs);
    return [...near, ...far];
  };
  under(partId);
  return { x, y };
}

/** The side nearer the origin first. */
function inOrder({ fromEdge, part, yields }: CutStep, groups: readonly number[][]): readonly number[][] {
  const [first] = yields;
  if (groups.length < 2 || !first) return groups;
  const atEdge = edgeAt(first.rect, fromEdge) === edgeAt(part.rect, fromEdge);
  return atEdge === isLow(fromEdge) ? groups : [...groups].reverse();
}
