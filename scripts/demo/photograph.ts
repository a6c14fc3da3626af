/** Takes one photograph of the demo: wood from the sawmill in front of a camera, as the JPEG file a phone would send. */
import sharp from "sharp";
import { sawBoard } from "@/lib/sawmill/board-face";
import type { KnotTruth } from "@/lib/sawmill/knots-on-face";
import type { FourPoints } from "@/lib/sawmill/photograph";
import { photographBoard } from "@/lib/sawmill/photograph-board";
import { type SapwoodReach, sapwoodAtFarEdge } from "@/lib/sawmill/sapwood-on-face";
import type { DemoPhoto } from "./boards";

/** The file with what a maker would see on it: corners in pixels, knots and sapwood in mm of the face. */
export interface TakenPhoto {
  readonly jpeg: Uint8Array;
  readonly cornersPx: FourPoints;
  readonly sheetCornersPx: FourPoints | null;
  readonly knots: readonly KnotTruth[];
  readonly sapwood: readonly SapwoodReach[];
}

export interface PhotoWish {
  readonly photo: DemoPhoto;
  /** Share of the full number of pixels along each side: 1 for the demo, less for a quick look. */
  readonly scale: number;
  /** ISO 8601 with seconds. */
  readonly takenAt: string;
}

/** An invented phone. Its lens bends nothing, so four corners bring a photograph wholly to scale. */
const camera = { Make: "Fernhill", Model: "Pocket 3" };
// mm, as EXIF writes it. Common for a phone's main camera, whose 70° the sawmill's camera has.
const focalLength = "57/10";
// As many corners as a patient hand would give the border of the sapwood.
const sapwoodPlaces = 16;

export async function photograph({ photo, scale, takenAt }: PhotoWish): Promise<TakenPhoto> {
  const { sheet, ...wood } = photo.wood;
  const frame = { widthPx: Math.round(photo.widthPx * scale), heightPx: Math.round(photo.heightPx * scale) };
  const { rgb, width, height, truth } = photographBoard({ ...wood, photo: frame, ...(sheet && { card: sheet }) });
  const [date = "", time = ""] = takenAt.slice(0, 19).split("T");
  const jpeg = await sharp(rgb, { raw: { width, height, channels: 3 } })
    .withExif({
      IFD0: camera,
      IFD2: {
        DateTimeOriginal: `${date.replaceAll("-", ":")} ${time}`,
        OffsetTimeOriginal: "+00:00",
        FocalLength: focalLength,
      },
    })
    .jpeg({ quality: 90 })
    .toBuffer();
  const { log, plane } = sawBoard(wood);
  return {
    jpeg: new Uint8Array(jpeg),
    cornersPx: truth.cornersPx,
    sheetCornersPx: truth.cardCornersPx,
    knots: truth.knots,
    sapwood: sapwoodAtFarEdge(log, plane, wood, sapwoodPlaces),
  };
}
