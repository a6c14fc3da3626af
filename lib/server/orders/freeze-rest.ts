/**
 * From a begun order to what its next revision freezes: what is done as it was cut, the rest planned around it, and the layout following
 * the pieces that had to move. Changes nothing itself.
 */
import "server-only";
import {
  type FaceLayout,
  followWood,
  piecesOnBoard,
  problems,
  type QuarterTurns,
  um,
  unplacedPieces,
  type WoodMove,
} from "@/lib/layout";
import { faceLayoutSchema } from "@/lib/schemas/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { cleanUps } from "@/lib/schemas/order-steps";
import { type RescueChoicesByBoard, type Rest, restSchema } from "@/lib/schemas/rest";
import { boardAsCutSchema, snapshotRestSchema } from "@/lib/schemas/rest-snapshot";
import { standsInTheWay } from "@/lib/schemas/spoken-for";
import { printTag } from "@/lib/schemas/tag";
import { asCutWords } from "@/lib/words/as-cut";
import { cutRefusalSentence, problemSentence } from "@/lib/words/layout-problem";
import { styleOf } from "@/lib/words/order-step";
import { refused } from "../faults";
import { type BegunOrder, basisOf } from "./begun-order";
import { faceWorkOf } from "./face-work";
import { boardFaceOf, boardsUsed, cutRequestOf, refusedFor, snapshotBoard, unitsOf } from "./freeze";
import type { Planner, RestPlanner } from "./plan-cuts";
import { type BoardRest, planRestOfBoard } from "./rest-of-board";

export interface FrozenRest {
  readonly snapshot: OrderSnapshot;
  readonly preview: Rest;
  /** The layout differs from the one that was saved last. */
  readonly layoutMoved: boolean;
}

export interface RestPlanners {
  readonly plan: Planner;
  readonly planRest: RestPlanner;
}

export async function freezeRest(begun: BegunOrder, choices: RescueChoicesByBoard, planners: RestPlanners): Promise<FrozenRest> {
  const { given, snapshot: before } = begun;
  const planned = before.boards.map((board) => planRestOfBoard(begun, board, choices[board.boardId] ?? {}, planners.planRest));
  const rests = (await Promise.all(planned)).filter((rest) => rest !== null).filter(isStillWanted);
  const layout = follow(begun, rests);
  const layoutMoved = JSON.stringify(layout) !== JSON.stringify(given.face.layout);
  const face = {
    ...given.face,
    layout,
    work: faceWorkOf(layout),
    layoutRevision: given.face.layoutRevision + Number(layoutMoved),
  };
  refuseProblems(begun, layout, rests);
  const saws = sawsNow(begun, rests);
  const fresh = await freshBoards(begun, rests, saws, planners.plan);
  const basis = basisOf(begun, choices);
  const troubles = rests.flatMap(({ before: { boardId }, plan }) =>
    plan.assessment.troubles.map((trouble) => ({ boardId, trouble: withChosen(trouble) })),
  );
  const snapshot: OrderSnapshot = {
    format: 1,
    shop: { name: given.shop.name },
    ...unitsOf(given.shop),
    job: given.job,
    faces: [face],
    ...saws,
    boards: [...rests.map((rest) => boardOf(begun, rest, layout)), ...fresh],
    rest: snapshotRestSchema.parse({
      revision: begun.revision.revision,
      basis,
      entries: [
        ...(before.rest?.entries ?? []),
        ...begun.asCut.map((one) => ({ ...one, words: asCutWords(one.entry, before, styleOf(before)) })),
      ],
      troubles,
    }),
  };
  return { snapshot, layoutMoved, preview: previewOf(begun, basis, rests, layout) };
}

/** A board that the bench has not touched and that no piece lies on any more leaves the order. */
const isStillWanted = ({ plan, before }: BoardRest): boolean =>
  plan.pieces.length > 0 || plan.done.length > 0 || (before.asCut?.done.length ?? 0) > 0;

/** Only the rescue that was taken is kept. */
function withChosen(trouble: BoardRest["plan"]["assessment"]["troubles"][number]) {
  return { ...trouble, rescues: trouble.rescues.filter(({ kind }) => kind === trouble.chosen) };
}

/** The document with every piece where it is cut from now; those that need another board lie on none. */
function follow({ given }: BegunOrder, rests: readonly BoardRest[]): OrderSnapshot["faces"][number]["layout"] {
  const moves = rests.flatMap(({ before, plan }): WoodMove[] => {
    const leftOut = plan.assessment.leftOut.map(({ pieceId }): WoodMove => ({ pieceId, by: null }));
    const drawn = new Map(piecesOnBoard(given.face.layout, before.boardId).map(({ pieceId, rect }) => [pieceId, rect]));
    const placed = plan.pieces.flatMap(({ pieceId, rect }): WoodMove[] => {
      const was = drawn.get(pieceId);
      return was
        ? [
            {
              pieceId,
              by: { x: nearer(was.x, was.width, rect.x, rect.width), y: nearer(was.y, was.height, rect.y, rect.height) },
            },
          ]
        : [];
    });
    return [...placed, ...leftOut];
  });
  const followed = followWood(given.face.layout, moves);
  if (!followed.ok)
    throw refused("The layout cannot follow: pieces that are sawn as one would have to part. Choose another way.");
  return faceLayoutSchema.parse(followed.layout);
}

