/** Requests used by several tests: invented boards and fronts, lengths in mm. */
import { boardEdges, type CutRequest, defaultCutBudget, type PlacedPiece } from "@/lib/layout/program/cut-request";
import type { ShopLimits } from "@/lib/layout/program/program";
import { umFromMm } from "@/lib/layout/units/um";

export const limits: ShopLimits = {
  shortestCrosscut: umFromMm(300),
  narrowestRip: umFromMm(80),
  shortestMachined: umFromMm(300),
  offcutLength: umFromMm(300),
  offcutWidth: umFromMm(50),
};

const leftFromTheSaw = { left: umFromMm(0), right: umFromMm(0), top: umFromMm(0), bottom: umFromMm(0) };

/** A front at a place, in mm, numbered from 1. */
export function front(number: number, x: number, y: number, width: number, height: number, cleanUpMm = 0): PlacedPiece {
  const amount = umFromMm(cleanUpMm);
  return {
    pieceId: `p${number}`,
    label: String(number),
    rect: { x: umFromMm(x), y: umFromMm(y), width: umFromMm(width), height: umFromMm(height) },
    cleanUp: cleanUpMm === 0 ? leftFromTheSaw : { left: amount, right: amount, top: amount, bottom: amount },
  };
}

export function request(
  lengthMm: number,
  widthMm: number,
  pieces: readonly PlacedPiece[],
  change: Partial<CutRequest> = {},
): CutRequest {
  return {
    board: { length: umFromMm(lengthMm), width: umFromMm(widthMm) },
    pieces,
    kerf: { rip: umFromMm(2.4), crosscut: umFromMm(2.4) },
    boardEdges: boardEdges(true, true),
    truingTakes: { longEdge: umFromMm(2), end: umFromMm(5) },
    limits,
    budget: defaultCutBudget,
    ...change,
  };
}

/** Fronts of one size in a row, `spacing` mm of wood between them. */
export function row(count: number, x: number, y: number, width: number, height: number, spacing: number): PlacedPiece[] {
  return Array.from({ length: count }, (_, i) => front(i + 1, x + i * (width + spacing), y, width, height));
}
