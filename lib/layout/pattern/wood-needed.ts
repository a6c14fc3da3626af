/**
 * The wood that a face takes where all of it lies in one piece as its pattern spaces it: every piece as it leaves the saw, and the
 * losses between. What a board's own ends and edges need beyond that is not in it.
 */
import { boundsOf } from "../frame/apply-isometry";
import { type Um, um } from "../units/um";
import { outlineOf, spacedChart } from "./charts";
import type { FaceLayout } from "./face-layout";
import { ofPiece } from "./piece-ids";
import { pieceIdAt } from "./piece-names";
import { rulesOf } from "./rules-of";

/** Along the grain and across it, µm. */
export interface WoodNeeded {
  readonly length: Um;
  readonly width: Um;
}

export function woodNeeded(layout: FaceLayout): WoodNeeded {
  const cleanUps = rulesOf(layout.face).cleanUps(layout);
  const corners = spacedChart(layout).flatMap(({ rect, mirrored }, index) => {
    const { left, right, top, bottom } = ofPiece(cleanUps, pieceIdAt(index));
    const [before, after] = mirrored === "leftRight" ? [right, left] : [left, right];
    const [above, below] = mirrored === "topBottom" ? [bottom, top] : [top, bottom];
    return outlineOf({
      x: um(rect.x - before),
      y: um(rect.y - above),
      width: um(rect.width + before + after),
      height: um(rect.height + above + below),
    });
  });
  const { width, height } = boundsOf(corners);
  return layout.face.grain === "horizontal" ? { length: width, width: height } : { length: height, width };
}
