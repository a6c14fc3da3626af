/**
 * What a corner takes of the run (engine: patterns on solid stock, wrap). With T the thickness, α the turn, θ = α / 2 and k the kerf:
 *
 *   hung gap on the show face      gap: as given · butt: T / sin α, the covering side's end as seen · mitre: 0
 *   inner face beyond the show edge, at each of the two ends
 *                                  gap: 0 · butt: T · cot α · mitre: −T · tan θ
 *   show face loses                parted by a square cut: k and what the ends reach beyond their show edges;
 *                                  by one bevel: k / cos θ
 *   inner face loses               what the show face loses, less what the two inner faces reach beyond
 *
 * so a mitre loses k and k + 2 · T · tan θ, or k / cos θ and k / cos θ + 2 · T · tan θ. The ends of a butt lie in the other side's
 * planes, which at a square corner are square cuts. Clean-up comes on top of each. Lengths in µm.
 */
import { type Um, um } from "../../units/um";
import type { WrapCorner, WrapFace } from "../face";
import type { CutLoss } from "../face-layout";
import { cutBetween, lossOf } from "../loss";
import type { CutSettings } from "../pattern-rules";

const radians = (degrees: number) => (degrees * Math.PI) / 180;

/** What hangs between the show edges of two sides on the unfolded face. */
export function hungGapOf(corner: WrapCorner, thickness: Um): Um {
  if (corner.kind === "gap") return corner.gap;
  return corner.kind === "mitre" ? um(0) : um(Math.round(thickness / Math.sin(radians(corner.turnDeg))));
}

/** How far the inner face of either side reaches beyond its show edge; negative where it falls short of it. */
export function innerBeyond(corner: WrapCorner, thickness: Um): Um {
  if (corner.kind === "gap") return um(0);
  if (corner.kind === "mitre") return um(Math.round(-thickness * Math.tan(radians(corner.turnDeg / 2))));
  return um(Math.round(thickness / Math.tan(radians(corner.turnDeg))));
}

/** What the blade takes where it goes through the show face: more than its width where it is tilted. */
export function kerfAtCorner(corner: WrapCorner, kerf: Um): Um {
  const tilted = corner.kind === "mitre" && corner.parting === "oneBevel";
  return tilted ? um(Math.round(kerf / Math.cos(radians(corner.turnDeg / 2)))) : kerf;
}

/** The bevel of both ends from square, degrees. */
export function bevelDegOf(corner: WrapCorner): number {
  if (corner.kind === "gap") return 0;
  return corner.kind === "mitre" ? corner.turnDeg / 2 : Math.abs(90 - corner.turnDeg);
}

/** The cut that parts the sides. */
export function sideCut(layout: CutSettings<WrapFace>): CutLoss {
  return layout[cutBetween("columns", layout.face.grain)];
}

/** Wood that is gone between the show edges of two sides, and between their inner edges, where one cut parts them. */
export function lossAtCorner(layout: CutSettings<WrapFace>, corner: WrapCorner): { readonly show: Um; readonly inner: Um } {
  const cut = sideCut(layout);
  const beyond = innerBeyond(corner, layout.face.thickness);
  const show = lossOf({ ...cut, kerf: kerfAtCorner(corner, cut.kerf) }) + 2 * Math.max(0, beyond);
  return { show: um(show), inner: um(show - 2 * beyond) };
}
