/**
 * Reads the seams of a face from the pictures of its boards: through the piece maps alone, so turned and mirrored pieces and pieces
 * of different boards are read alike.
 */
import type { Piece, StockId } from "../piece";
import type { Seam } from "../seam/seam";
import { compareEdges, runsAlong } from "./compare-edges";
import { type EdgeMap, edgeMap, edgePatch, SAMPLE_MM } from "./edge-patch";
import { DIRECTION_MM, type EdgeProfile, edgeProfile, PROFILE_MM } from "./edge-profile";
import { meanColour } from "./mean-colour";
import type { CannotTell, SeamFigure, SeamReading } from "./seam-reading";
import type { StockPicture } from "./stock-picture";
import { type Stretch, stretchInside } from "./stretch-inside";

/**
 * Least length that is compared: at the greatest lag, 8 mm, four fifths of it still overlap, and it holds twice the 20 mm that tell
 * figure from tone.
 */
const LEAST_MM = 40;

/** The straightened picture of a board, or null where there is none. */
export type PictureOf = (stockId: StockId) => StockPicture | null;

/** One reading a seam, in the order of the seams. */
export function readSeams(seams: readonly Seam[], pieces: readonly Piece[], pictureOf: PictureOf): SeamReading[] {
  const byId = new Map(pieces.map((piece) => [piece.id, piece]));
  return seams.map((seam) => {
    const a = sideOf(seam, byId.get(seam.a), pictureOf, "a");
    const b = sideOf(seam, byId.get(seam.b), pictureOf, "b");
    return { a: seam.a, b: seam.b, meanA: colourOf(a), meanB: colourOf(b), figure: figureOf(a, b) };
  });
}

/** One side of a seam on its board's picture. */
interface Side {
  readonly picture: StockPicture;
  readonly map: EdgeMap;
  /** The whole seam, and what of it this side's picture shows. */
  readonly whole: Stretch;
  readonly shown: Stretch;
}

type SideOrReason = Side | Extract<CannotTell, "notLaid" | "noPicture">;

function sideOf(
  { from, to, facing, normal }: Seam,
  piece: Piece | undefined,
  pictureOf: PictureOf,
  which: "a" | "b",
): SideOrReason {
  if (piece === undefined) return "notLaid";
  const picture = pictureOf(piece.stockId);
  if (picture === null) return "noPicture";
  const n = normal === "right" ? { x: 1, y: 0 } : { x: 0, y: 1 };
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const along = length > 0 ? { x: (to.x - from.x) / length, y: (to.y - from.y) / length } : { x: n.y, y: n.x };
  const edge =
    which === "a" ? { x: from.x, y: from.y, along, into: { x: -n.x, y: -n.y } } : { x: facing.x, y: facing.y, along, into: n };
  const map = edgeMap(edge, piece.stockFromFace, picture.pxPerMm);
  const whole = { fromMm: 0, toMm: length / 1000 };
  return { picture, map, whole, shown: stretchInside(whole, map, PROFILE_MM, picture.pixels) };
}

function colourOf(side: SideOrReason): SeamReading["meanA"] {
  return typeof side === "string" ? null : meanColour(side.picture, side.map, side.shown, PROFILE_MM);
}

function figureOf(a: SideOrReason, b: SideOrReason): SeamFigure {
  if (typeof a === "string") return cannotTell(a);
  if (typeof b === "string") return cannotTell(b);
  if (a.whole.toMm < LEAST_MM) return cannotTell("tooShort");
  // The stock's x axis is the grain, so a seam along it is one whatever the picture seems to show.
  if ([a, b].some(({ map }) => runsAlong(Math.atan2(map.alongX, map.alongY)))) return cannotTell("grainAlongSeam");
  const fromMm = Math.max(a.shown.fromMm, b.shown.fromMm);
  const toMm = Math.min(a.shown.toMm, b.shown.toMm);
  if (toMm - fromMm < LEAST_MM) return cannotTell("outsidePicture");
  return compareEdges(profileOf(a, fromMm, toMm), profileOf(b, fromMm, toMm));
}

function profileOf({ picture, map }: Side, fromMm: number, toMm: number): EdgeProfile {
  const length = Math.floor((toMm - fromMm) / SAMPLE_MM);
  return edgeProfile(edgePatch(picture, map, fromMm, length, DIRECTION_MM / SAMPLE_MM));
}

function cannotTell(why: CannotTell): SeamFigure {
  return { kind: "cannotTell", why };
}
