/**
 * The tree read in the order of work: a part is cut after the cut that made it, and cuts of one setting follow each other wherever
 * the tree allows. It must not change the tree.
 */
import { type CutPlan, settingKey, turnBetween } from "./cut-plan";

export interface OrderedCut {
  readonly plan: CutPlan;
  readonly turn: "none" | "quarter" | "end-for-end";
}

/** Same setting as the last cut first, else rips before crosscuts, else the part that came to hand first. */
export function orderOfWork(root: CutPlan): readonly OrderedCut[] {
  const inHand: OrderedCut[] = [{ plan: root, turn: "none" }];
  const order: OrderedCut[] = [];
  let dialled = "";
  while (inHand.length > 0) {
    const at = nextIndex(inHand, dialled);
    const [next] = inHand.splice(at, 1);
    if (!next) break;
    order.push(next);
    dialled = settingKey(next.plan.cut);
    const made = [next.plan.low, next.plan.high].filter((plan) => plan !== null);
    inHand.splice(at, 0, ...made.map((plan) => ({ plan, turn: turnBetween(next.plan.cut, plan.cut) })));
  }
  return order;
}

function nextIndex(inHand: readonly OrderedCut[], dialled: string): number {
  const same = inHand.findIndex(({ plan }) => settingKey(plan.cut) === dialled);
  if (same >= 0) return same;
  const rip = inHand.findIndex(({ plan }) => plan.cut.kind === "rip");
  return Math.max(rip, 0);
}
