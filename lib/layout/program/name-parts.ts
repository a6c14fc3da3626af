/**
 * What each rectangle that comes off a cut is called. Pieces carry their own labels, strips letters, offcuts C1, C2, …; waste has
 * none. A strip keeps its letter while pieces are taken off it.
 */
import type { PieceId } from "../piece";
import { groupsAlong } from "./candidate-cuts";
import { isOffcut } from "./cut-plan";
import type { Part, PartKind, ShopLimits } from "./program";
import { everyEdge, type Region, sizeOf, stockRectOf } from "./region";
import type { KerfByAxis } from "./workshop";

interface Name {
  readonly kind: PartKind;
  readonly label: string | null;
  readonly pieceId: PieceId | null;
}

export interface PartNamer {
  /** The parts a cut of `parent` leaves, in the order given; `step` is its number. */
  readonly nameAll: NameAll;
  /** The same of a rough cut, in whose regions every blank is a rough part. */
  readonly nameRough: NameAll;
}

type NameAll = (parent: Part, regions: readonly Region[], step: number) => readonly Part[];

export function partNamer(kerf: KerfByAxis, limits: ShopLimits): PartNamer {
  let strips = 0;
  let offcuts = 0;
  let roughs = 0;
  const strip = (): Name => ({ kind: "strip", label: stripLabel(strips++), pieceId: null });

  function unsawn(parent: Part, region: Region, siblings: readonly Region[]): Name {
    const unsawnSiblings = siblings.filter((other) => other !== region && !isOut(other));
    const rows = (of: Region) => groupsAlong(of, "y", kerf.y).length;
    // A board stays the board until single rows come off it, a strip keeps its letter while pieces do.
    const keeps =
      parent.kind === "board" || parent.kind === "rough"
        ? rows(region) > 1 && unsawnSiblings.every((other) => rows(other) === 1)
        : unsawnSiblings.length === 0;
    if (keeps) return { kind: parent.kind, label: parent.label, pieceId: parent.pieceId };
    const [blank, second] = region.blanks;
    // One piece parted from the others, still to be trimmed: it is marked as that piece at once.
    if (unsawnSiblings.length > 0 && parent.kind === "strip" && blank && !second)
      return { kind: "blank", label: blank.piece.label, pieceId: blank.piece.pieceId };
    return strip();
  }

  function empty(region: Region): Name {
    const kept = isOffcut(region, limits);
    return kept ? { kind: "offcut", label: `C${++offcuts}`, pieceId: null } : { kind: "waste", label: null, pieceId: null };
  }

  function rough(parent: Part, region: Region, siblings: readonly Region[]): Name {
    if (region.blanks.length === 0) return empty(region);
    const alone = siblings.every((other) => other === region || other.blanks.length === 0);
    // A board stays the board while only offcuts come off it; a rough part keeps its name.
    if (parent.kind === "rough" || (alone && region.blanks.length > 1)) return { ...parent };
    if (region.blanks.length === 1) return { kind: "rough", label: `R${++roughs}`, pieceId: null };
    return strip();
  }

  function fine(parent: Part, region: Region, siblings: readonly Region[]): Name {
    const [blank] = region.blanks;
    if (!blank) return empty(region);
    if (!isOut(region)) return unsawn(parent, region, siblings);
    const asSawn = everyEdge.every((edge) => blank.piece.cleanUp[edge] === 0);
    return { kind: asSawn ? "piece" : "blank", label: blank.piece.label, pieceId: blank.piece.pieceId };
  }

  const allBy =
    (name: typeof fine): NameAll =>
    (parent, regions, step) =>
      regions.map((region, i): Part => {
        const { kind, label, pieceId } = name(parent, region, regions);
        return { id: `${step}.${i + 1}`, kind, label, pieceId, rect: stockRectOf(region) };
      });
  return { nameAll: allBy(fine), nameRough: allBy(rough) };
}

/** Nothing in it is still to be sawn out: empty, or a blank at its size. */
function isOut(region: Region): boolean {
  const [blank, second] = region.blanks;
  if (!blank) return true;
  return !second && sizeOf(blank.x) === sizeOf(region.x) && sizeOf(blank.y) === sizeOf(region.y);
}

/** No I and no O, which are read as figures, and no C, which marks offcuts. After Z come AA, AB, … */
const stripLetters = "ABDEFGHJKLMNPQRSTUVWXYZ";

/** "A" for 0, "B" for 1, "D" for 2, … */
export function stripLabel(index: number): string {
  const letter = stripLetters[index % stripLetters.length] ?? "";
  return index < stripLetters.length ? letter : stripLabel(Math.floor(index / stripLetters.length) - 1) + letter;
}
