/**
 * A marked photograph brought to scale: where every photo point lies on the wood, how big the board is, how well the marks agree,
 * and the scale of the straightened picture. Refuses marks from which nothing right can come. Moves no pixels.
 */
import { type Um, umFromMm } from "../units/um";
import { boardExtent } from "./board-extent";
import { fitAtK1, type ReferenceFit } from "./fit-at-k1";
import { rootMeanSquare } from "./fit-homography";
import { FEWEST_EDGE_POINTS, fitLens, type LensOutcome } from "./fit-lens";
import {
  applyHomography,
  composeHomographies,
  depthAt,
  type Homography,
  identityHomography,
  invertHomography,
  type MmPoint,
} from "./homography";
import { flatFromPhoto, type PhotoSize } from "./lens";
import type { Marking } from "./marking";
import { checkCorners, checkQuadrilateral, GREATEST_DEPTH_RATIO, type MarksRefusal, outsidePhotoPx } from "./marks-check";
import { type OutputScale, outputScale, photoPxPerMmAt } from "./output-scale";
import { type PhotoGeometry, stockMmFromPhoto } from "./photo-geometry";
import { sheetLooksTurned } from "./sheet-sides";

/** How far off one mark is, mm on the wood. */
export interface MarkResidual {
  readonly mark: "corner" | "extra" | "edge";
  /** Into the reference's corners, `extraPoints` or `edgePoints`. */
  readonly index: number;
  readonly mm: number;
}

export type MarkingFit =
  | {
      readonly ok: true;
      readonly geometry: PhotoGeometry;
      /** The board: as given, or as measured by the sheet. */
      readonly length: Um;
      readonly width: Um;
      /** The board's marked corners in the stock frame, mm; the rectangle's own corners where the board is the reference and four marks fix it. */
      readonly cornersMm: readonly MmPoint[];
      readonly residuals: readonly MarkResidual[];
      /** Root mean square of the residuals of corners and extra points; 0 with four corners alone, which always agree. */
      readonly rmsMm: number;
      readonly lens: LensOutcome;
      /** How far the worst corner of the board moves on the wood when one reference corner is marked one pixel off. */
      readonly mmPerPixelOfMark: number;
      readonly scale: OutputScale;
      /** Length and width of the sheet seem to have changed places; always false with the board as reference. */
      readonly sheetLooksTurned: boolean;
    }
  | { readonly ok: false; readonly refusal: MarksRefusal };

/**
 * More than a shaky hand: px in the photo, turned to mm at the middle of the board. Least squares spreads the slip of a fifth mark over
 * all five and leaves about a seventh of it at the worst, so 6 px stand for a slip of about 40.
 */
const RESIDUAL_LIMIT_PX = 6;
const EDGE_LIMIT_PX = 30;

const refused = (refusal: MarksRefusal): MarkingFit => ({ ok: false, refusal });

/** Brings the marked photo to scale, or says why not. `photo`: size of the upright photo the marks were made on. */
export function fitMarking(marking: Marking, photo: PhotoSize): MarkingFit {
  const refusal = checkMarks(marking, photo);
  if (refusal !== null) return refused(refusal);
  const straight = fitAtK1(marking, photo, 0);
  if (straight === null) return refused({ reason: "in-line", of: marking.reference.kind, corner: 0, angleDeg: 0 });

  const lens = chooseLens(marking, photo);
  const fit = lens.kind === "taken-out" ? (fitAtK1(marking, photo, lens.k1) ?? straight) : straight;
  const placed = placeBoard(marking, fit);
  if (!placed.ok) return refused(placed.refusal);
  const { geometry, lengthMm, widthMm } = placed;
  const disagreement = checkResiduals(marking, fit, 1 / photoPxPerMmAt(geometry, { x: lengthMm / 2, y: widthMm / 2 }));
  if (disagreement !== null) return refused(disagreement);

  return {
    ok: true,
    geometry,
    length: umFromMm(lengthMm),
    width: umFromMm(widthMm),
    cornersMm: marking.corners.map((corner) => stockMmFromPhoto(geometry, corner)),
    residuals: fit.residuals,
    rmsMm: rootMeanSquare(fit.residuals.filter(({ mark }) => mark !== "edge").map(({ mm }) => mm)),
    lens,
    mmPerPixelOfMark: mmPerPixelOfMark(marking, photo, fit),
    scale: outputScale(geometry, lengthMm, widthMm),
    sheetLooksTurned: looksTurned(marking, fit),
  };
}

function checkMarks(marking: Marking, photo: PhotoSize): MarksRefusal | null {
  const { reference, corners } = marking;
  const groups = [
    ["corner", corners],
    ["sheet-corner", reference.kind === "sheet" ? reference.corners : []],
    ["extra", marking.extraPoints.map((point) => point.photo)],
    ["edge", marking.edgePoints.map((point) => point.photo)],
  ] as const;
  for (const [mark, points] of groups) {
    for (const [index, point] of points.entries()) {
      const byPx = outsidePhotoPx(point, photo);
      if (byPx > 0) return { reason: "outside-photo", mark, index, byPx };
    }
  }
  if (reference.kind === "board") return checkCorners("board", corners, reference.length / 1000, reference.width / 1000);
  return (
    checkCorners("sheet", reference.corners, reference.length / 1000, reference.width / 1000) ??
    checkQuadrilateral("board", corners)
  );
}

