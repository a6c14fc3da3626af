/** What one cut does, in one line: "Crosscut front 2 from strip A". */
import { type CutStep, type Edge, type LengthStyle, type Part, printedLength } from "@/lib/layout";
import type { SnapshotBoard } from "@/lib/schemas/order-snapshot";
import { edgeNames, oppositeEdge } from "./edge-name";
import { partName } from "./part-name";

export interface Title {
  /** Set in bold: which machine. */
  readonly verb: string;
  readonly rest: string;
}

/** Thinner than a saw takes surely, half a millimetre: common practice, no source. */
const THINNEST_SAWN_UM = 500;

/** Whether a cut takes a sliver so thin that it is a matter for the plane. */
export function isShaving(cut: CutStep, board: SnapshotBoard): boolean {
  if (cut.kind === "plane") return true;
  if (cut.kind === "true" || !cut.trim || cut.bladeSide !== "far" || cut.setting > THINNEST_SAWN_UM) return false;
  return !isBoardsOwn(trimmedEdge(cut), cut, board);
}

export function cutTitle(cut: CutStep, board: SnapshotBoard): Title {
  if (cut.kind === "true")
    return { verb: isEnd(cut.fromEdge) ? "Square" : "Joint", rest: `the ${edgeNames[cut.fromEdge]} of the board` };
  if (isShaving(cut, board)) return { verb: isEnd(cut.fromEdge) ? "Shoot" : "Plane", rest: trimmed(cut, board) };
  const verb = cut.kind === "rip" ? "Rip" : "Crosscut";
  return { verb, rest: whatComesOff(cut, board) };
}

/** How much truing takes, or that it takes no more than it needs. */
export function truingNote(cut: CutStep, style: LengthStyle): string {
  const { figure } = printedLength(cut.setting, style);
  return cut.setting > 0 ? `take ${figure} off` : "straight, taking no more than it needs";
}

function whatComesOff(cut: CutStep, board: SnapshotBoard): string {
  const kept = cut.yields.filter(({ kind }) => kind !== "waste" && kind !== "offcut");
  const fresh = kept.filter((part) => partName(part) !== partName(cut.part));
  const [one, two] = fresh;
  if (one && two) return `${partName(cut.part)} into ${partName(one)} and ${partName(two)}`;
  if (one)
    return cut.part.kind === "board" && kept.length === 1 ? whatStays(one, cut) : `${partName(one)} from ${partName(cut.part)}`;
  const offcut = cut.yields.find(({ kind }) => kind === "offcut");
  if (offcut) return `${partName(offcut)} off ${partName(cut.part)}`;
  return trimmed(cut, board);
}

/** Only waste comes off: said by the edge that falls away and what is kept. */
const whatStays = (part: Part, cut: CutStep) => `the ${edgeNames[trimmedEdge(cut)]} off, ${partName(part)} stays`;

function trimmed(cut: CutStep, board: SnapshotBoard): string {
  const edge = trimmedEdge(cut);
  const name = partName(cut.part);
  if (!isBoardsOwn(edge, cut, board)) return `the sliver off the fresh ${edgeNames[edge]} of ${name}`;
  return isEnd(edge) ? `the ${edgeNames[edge]} of ${name} square` : `the ${edgeNames[edge]} off ${name}`;
}

/** Where the wood comes off: beyond the blade, or before it when the setting is measured over the waste. */
function trimmedEdge(cut: CutStep): Edge {
  return cut.bladeSide === "far" ? cut.fromEdge : oppositeEdge[cut.fromEdge];
}

/** Not made by an earlier cut of this board: it lies where the first cut of the saw found it. */
function isBoardsOwn(edge: Edge, cut: CutStep, { program }: SnapshotBoard): boolean {
  const root = program.steps.find(({ kind }) => kind !== "true")?.part ?? cut.part;
  return coordinateOf(edge, root) === coordinateOf(edge, cut.part);
}

function coordinateOf(edge: Edge, { rect }: Part): number {
  if (edge === "left") return rect.x;
  if (edge === "right") return rect.x + rect.width;
  return edge === "top" ? rect.y : rect.y + rect.height;
}

const isEnd = (edge: Edge) => edge === "left" || edge === "right";
