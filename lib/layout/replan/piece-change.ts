/** What a rescue makes different, told from the pieces before and after it. */
import type { Part } from "../program/program";
import { type Um, um } from "../units/um";
import type { RestPiece } from "./part-in-hand";
import { everyEdge } from "./rect-edge";
import type { PieceChange } from "./trouble";

export function pieceChange(before: RestPiece, after: RestPiece, from: Part | null): PieceChange | null {
  const change = {
    pieceId: before.pieceId,
    label: before.label,
    by: {
      x: slideOf(before.rect.x, before.rect.width, after.rect.x, after.rect.width),
      y: slideOf(before.rect.y, before.rect.height, after.rect.y, after.rect.height),
    },
    cleanUp: everyEdge
      .filter((edge) => after.cleanUp[edge] !== before.cleanUp[edge])
      .map((edge) => ({ edge, planned: before.cleanUp[edge], left: after.cleanUp[edge] })),
    smaller: {
      along: um(before.rect.width - after.rect.width),
      across: um(before.rect.height - after.rect.height),
    },
    from,
  };
  const { by, cleanUp, smaller } = change;
  const same = by.x === 0 && by.y === 0 && cleanUp.length === 0 && smaller.along === 0 && smaller.across === 0 && !from;
  return same ? null : change;
}

/** Of a piece that lost some of its size: of the edge that slid less. */
function slideOf(from: number, size: number, newFrom: number, newSize: number): Um {
  const low = newFrom - from;
  const high = newFrom + newSize - from - size;
  return um(Math.abs(low) <= Math.abs(high) ? low : high);
}
