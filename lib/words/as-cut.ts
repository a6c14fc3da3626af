/** What the bench entered, in words: "Kerf 3.6 mm instead of 3.2 mm, from step 7 on". */
import { type EntryFault, type LengthStyle, type Part, printLength, type RestFault, type Um, um } from "@/lib/layout";
import type { AsCutEntry } from "@/lib/schemas/as-cut";
import type { OrderSnapshot } from "@/lib/schemas/order-snapshot";
import { orderSteps } from "@/lib/schemas/order-steps";
import { capital } from "./capital";
import { edgeNames } from "./edge-name";
import { partName } from "./part-name";

/** One sentence without its full stop. */
export function asCutWords(entry: AsCutEntry, snapshot: OrderSnapshot, style: LengthStyle): string {
  const print = (length: Um) => printLength(length, style);
  switch (entry.kind) {
    case "kerf": {
      const step = orderSteps(snapshot).find(({ id }) => id === entry.stepId);
      const number = step?.kind === "cut" ? step.number : null;
      const planned = plannedKerf(entry, snapshot);
      const instead = planned === null || planned === entry.kerf ? "" : ` instead of ${print(planned)}`;
      return `Kerf ${print(entry.kerf)}${instead}${reachWords(entry.reach, number)}`;
    }
    case "size": {
      const part = partNamed(snapshot, entry.boardId, entry.partId);
      if (!part) return `A part ${print(entry.by)} off at its ${edgeNames[entry.edge]}`;
      const isEnd = entry.edge === "left" || entry.edge === "right";
      const planned = isEnd ? part.rect.width : part.rect.height;
      const size = `${print(um(planned + entry.by))} ${isEnd ? "long" : "wide"} instead of ${print(planned)}`;
      return `${capital(partName(part))} ${size}, at its ${edgeNames[entry.edge]}`;
    }
    case "spoiled": {
      const label = labelOf(snapshot, entry.boardId, entry.pieceId);
      const { usable } = entry;
      const good = usable ? `; ${print(usable.length)} from its ${edgeNames[usable.from]} can be used` : "";
      return `Front ${label} is spoiled${good}`;
    }
  }
}

function reachWords(reach: Extract<AsCutEntry, { kind: "kerf" }>["reach"], step: number | null): string {
  if (step === null || reach === "all") return ", at every cut";
  return reach === "on" ? `, from step ${step} on` : `, at step ${step} only`;
}

/** The kerf that the saw of this step was thought to have. */
export function plannedKerf({ stepId }: { readonly stepId: string }, snapshot: OrderSnapshot): Um | null {
  const step = orderSteps(snapshot).find(({ id }) => id === stepId);
  if (step?.kind === "test-cut") return step.saw.kerf;
  if (step?.kind !== "cut") return null;
  const { cut, board } = step;
  const machine = board.program.machines?.find(({ id }) => id === cut.machineId);
  return machine?.kerf ?? (cut.kind === "rip" ? board.program.kerf.rip : board.program.kerf.crosscut);
}

function partNamed({ boards }: OrderSnapshot, boardId: string, partId: string): Part | undefined {
  const board = boards.find((one) => one.boardId === boardId);
  const parts = [
    ...(board?.program.steps.flatMap(({ yields }) => yields) ?? []),
    ...(board?.asCut?.inHand.map(({ part }) => part) ?? []),
  ];
  return parts.find(({ id }) => id === partId);
}

function labelOf({ boards }: OrderSnapshot, boardId: string, pieceId: string): string {
  const board = boards.find((one) => one.boardId === boardId);
  return board?.pieces.find((piece) => piece.pieceId === pieceId)?.label ?? pieceId;
}

const faults: Readonly<Record<EntryFault, string>> = {
  "unknown-step": "This order has no such cut.",
  "unknown-part": "This order has no such part.",
  "unknown-piece": "This order has no such front.",
  "more-than-there-is": "That is more wood than there is: the parts and the blade together would be larger than what was cut.",
  "longer-at-earlier-cut": "That edge was made by an earlier cut: enter the true size there.",
};

/** Why entries cannot be true together. */
export function restFaultSentence(fault: RestFault, snapshot: OrderSnapshot, tag: string): string {
  if (fault.reason === "entry") return faults[fault.fault];
  const step = orderSteps(snapshot).find(({ id }) => id === `${tag}:${fault.step}`);
  return `With what was entered, step ${step?.number ?? fault.step} could not have been cut as it is ticked. Correct the entry or take the tick back.`;
}
