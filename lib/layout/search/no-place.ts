/** Why a group has no place on a board. */
import { type Um, um } from "../units/um";
import type { SceneScan } from "./place-scan";
import { inTheWay, type Obstacle } from "./place-table";

export type NoPlace =
  /** What has to be sawn for the group is longer or wider than the board, by this much; 0 on an axis on which it fits. */
  | { readonly reason: "too-large"; readonly tooShortBy: Um; readonly tooNarrowBy: Um }
  /** It would fit but for these: the fewest that stand in the way of any one place. */
  | { readonly reason: "in-the-way"; readonly obstacles: readonly Obstacle[] }
  /** No side could be searched. */
  | { readonly reason: "no-side" };

/** For scenes without an allowed place. */
export function whyNone(scanned: readonly SceneScan[]): NoPlace {
  const [first] = scanned;
  if (first === undefined) return { reason: "no-side" };
  const { blank } = first.scene.laid;
  const { length, width } = first.scene.side.board;
  const tooShortBy = um(Math.max(0, blank.along.to - blank.along.from - length));
  const tooNarrowBy = um(Math.max(0, blank.across.to - blank.across.from - width));
  if (tooShortBy > 0 || tooNarrowBy > 0) return { reason: "too-large", tooShortBy, tooNarrowBy };
  const ways = scanned.filter(({ table }) => table.blocked.length > 0).map(({ table }) => inTheWay(table));
  ways.sort((p, q) => p.length - q.length);
  return { reason: "in-the-way", obstacles: ways[0] ?? ["board"] };
}
