/**
 * Takes the wood of spoiled pieces out of use. A piece that is parted from the rest leaves waste, and an offcut of what of it is still
 * good; one that is not parted yet leaves a place in its part that no other piece may lie on.
 */
import type { StockRect } from "../frame/point";
import type { EdgeState } from "../program/program";
import type { AsCutEntry } from "./as-cut";
import { type PartInHand, type RestPiece, wasteInHand } from "./part-in-hand";
import { blankRect, depthFrom, isInside, oppositeOf, overlap, sliceOf } from "./rect-edge";

type Spoiled = Extract<AsCutEntry, { kind: "spoiled" }>;

/** `pieces`: of this board, at the places they were to be cut from. */
export function spoilWood(
  bench: readonly PartInHand[],
  pieces: readonly RestPiece[],
  entries: readonly AsCutEntry[],
  freeLabel: () => string,
): readonly PartInHand[] {
  const spoiled = entries.filter((entry) => entry.kind === "spoiled");
  return spoiled.reduce((parts, entry) => {
    const piece = pieces.find(({ pieceId }) => pieceId === entry.pieceId);
    return piece ? parts.flatMap((held) => withoutPiece(held, piece, entry, freeLabel)) : parts;
  }, bench);
}

function withoutPiece(held: PartInHand, piece: RestPiece, entry: Spoiled, freeLabel: () => string): readonly PartInHand[] {
  const { part } = held;
  if (part.pieceId === piece.pieceId) return partedPiece(held, entry, freeLabel);
  const blank = blankRect(piece);
  if (part.kind === "waste" || part.pieceId !== null || !overlap(blank, part.rect)) return [held];
  return [{ ...held, spoiled: [...held.spoiled, badWood(blank, entry)] }];
}

function partedPiece(held: PartInHand, { usable }: Spoiled, freeLabel: () => string): readonly PartInHand[] {
  const { part, edges } = held;
  const depth = usable ? depthFrom(part.rect, usable.from) : 0;
  if (!usable || usable.length <= 0 || usable.length >= depth) return [wasteInHand(part.id, part.rect)];
  const good = sliceOf(part.rect, usable.from, 0, usable.length);
  const bad = sliceOf(part.rect, usable.from, usable.length, depth);
  const label = freeLabel();
  const rough: EdgeState = "rough";
  return [
    {
      ...held,
      part: { id: `${part.id}.good`, kind: "offcut", label, pieceId: null, rect: good },
      edges: { ...edges, [oppositeOf[usable.from]]: rough },
      spoiled: held.spoiled.filter((one) => isInside(one, good)),
    },
    wasteInHand(part.id, bad),
  ];
}

function badWood(blank: StockRect, { usable }: Spoiled): StockRect {
  if (!usable) return blank;
  const depth = depthFrom(blank, usable.from);
  return sliceOf(blank, usable.from, Math.min(Math.max(usable.length, 0), depth), depth);
}
