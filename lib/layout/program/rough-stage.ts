/** A board that is not flat: its rough parts, the cuts that free them, and how each comes to its fine cuts once it is flat. */

import type { CutPlan } from "./cut-plan";
import type { CutRequest, RoughAllowances } from "./cut-request";
import type { SearchReport } from "./program";
import { edgeAt, everyEdge, type Region, roomAt, wholeBoard } from "./region";
import { roughRules, widestKerf } from "./rough-cuts";
import { asBlank, type Cluster, roughParts } from "./rough-parts";
import { bestByRules } from "./search/best-trees";
import type { TruingTakes } from "./truing";
import type { Workshop } from "./workshop";

export interface RoughPart {
  /** With the pieces in it, before its edges are trued. */
  readonly region: Region;
  readonly takes: TruingTakes;
}

export interface RoughStage {
  /** null: the board is one rough part as it is. */
  readonly plan: CutPlan | null;
  readonly parts: readonly RoughPart[];
  readonly search: SearchReport;
}

/** A share of the budget that leaves the fine cuts theirs: rough parts are few. */
const roughShare = 0.25;

export function roughStage(request: CutRequest, allowances: RoughAllowances, shop: Workshop): RoughStage {
  const board = wholeBoard(request);
  const kerf = { x: widestKerf(shop, "x"), y: widestKerf(shop, "y") };
  const clusters = roughParts(board, { allowances, kerf, shortestMachined: request.limits.shortestMachined });
  const root: Region = { ...board, blanks: clusters.map(asBlank) };
  const rules = roughRules(shop);
  const { trees, ...search } = bestByRules([[root]], rules, shop, Math.floor(request.budget * roughShare));
  const plan = trees ? (trees[0]?.plan ?? null) : firstRoughPlan(root, rules);
  const leaves = plan ? leavesOf(plan) : [root];
  const parts = clusters.map((cluster, i) => {
    const leaf = leaves.find(({ blanks }) => blanks.some(({ piece }) => piece.pieceId === `r${i + 1}`));
    if (!leaf) throw new Error("a rough part is lost between its cuts");
    return partOf(leaf, cluster, board, request, allowances);
  });
  return { plan, parts, search };
}

/** Without a budget the first cut at every rectangle. */
function firstRoughPlan(region: Region | null, rules: ReturnType<typeof roughRules>): CutPlan | null {
  if (!region || rules.isFinished(region)) return null;
  const [cut] = rules.stepsIn(region);
  if (!cut) throw new Error("rough parts do not come apart though there is room between them");
  return { cut, low: firstRoughPlan(cut.low, rules), high: firstRoughPlan(cut.high, rules) };
}

/** Rectangles with a rough part in them that are not cut again. */
function leavesOf({ cut, low, high }: CutPlan): Region[] {
  const side = (region: Region | null, plan: CutPlan | null) => (plan ? leavesOf(plan) : region ? [region] : []);
  return [...side(cut.low, low), ...side(cut.high, high)].filter(({ blanks }) => blanks.length > 0);
}

/** Its long edges are not square to the face that is planed now, however true they were before. */
function partOf(leaf: Region, { blanks }: Cluster, board: Region, request: CutRequest, allowances: RoughAllowances): RoughPart {
  const region: Region = { ...leaf, edges: { ...leaf.edges, top: "rough", bottom: "rough" }, shortened: false, blanks };
  const isBoardsOwn = new Set(everyEdge.filter((edge) => edgeAt(leaf, edge) === edgeAt(board, edge)));
  const takes: TruingTakes = (edge) => {
    const along = edge === "left" || edge === "right";
    if (isBoardsOwn.has(edge)) return along ? request.truingTakes.end : request.truingTakes.longEdge;
    return Math.min(Math.floor((along ? allowances.length : allowances.width) / 2), roomAt(region, edge));
  };
  return { region, takes };
}
