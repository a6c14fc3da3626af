/** Edges and ends as the bench calls them: the board lies face up, as in its picture. */
import type { Edge, EdgeState } from "@/lib/layout";

export const edgeNames: Readonly<Record<Edge, string>> = {
  left: "left end",
  right: "right end",
  top: "upper edge",
  bottom: "lower edge",
};

export const oppositeEdge: Readonly<Record<Edge, Edge>> = { left: "right", right: "left", top: "bottom", bottom: "top" };

/** An edge that a cut is measured from: one that this order has sawn is called fresh, so that nobody looks for the board's own. */
export function measuredFrom(edge: Edge, state: EdgeState): string {
  return state === "sawn" ? `fresh ${edgeNames[edge]}` : edgeNames[edge];
}
