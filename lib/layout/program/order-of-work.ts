/**
 * Trees read in the order of work: a part is cut after the cut that made it, and cuts of one setting follow each other wherever the
 * trees allow. It must not change the trees.
 */
import { type CutPlan, settingKey, turnBetween } from "./cut-plan";
import type { Edge } from "./program";

export interface OrderedCut {
  readonly plan: CutPlan;
  readonly turn: "none" | "quarter" | "end-for-end";
}

interface InHand {
  readonly plan: CutPlan;
  /** From which edge the last saw measured at it; null before the first. */
  readonly lie: Edge | null;
}

/**
 * Same setting as the last cut first, then what only waits for the plane, else rips before crosscuts, else the machine that is running,
 * else the part that came to hand first.
 */
export function orderOfWork(roots: readonly CutPlan[]): readonly OrderedCut[] {
  const inHand: InHand[] = roots.map((plan) => ({ plan, lie: null }));
  const order: OrderedCut[] = [];
  let last: CutPlan | null = null;
  while (inHand.length > 0) {
    const at = nextIndex(inHand, last);
    const [next] = inHand.splice(at, 1);
    if (!next) break;
    const { plan, lie } = next;
    const { cut } = plan;
    order.push({ plan, turn: cut.tool && lie ? turnBetween(lie, cut.fromEdge) : "none" });
    if (cut.tool) last = plan;
    const made = [plan.low, plan.high].filter((one) => one !== null);
    inHand.splice(at, 0, ...made.map((one) => ({ plan: one, lie: cut.tool ? cut.fromEdge : lie })));
  }
  return order;
}

function nextIndex(inHand: readonly InHand[], last: CutPlan | null): number {
  const dialled = last && settingKey(last.cut);
  const first = (wanted: (plan: CutPlan) => boolean) => inHand.findIndex(({ plan }) => wanted(plan));
  const running = (plan: CutPlan) => plan.cut.tool?.machine.id === last?.cut.tool?.machine.id;
  const isRip = (plan: CutPlan) => plan.cut.kind === "rip";
  const choices = [
    first(({ cut }) => cut.tool !== null && settingKey(cut) === dialled),
    first(({ cut }) => cut.tool === null),
    first((plan) => isRip(plan) && running(plan)),
    first(isRip),
    first(running),
  ];
  return choices.find((index) => index >= 0) ?? 0;
}
