/**
 * From a revision as it was issued, with its ticks and what the bench entered, to what the core is asked about the rest of one board. The
 * bench works its effects out with it and the server plans by it.
 */
import {
  type BoardEdges,
  type BoardFace,
  boardEdges,
  type CutStep,
  type AsCutEntry as FoundEntry,
  isSawn,
  type Part,
  piecesOnBoard,
  type RestPiece,
  type RestRequest,
  um,
  wholeBoardInHand,
} from "@/lib/layout";
import type { AsCutEntry } from "./as-cut";
import type { OrderSnapshot, SnapshotBoard } from "./order-snapshot";
import { type OrderStep, orderSteps, testCuts } from "./order-steps";

/** A revision at the bench. */
export interface BegunRevision {
  readonly snapshot: OrderSnapshot;
  readonly ticked: ReadonlySet<string>;
  readonly entries: readonly AsCutEntry[];
}

/** What is not as it was issued any more: areas drawn anew, pieces laid elsewhere since. */
export type RestChange = Partial<Pick<RestRequest, "board" | "pieces" | "asked">>;

export function restRequestOf(begun: BegunRevision, board: SnapshotBoard, change: RestChange = {}): RestRequest {
  const { snapshot, ticked, entries } = begun;
  const { asCut, program } = board;
  return {
    board: boardFaceOf(board),
    start: asCut?.inHand ?? [wholeBoardInHand(board, edgesOf(snapshot, board), !program.steps.some(isFlattening))],
    program,
    doneBefore: new Set(asCut?.done),
    done: doneSteps(begun, board, ticked),
    pieces: piecesAsIssued(snapshot, board),
    saws: sawsOf(snapshot),
    entries: inOrderOfWork(snapshot, entries).flatMap((entry) => foundOn(begun, board, entry)),
    // Boards are marked along the line that truing reaches.
    asked: { truingTakes: { longEdge: um(0), end: um(0) } },
    ...change,
  };
}

const isFlattening = ({ kind }: CutStep): boolean => kind === "flatten";

/** The pieces of one board where the revision has them, with the clean-up it leaves them. */
export function piecesAsIssued({ faces }: OrderSnapshot, { boardId, pieces, program }: SnapshotBoard): readonly RestPiece[] {
  const roles = new Map(
    faces.flatMap(({ layout }) => piecesOnBoard(layout, boardId)).map(({ pieceId, role }) => [pieceId, role]),
  );
  return pieces.map(({ pieceId, label, rect }) => {
    const part = program.pieces.find((one) => one.pieceId === pieceId);
    const takes = program.cleanUps.filter(({ partId }) => partId === part?.id);
    const at = (edge: (typeof takes)[number]["edge"]) => takes.find((one) => one.edge === edge)?.amount ?? um(0);
    const cleanUp = { left: at("left"), right: at("right"), top: at("top"), bottom: at("bottom") };
    return { pieceId, label, rect, cleanUp, keepsSize: keepsSize(roles.get(pieceId)) };
  });
}

/** Strips and dividers of a rail may be left narrower before a front is. */
export const keepsSize = (role: ReturnType<typeof piecesOnBoard>[number]["role"] | undefined): boolean =>
  role !== "strip" && role !== "fixed";

function boardFaceOf({ boardId, length, width, thickness, outline, keepClear, glueLines }: SnapshotBoard): BoardFace {
  return { id: boardId, length, width, thickness, outline, keepClear, spokenFor: [], glueLines: glueLines ?? [] };
}

/** Orders issued before edges were kept had long edges as they came; an end was rough where a front reached to it. */
function edgesOf(snapshot: OrderSnapshot, board: SnapshotBoard): BoardEdges {
  if (board.edges) return board.edges;
  const pieces = piecesAsIssued(snapshot, board);
  const flushLeft = pieces.some(({ rect, cleanUp }) => rect.x <= cleanUp.left);
  const flushRight = pieces.some(({ rect, cleanUp }) => rect.x + rect.width + cleanUp.right >= board.length);
  return { ...boardEdges(false, true), ...(flushLeft && { left: "rough" }), ...(flushRight && { right: "rough" }) };
}