/** A piece left smaller than the layout has it stands with the edge that moved less. */
function nearer(from: number, size: number, newFrom: number, newSize: number) {
  const [low, high] = [newFrom - from, newFrom + newSize - from - size];
  return um(Math.abs(low) <= Math.abs(high) ? low : high);
}

/** Of pieces that are not cut yet, as when a layout is issued; what straight cuts can do there was decided by the plan. */
function refuseProblems({ given }: BegunOrder, layout: FaceLayout, rests: readonly BoardRest[]): void {
  const settled = new Set(rests.flatMap(({ plan }) => plan.pieces.map(({ pieceId }) => pieceId)));
  const found = problems(layout, given.boards.map(boardFaceOf)).filter((problem) => {
    if (!standsInTheWay(problem)) return false;
    if (problem.kind === "not-placed" || problem.kind === "grain") return problem.kind === "grain";
    return "piece" in problem ? !settled.has(problem.piece) : problem.pieces.some((piece) => !settled.has(piece));
  });
  if (found.length === 0) return;
  const tagOf = (stockId: string) => given.boards.find(({ board }) => board.id === stockId)?.board.tagNumber;
  const printed = (stockId: string) => printTag(tagOf(stockId) ?? 0);
  const style = styleOf(unitsOf(given.shop));
  throw refusedFor(found.map((problem) => problemSentence(problem, style, { tagOf: printed, woodOf: () => undefined })));
}

/** The saws with the blades they turned out to have. */
function sawsNow({ snapshot }: BegunOrder, rests: readonly BoardRest[]): Pick<OrderSnapshot, "ripSaw" | "crosscutSaw"> {
  const kerf = (kind: "rip" | "crosscut", planned: OrderSnapshot["ripSaw"]["kerf"]) =>
    rests.map(({ plan }) => plan.program.kerf[kind]).find((one) => one !== planned) ?? planned;
  const { ripSaw, crosscutSaw } = snapshot;
  return {
    ripSaw: { ...ripSaw, kerf: kerf("rip", ripSaw.kerf) },
    crosscutSaw: { ...crosscutSaw, kerf: kerf("crosscut", crosscutSaw.kerf) },
  };
}

/** Boards that the order did not cut from before, planned as when it is issued, with the blades as they are. */
async function freshBoards(
  { given }: BegunOrder,
  rests: readonly BoardRest[],
  saws: Pick<OrderSnapshot, "ripSaw" | "crosscutSaw">,
  plan: Planner,
): Promise<SnapshotBoard[]> {
  const known = new Set(rests.map(({ before }) => before.boardId));
  const fresh = boardsUsed(given).filter(({ board }) => !known.has(board.id));
  return Promise.all(
    fresh.map(async (one): Promise<SnapshotBoard> => {
      const request = { ...cutRequestOf(given, one), kerf: { rip: saws.ripSaw.kerf, crosscut: saws.crosscutSaw.kerf } };
      const outcome = await plan(request);
      if (!outcome.ok)
        throw refusedFor([cutRefusalSentence(outcome, styleOf(unitsOf(given.shop)), printTag(one.board.tagNumber))]);
      return snapshotBoard(given.face.layout, one, request, outcome.program);
    }),
  );
}

function boardOf(begun: BegunOrder, { before, one, plan }: BoardRest, layout: FaceLayout): SnapshotBoard {
  const edges = cutRequestOf(begun.given, one).boardEdges;
  const board = snapshotBoard(
    layout,
    one,
    { board: one.straightening, pieces: plan.pieces, boardEdges: before.edges ?? edges },
    plan.program,
  );
  const turns = new Map<string, QuarterTurns>(before.pieces.map((piece) => [piece.pieceId, piece.turns as QuarterTurns]));
  const cleanedUp = cleanUps(before)
    .filter(({ number }) => begun.ticked.has(`${before.tag}:clean-up-${number}`))
    .map(({ number, group }) => ({ number, ...group, labels: [...group.labels] }));
  return {
    ...board,
    // The steps of a blank that is glued up by now stay in its order.
    ...(before.gluing && { gluing: before.gluing }),
    pieces: board.pieces.map((piece) => ({ ...piece, turns: turns.get(piece.pieceId) ?? piece.turns })),
    asCut: boardAsCutSchema.parse({ done: plan.done, inHand: plan.inHand, cleanedUp }),
  };
}

function previewOf(begun: BegunOrder, basis: string, rests: readonly BoardRest[], layout: FaceLayout): Rest {
  return restSchema.parse({
    revision: begun.revision.revision,
    basis,
    layoutChanged: begun.layoutChanged,
    unplaced: unplacedPieces(layout).map(({ id, label }) => ({ pieceId: id, label })),
    boards: rests.map(({ before, plan }) => {
      const { assessment, program } = plan;
      const labelOf = new Map(plan.pieces.map(({ pieceId, label }) => [pieceId, label]));
      return {
        boardId: before.boardId,
        tag: before.tag,
        cut: assessment.finished.flatMap((pieceId) => labelOf.get(pieceId) ?? []),
        inHand: plan.inHand.map(({ part }) => part).filter(({ kind, pieceId }) => kind !== "waste" && pieceId === null),
        pieces: plan.pieces.map(({ pieceId, label, rect }) => ({ pieceId, label, rect })),
        done: plan.done.length,
        implied: assessment.implied.length,
        toCome: program.steps.length - plan.done.length,
        changed: plan.changed,
        troubles: assessment.troubles,
      };
    }),
  });
}
