/**
 * Brings the program of one part in hand, planned as a board of its own, back to where the part lies in the board, and gives its steps
 * and parts names of their own: a part in hand keeps its name while pieces come off it, new strips and offcuts take names that nothing
 * on any paper of the order bears.
 */
import type { StockRect } from "../frame/point";
import { type CutProgram, type CutStep, type EdgeState, isSawn, type Part } from "../program/program";
import type { FreeLabels } from "./free-labels";
import type { PartInHand } from "./part-in-hand";
import { edgeAt, movedBy } from "./rect-edge";

export interface NamedSteps {
  readonly steps: readonly CutStep[];
  /** The final parts of the part in hand, at their places, before clean-up. */
  readonly parts: readonly Part[];
}

/** `firstNumber`: of its first step; the others follow. `maker`: the cut that made the part. */
export function namedSteps(
  held: PartInHand,
  program: CutProgram,
  firstNumber: number,
  labels: FreeLabels,
  maker: CutStep | undefined,
): NamedSteps {
  const { x, y } = held.part.rect;
  const there = (rect: StockRect) => movedBy(rect, { x, y });
  const names = new Map<string, Part>([["board", held.part]]);
  const steps = program.steps.map((step, i): CutStep => {
    const number = firstNumber + i;
    const parent = names.get(step.part.id) ?? held.part;
    const part = { ...parent, rect: there(step.part.rect) };
    const yields = step.yields.map((made, j): Part => {
      const name = held.part.kind === "board" ? made : nameFor(made, step.yields, parent, labels);
      const named = { ...name, id: `${number}.${j + 1}`, rect: there(made.rect) };
      names.set(made.id, named);
      return named;
    });
    const turn = i === 0 && maker ? turnAfter(maker, step) : step.turn;
    return { ...step, number, part, fromEdgeState: stateOf(step, part, held), kerf: there(step.kerf), yields, turn };
  });
  const cutAgain = new Set(steps.map(({ part }) => part.id));
  return { steps, parts: steps.flatMap(({ yields }) => yields).filter(({ id }) => !cutAgain.has(id)) };
}

function nameFor(made: Part, siblings: readonly Part[], parent: Part, labels: FreeLabels): Part {
  if (made.kind === "offcut") return { ...made, label: labels.offcut() };
  if (made.kind !== "board" && made.kind !== "strip") return made;
  const others = siblings.filter((one) => one !== made && (one.kind === "board" || one.kind === "strip"));
  if (others.length === 0) return { ...made, kind: parent.kind, label: parent.label, pieceId: parent.pieceId };
  return { ...made, kind: "strip", label: labels.strip() };
}

/** The part's own edge may have been sawn before: it is called fresh, not the board's own. */
function stateOf({ fromEdge, fromEdgeState }: CutStep, part: Part, held: PartInHand): EdgeState {
  const own = edgeAt(part.rect, fromEdge) === edgeAt(held.part.rect, fromEdge);
  return own && fromEdgeState === "trued" && held.edges[fromEdge] === "sawn" ? "sawn" : fromEdgeState;
}

function turnAfter(made: CutStep, next: CutStep): CutStep["turn"] {
  if (!isSawn(made.kind) || !isSawn(next.kind)) return "none";
  if (made.kind !== next.kind) return "quarter";
  return made.fromEdge === next.fromEdge ? "none" : "end-for-end";
}
