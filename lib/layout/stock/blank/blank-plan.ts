/** What a blank is glued up from: boards edge to edge, as the maker lays them. */
import type { StockPoint } from "../../frame/point";
import type { StockId } from "../../piece";
import type { Um } from "../../units/um";
import type { KeepClear } from "../board";

/** Turned end for end, the board is turned by half a turn in its own plane: the same face stays up. */
export interface MemberPlace {
  readonly endForEnd: boolean;
  /** Where its left end lies along the blank, as it lies. Only differences among the members count. */
  readonly along: Um;
  /** Taken off its edges before they are jointed, as it lies. */
  readonly trim: { readonly upper: Um; readonly lower: Um };
}

export interface PlacedMember extends MemberPlace {
  readonly id: StockId;
  /** Of its picture. */
  readonly length: Um;
  readonly width: Um;
}

/** A board to be glued, with what was drawn on its picture. */
export interface BlankMember extends PlacedMember {
  readonly thickness: Um;
  readonly outline: readonly StockPoint[] | null;
  readonly keepClear: readonly KeepClear[];
  /** Of a board that is glued up already. */
  readonly glueLines: readonly Um[];
}

export interface BlankPlan<Member extends PlacedMember = BlankMember> {
  /** From the upper edge of the blank down. */
  readonly members: readonly Member[];
  /** What jointing takes off each edge that is glued. */
  readonly jointing: Um;
}
