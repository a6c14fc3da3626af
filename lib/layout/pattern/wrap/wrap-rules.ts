/**
 * A run round corners, unfolded: sides in a row, at the hung gaps of their corners as seen and at the losses of their corners in the
 * wood. A closed run starts and ends with the corner that closes it; there no cut parts neighbours, and the figure cannot run on.
 */
import { type Um, um } from "../../units/um";
import type { EdgeAmounts, WrapCorner, WrapFace } from "../face";
import { cutBetween, spacingAt } from "../loss";
import type { ChartPlace, CutSettings, PatternRules, SeamPlace } from "../pattern-rules";
import { pieceIdAt } from "../piece-names";
import { lengthOf, type Run, startsOf } from "../run";
import { seamBetween } from "../seam-between";
import { hungGapOf, innerBeyond, kerfAtCorner, lossAtCorner, sideCut } from "./corner-loss";
import { wrapFaults } from "./wrap-faults";

export const wrapRules: PatternRules<WrapFace> = {
  count: ({ sides }) => sides.length,
  pieces: (face) => rectsOf(hungRun(face), face.height).map((rect) => ({ role: "side", rect })),
  size: (face) => ({ width: lengthOf(hungRun(face)), height: face.height }),
  places: (layout) =>
    rectsOf(spacedRun(layout), layout.face.height).map((rect): ChartPlace => ({ rect, mirrored: "no", anchors: true })),
  cleanUps: (layout) => layout.face.sides.map((_, side) => cleanUpOf(layout, side)),
  seams: seamsOfWrap,
  // At a butt the edge of the covering part is seen, as a gap of its thickness.
  openSeams: ({ corners }) => corners.map(({ kind }) => kind === "gap"),
  faults: wrapFaults,
  stockThickness: ({ thickness }) => thickness,
};

/** The corners between neighbours of the unfolded run: all but the one that closes it. */
export function cornersWithin({ sides, corners }: WrapFace): readonly WrapCorner[] {
  return corners.slice(0, sides.length - 1);
}

/** The corners at the near and the far end of a side; null at the ends of an open run. */
export function cornersOf({ sides, corners, closed }: WrapFace, side: number): readonly [WrapCorner | null, WrapCorner | null] {
  const last = closed ? (corners[sides.length - 1] ?? null) : null;
  return [corners[side - 1] ?? last, side < sides.length - 1 ? (corners[side] ?? null) : last];
}

export function hungRun(face: WrapFace): Run {
  return { sizes: face.sides, between: cornersWithin(face).map((corner) => hungGapOf(corner, face.thickness)) };
}

function spacedRun(layout: CutSettings<WrapFace>): Run {
  const { face, spacing } = layout;
  const between = cornersWithin(face).map((corner) =>
    spacingAt(lossAtCorner(layout, corner).show, hungGapOf(corner, face.thickness), spacing),
  );
  return { sizes: face.sides, between };
}

function rectsOf(run: Run, height: Um) {
  const starts = startsOf(run);
  return run.sizes.map((width, index) => ({ x: starts[index] ?? um(0), y: um(0), width, height }));
}

/** Where an inner face reaches beyond its show edge the blank does, too; what a tilted blade takes more is the next side's recut. */
function cleanUpOf(layout: CutSettings<WrapFace>, side: number): EdgeAmounts {
  const { face } = layout;
  const [near, far] = cornersOf(face, side);
  const cut = sideCut(layout);
  const reach = (corner: WrapCorner | null) => (corner === null ? 0 : Math.max(0, innerBeyond(corner, face.thickness)));
  const recut = near === null || side === 0 ? 0 : kerfAtCorner(near, cut.kerf) - cut.kerf;
  const row = layout[cutBetween("rows", face.grain)];
  return {
    left: um(cut.cleanUpAfter + reach(near) + recut),
    right: um(cut.cleanUpBefore + reach(far)),
    top: row.cleanUpAfter,
    bottom: row.cleanUpBefore,
  };
}

function seamsOfWrap(face: WrapFace): SeamPlace[] {
  const rects = rectsOf(hungRun(face), face.height);
  return rects.flatMap((rect, index): SeamPlace[] => {
    const next = rects[index + 1];
    if (next !== undefined) return [seamBetween({ index, rect }, { index: index + 1, rect: next }, "right")];
    const corner = face.closed ? face.corners[index] : undefined;
    if (corner === undefined) return [];
    const from = { x: um(rect.x + rect.width), y: um(0) };
    const facing = { x: um(0), y: um(0) };
    const gap = hungGapOf(corner, face.thickness);
    return [{ a: pieceIdAt(index), b: pieceIdAt(0), from, to: { x: from.x, y: face.height }, facing, gap, normal: "right" }];
  });
}
