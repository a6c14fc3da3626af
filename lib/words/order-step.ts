/** Every step of a cut order in words: the same on paper, at the bench and on the maker's screen. */
import { type CutStep, type Edge, type LengthStyle, type Part, printedLength, type Um } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "@/lib/schemas/order-snapshot";
import type { CleanUpGroup, OrderStep } from "@/lib/schemas/order-steps";
import { cautionWords } from "./caution";
import { cutTitle, isShaving, truingNote } from "./cut-title";
import { edgeNames, measuredFrom } from "./edge-name";
import { faceStepWords } from "./face-step";
import { gluingWords } from "./gluing-step";
import { labelRanges, partName, sizeFigures } from "./part-name";
import type { Gives, StepWords } from "./step-words";

export type { Gives, StepWords } from "./step-words";

/** The shop's way to write lengths, as frozen with the order. */
export function styleOf({ units, inchFraction }: Pick<OrderSnapshot, "units" | "inchFraction">): LengthStyle {
  return units === "mm" ? { unit: "mm" } : { unit: "inch", denominator: inchFraction };
}

/** `before` is the step done just before, on paper the row above: it tells whether the saw stands right already. */
export function stepWords(step: OrderStep, style: LengthStyle, before?: OrderStep): StepWords {
  switch (step.kind) {
    case "fetch-member":
    case "arrange":
    case "trim-edge":
    case "joint":
    case "glue-up":
      return gluingWords(step, style);
    case "gauge-lines":
    case "resaw":
    case "bevel":
    case "set-back":
    case "fit":
      return faceStepWords(step, style);
    case "fetch":
      return { ...bare, verb: "Fetch", rest: `board ${step.board.tag}${step.board.place && ` from ${step.board.place}`}` };
    case "mark":
      return { ...bare, verb: "Mark", rest: `board ${step.board.tag}`, notes: [markNoteOf(step.board)] };
    case "test-cut":
      return testCutWords(step);
    case "cut":
      return cutWords(step, style, before);
    case "clean-up":
      return cleanUpWords(step.group, style);
    case "rack":
      return { ...bare, verb: "Label and rack", rest: "what is left", gives: [givesOf(step.offcut, style)] };
  }
}

/** Said once above the steps, and again as a step to tick. */
export const markNote = "Face up as in the picture. Chalk the triangle over the fronts before any cut.";
const backUpNote =
  "Back up as in the picture: turn the board over about its long edge, its left end stays left. Chalk the triangle over the fronts before any cut.";

export const markNoteOf = ({ side }: Pick<SnapshotBoard, "side">): string => (side === "back" ? backUpNote : markNote);

const bare = { notes: [], cautions: [], from: null, measure: null, setting: null, gives: [] } as const;

function testCutWords({ saw, cuts }: Extract<OrderStep, { kind: "test-cut" }>): StepWords {
  return {
    ...bare,
    verb: "Test cut",
    rest: `in scrap with ${saw.name}`,
    notes: [
      `For ${cuts.map((cut) => (cut === "rip" ? "the rips" : "the crosscuts")).join(" and ")}. A true kerf that differs goes to the maker before the first cut.`,
    ],
    from: "planned kerf",
    measure: "Planned kerf: measure the true one and write it on the sheet",
    setting: saw.kerf,
  };
}

function cutWords(step: Extract<OrderStep, { kind: "cut" }>, style: LengthStyle, before: OrderStep | undefined): StepWords {
  const { cut, board } = step;
  const truing = cut.kind === "true";
  if (isShaving(cut, board)) return shavingWords(cut, board, style);
  return {
    ...cutTitle(cut, board),
    notes: truing ? [truingNote(cut, style)] : cutNotes(cut, before),
    cautions: cut.cautions.map((caution) => cautionWords[caution]),
    from: truing ? edgeNames[cut.fromEdge] : measuredFrom(cut.fromEdge, cut.fromEdgeState),
    measure: truing ? null : measure(cut),
    setting: truing ? null : cut.setting,
    gives: truing ? [] : cut.yields.map((part) => givesOf(part, style)),
  };
}

/** A sliver for the plane: what it takes off, and none of the saw's cautions. */
function shavingWords(cut: CutStep, board: SnapshotBoard, style: LengthStyle): StepWords {
  const from = measuredFrom(cut.fromEdge, cut.fromEdgeState);
  return {
    ...cutTitle(cut, board),
    notes: ["Thinner than the saw takes surely: use the plane."],
    cautions: cut.cautions.filter((caution) => caution === "too-short-for-planer").map((caution) => cautionWords[caution]),
    from,
    measure: `Take so much off the ${from}`,
    setting: cut.setting,
    gives: cut.yields.map((part) => givesOf(part, style)),
  };
}

function cutNotes(cut: CutStep, before: OrderStep | undefined): string[] {
  const notes: string[] = [];
  if (cut.turn === "end-for-end") notes.push(cut.kind === "rip" ? "turn the other edge to the fence" : "turn end for end");
  if (before?.kind === "cut" && before.cut.kind === cut.kind && before.cut.settingNumber === cut.settingNumber)
    notes.push("same setting");
  return notes;
}

function measure(cut: CutStep): string {
  const edge = measuredFrom(cut.fromEdge, cut.fromEdgeState);
  if (cut.bladeSide === "far") return `Mark from the ${edge}, blade on the waste side of the mark`;
  return cut.kind === "rip" ? `Fence to blade, ${edge} against the fence` : `Stop to blade, ${edge} against the stop`;
}

function cleanUpWords(group: CleanUpGroup, style: LengthStyle): StepWords {
  const labels = labelRanges(group.labels);
  const size = sizeFigures({ width: group.length, height: group.width }, style);
  return {
    ...bare,
    verb: "Clean up",
    rest: `${group.labels.length === 1 ? "front" : "fronts"} ${labels}`,
    notes: [takesNote(group.takes, style)],
    gives: [{ word: "finished", label: null, size }],
  };
}

function takesNote(takes: CleanUpGroup["takes"], style: LengthStyle): string {
  const figure = (amount: Um) => printedLength(amount, style).figure;
  const pair = (a: Edge, b: Edge, both: string): string[] => {
    const [first, second] = [takes[a], takes[b]];
    if (first !== undefined && first === second) return [`${figure(first)} off ${both}`];
    return [a, b].flatMap((edge) => {
      const amount = takes[edge];
      return amount === undefined ? [] : [`${figure(amount)} off the ${edgeNames[edge]}`];
    });
  };
  return [...pair("left", "right", "each end"), ...pair("top", "bottom", "each long edge")].join(", ");
}

function givesOf(part: Part, style: LengthStyle): Gives {
  if (part.kind === "waste") return { word: "waste", label: null, size: null };
  const size = sizeFigures(part.rect, style);
  if (part.kind === "board") return { word: "board", label: null, size };
  return { word: part.kind === "offcut" ? "offcut" : "", label: part.label ?? partName(part), size };
}
