/**
 * The steps of a cut order, from its snapshot: what the bench ticks one by one and the paper prints one row each. Knows what is to be
 * done and in which order; how it is said is in `lib/words`. Step ids are stable: the same snapshot gives the same ids for ever.
 */
import type { CleanUp, CutKind, CutStep, Edge, Part, Um } from "@/lib/layout";
import type { OrderSnapshot, SnapshotBoard } from "./order-snapshot";

interface StepOf<Kind extends string> {
  /** Unique in the order, at most 40 characters. */
  readonly id: string;
  /** 1, 2, … through the whole order. */
  readonly number: number;
  readonly kind: Kind;
  readonly board: SnapshotBoard;
}

/** Fronts of one finished size that lose the same at every edge. */
export interface CleanUpGroup {
  readonly labels: readonly string[];
  readonly length: Um;
  readonly width: Um;
  readonly takes: Readonly<Partial<Record<Edge, Um>>>;
}

export type OrderStep =
  /** Bring the board from the rack. */
  | StepOf<"fetch">
  /** Face up, triangle on, before anything is cut. */
  | StepOf<"mark">
  /** A cut in scrap that tells the true kerf; once for each saw that the order uses, on its first board. */
  | (StepOf<"test-cut"> & { readonly saw: OrderSnapshot["ripSaw"]; readonly cuts: readonly CutKind[] })
  | (StepOf<"cut"> & { readonly cut: CutStep })
  | (StepOf<"clean-up"> & { readonly group: CleanUpGroup })
  /** Label what is left and put it back in the rack. */
  | (StepOf<"rack"> & { readonly offcut: Part });

type Unnumbered<S> = S extends OrderStep ? Omit<S, "number"> : never;

/** Every step in the order of work, board by board. */
export function orderSteps(snapshot: OrderSnapshot): readonly OrderStep[] {
  const tests = testCuts(snapshot);
  const steps = snapshot.boards.flatMap((board, index): Unnumbered<OrderStep>[] => [
    { id: fetchId(board.tag), kind: "fetch", board },
    { id: markId(board.tag), kind: "mark", board },
    ...(index === 0 ? tests.map((test) => ({ ...test, kind: "test-cut" as const, board })) : []),
    ...board.program.steps.map((cut) => ({ id: `${board.tag}:${cut.number}`, kind: "cut" as const, board, cut })),
    ...cleanUpGroups(board).map((group, i) => ({
      id: `${board.tag}:clean-up-${i + 1}`,
      kind: "clean-up" as const,
      board,
      group,
    })),
    ...board.program.offcuts.map((offcut) => ({
      id: `${board.tag}:rack-${offcut.label ?? offcut.id}`,
      kind: "rack" as const,
      board,
      offcut,
    })),
  ]);
  return steps.map((step, index) => ({ ...step, number: index + 1 }));
}

const fetchId = (tag: string) => `${tag}:fetch`;
const markId = (tag: string) => `${tag}:mark`;

/**
 * Whether wood of the board is gone once this step is ticked: a cut, or what can only be done after one. Told by the id alone, so that
 * nobody has to read a snapshot for it. Test cuts are made in scrap.
 */
export function takesWood(stepId: string, tag: string): boolean {
  return stepId.startsWith(`${tag}:`) && stepId !== fetchId(tag) && stepId !== markId(tag);
}

export interface TestCut {
  readonly id: string;
  readonly saw: OrderSnapshot["ripSaw"];
  /** The cuts of the order that this saw makes. */
  readonly cuts: readonly CutKind[];
}

/** One for each saw that the order uses. */
export function testCuts({ boards, ripSaw, crosscutSaw }: OrderSnapshot): readonly TestCut[] {
  const used = new Set(boards.flatMap(({ program }) => program.steps.map(({ kind }) => kind)));
  const cuts = (["rip", "crosscut"] as const).filter((kind) => used.has(kind));
  const one = ripSaw.name === crosscutSaw.name && ripSaw.kerf === crosscutSaw.kerf;
  if (one && cuts.length > 0) return [{ id: "test-cut", saw: ripSaw, cuts }];
  return cuts.map((cut) => ({ id: `test-cut:${cut}`, saw: cut === "rip" ? ripSaw : crosscutSaw, cuts: [cut] }));
}

/** In the order in which the first front of each group comes off the saw. */
function cleanUpGroups({ program }: SnapshotBoard): CleanUpGroup[] {
  const groups = new Map<string, CleanUpGroup>();
  for (const piece of program.pieces) {
    const takes = takesOf(program.cleanUps.filter(({ partId }) => partId === piece.id));
    if (Object.keys(takes).length === 0) continue;
    const { width: length, height: width } = piece.rect;
    const key = JSON.stringify([length, width, takes.left, takes.right, takes.top, takes.bottom]);
    const before = groups.get(key)?.labels ?? [];
    groups.set(key, { labels: [...before, piece.label ?? ""], length, width, takes });
  }
  return [...groups.values()];
}

function takesOf(cleanUps: readonly CleanUp[]): CleanUpGroup["takes"] {
  return Object.fromEntries(cleanUps.map(({ edge, amount }) => [edge, amount]));
}
