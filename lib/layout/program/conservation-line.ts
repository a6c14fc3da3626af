/** The check that is printed under a cut order: where the board went, as areas and, where the pieces are one row, along its length. */
import type { StockRect } from "../frame/point";
import { bladeOf, type CutProgram, type CutStep, isSawn, type Part } from "./program";

/** All parts add up to `board`. In µm² for areas, in µm along a strip. */
export interface WoodSum {
  readonly fronts: number;
  readonly kerf: number;
  /** What is taken out between two pieces to set their spacing: dust where it is narrower than the blade, else waste. */
  readonly slivers: number;
  readonly cleanUp: number;
  readonly offcuts: number;
  readonly waste: number;
  readonly board: number;
}

export interface ConservationLine {
  readonly area: WoodSum;
  /** Along the board through the middle of the row; null when the blanks are not one row. */
  readonly length: WoodSum | null;
}

export function conservationLine(program: CutProgram): ConservationLine | null {
  const board = program.steps[0]?.part.rect;
  if (!board) return null;
  const row = rowOf(program);
  return {
    area: sumUp(program, board, (rect) => rect.width * rect.height),
    length: row && sumUp(program, board, (rect) => (crosses(rect, row.y + row.height / 2) ? rect.width : 0)),
  };
}

function sumUp(program: CutProgram, board: StockRect, measure: (rect: StockRect) => number): WoodSum {
  const total = (rects: readonly StockRect[]) => rects.reduce((sum, rect) => sum + measure(rect), 0);
  const cuts = program.steps.filter((step) => isSawn(step.kind));
  const truing = program.steps.filter((step) => step.kind === "true").map((step) => step.kerf);
  const planed = program.steps.filter((step) => step.kind === "plane").map((step) => step.kerf);
  const shaving = (step: CutStep) => isNarrowerThanBlade(step, program);
  const between = sliversIn(program);
  const fronts = total(program.pieces.map((piece) => piece.rect));
  return {
    fronts,
    kerf: total(cuts.filter((step) => !shaving(step)).map((step) => step.kerf)),
    slivers: total(cuts.filter(shaving).map((step) => step.kerf)) + total(planed) + total(between.map((part) => part.rect)),
    cleanUp: total(truing) + total(blanksOf(program).map((part) => part.rect)) - fronts,
    offcuts: total(program.offcuts.map((part) => part.rect)),
    waste: total(program.waste.filter((part) => !between.includes(part)).map((part) => part.rect)),
    board: measure(board),
  };
}

/** Height and place of the one row in which all blanks lie. */
function rowOf(program: CutProgram): StockRect | null {
  const [first, ...others] = blanksOf(program).map((part) => part.rect);
  const one = first && others.every((rect) => rect.y === first.y && rect.height === first.height);
  return one ? first : null;
}

function blanksOf(program: CutProgram): readonly Part[] {
  const ids = new Set(program.pieces.map((piece) => piece.id));
  return program.steps.flatMap((step) => step.yields).filter((part) => ids.has(part.id));
}

function isNarrowerThanBlade(step: CutStep, program: CutProgram): boolean {
  return (step.kind === "crosscut" ? step.kerf.width : step.kerf.height) < bladeOf(step, program);
}

/** Waste of a trim that does not reach the board's own edge in the direction the trim works. */
function sliversIn(program: CutProgram): readonly Part[] {
  const cuts = program.steps.filter((step) => isSawn(step.kind));
  const board = cuts[0]?.part.rect;
  if (!board) return [];
  return program.waste.filter((part) => {
    const step = cuts.find((one) => one.yields.some((made) => made.id === part.id));
    const [from, size, boardFrom, boardSize] =
      step?.kind === "crosscut"
        ? [part.rect.x, part.rect.width, board.x, board.width]
        : [part.rect.y, part.rect.height, board.y, board.height];
    return from > boardFrom && from + size < boardFrom + boardSize;
  });
}

const crosses = (rect: StockRect, y: number): boolean => rect.y < y && rect.y + rect.height > y;
