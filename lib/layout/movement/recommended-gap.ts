/**
 * The recommended gap put into a layout: every gap of the face along one line becomes the widest that one of them asks for, so that the
 * reveals stay even. Openings and the face keep their size; the fronts give up what the gaps take.
 */
import { changeFace } from "../pattern/change-face";
import { hungChart } from "../pattern/charts";
import type { Face } from "../pattern/face";
import type { FaceLayout } from "../pattern/face-layout";
import type { SizeStep } from "../pattern/graduate";
import { rulesOf } from "../pattern/rules-of";
import { type Um, um } from "../units/um";
import type { FaceGap } from "./face-gaps";
import { faceMovement } from "./face-movement";
import type { FaceMovement, MovementRequest } from "./movement";

export type RecommendedGap =
  /** `mostGivenUp`: by how much the front that loses most becomes smaller; negative where fronts grow. */
  | { readonly ok: true; readonly layout: FaceLayout; readonly gap: Um; readonly mostGivenUp: Um }
  /** `no-gaps`: the pattern has none to change along this line. `not-known`: see the warnings. `no-room`: a front would come to nothing. */
  | { readonly ok: false; readonly reason: "no-gaps" | "not-known" | "no-room" };

/** Whether the pattern of a face has gaps that can be made as recommended. */
export const canEvenGaps = (face: Face): boolean => rulesOf(face).evenGaps !== undefined;

/** The widest gap that is to be cut at fronts along this line, up to the next step of the rule; null where one is not known. */
export function recommendedGap({ gaps }: FaceMovement, runs: FaceGap["runs"], step: SizeStep): Um | null {
  const between = gaps.filter((gap) => gap.runs === runs && "piece" in gap.b);
  let widest = 0;
  for (const { figures } of between) {
    if (figures === null) return null;
    widest = Math.max(widest, figures.toCut);
  }
  return between.length === 0 ? null : roundedUp(widest, step);
}

/** Up to the next whole step: a gap cut as it is printed is still wide enough. */
export function roundedUp(length: number, { um: whole, parts }: SizeStep): Um {
  return um(Math.ceil((Math.ceil((length * parts) / whole) * whole) / parts));
}

/** Narrower fronts move less, so a second round seldom asks for more; a few are enough. */
const MOST_ROUNDS = 8;

export function withRecommendedGap(request: MovementRequest, runs: FaceGap["runs"], step: SizeStep): RecommendedGap {
  const { face } = request.layout;
  const { evenGaps } = rulesOf(face);
  if (evenGaps === undefined) return { ok: false, reason: "no-gaps" };
  let layout = request.layout;
  for (let round = 0, gap = um(0); round < MOST_ROUNDS; round++) {
    const movement = faceMovement({ ...request, layout });
    if (!movement.gaps.some((one) => one.runs === runs && "piece" in one.b)) return { ok: false, reason: "no-gaps" };
    const wanted = recommendedGap(movement, runs, step);
    if (wanted === null) return { ok: false, reason: "not-known" };
    if (round > 0 && wanted <= gap) return { ok: true, layout, gap, mostGivenUp: mostGivenUp(request.layout, layout, runs) };
    gap = wanted;
    const changed = evenGaps(face, runs === "sideways" ? "columns" : "rows", gap);
    if (changed === null) return { ok: false, reason: "no-room" };
    layout = changeFace(request.layout, changed).layout;
  }
  return { ok: false, reason: "no-room" };
}

function mostGivenUp(before: FaceLayout, after: FaceLayout, runs: FaceGap["runs"]): Um {
  const side = runs === "sideways" ? "width" : "height";
  const now = hungChart(after.face);
  return um(Math.max(...hungChart(before.face).map(({ rect }, index) => rect[side] - (now[index]?.rect[side] ?? 0))));
}
