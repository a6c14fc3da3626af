/** Programs as issued, and what the bench made of them. */
import type { CutRequest } from "@/lib/layout/program/cut-request";
import { planCuts } from "@/lib/layout/program/plan-cuts";
import type { CutProgram, CutStep, Part } from "@/lib/layout/program/program";
import type { AsCutEntry } from "@/lib/layout/replan/as-cut";
import { type RestRequest, wholeBoardInHand } from "@/lib/layout/replan/part-in-hand";
import { planRest, type RestPlan } from "@/lib/layout/replan/plan-rest";
import type { RescueChoices } from "@/lib/layout/replan/trouble";
import { verifyRest } from "@/lib/layout/replan/verify-rest";
import type { BoardFace } from "@/lib/layout/stock/board";
import { umFromMm } from "@/lib/layout/units/um";

export interface AtTheBench {
  /** How many steps are done, from the first on; or which. */
  readonly done: number | ((step: CutStep) => boolean);
  readonly entries?: (program: CutProgram) => readonly AsCutEntry[];
  readonly change?: Partial<RestRequest>;
}

export function programOf(asked: CutRequest): CutProgram {
  const outcome = planCuts(asked);
  if (!outcome.ok) throw new Error(`not to be sawn: ${outcome.reason}`);
  return outcome.program;
}

export function plainBoard(asked: CutRequest, change: Partial<BoardFace> = {}): BoardFace {
  const { length, width } = asked.board;
  return {
    id: "board-1",
    length,
    width,
    thickness: umFromMm(26),
    outline: null,
    keepClear: [],
    spokenFor: [],
    glueLines: [],
    ...change,
  } as BoardFace;
}

/** One saw makes both kinds of cut. */
export function restRequest(asked: CutRequest, { done, entries, change }: AtTheBench): RestRequest {
  const program = programOf(asked);
  const isDone = typeof done === "number" ? (_: CutStep, i: number) => i < done : done;
  return {
    board: plainBoard(asked),
    start: [wholeBoardInHand(asked.board, asked.boardEdges, true)],
    program,
    doneBefore: new Set(),
    done: new Set(program.steps.filter(isDone).map(({ number }) => number)),
    pieces: asked.pieces.map((piece) => ({ ...piece, keepsSize: true })),
    saws: { rip: "saw", crosscut: "saw" },
    entries: entries?.(program) ?? [],
    asked: { truingTakes: asked.truingTakes },
    ...change,
  };
}

/** The rest as planned, after the last gate. */
export function planned(asked: CutRequest, at: AtTheBench, choices: RescueChoices = {}): RestPlan {
  const request = restRequest(asked, at);
  const plan = planRest(request, asked, choices);
  if (!plan.ok) throw new Error(JSON.stringify(plan));
  const verdict = verifyRest(asked.board, plan);
  if (!verdict.ok) throw new Error(JSON.stringify(verdict));
  return plan;
}

/** The step from which a part with this label first comes off. */
export function stepThatMakes(program: CutProgram, label: string): CutStep {
  const step = program.steps.find(({ yields }) => yields.some((part) => part.label === label));
  if (!step) throw new Error(`nothing is called ${label}`);
  return step;
}

export function partOf(program: CutProgram, label: string): Part {
  const part = stepThatMakes(program, label).yields.find((one) => one.label === label);
  if (!part) throw new Error(`nothing is called ${label}`);
  return part;
}

/** What the next revision is asked with before anything more is done. */
export function issuedAgain(request: RestRequest, plan: RestPlan): RestRequest {
  return {
    ...request,
    start: plan.inHand,
    program: plan.program,
    doneBefore: new Set(plan.done),
    done: new Set(),
    pieces: plan.pieces,
    entries: [],
  };
}
