/** Whether a board comes into question for a group at all, from figures on its tag, before any picture is looked at. */
import type { FaceLayout } from "../pattern/face-layout";
import { turnsAlongGrain } from "../pattern/place-group";
import type { StockId } from "../piece";
import { type Um, um } from "../units/um";
import { layGroup } from "./laid-group";
import type { Obstacle } from "./place-table";

/** What is looked for. */
export interface StockWish {
  readonly layout: FaceLayout;
  readonly groupId: string;
  /** Null: any. */
  readonly species: string | null;
  /** Of the rough board, inclusive; null: any. */
  readonly thickness: { readonly least: Um; readonly most: Um } | null;
}

/** What the rack knows of a board. */
export interface StockFacts {
  readonly stockId: StockId;
  readonly species: string;
  readonly length: Um;
  readonly width: Um;
  readonly thickness: Um;
  /** Another order has it. */
  readonly isHeld: boolean;
  readonly hasPicture: boolean;
}

/** Why a board is left out of a search. */
export type StockLeftOut =
  | { readonly reason: "species"; readonly has: string }
  | { readonly reason: "too-thin" | "too-thick" | "too-short" | "too-narrow"; readonly by: Um }
  /** Belongs to another order. */
  | { readonly reason: "held" }
  /** Nothing to judge it by. */
  | { readonly reason: "no-picture" }
  /** Large enough, but there is no place on it: these, the fewest, stand in the way of any one. */
  | { readonly reason: "no-place"; readonly obstacles: readonly Obstacle[] };

/** Every reason that its tag gives, in the order of the union; none: its picture has to be searched. */
export function stockLeftOut({ layout, groupId, species, thickness }: StockWish, stock: StockFacts): StockLeftOut[] {
  const [turns] = turnsAlongGrain(layout.face.grain);
  const { blank } = layGroup(layout, groupId, { stockId: stock.stockId, turns });
  const missing = (reason: "too-thin" | "too-thick" | "too-short" | "too-narrow", by: number): StockLeftOut[] =>
    by > 0 ? [{ reason, by: um(by) }] : [];
  return [
    ...(species === null || species === stock.species ? [] : [{ reason: "species", has: stock.species } as const]),
    ...(thickness === null ? [] : missing("too-thin", thickness.least - stock.thickness)),
    ...(thickness === null ? [] : missing("too-thick", stock.thickness - thickness.most)),
    ...missing("too-short", blank.along.to - blank.along.from - stock.length),
    ...missing("too-narrow", blank.across.to - blank.across.from - stock.width),
    ...(stock.isHeld ? [{ reason: "held" } as const] : []),
    ...(stock.hasPicture ? [] : [{ reason: "no-picture" } as const]),
  ];
}
