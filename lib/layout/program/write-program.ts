/** Writes chosen trees down as the program the bench follows: rough cuts, flattening, truing, then fine cuts with names and cautions. */
import { openBench } from "./bench";
import { conservationOf } from "./conservation";
import type { CutPlan } from "./cut-plan";
import type { CutRequest } from "./cut-request";
import { type CleanUp, type CutProgram, type CutStep, isSawn, type Part, type SearchReport } from "./program";
import { everyEdge } from "./region";
import type { RoughStage } from "./rough-stage";
import type { TruingWay } from "./truing";
import type { Workshop } from "./workshop";

export interface ChosenTrees {
  /** null: the board is flat. */
  readonly rough: RoughStage | null;
  /** One for each rough part, or for the board. */
  readonly parts: readonly { readonly truing: TruingWay; readonly plan: CutPlan | null }[];
}

export function writeProgram(
  request: CutRequest,
  shop: Workshop,
  { rough, parts }: ChosenTrees,
  search: SearchReport,
): CutProgram {
  const bench = openBench(request, shop);
  if (rough?.plan) bench.cut([rough.plan], "rough");
  for (const { region } of rough?.parts ?? []) bench.flatten(region);
  for (const { truing, plan } of parts) {
    let region = truing.from;
    truing.edges.forEach((edge, i) => {
      const done = plan === null && i === truing.edges.length - 1;
      region = bench.trueEdge(region, edge, truing.takes(edge), done);
    });
  }
  bench.cut(
    parts.flatMap(({ plan }) => plan ?? []),
    "fine",
  );
  return summedUp(request, shop, bench.steps, search);
}

function summedUp(request: CutRequest, shop: Workshop, steps: readonly CutStep[], search: SearchReport): CutProgram {
  const parts = finalParts(steps);
  const blanks = parts.filter((part) => part.pieceId !== null);
  const program = {
    steps,
    kerf: request.kerf,
    ...(shop.named && { machines: machinesOf(steps, shop) }),
    cleanUps: blanks.flatMap((part) => cleanUpsOf(part, request)),
    pieces: blanks.map((part) => finished(part, request)),
    offcuts: parts.filter((part) => part.kind === "offcut"),
    waste: parts.filter((part) => part.kind === "waste"),
    settings: new Set(steps.filter((step) => isSawn(step.kind)).map((step) => step.settingNumber)).size,
    search,
  };
  return { ...program, conservation: conservationOf(request.board, program) };
}

/** In order of first use. */
function machinesOf(steps: readonly CutStep[], { tools }: Workshop) {
  const ids = [...new Set(steps.flatMap(({ machineId }) => machineId ?? []))];
  const all = [...tools.x, ...tools.y].map(({ machine }) => machine);
  return ids.flatMap((id) => all.find((machine) => machine.id === id) ?? []);
}

/** Parts that no step takes in hand again, in the order in which they come off. */
function finalParts(steps: readonly CutStep[]): readonly Part[] {
  const cutAgain = new Set(steps.map((step) => step.part.id));
  return steps.flatMap((step) => step.yields).filter((part) => !cutAgain.has(part.id));
}

function pieceOf(part: Part, request: CutRequest) {
  const piece = request.pieces.find(({ pieceId }) => pieceId === part.pieceId);
  if (!piece) throw new Error(`no piece ${part.pieceId} was asked for`);
  return piece;
}

function cleanUpsOf(part: Part, request: CutRequest): readonly CleanUp[] {
  const { cleanUp } = pieceOf(part, request);
  return everyEdge.filter((edge) => cleanUp[edge] > 0).map((edge) => ({ partId: part.id, edge, amount: cleanUp[edge] }));
}

function finished(part: Part, request: CutRequest): Part {
  return { ...part, kind: "piece", rect: pieceOf(part, request).rect };
}
