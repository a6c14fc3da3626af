/**
 * The steps of a cut order, from its snapshot: what the bench ticks one by one and the paper prints one row each. Knows what is to be
 * done and in which order; how it is said is in `lib/words`. Step ids are stable: the same snapshot gives the same ids for ever.
 */
import { type CleanUp, type CutKind, type CutStep, type Edge, type Part, type Um, um } from "@/lib/layout";
import { type FaceStep, type FaceStepBody, stepsAfterCutting, stepsBeforeCutting } from "./face-steps";
import type { Gluing, GluingMember } from "./gluing";
import type { OrderSnapshot, SnapshotBoard } from "./order-snapshot";

interface StepOf<Kind extends string> {
  /** Unique in the order, at most 40 characters. */
  readonly id: string;
  /** 1, 2, … through the whole order. */
  readonly number: number;
  readonly kind: Kind;
  readonly board: SnapshotBoard;
}

/** Of a blank that is yet to be glued up; `board` is the blank. */
export type GluingStep =
  /** Bring one of its boards from the rack. */
  | (StepOf<"fetch-member"> & { readonly member: GluingMember })
  /** Lay the boards out as they are to lie, and mark them so. */
  | (StepOf<"arrange"> & { readonly members: readonly GluingMember[] })
  /** Take an outer edge of the blank back, which no joint does. */
  | (StepOf<"trim-edge"> & { readonly member: GluingMember; readonly edge: "upper" | "lower"; readonly by: Um })
  /** The two edges of one joint. */
  | (StepOf<"joint"> & {
      readonly joint: number;
      readonly above: GluingMember;
      readonly below: GluingMember;
      readonly jointing: Um;
      /** The boards that have both their edges now. */
      readonly ready: readonly GluingMember[];
    })
  | (StepOf<"glue-up"> & { readonly members: readonly GluingMember[] });

/** Fronts of one finished size that lose the same at every edge. */
export interface CleanUpGroup {
  readonly labels: readonly string[];
  readonly length: Um;
  readonly width: Um;
  readonly takes: Readonly<Partial<Record<Edge, Um>>>;
}

/** Of the pattern of the face; `board`: where the step comes in the order of work. */
export type PatternStep = FaceStepBody extends infer Body
  ? Body extends FaceStepBody
    ? StepOf<Body["kind"]> & Body
    : never
  : never;

