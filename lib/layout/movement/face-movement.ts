/** Every gap of a face through the year, and what to be warned of. */
import { faceGaps } from "./face-gaps";
import { gapAfter, gapToCut } from "./gap-through-year";
import type { FaceMovement, GapFigures, MovementRequest } from "./movement";
import { movementWarnings } from "./movement-warnings";
import { acrossShare, type MovingFace, movingFace, strainsAt } from "./strains";

export function faceMovement(request: MovementRequest): FaceMovement {
  const face = movingFace(request);
  const gaps = faceGaps(request.layout, request.around).map((gap) => ({
    ...gap,
    across: acrossShare(face, gap.a, gap.runs),
    figures: figuresOf(face, gap),
  }));
  return { gaps, warnings: movementWarnings(face, gaps) };
}

function figuresOf(face: MovingFace, gap: Parameters<typeof strainsAt>[1]): GapFigures | null {
  const { year, leastGap } = face.request;
  const driest = strainsAt(face, gap, year.driest);
  const dampest = strainsAt(face, gap, year.dampest);
  if (driest === null || dampest === null) return null;
  return {
    driest: gapAfter(gap.gap, gap, driest),
    dampest: gapAfter(gap.gap, gap, dampest),
    toCut: gapToCut(leastGap, gap, [driest, dampest]),
  };
}
