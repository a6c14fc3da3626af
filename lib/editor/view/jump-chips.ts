/**
 * Where the jump of each seam is written on the show side: under the bottom row and beside the last column, on paper; inside the face only where there is
 * something to say, since a chip covers wood. Chips that would lie on each other give way to those with a jump.
 */
import { type LengthStyle, type Piece, type PieceId, printedLength, type Seam, type Um, type UmRange, um } from "@/lib/layout";
import { seamRelation } from "../selectors/seam-relation";
import type { Size, TableGeometry } from "./geometry";

export interface JumpChip {
  /** Middle of the chip on the show side, px from the origin of the face. */
  readonly x: number;
  readonly y: number;
  readonly lines: readonly string[];
  readonly jumps: boolean;
}

export const CHIP_SIZE: Size = { width: 78, height: 20 };
const TWO_LINES_HEIGHT = 36;
const AWAY_FROM_FACE_PX = 8;

export function chipHeight({ lines }: Pick<JumpChip, "lines">): number {
  return lines.length > 1 ? TWO_LINES_HEIGHT : CHIP_SIZE.height;
}

/** `pieces`: those on wood; a seam beside one that is not gets no chip. `face`: size of the face, µm. */
export function jumpChips(
  seams: readonly Seam[],
  pieces: ReadonlyMap<PieceId, Piece>,
  face: { readonly width: Um; readonly height: Um },
  { showPxPerMm }: Pick<TableGeometry, "showPxPerMm">,
  style: LengthStyle,
): JumpChip[] {
  const px = (length: number) => (length / 1000) * showPxPerMm;
  const wanted = seams.flatMap((seam): JumpChip[] => {
    const lines = jumpLines(seam, pieces, style);
    if (lines.length === 0) return [];
    const jumps = lines.length > 1;
    const across = seam.normal === "right" ? px(seam.from.x) + px(seam.gap) / 2 : (px(seam.from.x) + px(seam.to.x)) / 2;
    const down = seam.normal === "right" ? (px(seam.from.y) + px(seam.to.y)) / 2 : px(seam.from.y) + px(seam.gap) / 2;
    const height = chipHeight({ lines });
    if (seam.normal === "right" && seam.to.y === face.height) {
      return [{ x: across, y: px(face.height) + AWAY_FROM_FACE_PX + height / 2, lines, jumps }];
    }
    if (seam.normal === "down" && seam.to.x === face.width) {
      return [{ x: px(face.width) + AWAY_FROM_FACE_PX + CHIP_SIZE.width / 2, y: down, lines, jumps }];
    }
    return jumps ? [{ x: across, y: down, lines, jumps }] : [];
  });
  const placed: JumpChip[] = [];
  for (const chip of [...wanted.filter(({ jumps }) => jumps), ...wanted.filter(({ jumps }) => !jumps)]) {
    if (!placed.some((other) => overlap(chip, other))) placed.push(chip);
  }
  return placed;
}

/** A jump as a figure: the end of the range that is further from none. */
export function jumpOf({ min, max }: UmRange): Um {
  return Math.abs(min) > Math.abs(max) ? min : max;
}

/** Two lines where the figure jumps, one where there is nothing to measure or nothing to see. */
function jumpLines(seam: Seam, pieces: ReadonlyMap<PieceId, Piece>, style: LengthStyle): string[] {
  const relation = seamRelation(seam, pieces);
  if (relation === "no-wood") return [];
  if (relation === "turned") return ["turned"];
  if (seam.jump === null) return ["other wood"];
  const [along, across] = [jumpOf(seam.jump.along), jumpOf(seam.jump.across)];
  if (along === 0 && across === 0) return [`jump ${printedLength(um(0), style).figure}`];
  return [`along ${printedLength(along, style).figure}`, `across ${printedLength(across, style).figure}`];
}

function overlap(a: JumpChip, b: JumpChip): boolean {
  return Math.abs(a.x - b.x) < CHIP_SIZE.width + 2 && Math.abs(a.y - b.y) < (chipHeight(a) + chipHeight(b)) / 2 + 2;
}
