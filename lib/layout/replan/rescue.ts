/** The rescues of one trouble, each carried through on the parts in hand and checked, in the order of choice. */
import { placeElsewhere } from "./elsewhere";
import { type InPart, slidInPart } from "./fit-in-part";
import type { Holding } from "./hold-pieces";
import { cleanedLess } from "./less-clean-up";
import { leftNarrower } from "./narrower";
import type { RestPiece } from "./part-in-hand";
import { pieceChange } from "./piece-change";
import { type Sawing, stands } from "./stands";
import { type PieceChange, type Rescue, type RescueKind, rescueKinds } from "./trouble";
import { nameOf } from "./trouble-facts";

/** What the parts in hand hold after a rescue. */
export interface Rescued {
  readonly rescue: Rescue;
  readonly holdings: readonly Holding[];
  readonly leftOut: readonly RestPiece[];
}

/** Of a part whose pieces cannot be cut as they lie. `named`: those that the trouble is about, which give way first. */
export function rescuesOfPart(
  at: number,
  part: InPart,
  named: readonly RestPiece[],
  holdings: readonly Holding[],
): readonly Rescued[] {
  const inPart = (kind: RescueKind, pieces: readonly RestPiece[] | null): Rescued[] =>
    pieces ? [rescued(kind, holdings, withPieces(holdings, at, pieces), [])] : [];
  const slid = slidInPart(part);
  const smaller = slid ? null : leftNarrower(part);
  const loses = smaller?.find((piece, i) => piece.rect.width * piece.rect.height < areaOf(part.pieces[i]));
  const found = [
    ...inPart("slide", slid),
    ...(slid ? [] : inPart("less-clean-up", cleanedLess(part))),
    ...inPart(loses?.keepsSize === false ? "narrower" : "smaller", smaller),
    ...(slid ? [] : givingWay(at, part, named, holdings)),
  ];
  return inOrder(found);
}

/** Of pieces that lie in no part in hand: other wood of this board, or of another. */
export function rescuesOfPiece(piece: RestPiece, holdings: readonly Holding[], sawing: Sawing): readonly Rescued[] {
  const place = placeElsewhere(piece, holdings, sawing);
  const there = place && withMore(holdings, place.partId, place.piece);
  return inOrder([
    ...(there ? [rescued("elsewhere", holdings, there, [], [piece])] : []),
    rescued("other-board", holdings, holdings, [piece]),
  ]);
}

/** As few pieces as can be leave the part, so that the others fit; they go elsewhere on the board, or to another one. */
function givingWay(at: number, part: InPart, named: readonly RestPiece[], holdings: readonly Holding[]): readonly Rescued[] {
  const { staying, leaving } = fewestLeaving(part, named);
  const without = withPieces(holdings, at, staying);
  let there: readonly Holding[] | null = without;
  for (const piece of leaving) {
    const place: ReturnType<typeof placeElsewhere> = there && placeElsewhere(piece, there, part.sawing);
    there = there && place && withMore(there, place.partId, place.piece);
  }
  return [
    ...(there ? [rescued("elsewhere", holdings, there, [], leaving)] : []),
    rescued("other-board", holdings, without, leaving),
  ];
}

/** One after another, the piece whose leaving helps most quickly: at once if one is enough, else the first that the trouble is about. */
function fewestLeaving(part: InPart, named: readonly RestPiece[]) {
  let staying = part.pieces;
  const leaving: RestPiece[] = [];
  while (staying.length > 0) {
    const kept = settled({ ...part, pieces: staying, issued: null });
    if (kept) return { staying: kept, leaving };
    const byName = [...staying].sort((a, b) => Number(named.includes(b)) - Number(named.includes(a)));
    const enough = byName.find((piece) => settled({ ...part, pieces: staying.filter((one) => one !== piece), issued: null }));
    const gone = enough ?? byName[0];
    if (!gone) break;
    leaving.push(gone);
    staying = staying.filter((one) => one !== gone);
  }
  return { staying, leaving };
}

function settled(part: InPart): readonly RestPiece[] | null {
  return stands(part.held, part.pieces, part.sawing) ? part.pieces : slidInPart(part);
}

function rescued(
  kind: RescueKind,
  before: readonly Holding[],
  after: readonly Holding[],
  leftOut: readonly RestPiece[],
  homeless: readonly RestPiece[] = [],
): Rescued {
  const lay = new Map([...homeless, ...before.flatMap(({ pieces }) => pieces)].map((piece) => [piece.pieceId, piece]));
  const changes = after.flatMap(({ held, pieces }) =>
    pieces.flatMap((piece): PieceChange[] => {
      const was = lay.get(piece.pieceId);
      const moved = homeless.some(({ pieceId }) => pieceId === piece.pieceId);
      const change = was && pieceChange(was, piece, moved ? held.part : null);
      return change ? [change] : [];
    }),
  );
  return { rescue: { kind, changes, leftOut: leftOut.map(nameOf) }, holdings: after, leftOut };
}

function withPieces(holdings: readonly Holding[], at: number, pieces: readonly RestPiece[]): readonly Holding[] {
  return holdings.map((holding, i) => (i === at ? { ...holding, pieces } : holding));
}

function withMore(holdings: readonly Holding[], partId: string, piece: RestPiece): readonly Holding[] {
  return holdings.map((holding) =>
    holding.held.part.id === partId ? { ...holding, pieces: [...holding.pieces, piece] } : holding,
  );
}

const areaOf = (piece: RestPiece | undefined): number => (piece ? piece.rect.width * piece.rect.height : 0);

function inOrder(found: readonly Rescued[]): readonly Rescued[] {
  return [...found].sort((a, b) => rescueKinds.indexOf(a.rescue.kind) - rescueKinds.indexOf(b.rescue.kind));
}