export type OrderStep =
  | GluingStep
  | PatternStep
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
  const pattern = patternSteps(snapshot);
  const steps = snapshot.boards.flatMap((board, index): Unnumbered<OrderStep>[] => [
    ...(board.gluing ? gluingSteps(board, board.gluing) : [{ id: fetchId(board.tag), kind: "fetch" as const, board }]),
    { id: markId(board.tag), kind: "mark", board },
    ...(index === 0 ? pattern.before.map((step) => ({ ...step, board })) : []),
    ...(index === 0 ? tests.map((test) => ({ ...test, kind: "test-cut" as const, board })) : []),
    ...board.program.steps.map((cut) => ({ id: `${board.tag}:${cut.number}`, kind: "cut" as const, board, cut })),
    ...cleanUps(board).map(({ number, group }) => ({
      id: `${board.tag}:clean-up-${number}`,
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
    ...(index === snapshot.boards.length - 1 ? pattern.after.map((step) => ({ ...step, board })) : []),
  ]);
  return steps.map((step, index) => ({ ...step, number: index + 1 }));
}

/** What the patterns of the faces ask for before the first cut and after the last clean-up. */
function patternSteps({ faces }: OrderSnapshot): { readonly before: readonly FaceStep[]; readonly after: readonly FaceStep[] } {
  const steps = (of: typeof stepsBeforeCutting) => faces.flatMap(({ work }, index) => (work ? of(work, index + 1) : []));
  return { before: steps(stepsBeforeCutting), after: steps(stepsAfterCutting) };
}

/** Ids of the steps that were done before this revision was issued: cuts, clean-ups, and what comes before any cut of a board. */
export function doneBefore(snapshot: OrderSnapshot): ReadonlySet<string> {
  const isDone = (step: OrderStep): boolean => {
    const { asCut, tag } = step.board;
    if (!asCut) return false;
    if (step.kind === "cut") return asCut.done.includes(step.cut.number);
    if (step.kind === "clean-up") return asCut.cleanedUp.some(({ number }) => step.id === `${tag}:clean-up-${number}`);
    return !afterCutting.has(step.kind) && asCut.done.length > 0;
  };
  return new Set(
    orderSteps(snapshot)
      .filter(isDone)
      .map(({ id }) => id),
  );
}

/** What is done once a board is cut, and test cuts, which every revision asks for anew. */
const afterCutting: ReadonlySet<OrderStep["kind"]> = new Set(["test-cut", "rack", "resaw", "bevel", "set-back", "fit"]);

/** In the order of work: everything at hand first, outer edges before joints, so that a joint leaves a board as wide as it stays. */
function gluingSteps(board: SnapshotBoard, { members, jointing }: Gluing): Unnumbered<OrderStep>[] {
  const [first, last] = [members[0], members.at(-1)];
  const outer = [
    { member: first, edge: "upper" as const },
    { member: last, edge: "lower" as const },
  ];
  return [
    ...members.map((member) => ({ id: `${board.tag}:member-${member.tag}`, kind: "fetch-member" as const, board, member })),
    { id: `${board.tag}:arrange`, kind: "arrange" as const, board, members },
    ...outer.flatMap(({ member, edge }) => {
      const by = member?.takes[edge] ?? 0;
      return member && by > 0
        ? [{ id: `${board.tag}:trim-${edge}`, kind: "trim-edge" as const, board, member, edge, by: um(by) }]
        : [];
    }),
    ...members.slice(1).flatMap((below, index) => {
      const above = members[index];
      if (!above) return [];
      const ready = below === last ? [above, below] : [above];
      return [
        { id: `${board.tag}:joint-${index + 1}`, kind: "joint" as const, board, joint: index + 1, above, below, jointing, ready },
      ];
    }),
    { id: glueUpId(board.tag), kind: "glue-up" as const, board, members },
  ];
}

/** Ticked, the blank is glued, whichever revision the step was in. */
export const glueUpId = (tag: string): string => `${tag}:glue-up`;
/** Steps before there is a blank to cut: they make it what its picture shows. */
const makesBlank = /^(?:member-B-\d+|arrange|trim-upper|trim-lower|joint-\d+|glue-up)$/;

const fetchId = (tag: string) => `${tag}:fetch`;
const markId = (tag: string) => `${tag}:mark`;

/**
 * Whether wood of the board is gone once this step is ticked: a cut, or what can only be done after one. Told by the id alone, so that
 * nobody has to read a snapshot for it. Test cuts are made in scrap; gluing up makes the board what its picture shows.
 */
export function takesWood(stepId: string, tag: string): boolean {
  if (!stepId.startsWith(`${tag}:`) || stepId === fetchId(tag) || stepId === markId(tag)) return false;
  return !makesBlank.test(stepId.slice(tag.length + 1));
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

/** Those ticked before this revision was issued keep their numbers; the others go on from there. */
export function cleanUps(board: SnapshotBoard): readonly { readonly number: number; readonly group: CleanUpGroup }[] {
  const before = board.asCut?.cleanedUp ?? [];
  const cleaned = new Set(before.flatMap(({ labels }) => labels));
  const last = Math.max(0, ...before.map(({ number }) => number));
  return [
    ...before.map(({ number, ...group }) => ({ number, group })),
    ...cleanUpGroups(board, cleaned).map((group, i) => ({ number: last + i + 1, group })),
  ];
}

/** In the order in which the first front of each group comes off the saw. */
function cleanUpGroups({ program }: SnapshotBoard, cleaned: ReadonlySet<string>): CleanUpGroup[] {
  const groups = new Map<string, CleanUpGroup>();
  for (const piece of program.pieces) {
    if (cleaned.has(piece.label ?? "")) continue;
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
