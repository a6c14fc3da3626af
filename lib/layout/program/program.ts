/**
 * The cut program of one board: a tree in which every node is a rectangle in hand, every inner node one straight cut through it,
 * every leaf a piece, an offcut or waste. Steps are the tree read in the order of work. Coordinates: stock frame, µm.
 */
import type { StockRect } from "../frame/point";
import type { PieceId } from "../piece";
import { type Um, um } from "../units/um";
import type { Machine } from "./machine";

export type CutKind = "rip" | "crosscut";

/**
 * Thinner than a saw takes surely: it is planed or shot off instead, and needs no setting of a saw. Half a millimetre: common practice,
 * no source.
 */
export const THINNEST_SAWN = um(500);

/**
 * "true" and "plane" are no cuts of the saw. True: a rough edge is jointed straight, so that cuts can be measured from it. Plane: wood
 * thinner than a saw takes surely, or that a saw's clean-up asks for, is planed or shot off a straight edge. Flatten: a rough part is
 * made flat and planed to thickness; its outline stays.
 */
export type StepKind = "true" | "plane" | "flatten" | CutKind;

/** Whether a saw makes the step. */
export const isSawn = (kind: StepKind): kind is CutKind => kind === "rip" || kind === "crosscut";
/** Of a rectangle as it lies in the stock frame: left is x = 0, top is y = 0. */
export type Edge = "left" | "right" | "top" | "bottom";
/**
 * Rough: as the board came, or left by a rough rip. Marked: an end as it came, or left by a rough crosscut: a line can be marked from it
 * with a tape, but nothing lies against it and no piece may keep it. Sawn: made by an earlier fine cut of this program. Trued:
 * straightened by jointing or planing.
 */
export type EdgeState = "rough" | "marked" | "trued" | "sawn";

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

export type PartKind = "board" | "rough" | "strip" | "blank" | "piece" | "offcut" | "waste";

/**
 * A rectangle in hand. Labels: pieces carry their own, strips "A", "B", … (no I, O), offcuts "C1", "C2", …, rough parts "R1", "R2", …;
 * waste has none.
 */
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
  | "too-short-for-planer"
  /** No machine of the shop may take the cut as it says of itself; it is reckoned with the preferred one. */
  | "no-machine"
  /** The part is not flat yet and rocks on a table. */
  | "not-flat";

export interface CutStep {
  /** 1, 2, … in the order of work; unique in the program. */
  readonly number: number;
  readonly kind: StepKind;
  /** A rough cut frees a part that is flattened before its fine cuts; it follows a line marked on the face. Absent: fine. */
  readonly stage?: "rough";
  /** Which of the program's machines makes the cut; absent where no saw does, and where the program knows saws by their kerf alone. */
  readonly machineId?: string;
  /** How wide the blade really was, where the step is done and it was another than the program knows of the saw. */
  readonly blade?: Um;
  /** The rectangle in hand before the cut. */
  readonly part: Part;
  /** Measured from this edge of the part in hand, which exists and is straight at that moment. Of a "true" or "plane": the edge worked. */
  readonly fromEdge: Edge;
  /** "rough" only of a "true" and in the rough stage; "marked" besides where a line is marked from an end, blade side "far". */
  readonly fromEdgeState: EdgeState;
  /** Distance to dial in or mark, from `fromEdge` to the side of the blade named in `bladeSide`. Of a "true" or "plane": what is taken
   *  off. 0 of a "flatten". */
  readonly setting: Um;
  /** "near": to the side of the blade next to `fromEdge`, the part between is wanted. "far": to the side away from it, what lies
   *  between is cut away and the part beyond starts exactly at the setting. It is always the side that leaves a piece's edge. */
  readonly bladeSide: "near" | "far";
  /** The wood turned to dust: the kerf, narrower than the blade where the blade runs over the part's edge; of a "true" or "plane" the
   *  shavings; nothing of a "flatten". */
  readonly kerf: StockRect;
  /** What comes off, the part next to `fromEdge` first: one or two parts (waste narrower than the blade yields nothing). */
  readonly yields: readonly Part[];
  /** True when this cut only takes a sliver or a rough edge away. */
  readonly trim: boolean;
  /** Steps of one kind at one machine with equal settings to the same side of the blade share one number, in order of first use: one
   *  setting of the machine. 0 where no saw is set. */
  readonly settingNumber: number;
  /** How the part in hand lies against the cut that made it: a quarter turn from rip to crosscut, end for end from edge to edge. */
  readonly turn: "none" | "quarter" | "end-for-end";
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

/** How wide the blade is that makes a step, µm; 0 where no saw does. */
export function bladeOf(step: Pick<CutStep, "kind" | "machineId" | "blade">, program: Pick<CutProgram, "kerf" | "machines">): Um {
  if (!isSawn(step.kind)) return um(0);
  if (step.blade !== undefined) return step.blade;
  const machine = program.machines?.find(({ id }) => id === step.machineId);
  return machine?.kerf ?? program.kerf[step.kind];
}

export interface CutProgram {
  readonly steps: readonly CutStep[];
  /** Width of the blade at each kind of cut, µm; of steps with a machine of their own, that of the machine counts. */
  readonly kerf: Readonly<Record<CutKind, Um>>;
  /** Those that steps name, in order of first use; absent where the program knows saws by their kerf alone. */
  readonly machines?: readonly Machine[];
  readonly cleanUps: readonly CleanUp[];
  /** The pieces at their finished rectangles, after clean-up; `id` is that of the part they come from. */
  readonly pieces: readonly Part[];
  readonly offcuts: readonly Part[];
  readonly waste: readonly Part[];
  readonly conservation: Conservation;
  /** Different settings of the saw. */
  readonly settings: number;
  readonly search: SearchReport;
}

/** How the tree was chosen. `proven`: every tree of the candidate cuts was weighed and none is better. Otherwise the steps ran
 *  out, or a set of equally good plans was cut short: the program is exact and safe to follow, but perhaps not the shortest. */
export interface SearchReport {
  readonly steps: number;
  readonly proven: boolean;
}

export type CutProgramOutcome =
  | { readonly ok: true; readonly program: CutProgram }
  /** No guillotine sequence: the pieces named block one another. */
  | { readonly ok: false; readonly reason: "blocked"; readonly pieces: readonly PieceId[] }
  /** Two pieces lie closer than the loss of the cut between them, by this much. */
  | { readonly ok: false; readonly reason: "too-close"; readonly pieces: readonly [PieceId, PieceId]; readonly missing: Um }
  | { readonly ok: false; readonly reason: "outside"; readonly piece: PieceId; readonly by: Um }
  | { readonly ok: false; readonly reason: "nothing-to-cut" };