function chooseLens(marking: Marking, photo: PhotoSize): LensOutcome {
  const points = marking.edgePoints.length;
  if (points === 0) return { kind: "not-asked" };
  if (points < FEWEST_EDGE_POINTS) return { kind: "too-few", points, needed: FEWEST_EDGE_POINTS };
  // Four corners use up what the homography asks for; every further mark spares two conditions, every edge point one.
  return fitLens((k1) => fitAtK1(marking, photo, k1)?.leftOver ?? null, points + 2 * marking.extraPoints.length);
}

type PlacedBoard =
  | { readonly ok: true; readonly geometry: PhotoGeometry; readonly lengthMm: number; readonly widthMm: number }
  | { readonly ok: false; readonly refusal: MarksRefusal };

/** Puts the stock frame on the board. A board measured by a sheet is judged only here, where its size is known. */
function placeBoard(marking: Marking, fit: ReferenceFit): PlacedBoard {
  const { reference, corners } = marking;
  const flat = corners.map((corner) => flatFromPhoto(fit.lens, corner));
  if (flat.some((p) => !(depthAt(fit.referenceMmFromFlat, p) > 0))) {
    const ratio = Number.POSITIVE_INFINITY;
    return { ok: false, refusal: { reason: "scale-varies", of: "board", ratio, limit: GREATEST_DEPTH_RATIO } };
  }
  const extent =
    reference.kind === "board"
      ? { stockMmFromSheetMm: identityHomography, lengthMm: reference.length / 1000, widthMm: reference.width / 1000 }
      : boardExtent(flat.map((p) => applyHomography(fit.referenceMmFromFlat, p)));
  const { lengthMm, widthMm } = extent;
  const refusal = reference.kind === "board" ? null : checkCorners("board", corners, lengthMm, widthMm);
  if (refusal !== null) return { ok: false, refusal };
  const stockMmFromFlat = composeHomographies(extent.stockMmFromSheetMm, fit.referenceMmFromFlat);
  const flatFromStockMm = invertHomography(stockMmFromFlat);
  if (flatFromStockMm === null) return { ok: false, refusal: { reason: "in-line", of: "board", corner: 0, angleDeg: 0 } };
  return { ok: true, geometry: { lens: fit.lens, stockMmFromFlat, flatFromStockMm }, lengthMm, widthMm };
}

function checkResiduals(marking: Marking, fit: ReferenceFit, mmPerPx: number): MarksRefusal | null {
  const worst = (kinds: readonly MarkResidual["mark"][]): MarkResidual | null =>
    fit.residuals
      .filter(({ mark }) => kinds.includes(mark))
      .reduce<MarkResidual | null>((most, residual) => (most === null || residual.mm > most.mm ? residual : most), null);
  const edge = worst(["edge"]);
  if (edge !== null && edge.mm > EDGE_LIMIT_PX * mmPerPx) {
    const on = marking.edgePoints[edge.index]?.edge ?? "top";
    return { reason: "edge-point-off", index: edge.index, edge: on, mm: edge.mm, limitMm: EDGE_LIMIT_PX * mmPerPx };
  }
  const mark = worst(["corner", "extra"]);
  if (mark === null || mark.mm <= RESIDUAL_LIMIT_PX * mmPerPx) return null;
  return { reason: "residual", worst: mark.mark, index: mark.index, mm: mark.mm, limitMm: RESIDUAL_LIMIT_PX * mmPerPx };
}

function looksTurned({ reference }: Marking, fit: ReferenceFit): boolean {
  const flatFromSheetMm = reference.kind === "sheet" ? invertHomography(fit.referenceMmFromFlat) : null;
  return flatFromSheetMm !== null && sheetLooksTurned(flatFromSheetMm, reference.length / 1000, reference.width / 1000);
}

/** Each reference corner moved by a pixel along x and along y in turn, the lens held. */
function mmPerPixelOfMark(marking: Marking, photo: PhotoSize, fit: ReferenceFit): number {
  const board = (map: Homography): MmPoint[] =>
    marking.corners.map((corner) => applyHomography(map, flatFromPhoto(fit.lens, corner)));
  const now = board(fit.referenceMmFromFlat);
  let worst = 0;
  for (let corner = 0; corner < 4; corner++) {
    for (const [dx, dy] of [
      [1, 0],
      [0, 1],
    ] as const) {
      const shifted = fitAtK1(shiftReferenceCorner(marking, corner, dx, dy), photo, fit.lens.k1);
      if (shifted === null) return Number.POSITIVE_INFINITY;
      for (const [i, p] of board(shifted.referenceMmFromFlat).entries()) {
        const before = now[i] as MmPoint;
        worst = Math.max(worst, Math.hypot(p.x - before.x, p.y - before.y));
      }
    }
  }
  return worst;
}

function shiftReferenceCorner(marking: Marking, corner: number, dx: number, dy: number): Marking {
  const { reference } = marking;
  const [a, b, c, d] = (reference.kind === "sheet" ? reference.corners : marking.corners).map((p, i) =>
    i === corner ? { x: p.x + dx, y: p.y + dy } : p,
  );
  if (a === undefined || b === undefined || c === undefined || d === undefined) return marking;
  if (reference.kind === "sheet") return { ...marking, reference: { ...reference, corners: [a, b, c, d] } };
  return { ...marking, corners: [a, b, c, d] };
}
