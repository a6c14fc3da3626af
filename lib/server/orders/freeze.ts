/**
 * From a saved layout to what an order freezes: pieces and cut programs worked out anew from the document, never taken from the
 * browser. Refuses, in words, whatever cannot be cut as it lies.
 */
import "server-only";
import type { listLayoutBoards } from "@/db/queries/layout";
import type { readShop } from "@/db/queries/shop";
import {
  type BoardEdges,
  type BoardFace,
  boardEdges,
  type CutProgram,
  type CutRequest,
  cutRequestFor,
  defaultCutBudget,
  type FaceLayout,
  groupOf,
  type PieceId,
  type PlacedPiece,
  piecesOnBoard,
  problems,
  type QuarterTurns,
  type ShopLimits,
  type Um,
  um,
} from "@/lib/layout";
import { cutProgramSchema } from "@/lib/schemas/cut-program";
import type { Gluing } from "@/lib/schemas/gluing";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { standsInTheWay } from "@/lib/schemas/spoken-for";
import { printTag } from "@/lib/schemas/tag";
import type { KeepClearArea } from "@/lib/schemas/zones";
import { cutRefusalSentence, problemSentence } from "@/lib/words/layout-problem";
import { styleOf } from "@/lib/words/order-step";
import { refused } from "../faults";
import { faceWorkOf } from "./face-work";
import type { Planner } from "./plan-cuts";

export interface ToFreeze {
  readonly shop: ShopLimits & Pick<NonNullable<Awaited<ReturnType<typeof readShop>>>, "name" | "units" | "inchFraction">;
  readonly job: OrderSnapshot["job"];
  readonly face: OrderSnapshot["faces"][number];
  readonly crosscutSaw: OrderSnapshot["crosscutSaw"];
  readonly ripSaw: OrderSnapshot["ripSaw"];
  readonly boards: readonly LayoutBoard[];
}

type BoardRow = Awaited<ReturnType<typeof listLayoutBoards>>[number];

export interface LayoutBoard {
  readonly board: Pick<BoardRow["board"], "id" | "tagNumber" | "species" | "cut" | "place" | "thickness">;
  readonly straightening: Pick<BoardRow["straightening"], "id" | "side" | "length" | "width" | "outline" | "zonesRevision">;
  readonly keepClear: readonly KeepClearArea[];
  /** From the upper edge down. */
  readonly glueLines: readonly Um[];
  /** Of a planned blank that is not glued up yet; null for every other board. */
  readonly gluing: Gluing | null;
}

/** The snapshot, or a refusal that names everything in the way. */
export async function freeze(given: ToFreeze, plan: Planner): Promise<OrderSnapshot> {
  refuseProblems(given);
  const { shop } = given;
  const face = { ...given.face, work: faceWorkOf(given.face.layout) };
  const heading = {
    format: 1,
    shop: { name: shop.name },
    ...unitsOf(shop),
    job: given.job,
    faces: [face],
    crosscutSaw: given.crosscutSaw,
    ripSaw: given.ripSaw,
  } as const;
  const style = styleOf(heading);
  const planned = boardsUsed(given).map(async (one): Promise<SnapshotBoard | string> => {
    const request = cutRequestOf(given, one);
    const outcome = await plan(request);
    if (!outcome.ok) return cutRefusalSentence(outcome, style, printTag(one.board.tagNumber));
    return snapshotBoard(face.layout, one, request, outcome.program);
  });
  const boards = await Promise.all(planned);
  const refusals = boards.filter((board) => typeof board === "string");
  if (refusals.length > 0) throw refusedFor(refusals);
  return { ...heading, faces: [face], boards: boards.filter((board) => typeof board !== "string") };
}

/** Those on the table that a piece lies on. */
export function boardsUsed({ face, boards }: ToFreeze): readonly LayoutBoard[] {
  return boards.filter(({ board }) => piecesOnBoard(face.layout, board.id).length > 0);
}

