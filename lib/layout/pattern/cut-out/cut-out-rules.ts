/**
 * Fronts cut out of a rail and set back into it. In the spaced chart the strips lie along the grain exactly as they hang, so that a
 * strip never drifts along it and the place of a part in the wood, less its place on the rail, is what has to be moved for gluing.
 * Everything between two strips is one ripped row: the fronts' gaps above and below them come out of it.
 */
import type { FaceRect } from "../../frame/point";
import type { Um } from "../../units/um";
import type { CutOutFace, EdgeAmounts } from "../face";
import type { ChartPlace, CutSettings, PatternRules, SeamPlace } from "../pattern-rules";
import { inReadingOrder, seamBetween } from "../seam-between";
import { cutOutFaults } from "./cut-out-faults";
import { lossAcross, offsetsOfRow } from "./cut-out-losses";
import {
  type CutOutPiece,
  countOfCutOut,
  hungRect,
  hungStretches,
  indexOfPart,
  lengthOfRow,
  piecesOfCutOut,
} from "./cut-out-pieces";
import { byEdge, bySide, rectOnFace } from "./rail-axes";

export const cutOutRules: PatternRules<CutOutFace> = {
  count: countOfCutOut,
  pieces: (face) => piecesOfCutOut(face).map((piece) => ({ role: piece.role, rect: hungRect(face, piece) })),
  size: (face) => {
    const across = [...face.strips, ...face.rows.map(({ height }) => height)].reduce((sum, one) => sum + one, 0);
    const { width, height } = rectOnFace(face.grain, { start: 0, size: lengthOfRow(face, 0) }, { start: 0, size: across });
    return { width, height };
  },
  places: placesOfCutOut,
  cleanUps: (layout) => piecesOfCutOut(layout.face).map((piece) => cleanUpOf(layout, piece)),
  seams: seamsOfCutOut,
  faults: cutOutFaults,
  evenGaps: withGaps,
};

/** The gap on both sides of every front, in its opening as it is; null where that leaves nothing of a front. */
function withGaps(face: CutOutFace, axis: "columns" | "rows", gap: Um): CutOutFace | null {
  const sides = axis === "columns" ? { left: gap, right: gap } : { top: gap, bottom: gap };
  const changed = { ...face, gap: { ...face.gap, ...sides } };
  return cutOutFaults(changed).length === 0 ? changed : null;
}

function placesOfCutOut(layout: CutSettings<CutOutFace>): ChartPlace[] {
  const { face } = layout;
  const offsets = face.rows.map((_, row) => offsetsOfRow(layout, row));
  const loss = lossAcross(layout);
  return piecesOfCutOut(face).map((piece) => {
    const { along, across } = hungStretches(face, piece);
    const strip = piece.role === "strip";
    const offset = strip ? 0 : (offsets[piece.row]?.[piece.part] ?? 0);
    const rips = strip ? 2 * piece.strip : 2 * piece.row + 1;
    const lying = { along: { ...along, start: along.start + offset }, across: { ...across, start: across.start + rips * loss } };
    return { rect: rectOnFace(face.grain, lying.along, lying.across), mirrored: "no", anchors: strip };
  });
}

function cleanUpOf({ face, crosscut, rip }: CutSettings<CutOutFace>, piece: CutOutPiece): EdgeAmounts {
  const jointed = face.rails === "jointed";
  const ripped = { above: jointed ? rip.cleanUpAfter : 0, below: jointed ? rip.cleanUpBefore : 0 };
  if (piece.role !== "front") {
    return byEdge({ near: crosscut.cleanUpAfter, far: crosscut.cleanUpBefore, ...ripped }, face.grain);
  }
  const { above, below } = bySide(face.gap, face.grain);
  const trimmed = { above: ripped.above + above, below: ripped.below + below };
  return byEdge({ near: face.fitting, far: face.fitting, ...trimmed }, face.grain);
}

function seamsOfCutOut(face: CutOutFace): SeamPlace[] {
  const rects: FaceRect[] = piecesOfCutOut(face).map((piece) => hungRect(face, piece));
  const [along, across] = face.grain === "horizontal" ? (["right", "down"] as const) : (["down", "right"] as const);
  const between = (a: number, b: number, normal: SeamPlace["normal"]): SeamPlace[] => {
    const [first, second] = [rects[a], rects[b]];
    return first && second ? [seamBetween({ index: a, rect: first }, { index: b, rect: second }, normal)] : [];
  };
  const seams = face.rows.flatMap(({ parts }, row) => {
    const first = indexOfPart(face, row, 0);
    const next = first + parts.length;
    return parts.flatMap((_, part) => [
      ...between(first - 1, first + part, across),
      ...(part + 1 < parts.length ? between(first + part, first + part + 1, along) : []),
      ...between(first + part, next, across),
    ]);
  });
  return inReadingOrder(seams);
}
