/**
 * From pieces placed by hand on one board to the cut program, or what stands in its way.
 *
 * Whether a layout can be sawn is always decided; the budget only limits how long a better tree is sought. A board that is not flat is
 * cut into rough parts first; the fine cuts of all of them are chosen together.
 */
import { blockingPieces } from "./blocking";
import { placementRefusal } from "./check-placement";
import type { CutRequest } from "./cut-request";
import { mirrorProgram, mirrorRequest, viewFromFirstPiece } from "./mirror";
import type { CutProgramOutcome } from "./program";
import { wholeBoard } from "./region";
import { roughStage } from "./rough-stage";
import { bestTrees } from "./search/best-trees";
import { type TruingTakes, type TruingWay, truingWays } from "./truing";
import { type Workshop, workshopOf } from "./workshop";
import { writeProgram } from "./write-program";

type Refusal = Extract<CutProgramOutcome, { ok: false }>;

/** Deterministic: the same request gives the same program; a mirrored request the mirrored program. */
export function planCuts(request: CutRequest): CutProgramOutcome {
  const view = viewFromFirstPiece(request);
  const outcome = planAsSeen(mirrorRequest(request, view));
  return outcome.ok ? { ok: true, program: mirrorProgram(outcome.program, view) } : outcome;
}

/** Whether the pieces can be sawn at all, without working out how: cheap enough for every move on the screen. */
export function cutRefusal(request: CutRequest): Refusal | null {
  const shop = workshopOf(request);
  const blocked = placementRefusalOf(request, shop);
  if (blocked) return blocked;
  if (request.flatten) return null;
  const truing = truingWays(wholeBoard(request), truingTakes(request));
  return truing.ok ? null : truing;
}

function placementRefusalOf(request: CutRequest, shop: Workshop): Refusal | null {
  const board = wholeBoard(request);
  const refusal = placementRefusal(board, shop.kerf);
  if (refusal) return refusal;
  const pieces = blockingPieces(board.blanks, shop.kerf);
  return pieces && { ok: false, reason: "blocked", pieces };
}

/** A part of the board as it comes to its fine cuts, and the ways to true its edges first. */
interface PartToCut {
  readonly ways: readonly TruingWay[];
}

function planAsSeen(request: CutRequest): CutProgramOutcome {
  const shop = workshopOf(request);
  const refusal = placementRefusalOf(request, shop);
  if (refusal) return refusal;
  const rough = request.flatten ? roughStage(request, request.flatten, shop) : null;
  const parts: PartToCut[] = [];
  for (const { region, takes } of rough?.parts ?? [{ region: wholeBoard(request), takes: truingTakes(request) }]) {
    const truing = truingWays(region, takes);
    if (!truing.ok) return truing;
    parts.push(truing);
  }
  const { trees, search } = bestTrees(
    parts.map(({ ways }) => ways.map(({ board }) => board)),
    shop,
    request.budget,
  );
  const chosen = trees.map(({ way, plan }, i) => {
    const truing = parts[i]?.ways[way];
    if (!truing) throw new Error("a way to true a part that was not thought of");
    return { truing, plan };
  });
  if (!rough && chosen.every(({ truing, plan }) => !plan && truing.edges.length === 0))
    return { ok: false, reason: "nothing-to-cut" };
  const steps = search.steps + (rough?.search.steps ?? 0);
  const proven = search.proven && (rough?.search.proven ?? true);
  return { ok: true, program: writeProgram(request, shop, { rough, parts: chosen }, { steps, proven }) };
}

function truingTakes({ truingTakes: { end, longEdge } }: CutRequest): TruingTakes {
  return (edge) => (edge === "left" || edge === "right" ? end : longEdge);
}
