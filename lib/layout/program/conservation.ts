/** Where the wood of the board goes, in µm²; whole numbers far below 2^53, so sums are exact. */
import type { StockRect } from "../frame/point";
import type { CutRequest } from "./cut-request";
import { type Conservation, type CutProgram, isSawn, type Part } from "./program";

/** Area in µm². */
export function rectArea(rect: StockRect): number {
  return rect.width * rect.height;
}

/** Each share by itself from the parts and the dust; nothing is found by subtraction from the board, so the sum can be checked. */
export function conservationOf(
  board: CutRequest["board"],
  program: Pick<CutProgram, "steps" | "cleanUps" | "pieces" | "offcuts" | "waste">,
): Conservation {
  const parts = new Map(program.steps.flatMap((step) => step.yields).map((part) => [part.id, part]));
  const blanks = program.pieces.map((piece) => parts.get(piece.id) ?? piece);
  const dust = (ofSaw: boolean) =>
    total(program.steps.filter((step) => isSawn(step.kind) === ofSaw).map((step) => rectArea(step.kerf)));
  return {
    stock: board.length * board.width,
    pieces: areaOfAll(program.pieces),
    kerf: dust(true),
    cleanUp: dust(false) + areaOfAll(blanks) - areaOfAll(program.pieces),
    offcuts: areaOfAll(program.offcuts),
    waste: areaOfAll(program.waste),
  };
}

const areaOfAll = (parts: readonly Part[]): number => total(parts.map((part) => rectArea(part.rect)));
const total = (numbers: readonly number[]): number => numbers.reduce((sum, value) => sum + value, 0);
