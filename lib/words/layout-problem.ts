/** What is wrong with a layout, in plain words: what, by how much, and what would mend it. */
import { type CutProgramOutcome, type LengthStyle, type PieceId, type Problem, printLength, type Um, um } from "@/lib/layout";
import type { WoodOf } from "@/lib/schemas/spoken-for";
import { labelRanges } from "./part-name";

type CutRefusal = Extract<CutProgramOutcome, { ok: false }>;

/** Boards by id, for the problems that name one. */
export type TagOf = (stockId: string) => string;

/** What problems only have the id of. */
export interface Named {
  readonly tagOf: TagOf;
  readonly woodOf: WoodOf;
}

export function problemSentence(problem: Problem, style: LengthStyle, { tagOf, woodOf }: Named): string {
  const print = (length: Um) => printLength(length, style);
  switch (problem.kind) {
    case "not-placed":
      return `${fronts(problem.pieces)} ${isOrAre(problem.pieces)} not laid on a board yet.`;
    case "unknown-stock":
      return `${fronts(problem.pieces)} ${liesOrLie(problem.pieces)} on a board that is not on the table.`;
    case "outside":
      return outsideSentence(problem.piece, print(problem.by));
    case "keep-clear":
      return `${fronts([problem.piece])} reaches ${print(problem.by)} into the ${problem.area} at ${print(problem.atX)}. ${slideSentence(problem.slide, print)}`;
    case "too-close":
      return tooCloseSentence(problem.pieces, print(problem.missing));
    case "spoken-for":
      return `${spokenForSentence(problem, woodOf, print)} ${slideSentence(problem.slide, print)}`;
    case "blocked":
      return blockedSentence(problem.pieces, tagOf(problem.stockId));
    case "too-thin":
      return `${fronts(problem.pieces)} ${needsOrNeed(problem.pieces)} stock ${print(problem.missing)} thicker than board ${tagOf(problem.stockId)}.`;
    case "glue-line":
      return `${fronts([problem.piece])} has a glue line ${print(problem.fromEdge)} from its long edge, where so narrow a strip may part. Slide it across the board, or leave it.`;
    case "grain":
      return `${fronts(problem.pieces)} ${liesOrLie(problem.pieces)} across the grain that the face asks for. Turn the grain, and they lie along it.`;
  }
}

/** Why no cut program could be made for a board. */
export function cutRefusalSentence(refusal: CutRefusal, style: LengthStyle, tag: string): string {
  switch (refusal.reason) {
    case "blocked":
      return blockedSentence(refusal.pieces, tag);
    case "too-close":
      return tooCloseSentence(refusal.pieces, printLength(refusal.missing, style));
    case "outside":
      return outsideSentence(refusal.piece, printLength(refusal.by, style));
    case "nothing-to-cut":
      return `Nothing is to be cut from board ${tag}: its one front is the whole board.`;
  }
}

/** "Front 3", "Fronts 1–4". */
function fronts(pieces: readonly PieceId[]): string {
  const labels = pieces.map((id) => id.replace(/^p/, ""));
  return `${labels.length === 1 ? "Front" : "Fronts"} ${labelRanges(labels)}`;
}

const isOrAre = (pieces: readonly PieceId[]) => (pieces.length === 1 ? "is" : "are");
const needsOrNeed = (pieces: readonly PieceId[]) => (pieces.length === 1 ? "needs" : "need");
const liesOrLie = (pieces: readonly PieceId[]) => (pieces.length === 1 ? "lies" : "lie");

const outsideSentence = (piece: PieceId, by: string) =>
  `${fronts([piece])} reaches ${by} over the usable outline of the board. Slide it back inside.`;

const tooCloseSentence = (pieces: readonly [PieceId, PieceId], missing: string) =>
  `${fronts(pieces)} lie ${missing} too close for the saw. Move them apart by that much.`;

function spokenForSentence(
  { piece, spokenForId, over, missing }: Extract<Problem, { kind: "spoken-for" }>,
  woodOf: WoodOf,
  print: (length: Um) => string,
): string {
  const wood = woodOf(spokenForId);
  const whose = wood ? `front ${wood.label} of ${wood.faceTitle}, ${wood.jobTitle}` : "the wood of another face";
  const given = wood?.issued ? ", which is issued for cutting" : "";
  if (over > 0) return `${fronts([piece])} lies ${print(over)} over ${whose}${given}.`;
  return `${fronts([piece])} lies ${print(missing)} too close for the saw to ${whose}${given}.`;
}

const blockedSentence = (pieces: readonly PieceId[], tag: string) =>
  `${fronts(pieces)} block one another: no straight cut from edge to edge of board ${tag} parts them. Line them up or move one to another board.`;

function slideSentence(slide: Um | null, print: (length: Um) => string): string {
  if (slide === null) return "No slide along the board clears it: let the front loose or take another board.";
  return `Slide the set ${print(um(Math.abs(slide)))} ${slide < 0 ? "left" : "right"}.`;
}