/** One saw makes both kinds of cut where both are told of with one name and one blade. */
function sawsOf({ ripSaw, crosscutSaw }: OrderSnapshot): RestRequest["saws"] {
  const one = ripSaw.name === crosscutSaw.name && ripSaw.kerf === crosscutSaw.kerf;
  return one ? { rip: "saw", crosscut: "saw" } : { rip: "rip", crosscut: "crosscut" };
}

/** Cuts that are ticked, and those without which a ticked clean-up or a racked offcut could not be. */
function doneSteps({ snapshot }: BegunRevision, board: SnapshotBoard, ticked: ReadonlySet<string>): ReadonlySet<number> {
  const maker = (has: (part: Part) => boolean) => board.program.steps.find(({ yields }) => yields.some(has))?.number;
  const partIds = new Map(board.program.pieces.map(({ label, id }) => [label, id]));
  const numbersOf = (step: OrderStep): readonly (number | undefined)[] => {
    switch (step.kind) {
      case "cut":
        return [step.cut.number];
      case "clean-up":
        return step.group.labels.map((label) => maker(({ id }) => id === partIds.get(label)));
      case "rack":
        return [maker(({ id }) => id === step.offcut.id)];
      default:
        return [];
    }
  };
  const steps = orderSteps(snapshot).filter((step) => step.board.boardId === board.boardId && ticked.has(step.id));
  return new Set(steps.flatMap(numbersOf).filter((number) => number !== undefined));
}

/** An entry as it concerns one board: a kerf is that of a saw, which cuts the other boards too. */
function foundOn(begun: BegunRevision, board: SnapshotBoard, entry: AsCutEntry): readonly FoundEntry[] {
  switch (entry.kind) {
    case "kerf":
      return kerfOn(begun, board, entry);
    case "size":
      return entry.boardId === board.boardId ? [{ kind: "size", partId: entry.partId, edge: entry.edge, by: entry.by }] : [];
    case "spoiled":
      return entry.boardId === board.boardId ? [{ kind: "spoiled", pieceId: entry.pieceId, usable: entry.usable }] : [];
  }
}

function kerfOn(begun: BegunRevision, board: SnapshotBoard, entry: Extract<AsCutEntry, { kind: "kerf" }>): readonly FoundEntry[] {
  const { snapshot } = begun;
  const { kerf, stepId, reach } = entry;
  const saws = sawsOf(snapshot);
  const open = board.program.steps.filter(({ number }) => !board.asCut?.done.includes(number));
  const test = testCuts(snapshot).find(({ id }) => id === stepId);
  if (test) {
    const cut = open.find(({ kind }) => isSawn(kind) && test.cuts.includes(kind));
    return cut ? [{ kind: "kerf", step: cut.number, kerf, reach: "all" }] : [];
  }
  const at = snapshot.boards.findIndex(({ tag, program }) => program.steps.some(({ number }) => stepId === `${tag}:${number}`));
  const owner = snapshot.boards[at];
  const step = owner?.program.steps.find(({ number }) => stepId === `${owner.tag}:${number}`);
  if (!owner || !step || !isSawn(step.kind)) return [];
  if (owner.boardId === board.boardId) return [{ kind: "kerf", step: step.number, kerf, reach }];
  if (reach === "only") return [];
  const saw = sawOf(step, saws);
  // Boards are worked off in their order: those after it are cut with that blade, those before it with what is left of them.
  const later = snapshot.boards.findIndex(({ boardId }) => boardId === board.boardId) > at;
  const done = doneSteps(begun, board, begun.ticked);
  const same = open.filter((one) => sawOf(one, saws) === saw && (later || reach === "all" || !done.has(one.number)));
  return same[0] ? [{ kind: "kerf", step: same[0].number, kerf, reach: later || reach === "all" ? "all" : "on" }] : [];
}

/** Kerfs by the place of their step in the order; of two that hold for the same cuts the later one counts. */
function inOrderOfWork(snapshot: OrderSnapshot, entries: readonly AsCutEntry[]): readonly AsCutEntry[] {
  const places = new Map(orderSteps(snapshot).map(({ id, number }) => [id, number]));
  const place = (entry: AsCutEntry) => (entry.kind === "kerf" ? (places.get(entry.stepId) ?? 0) : 0);
  return [...entries].sort((a, b) => place(a) - place(b));
}

const sawOf = ({ kind, machineId }: CutStep, saws: RestRequest["saws"]): string | null =>
  isSawn(kind) ? (machineId ?? saws[kind]) : null;
