/**
 * What a pattern has to say about a face; everything else in the core works through this. Each pattern answers with one module of
 * rules, and the table of them (`rules-of.ts`) is the only place that tells patterns apart.
 *
 * Lists of pieces and places are in reading order, so that index 0 is piece "p1".
 */
import type { FacePoint, FaceRect } from "../frame/point";
import type { PieceId, PieceRole } from "../piece";
import type { Um } from "../units/um";
import type { EdgeAmounts, Face } from "./face";
import type { FaceFault } from "./face-fault";
import type { FaceLayout } from "./face-layout";

/** A piece as it hangs: finished size, face frame. */
export interface HungPiece {
  readonly role: PieceRole;
  readonly rect: FaceRect;
}

/** How a piece shows its wood: as photographed, or as in a mirror, with left and right or top and bottom of the face exchanged. */
export type Mirrored = "no" | "leftRight" | "topBottom";

/**
 * Where a piece is cut: its rectangle in the spaced chart, which has the face's axes and is turned on to the stock only by a
 * placement. Same size as the rectangle it hangs in.
 */
export interface ChartPlace {
  readonly rect: FaceRect;
  readonly mirrored: Mirrored;
  /** Whether the anchor of a group is found from this place; where a group has none that says so, from all of its places. */
  readonly anchors: boolean;
}

/** Where two pieces meet on the face as hung. */
export interface SeamPlace {
  readonly a: PieceId;
  readonly b: PieceId;
  /** The stretch of A's edge that faces B, in reading order. */
  readonly from: FacePoint;
  readonly to: FacePoint;
  /** The point of B's edge that faces `from`: across the gap, or at the far end of a run that closes on itself. */
  readonly facing: FacePoint;
  readonly gap: Um;
  /** Direction from A to B on the face. */
  readonly normal: "right" | "down";
}

/** A face with what decides how it is cut. */
export type CutSettings<F extends Face = Face> = { readonly face: F } & Pick<
  FaceLayout,
  "crosscut" | "rip" | "spacing" | "anchorX" | "anchorY"
>;

export interface PatternRules<F extends Face = Face> {
  /** How many pieces the face has; cheap. */
  readonly count: (face: F) => number;
  readonly pieces: (face: F) => readonly HungPiece[];
  /** Outer edge to outer edge, as hung. */
  readonly size: (face: F) => { readonly width: Um; readonly height: Um };
  readonly places: (layout: CutSettings<F>) => readonly ChartPlace[];
  /** Taken off each edge after sawing, by edge as the piece hangs. */
  readonly cleanUps: (layout: CutSettings<F>) => readonly EdgeAmounts[];
  /** In reading order of the first piece, the seam on its right before the one below it. */
  readonly seams: (face: F) => readonly SeamPlace[];
  /**
   * The face with the gaps along an axis that its fronts can make, all of this width; openings and the face keep their size, the fronts
   * give up what the gaps take. Null when a front would come to nothing; absent where the pattern has no such gaps.
   */
  readonly evenGaps?: (face: F, axis: "columns" | "rows", gap: Um) => F | null;
  /** By place in `seams`: whether what lies there is a gap that may open and close, and no joint. Absent: wherever there is a gap. */
  readonly openSeams?: (face: F) => readonly boolean[];
  /** Everything that makes the face mean nothing; the others may only be asked when there is none. */
  readonly faults: (face: F) => readonly FaceFault[];
  /** Sets of pieces, by place in reading order, that are sawn as one blank and parted through its thickness. Absent: none. */
  readonly oneBlank?: (face: F) => readonly (readonly number[])[];
  /** What the stock has to measure through its thickness. Absent: nothing that is known of. */
  readonly stockThickness?: (face: F) => Um;
  /**
   * Where the photograph has the figure that a place shows, µm across the grain from the place itself, for wood that shows below the
   * photographed face; null where it is not known. Absent: at the place.
   */
  readonly figureOffsets?: (face: F) => readonly (Um | null)[];
}
