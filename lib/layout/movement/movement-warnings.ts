/** What to be warned of: what is not known, what the equation is not meant for, and gaps that close. In the order in which to mend it. */
import { unplacedPieces } from "../pattern/lay-out";
import type { StockId } from "../piece";
import { um } from "../units/um";
import type { BoardWood, GapThroughYear, MovementRequest, MovementWarning, Season } from "./movement";
import { FIBRE_SATURATION, outsideRange } from "./size-change";
import { type MovingFace, mainBoard } from "./strains";

export function movementWarnings({ request, pieces }: MovingFace, gaps: readonly GapThroughYear[]): MovementWarning[] {
  const unplaced = unplacedPieces(request.layout).map(({ id }) => id);
  const boards = [...new Set(pieces.map(({ stockId }) => stockId))];
  return [
    ...(unplaced.length > 0 ? [{ kind: "not-on-wood" as const, pieces: unplaced }] : []),
    ...boards.flatMap((stockId) => ofBoard(request, stockId)),
    ...(["dampest", "driest"] as const).flatMap((season) => ofSeason(request, gaps, season)),
  ];
}

const unknownWood: BoardWood = { movement: null, ringAngle: 0, moisture: null };

function ofBoard(request: MovementRequest, stockId: StockId): MovementWarning[] {
  const { movement, moisture } = request.woods.get(stockId) ?? unknownWood;
  const warnings: MovementWarning[] = [];
  if (movement === null) warnings.push({ kind: "no-species", stockId });
  if (moisture === null) return [...warnings, { kind: "no-reading", stockId }];
  if (moisture > FIBRE_SATURATION) return [...warnings, { kind: "too-damp", stockId, moisture }];
  const { driest, dampest } = request.year;
  if (moisture < driest || moisture > dampest) warnings.push({ kind: "outside-place", stockId, moisture });
  const surround = moistureOfSurround(request);
  if (surround !== null && Math.abs(surround - moisture) > request.moistureLimit) {
    warnings.push({ kind: "surround-differs", stockId, moisture, surround });
  }
  if (movement !== null) {
    const reckoned = [moisture, driest, dampest, ...(surround !== null && stockId === mainBoard(request) ? [surround] : [])];
    const moistures = [...new Set(outsideRange(movement, reckoned))].sort((p, q) => p - q);
    if (moistures.length > 0) warnings.push({ kind: "range-left", stockId, moistures });
  }
  return warnings;
}

/** Only solid wood has a moisture to tell; where it was not read it is as the main board's. */
function moistureOfSurround(request: MovementRequest): number | null {
  const board = mainBoard(request);
  if (request.surround.kind !== "sameWood" || board === null) return null;
  return request.surround.moisture ?? request.woods.get(board)?.moisture ?? null;
}

function ofSeason({ leastGap }: MovementRequest, gaps: readonly GapThroughYear[], season: Season): MovementWarning[] {
  const widthOf = ({ figures }: GapThroughYear) => figures?.[season] ?? Number.POSITIVE_INFINITY;
  const told = (kind: "closes" | "too-narrow", among: readonly GapThroughYear[]): MovementWarning[] =>
    among.length === 0 ? [] : [{ kind, season, gaps: among, least: um(Math.min(...among.map(widthOf))) }];
  const closing = gaps.filter((gap) => widthOf(gap) <= 0);
  const narrow = gaps.filter((gap) => widthOf(gap) > 0 && widthOf(gap) < leastGap);
  return [...told("closes", closing), ...told("too-narrow", narrow)];
}
