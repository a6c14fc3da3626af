/**
 * What the entries of the bench mean for the pieces still to be cut: what lies on the bench, what is cut, what no longer fits as issued,
 * and what can be done about it. Plans no cuts, so it is quick enough to answer while an entry is being typed.
 */
import type { PieceId } from "../piece";
import type { CutStep, Part } from "../program/program";
import { um } from "../units/um";
import { carryOut, type RestFault } from "./carry-out";
import { type InPart, missingInPart } from "./fit-in-part";
import { type FreeLabels, freeLabels } from "./free-labels";
import { finishedPiece, type Holding, holdPieces } from "./hold-pieces";
import { issuedWay, stepsOf } from "./issued-way";
import { openSteps, type RestPiece, type RestRequest } from "./part-in-hand";
import { everyEdge } from "./rect-edge";
import { type Rescued, rescuesOfPart, rescuesOfPiece } from "./rescue";
import { spoilWood } from "./spoil";
import { type Sawing, stands } from "./stands";
import type { RescueChoices, Trouble } from "./trouble";
import { nameOf, troubleFacts } from "./trouble-facts";
import { kerfsAsCut } from "./true-kerf";

export interface RestAssessment {
  readonly ok: true;
  /** Every part in hand, with the pieces that are cut or are to be cut from it once the chosen rescues are taken. */
  readonly holdings: readonly Holding[];
  /** Steps done since the revision was issued, as they were cut. */
  readonly doneSteps: readonly CutStep[];
  /** Numbers of those that nobody ticked, though a later one is. */
  readonly implied: readonly number[];
  /** What cutting on takes, with the blades as they turned out to be. */
  readonly sawing: Sawing;
  /** Pieces sawn to size already: they stay where they are. */
  readonly finished: readonly PieceId[];
  readonly troubles: readonly Trouble[];
  /** Pieces that another board is needed for. */
  readonly leftOut: readonly RestPiece[];
}

export type RestOutcome = RestAssessment | RestFault;

export function assessRest(request: RestRequest, choices: RescueChoices = {}): RestOutcome {
  const carried = carryOut(request);
  if (!carried.ok) return carried;
  const { kerf, machines } = kerfsAsCut(request);
  const sawing: Sawing = { board: request.board, asked: request.asked, kerf, machines };
  const spoiled = new Set(request.entries.flatMap((entry) => (entry.kind === "spoiled" ? [entry.pieceId] : [])));
  const known = [...request.start.map(({ part }) => part), ...request.program.steps.flatMap(({ yields }) => yields)];
  const labels = freeLabels(known);
  const bench = spoilWood(carried.bench, request.pieces, request.entries, labels.offcut);
  const { parts, without } = holdPieces(bench, request.pieces, spoiled);
  const done = new Set(carried.steps.map(({ number }) => number));
  const open = openSteps(request).filter(({ number }) => !done.has(number));

  let holdings = parts;
  const troubles: Trouble[] = [];
  const leftOut: RestPiece[] = [];
  const take = (trouble: Omit<Trouble, "rescues" | "chosen">, rescues: readonly Rescued[]): void => {
    const chosen = rescues.find(({ rescue }) => rescue.kind === choices[trouble.key]) ?? rescues[0];
    if (!chosen) throw new Error("a trouble without any rescue");
    troubles.push({ ...trouble, rescues: rescues.map(({ rescue }) => rescue), chosen: chosen.rescue.kind });
    holdings = chosen.holdings;
    leftOut.push(...chosen.leftOut);
  };
  for (const [at, { held, pieces }] of parts.entries()) {
    if (pieces.length === 0 || finishedPiece({ held, pieces }) || stands(held, pieces, sawing)) continue;
    const part: InPart = { held, pieces, sawing, issued: issuedWay(held.part.id, pieces, stepsOf(held.part.id, open)) };
    const facts = troubleFacts(part);
    const named = pieces.filter(({ pieceId }) => facts.some((fact) => namesOf(fact).includes(pieceId)));
    const missing = missingInPart(part);
    // What an earlier rescue brought into the part is among its pieces by now.
    const now = holdings[at]?.pieces ?? pieces;
    take(
      { key: `part ${held.part.id}`, part: held.part, facts, missing },
      rescuesOfPart(at, { ...part, pieces: now }, named, holdings),
    );
  }
  for (const piece of without) {
    const kind = spoiled.has(piece.pieceId) ? "spoiled" : "no-wood";
    const trouble = {
      key: `piece ${piece.pieceId}`,
      part: null,
      facts: [{ kind, piece: nameOf(piece) }],
      missing: none,
    } as const;
    take(trouble, rescuesOfPiece(piece, holdings, sawing));
  }
  return {
    ok: true,
    holdings: holdings.map((holding) => ({ ...holding, held: { ...holding.held, part: partNow(holding, labels) } })),
    doneSteps: carried.steps,
    implied: carried.implied,
    sawing,
    finished: parts.flatMap((holding) => finishedPiece(holding)?.pieceId ?? []),
    troubles,
    leftOut,
  };
}

/** A part is called by what becomes of it: by its one piece once nothing more is cut off it, as an offcut once its piece is cut from other wood. */
function partNow(holding: Holding, labels: FreeLabels): Part {
  const { part } = holding.held;
  const piece = finishedPiece(holding);
  if (piece && part.pieceId === null) {
    const asSawn = everyEdge.every((edge) => piece.cleanUp[edge] === 0);
    return { ...part, kind: asSawn ? "piece" : "blank", label: piece.label, pieceId: piece.pieceId };
  }
  const forsaken = part.pieceId !== null && holding.pieces.length === 0;
  return forsaken ? { ...part, kind: "offcut", label: labels.offcut(), pieceId: null } : part;
}

const none = { along: um(0), across: um(0) };

function namesOf(fact: Trouble["facts"][number]): readonly PieceId[] {
  return "pieces" in fact ? fact.pieces.map(({ pieceId }) => pieceId) : [fact.piece.pieceId];
}