/** Throws a refusal in words for what can be seen without planning the cuts. */
function refuseProblems({ shop, face, boards }: ToFreeze): void {
  const tagOf = (stockId: string) => {
    const found = boards.find(({ board }) => board.id === stockId);
    return found ? printTag(found.board.tagNumber) : stockId;
  };
  // No board face has wood spoken for.
  const woodOf = () => undefined;
  const found = problems(face.layout, boards.map(boardFaceOf)).filter(standsInTheWay);
  if (found.length === 0) return;
  throw refusedFor(found.map((problem) => problemSentence(problem, styleOf(unitsOf(shop)), { tagOf, woodOf })));
}

export function unitsOf({ units, inchFraction }: ToFreeze["shop"]): Pick<OrderSnapshot, "units" | "inchFraction"> {
  return { units, inchFraction: inchFraction === 32 ? 32 : 64 };
}

/** The first few in full; a long list is worked off at the layout table, where each problem can be seen. */
export function refusedFor(sentences: readonly string[]) {
  const shown = sentences.slice(0, 3);
  const more = sentences.length - shown.length;
  return refused(`This layout cannot be cut yet. ${shown.join(" ")}${more > 0 ? ` And ${more} more.` : ""}`);
}

/**
 * The board as its picture of that version shows it: size, outline and keep-clear areas are in the picture's frame. The order has it to
 * itself (`refuse-taken.ts`): what others have only planned for does not stand in its way.
 */
export function boardFaceOf({ board, straightening, keepClear, glueLines }: LayoutBoard): BoardFace {
  const { length, width, outline } = straightening;
  return { id: board.id, length, width, thickness: board.thickness, outline, keepClear, spokenFor: [], glueLines };
}

export function cutRequestOf({ shop, face }: ToFreeze, one: LayoutBoard): CutRequest {
  const board = boardFaceOf(one);
  return cutRequestFor(face.layout, board, {
    boardEdges: edgesAsTheyCame(piecesOnBoard(face.layout, board.id), board),
    // Boards are marked along the line that truing reaches.
    truingTakes: { longEdge: um(0), end: um(0) },
    limits: shop,
    budget: defaultCutBudget,
  });
}

/**
 * No shop is asked about every board yet, so its long edges count as rough: one is jointed before the first rip. An end needs no
 * truing to be marked from; only where a front reaches to it must it become that front's edge.
 */
function edgesAsTheyCame(pieces: readonly PlacedPiece[], board: BoardFace): BoardEdges {
  const flushLeft = pieces.some(({ rect, cleanUp }) => rect.x <= cleanUp.left);
  const flushRight = pieces.some(({ rect, cleanUp }) => rect.x + rect.width + cleanUp.right >= board.length);
  return { ...boardEdges(false, true), ...(flushLeft && { left: "rough" }), ...(flushRight && { right: "rough" }) };
}

export function snapshotBoard(
  layout: FaceLayout,
  one: LayoutBoard,
  request: Pick<CutRequest, "board" | "pieces" | "boardEdges">,
  program: CutProgram,
): SnapshotBoard {
  const { board, straightening, keepClear, glueLines, gluing } = one;
  const { length, width } = request.board;
  return {
    boardId: board.id,
    tag: printTag(board.tagNumber),
    species: board.species,
    cut: board.cut,
    place: board.place,
    thickness: board.thickness,
    length,
    width,
    straighteningId: straightening.id,
    ...(straightening.side === "back" && { side: "back" }),
    ...(glueLines.length > 0 && { glueLines: [...glueLines] }),
    ...(gluing && { gluing }),
    outline: straightening.outline,
    keepClear: [...keepClear],
    pieces: request.pieces.map(({ pieceId, label, rect }) => ({ pieceId, label, rect, turns: turnsOf(layout, pieceId) })),
    program: cutProgramSchema.parse(program),
    edges: request.boardEdges,
  };
}

const turnsOf = (layout: FaceLayout, pieceId: PieceId): QuarterTurns => groupOf(layout, pieceId)?.placement?.turns ?? 0;
