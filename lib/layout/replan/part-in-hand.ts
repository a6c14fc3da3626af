/** The wood of one board as it lies on the bench: rectangles that no longer hang together, each where it lay in the board. */
import type { StockRect } from "../frame/point";
import type { BoardEdges, CutRequest, PlacedPiece } from "../program/cut-request";
import type { CutKind, CutProgram, CutStep, Edge, EdgeState, Part, ShopLimits } from "../program/program";
import type { BoardFace } from "../stock/board";
import { type Um, um } from "../units/um";
import type { AsCutEntry } from "./as-cut";

/** A part as it is in truth. Waste and finished pieces are parts in hand too: all of them and the dust make up the board. */
export interface PartInHand {
  readonly part: Part;
  readonly edges: Readonly<Record<Edge, EdgeState>>;
  /** µm that have to be planed off an edge because of the machine that left it. */
  readonly owes: Readonly<Record<Edge, Um>>;
  /** Fit for fine cuts: flat as the board came, or flattened since. */
  readonly flat: boolean;
  /** Wood that cannot be used for a piece, inside the part. */
  readonly spoiled: readonly StockRect[];
}

/** A piece of which some is still asked. */
export interface RestPiece extends PlacedPiece {
  /** A front keeps its size as long as anything else helps; a strip or a divider may be left narrower before. */
  readonly keepsSize: boolean;
}

/** A revision of a cut program, and what has become of it at the bench. */
export interface RestRequest {
  readonly board: BoardFace;
  /** What lay on the bench when the revision was issued: the board, or the parts that an earlier revision had left. */
  readonly start: readonly PartInHand[];
  /** As issued. Steps done before that stand first in it, as they were cut. */
  readonly program: CutProgram;
  /** Numbers of the steps that were done before the revision was issued. */
  readonly doneBefore: ReadonlySet<number>;
  /** Numbers of the steps that are ticked. */
  readonly done: ReadonlySet<number>;
  /** The pieces asked of this board, cut or not, where they lie or are to lie in it. */
  readonly pieces: readonly RestPiece[];
  /** Which saw makes the cuts that name no machine: equal where one saw makes both kinds, so that its kerf is entered once. */
  readonly saws: Readonly<Record<CutKind, string>>;
  readonly entries: readonly AsCutEntry[];
  /** As the program was asked for. */
  readonly asked: Pick<CutRequest, "truingTakes" | "machines" | "flatten" | "thinnestSawn">;
}

/** What planning needs besides. */
export interface RestLimits {
  readonly limits: ShopLimits;
  readonly budget: number;
}

/** The board before anything was cut. */
export function wholeBoardInHand(board: Pick<BoardFace, "length" | "width">, edges: BoardEdges, flat: boolean): PartInHand {
  const rect = { x: um(0), y: um(0), width: board.length, height: board.width };
  return { part: { id: "board", kind: "board", label: null, pieceId: null, rect }, edges, owes: owesNothing, flat, spoiled: [] };
}

export const owesNothing: PartInHand["owes"] = { left: um(0), right: um(0), top: um(0), bottom: um(0) };

/** The steps of a revision that were still to be done when it was issued. */
export function openSteps({ program, doneBefore }: Pick<RestRequest, "program" | "doneBefore">): readonly CutStep[] {
  return program.steps.filter(({ number }) => !doneBefore.has(number));
}

/** Wood that is good for nothing any more: what broke away, or what a spoiled piece leaves. */
export function wasteInHand(id: string, rect: StockRect): PartInHand {
  const edges = { left: "rough", right: "rough", top: "rough", bottom: "rough" } as const;
  return { part: { id, kind: "waste", label: null, pieceId: null, rect }, edges, owes: owesNothing, flat: false, spoiled: [] };
}
