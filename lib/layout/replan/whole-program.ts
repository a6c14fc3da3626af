/** One program of what is done and what is left to do: every piece, offcut and bit of waste of the board in it once. */
import { bladeOf, type CleanUp, type CutProgram, type CutStep, isSawn, type Part, type SearchReport } from "../program/program";
import type { RestAssessment } from "./assess-rest";
import { freeLabels } from "./free-labels";
import type { RestLimits, RestPiece, RestRequest } from "./part-in-hand";
import { everyEdge } from "./rect-edge";

export interface Whole {
  /** As they were cut, each with the width of its blade. */
  readonly done: readonly CutStep[];
  readonly rest: readonly CutStep[];
  /** What lies on the bench at the end, before clean-up. */
  readonly final: readonly Part[];
  readonly search: SearchReport;
}

export function wholeProgram(
  request: RestRequest,
  { holdings, sawing }: RestAssessment,
  { done, rest, final, search }: Whole,
  { limits }: RestLimits,
): Omit<CutProgram, "conservation"> {
  const pieces = new Map(holdings.flatMap((holding) => holding.pieces.map((piece) => [piece.pieceId, piece] as const)));
  const steps = [
    ...withTrueParts(
      done,
      holdings.map(({ held }) => held.part),
    ),
    ...rest,
  ];
  const labels = freeLabels([...final, ...steps.flatMap(({ yields }) => yields)]);
  const blanks: { part: Part; piece: RestPiece }[] = [];
  const offcuts: Part[] = [];
  const waste: Part[] = [];
  const racked = new Set(request.program.offcuts.map(({ id }) => id));
  const isLarge = ({ rect }: Part) => rect.width >= limits.offcutLength && rect.height >= limits.offcutWidth;
  for (const part of final) {
    const piece = part.pieceId === null ? undefined : pieces.get(part.pieceId);
    if (piece) blanks.push({ part, piece });
    else if (part.kind === "waste" || !(isLarge(part) || racked.has(part.id)))
      waste.push({ ...part, kind: "waste", label: null, pieceId: null });
    // A strip that gives nothing any more is an offcut too.
    else offcuts.push(part.kind === "offcut" ? part : { ...part, kind: "offcut", label: labels.offcut() });
  }
  const machines = machinesOf(request, steps, sawing);
  const saws = { kerf: sawing.kerf, ...(machines && { machines }) };
  return {
    ...saws,
    steps: steps.map((step) => withBlade(step, saws)),
    cleanUps: blanks.flatMap(({ part, piece }) => cleanUpsOf(part, piece)),
    pieces: blanks.map(({ part, piece }) => ({ ...part, kind: "piece", rect: piece.rect })),
    offcuts,
    waste,
    settings: new Set(steps.filter(({ kind }) => isSawn(kind)).map(({ settingNumber }) => settingNumber)).size,
    search,
  };
}

/** Parts in hand that turned out shorter after the cut that made them. */
function withTrueParts(steps: readonly CutStep[], inHand: readonly Part[]): readonly CutStep[] {
  const rects = new Map(inHand.map(({ id, rect }) => [id, rect]));
  return steps.map((step) => ({
    ...step,
    yields: step.yields.map((part) => ({ ...part, rect: rects.get(part.id) ?? part.rect })),
  }));
}

/** A blade is only told of where it was another than the saw's is now. */
function withBlade({ blade, ...step }: CutStep, saws: Pick<CutProgram, "kerf" | "machines">): CutStep {
  return blade === undefined || blade === bladeOf(step, saws) ? step : { ...step, blade };
}

function cleanUpsOf(part: Part, { cleanUp }: RestPiece): readonly CleanUp[] {
  return everyEdge.filter((edge) => cleanUp[edge] > 0).map((edge) => ({ partId: part.id, edge, amount: cleanUp[edge] }));
}

/** Those that steps name, with their blades as they are now; of a saw that is asked for no more, as it was. */
function machinesOf({ program }: RestRequest, steps: readonly CutStep[], { machines }: RestAssessment["sawing"]) {
  const all = [...(machines ? [machines.rip, machines.crosscut, ...machines.others] : []), ...(program.machines ?? [])];
  const named = [...new Set(steps.flatMap(({ machineId }) => machineId ?? []))];
  return named.length === 0 ? undefined : named.flatMap((id) => all.find((machine) => machine.id === id) ?? []);
}
