/** A blank from its boards: one stock with its own size, outline, keep-clear areas and glue lines, all carried over by the boards' maps. */
import type { StockPoint } from "../../frame/point";
import type { StockId } from "../../piece";
import { type Um, um } from "../../units/um";
import type { KeepClear, KeepClearKind, KeepClearShape } from "../board";
import { liesOnBoard } from "../carry-zones";
import { cutPolygon } from "../cut-polygon";
import { movedArea, movedPoint } from "../move-area";
import { polygonFault } from "../polygon-fault";
import { blankOutline } from "./blank-outline";
import type { BlankMember, BlankPlan } from "./blank-plan";
import { type BlankJoint, type BlankStrip, blankStrips, type StripRefusal } from "./blank-strips";

/** As many corners and areas as a picture's drawing holds. */
export const MOST_CORNERS = 200;
export const MOST_AREAS = 200;

/** Boards to be glued may differ by so much in thickness; the rest is flattened away. Common practice, no source. */
export const THICKNESS_TOLERANCE = um(2000);

export interface BlankGlueLine {
  readonly across: Um;
  /** The same board twice for a joint that it came with. */
  readonly above: StockId;
  readonly below: StockId;
}

export interface BlankArea {
  /** The board and the area it comes from; null: wood between two outlines that do not reach their joint. */
  readonly from: { readonly member: StockId; readonly area: string } | null;
  readonly kind: KeepClearKind;
  readonly area: KeepClearShape;
}

export interface ComposedBlank {
  readonly length: Um;
  readonly width: Um;
  /** Of the thinnest board. */
  readonly thickness: Um;
  readonly strips: readonly BlankStrip[];
  readonly joints: readonly (BlankJoint & { readonly soundAlong: Um })[];
  /** From the upper edge down. */
  readonly glueLines: readonly BlankGlueLine[];
  readonly outline: readonly StockPoint[] | null;
  readonly keepClear: readonly BlankArea[];
  /** Usable parts that hang together with no other and are left out of the outline. */
  readonly leftOut: number;
}

export type BlankRefusal =
  | StripRefusal
  | { readonly reason: "thickness"; readonly thin: StockId; readonly thick: StockId; readonly by: Um }
  | { readonly reason: "no-wood" }
  | { readonly reason: "tangled" }
  | { readonly reason: "too-detailed"; readonly of: "corners" | "areas"; readonly count: number; readonly most: number };

export type BlankOutcome =
  | { readonly ok: true; readonly blank: ComposedBlank }
  | { readonly ok: false; readonly refusal: BlankRefusal };

const refused = (refusal: BlankRefusal): BlankOutcome => ({ ok: false, refusal });

export function composeBlank(plan: BlankPlan): BlankOutcome {
  const placed = blankStrips(plan);
  if (!placed.ok) return refused(placed.refusal);
  const { layout } = placed;
  const uneven = unevenThickness(plan.members);
  if (uneven) return refused(uneven);
  const outlined = blankOutline(plan.members, layout);
  if (!outlined.ok) return refused({ reason: outlined.reason });
  const { outline, holes, leftOut, soundAlong } = outlined;
  const carried = plan.members.flatMap((member, index) => areasOf(member, layout.strips[index]));
  const keepClear = [
    ...carried,
    ...holes.map((points): BlankArea => ({ from: null, kind: "other", area: { shape: "polygon", points } })),
  ];
  const corners = Math.max(
    outline?.length ?? 0,
    ...keepClear.map(({ area }) => (area.shape === "polygon" ? area.points.length : 0)),
  );
  if (corners > MOST_CORNERS) return refused({ reason: "too-detailed", of: "corners", count: corners, most: MOST_CORNERS });
  if (keepClear.length > MOST_AREAS)
    return refused({ reason: "too-detailed", of: "areas", count: keepClear.length, most: MOST_AREAS });
  return {
    ok: true,
    blank: {
      length: layout.length,
      width: layout.width,
      thickness: um(Math.min(...plan.members.map(({ thickness }) => thickness))),
      strips: layout.strips,
      joints: layout.joints.map((joint, index) => ({ ...joint, soundAlong: soundAlong[index] ?? um(0) })),
      glueLines: glueLinesOf(plan.members, layout.strips, layout.joints),
      outline,
      keepClear,
      leftOut,
    },
  };
}

function unevenThickness(members: readonly BlankMember[]): BlankRefusal | null {
  const byThickness = [...members].sort((p, q) => p.thickness - q.thickness || (p.id < q.id ? -1 : 1));
  const [thin, thick] = [byThickness[0], byThickness.at(-1)];
  if (!thin || !thick || thick.thickness - thin.thickness <= THICKNESS_TOLERANCE) return null;
  return { reason: "thickness", thin: thin.id, thick: thick.id, by: um(thick.thickness - thin.thickness) };
}

/**
 * A board's areas where they reach into its strip. Polygons end at the strip; an ellipse cannot, so one that overhangs bars a little of
 * its neighbour too.
 */
function areasOf({ id, keepClear }: BlankMember, strip: BlankStrip | undefined): BlankArea[] {
  if (!strip) return [];
  const { rect, blankFromMember } = strip;
  return keepClear.flatMap(({ id: areaId, kind, area }: KeepClear): BlankArea[] => {
    const moved = movedArea(blankFromMember, area);
    if (!reachesInto(moved, rect)) return [];
    const within = moved.shape === "polygon" ? withinStrip(moved.points, rect) : moved;
    return within ? [{ from: { member: id, area: areaId }, kind, area: within }] : [];
  });
}

function reachesInto(area: KeepClearShape, { x, y, width, height }: BlankStrip["rect"]): boolean {
  const map = { a: 1, b: 0, c: 0, d: 1, tx: -x, ty: -y };
  return liesOnBoard(movedArea(map, area), { length: width, width: height });
}

/** null where nothing is left; left whole where cutting would tie it in knots, which bars more and never less. */
function withinStrip(points: readonly StockPoint[], { y, height }: BlankStrip["rect"]): KeepClearShape | null {
  const cut = cutPolygon(points, [
    { axis: "y", limit: y, keeps: "above" },
    { axis: "y", limit: um(y + height), keeps: "below" },
  ]);
  if (cut.length < 3) return null;
  return { shape: "polygon", points: polygonFault(cut) === null ? cut : points };
}

function glueLinesOf(
  members: readonly BlankMember[],
  strips: readonly BlankStrip[],
  joints: readonly BlankJoint[],
): BlankGlueLine[] {
  const own = members.flatMap(({ id, glueLines }, index): BlankGlueLine[] => {
    const strip = strips[index];
    if (!strip) return [];
    const { rect, blankFromMember } = strip;
    const lines = glueLines.map((across) => movedPoint(blankFromMember, { x: um(0), y: across }).y);
    return lines.filter((y) => y > rect.y && y < rect.y + rect.height).map((across) => ({ across, above: id, below: id }));
  });
  const made = joints.map(({ across, above, below }): BlankGlueLine => ({ across, above, below }));
  return [...made, ...own].sort((p, q) => p.across - q.across || (p.above < q.above ? -1 : 1));
}
