/**
 * The cut program of one board: a tree in which every node is a rectangle in hand, every inner node one straight cut through it,
 * every leaf a piece, an offcut or waste. Steps are the tree read in the order of work. Coordinates: stock frame, µm.
 */
import type { StockRect } from "../frame/point";
import type { PieceId } from "../piece";
import type { Um } from "../units/um";

export type CutKind = "rip" | "crosscut";
/** Of a rectangle as it lies in the stock frame: left is x = 0, top is y = 0. */
export type Edge = "left" | "right" | "top" | "bottom";
/** Rough: as the board came. Sawn: made by an earlier cut of this program. Trued: straightened by jointing before the first cut. */
export type EdgeState = "rough" | "trued" | "sawn";

/** What a cut needs from the saw and the shop. Cautions are chosen by these. */
export interface ShopLimits {
  /** Shortest length held by hand at a crosscut. */
  readonly shortestCrosscut: Um;
  /** Narrowest rip without a push stick. */
  readonly narrowestRip: Um;
  /** Shortest length through planer and jointer. */
  readonly shortestMachined: Um;
  /** Offcuts at least this long and this wide go back to the rack; anything smaller is waste. */
  readonly offcutLength: Um;
  readonly offcutWidth: Um;
}

export type PartKind = "board" | "strip" | "blank" | "piece" | "offcut" | "waste";

/** A rectangle in hand. Labels: pieces carry their own, strips "A", "B", … (no I, O), offcuts "C1", "C2", …; waste has none. */
export interface Part {
  readonly id: string;
  readonly kind: PartKind;
  readonly label: string | null;
  readonly pieceId: PieceId | null;
  readonly rect: StockRect;
}

export type Caution =
  | "short-crosscut-clamp"
  | "narrow-rip-push-stick"
  | "guard-and-riving-knife"
  | "offcut-not-between-fence-and-blade"
  | "too-short-for-planer";

export interface CutStep {
  /** "1", "2", … in the order of work; unique in the program. */
  readonly number: number;
  readonly kind: CutKind;
  /** The rectangle in hand before the cut. */
  readonly part: Part;
  /** Measured from this edge of the part in hand, which exists and is straight at that moment. */
  readonly fromEdge: Edge;
  readonly fromEdgeState: EdgeState;
  /** Distance to dial in, from `fromEdge` to the near side of the blade. */
  readonly setting: Um;
  /** The kerf as a rectangle of wood turned to dust. */
  readonly kerf: StockRect;
  /** What comes off: one or two parts (a trim yields one and waste narrower than the blade none). */
  readonly yields: readonly Part[];
  /** True when this cut only takes a sliver or a rough edge away. */
  readonly trim: boolean;
  /** Steps with equal settings from the same kind of edge share one number, in order of first use: one setting of the machine. */
  readonly settingNumber: number;
  /** How many turns of the stock lead from the step before to this one. */
  readonly cautions: readonly Caution[];
}

/** Clean-up taken off one edge of a piece after sawing (jointing, planing, shooting). */
export interface CleanUp {
  readonly partId: string;
  readonly edge: Edge;
  readonly amount: Um;
}

export interface Conservation {
  /** µm². A 6 m × 0.6 m board has 3.6e12 µm², far below 2^53, so whole numbers stay exact. */
  readonly stock: number;
  readonly pieces: number;
  readonly kerf: number;
  readonly cleanUp: number;
  readonly offcuts: number;
  readonly waste: number;
}

export interface CutProgram {
  readonly steps: readonly CutStep[];
  readonly cleanUps: readonly CleanUp[];
  readonly offcuts: readonly Part[];
  readonly waste: readonly Part[];
  readonly conservation: Conservation;
  readonly settings: number;
}

export type CutProgramOutcome =
  | { readonly ok: true; readonly program: CutProgram }
  /** No guillotine sequence: the pieces named block one another. */
  | { readonly ok: false; readonly reason: "blocked"; readonly pieces: readonly PieceId[] }
  /** Two pieces lie closer than the loss of the cut between them, by this much. */
  | { readonly ok: false; readonly reason: "too-close"; readonly pieces: readonly [PieceId, PieceId]; readonly missing: Um }
  | { readonly ok: false; readonly reason: "outside"; readonly piece: PieceId; readonly by: Um }
  | { readonly ok: false; readonly reason: "nothing-to-cut" };
