/** A doubt worth telling: whether length and width of a marked sheet have changed places. A hint, never a correction. */
import { type Homography, jacobianAt } from "./homography";

/** How much better the other way round must fit before it is spoken of; a camera tilted by 45 degrees stays below it with A4. */
const CLEARLY_BETTER = 1.25;

/**
 * Cameras have square pixels, so a sheet seen from above holds as many px/mm along as across. True where that would come out
 * clearly better with the sides exchanged. A sheet seen at a slant of 60 degrees can look the same: measuring a known distance tells.
 */
export function sheetLooksTurned(flatFromSheetMm: Homography, lengthMm: number, widthMm: number): boolean {
  const j = jacobianAt(flatFromSheetMm, { x: lengthMm / 2, y: widthMm / 2 });
  const asMarked = Math.log(Math.hypot(j.xx, j.yx) / Math.hypot(j.xy, j.yy));
  const exchanged = asMarked + 2 * Math.log(lengthMm / widthMm);
  return Math.abs(exchanged) + Math.log(CLEARLY_BETTER) < Math.abs(asMarked);
}
